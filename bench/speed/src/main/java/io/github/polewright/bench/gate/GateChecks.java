package io.github.polewright.bench.gate;

import io.github.polewright.bench.measure.Allocation;
import io.github.polewright.bench.measure.Contest;
import io.github.polewright.bench.measure.Score;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.workload.Case;
import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.Motion;
import io.github.polewright.bench.workload.Samples;
import io.github.polewright.bench.workload.Signal;
import io.github.polewright.live.Form;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/** What is gated for one form. */
final class GateChecks {

    static final double MOST_BYTES_A_BLOCK = 1;
    static final double MOST_DECAY_OVER_NOISE = 1.5;
    static final double LINEAR = 1.25;

    /** Ten times what a sample takes a section on a server part of 2023: room for any machine, not for a blunder. */
    static final double MOST_NANOS = 10;

    private static final double RATE_HZ = 48_000;
    private static final int BLOCKS_A_ROUND = 2_000;

    private final Chain base;
    private final Map<String, Case> players = new LinkedHashMap<>();

    GateChecks(Form form) {
        base = new Chain(RATE_HZ, 1, 64, 8, form);
        for (Samples samples : Samples.values()) {
            for (Signal signal : Signal.values()) {
                enter(Case.plain(base).with(samples).with(signal));
            }
        }
        enter(frames(512));
        enter(frames(4096));
        enter(sections(16));
        enter(sections(64));
    }

    private Case frames(int count) {
        return Case.plain(base.withFrames(count));
    }

    private Case sections(int count) {
        return Case.plain(base.withSections(count));
    }

    private void enter(Case what) {
        players.put(what.toString(), what);
    }

    /** Bytes a block in every motion and format. */
    List<Check> allocation() {
        List<Check> checks = new ArrayList<>();
        for (Motion motion : Motion.values()) {
            for (Samples samples : Samples.values()) {
                Case what = Case.plain(base.withChannels(2)).with(motion).with(samples);
                double bytes = Allocation.bytesPerBlock(what.live(), BLOCKS_A_ROUND);
                checks.add(new Check(
                        Row.exact("allocation, " + what, "B a block", bytes), 0, Math.nextDown(MOST_BYTES_A_BLOCK)));
            }
        }
        return checks;
    }

    void enter(Contest contest) {
        players.forEach((name, what) -> contest.add(name, what.live()));
    }

    /** The budget, the decays and the growth, from the scores of the contest that was entered. */
    List<Check> times(Map<String, Score> scores) {
        List<Check> checks = new ArrayList<>();
        for (Samples samples : Samples.values()) {
            Case noise = Case.plain(base).with(samples);
            Score score = score(scores, noise);
            checks.add(Check.atMost(
                    new Row(
                            "cost, " + noise,
                            "ns a sample a section",
                            score.median(),
                            score.quantile(0.25),
                            score.quantile(0.75)),
                    MOST_NANOS));
            for (Signal signal : List.of(Signal.DECAY, Signal.SUBNORMAL)) {
                Case quiet = noise.with(signal);
                checks.add(Check.atMost(ratio(scores, quiet, noise, "over noise, " + quiet), MOST_DECAY_OVER_NOISE));
            }
        }
        linear(checks, scores, frames(512), frames(64), "a frame");
        linear(checks, scores, frames(4096), frames(512), "a frame");
        // From 8 sections on, load and store no longer decide.
        linear(checks, scores, sections(16), sections(8), "a section");
        linear(checks, scores, sections(64), sections(16), "a section");
        return checks;
    }

    private static void linear(List<Check> checks, Map<String, Score> scores, Case large, Case small, String unit) {
        Row ratio = ratio(
                scores,
                large,
                small,
                "cost " + unit + ", " + large + " over " + small.chain().sections() + " sections, "
                        + small.chain().frames() + " frames");
        checks.add(new Check(ratio, 1 / LINEAR, LINEAR));
    }

    private static Row ratio(Map<String, Score> scores, Case over, Case under, String name) {
        Score ratios = score(scores, over).over(score(scores, under));
        return new Row(name, "ratio", ratios.median(), ratios.quantile(0.25), ratios.quantile(0.75));
    }

    private static Score score(Map<String, Score> scores, Case what) {
        return Objects.requireNonNull(scores.get(what.toString()), what::toString);
    }
}
