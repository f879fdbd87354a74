package io.github.polewright.bench.contest;

import io.github.polewright.bench.measure.Contest;
import io.github.polewright.bench.workload.Case;
import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.Motion;
import io.github.polewright.bench.workload.Rig;
import io.github.polewright.bench.workload.Samples;
import io.github.polewright.bench.workload.Signal;
import io.github.polewright.live.Form;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Supplier;

/** The promised ratios and the players they need, for one form. */
final class Goals {

    private static final double RATE_HZ = 48_000;
    private static final double FLAT = 1.10;

    private final Map<String, Supplier<Rig>> players = new LinkedHashMap<>();
    private final List<Goal> goals = new ArrayList<>();
    private final Chain base;
    private final String prefix;

    Goals(Form form) {
        base = new Chain(RATE_HZ, 1, 64, 8, form);
        prefix = prefix(form);
        String plain = live(Case.plain(base));
        textbook(1, 64, 2);
        textbook(1, 512, 2);
        textbook(8, 64, 3);
        textbook(8, 512, 3.5);
        most("stereo / mono, per sample", live(Case.plain(base.withChannels(2))), plain, 0.95);
        shown("8 channels / mono, per sample", live(Case.plain(base.withChannels(8))), plain);
        shown("32 channels / mono, per sample", live(Case.plain(base.withChannels(32))), plain);
        String four = live(Case.plain(base.withSections(4)));
        most("16 sections / 4, per section", live(Case.plain(base.withSections(16))), four, FLAT);
        most("64 sections / 4, per section", live(Case.plain(base.withSections(64))), four, FLAT);
        most("512 frames / 64, per frame", live(Case.plain(base.withFrames(512))), plain, FLAT);
        most("4096 frames / 64, per frame", live(Case.plain(base.withFrames(4096))), plain, FLAT);
        Case floats = Case.plain(base).with(Samples.FLOAT);
        most("float samples / double", live(floats), plain, 1.10);
        most("decay / noise, double", live(Case.plain(base).with(Signal.DECAY)), plain, 1.3);
        most("decay / noise, float", live(floats.with(Signal.DECAY)), live(floats), 1.3);
        most("subnormal input / noise, double", live(Case.plain(base).with(Signal.SUBNORMAL)), plain, 1.3);
        most("subnormal input / noise, float", live(floats.with(Signal.SUBNORMAL)), live(floats), 1.3);
        most("ramp / steady", live(Case.plain(base).with(Motion.RAMPING)), plain, 1.25);
        shown(
                "for comparison: objects' own decay / noise",
                objects(Case.plain(base).with(Signal.DECAY)),
                objects(Case.plain(base)));
    }

    static String prefix(Form form) {
        return form == Form.DIRECT_FORM_1 ? "DF I: " : "DF II T: ";
    }

    private void textbook(int sections, int frames, double least) {
        Case plain = Case.plain(base.withSections(sections).withFrames(frames));
        String name = sections == 1 ? "1 section" : sections + " sections";
        goals.add(Goal.atLeast(
                prefix + "objects / live, " + name + ", " + frames + " frames", objects(plain), live(plain), least));
    }

    private void most(String name, String over, String under, double most) {
        goals.add(Goal.atMost(prefix + name, over, under, most));
    }

    private void shown(String name, String over, String under) {
        goals.add(Goal.shown(prefix + name, over, under));
    }

    private String live(Case what) {
        String key = "live: " + what;
        players.put(key, what::live);
        return key;
    }

    private String objects(Case what) {
        String key = "objects: " + what;
        players.put(key, what::objects);
        return key;
    }

    List<Goal> list() {
        return List.copyOf(goals);
    }

    void enter(Contest contest) {
        players.forEach((name, rig) -> contest.add(name, rig.get()));
    }

    /** The two players that tell what emulation of a missing instruction would cost, in each form. */
    static void enterForFusion(Contest contest) {
        for (Form form : Form.values()) {
            Case plain = Case.plain(new Chain(RATE_HZ, 1, 64, 8, form));
            contest.add(fusionLive(form), plain.live());
            contest.add(fusionObjects(form), plain.objects());
        }
    }

    static String fusionLive(Form form) {
        return "live " + form;
    }

    static String fusionObjects(Form form) {
        return "objects " + form;
    }
}
