package io.github.polewright.retune;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleFunction;

/** Makes glides: chooses knots and lengths, and certifies each section before anything is handed over. */
final class GlidePlan {

    static final double HOP_FRACTION = 0.7;

    private static final int GENTLE_KNOTS = 32;
    private static final int MOST_LEGS = 16;
    private static final int LEAST_GENTLE_FRAMES = 8;
    private static final double LONGEST_FRAMES = 1 << 30;

    /** The amplitude left of what a dying section still rings when it is swapped out: -120 dB. */
    private static final double DECAYED = 1e-6;

    private static final int WIDTH = Knots.WIDTH;

    private GlidePlan() {}

    static Glide straight(Cascade from, Cascade to, Pace pace) {
        if (from.sampleRateHz() != to.sampleRateHz()) {
            throw new RefusedGlideException(
                    -1, "the target's sampleRateHz is " + to.sampleRateHz() + "; it must be " + from.sampleRateHz());
        }
        Pairing pairing = Pairing.of(from, to);
        double[] first = flat(from);
        double[] start = first.clone();
        double[] end = first.clone();
        double[] last = first.clone();
        boolean births = false;
        int hold = 0;
        for (int slot = 0; slot < from.sectionCount(); slot++) {
            int target = pairing.target(slot);
            if (target >= 0) {
                put(end, slot, to.section(target));
                put(last, slot, to.section(target));
                if (pairing.isBorn(slot)) {
                    becomeTransparent(
                            start,
                            slot,
                            to.section(target).a1(),
                            to.section(target).a2());
                    births = true;
                }
            } else if (pairing.isDying(slot)) {
                Section old = from.section(slot);
                becomeTransparent(end, slot, old.a1(), old.a2());
                put(last, slot, Section.PASS_THROUGH);
                hold = Math.max(hold, decayFrames(slot, old));
            }
        }
        Cascade target = cascade(from.sampleRateHz(), last);
        GlideDraft draft = new GlideDraft(first);
        if (births) {
            draft.swap(start);
        }
        long[] shortest = shortestStraight(start, end);
        double octaves = widestOctaves(start, end);
        walk(
                draft,
                share -> mix(start, end, share),
                1,
                true,
                pace.frames(from.sampleRateHz(), (double) most(shortest), octaves),
                pace.isGentle());
        if (hold > 0) {
            draft.hold(hold);
            draft.swap(last);
        }
        return draft.finish(from, target, shortest, true);
    }

    static Glide along(CascadeDesign design, Setting from, Setting to, Pace pace) {
        Cascade first = design.design(from.frequencyHz(), from.q(), from.gainDb());
        Cascade last = design.design(to.frequencyHz(), to.q(), to.gainDb());
        requireAlike(first, first, from);
        requireAlike(first, last, to);
        double octaves = from.octavesTo(to);
        int legs = (int) Math.max(1, Math.min(MOST_LEGS, Math.ceil(2 * octaves)));
        DoubleFunction<double[]> path = share -> {
            Setting at = from.towards(to, share);
            Cascade knot = design.design(at.frequencyHz(), at.q(), at.gainDb());
            requireAlike(first, knot, at);
            return flat(knot);
        };
        GlideDraft shortestWay = new GlideDraft(flat(first));
        walk(shortestWay, path, legs, legs == 1, 0, false);
        double wish = pace.frames(first.sampleRateHz(), (double) most(shortestWay.shortest()), octaves);
        GlideDraft draft = new GlideDraft(flat(first));
        boolean straight = legs == 1 && !pace.isGentle();
        walk(draft, path, legs, straight, wish, pace.isGentle());
        long[] shortest = straight ? shortestStraight(flat(first), flat(last)) : draft.shortest();
        return draft.finish(first, last, shortest, straight);
    }

    /** Knots at even times; at a gentle pace their places follow the smoothstep, 3u^2 - 2u^3. */
    private static void walk(
            GlideDraft draft, DoubleFunction<double[]> path, int legs, boolean straight, double wish, boolean gentle) {
        int segments = legs;
        if (gentle) {
            segments = (int) Math.max(legs, Math.min(GENTLE_KNOTS, Math.floor(wish / LEAST_GENTLE_FRAMES)));
        }
        double before = 0;
        for (int i = 1; i <= segments; i++) {
            double time = (double) i / segments;
            double share = gentle && i < segments ? time * time * (3 - 2 * time) : time;
            double until = Math.rint(wish * time);
            draft.move(path.apply(share), until - before, straight, i == segments);
            before = until;
        }
    }

    private static long[] shortestStraight(double[] start, double[] end) {
        GlideDraft once = new GlideDraft(start);
        once.move(end, 0, true, true);
        return once.shortest();
    }

    static boolean mayJump(double a1, double a2, double c1, double c2) {
        return Distance.hopFraction(a1, a2, c1, c2) <= HOP_FRACTION;
    }

    static int wholeFrames(int section, double frames) {
        if (!(frames <= LONGEST_FRAMES)) {
            throw new RefusedGlideException(
                    section,
                    "too close to instability: its ramp would take " + frames + " frames; at most " + LONGEST_FRAMES
                            + " are possible");
        }
        return (int) Math.ceil(frames);
    }

    private static int decayFrames(int slot, Section section) {
        double decay = Poles.decay(section.a1(), section.a2());
        return 1 + wholeFrames(slot, Math.log(DECAYED) / Math.log1p(-decay));
    }

    private static void requireAlike(Cascade first, Cascade knot, Setting at) {
        if (knot.sampleRateHz() != first.sampleRateHz() || knot.sectionCount() != first.sectionCount()) {
            throw new RefusedGlideException(
                    -1,
                    "at " + at + " the design has " + knot.sectionCount() + " sections at " + knot.sampleRateHz()
                            + " Hz; it must have " + first.sectionCount() + " at " + first.sampleRateHz() + " Hz");
        }
        for (int i = 0; i < knot.sectionCount(); i++) {
            if (!knot.section(i).isStable()) {
                throw new RefusedGlideException(i, "not stable at " + at + ": " + knot.section(i));
            }
        }
    }

    private static double widestOctaves(double[] start, double[] end) {
        double widest = 0;
        for (int at = 0; at < start.length; at += WIDTH) {
            boolean complex =
                    Poles.areComplex(start[at + 3], start[at + 4]) && Poles.areComplex(end[at + 3], end[at + 4]);
            if (complex) {
                double ratio = Poles.angle(end[at + 3], end[at + 4]) / Poles.angle(start[at + 3], start[at + 4]);
                widest = Math.max(widest, Math.abs(Math.log(ratio)) / Math.log(2));
            }
        }
        return widest;
    }

    private static long most(long[] values) {
        long most = 0;
        for (long value : values) {
            most = Math.max(most, value);
        }
        return most;
    }

    private static double[] mix(double[] start, double[] end, double share) {
        double[] mixed = new double[start.length];
        for (int i = 0; i < mixed.length; i++) {
            mixed[i] = Knots.mix(start[i], end[i], share);
        }
        return mixed;
    }

    static double[] flat(Cascade cascade) {
        double[] flat = new double[cascade.sectionCount() * WIDTH];
        for (int i = 0; i < cascade.sectionCount(); i++) {
            put(flat, i, cascade.section(i));
        }
        return flat;
    }

    static Cascade cascade(double sampleRateHz, double[] flat) {
        List<Section> sections = new ArrayList<>();
        for (int at = 0; at < flat.length; at += WIDTH) {
            sections.add(Section.of(flat[at], flat[at + 1], flat[at + 2], flat[at + 3], flat[at + 4]));
        }
        return Cascade.of(sampleRateHz, sections);
    }

    private static void put(double[] flat, int slot, Section section) {
        int at = slot * WIDTH;
        flat[at] = section.b0();
        flat[at + 1] = section.b1();
        flat[at + 2] = section.b2();
        flat[at + 3] = section.a1();
        flat[at + 4] = section.a2();
    }

    /** b = a: the section passes its input through whatever its poles. */
    private static void becomeTransparent(double[] flat, int slot, double a1, double a2) {
        int at = slot * WIDTH;
        flat[at] = 1;
        flat[at + 1] = a1;
        flat[at + 2] = a2;
        flat[at + 3] = a1;
        flat[at + 4] = a2;
    }
}
