package io.github.polewright.retune;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.function.DoubleFunction;

/** Makes glides: chooses knots and lengths, and certifies each section before anything is handed over. */
final class GlidePlan {

    static final double HOP_FRACTION = 0.7;

    private static final int GENTLE_KNOTS = 64;
    private static final int MOST_LEGS = 16;
    private static final int LEAST_GENTLE_FRAMES = 8;
    private static final double LONGEST_FRAMES = 1 << 30;

    private static final int WIDTH = Knots.WIDTH;

    private GlidePlan() {}

    static Glide straight(Cascade from, Cascade to, Pace pace) {
        Changes changes = Changes.between(from, to);
        double octaves = widestOctaves(changes.start(), changes.end());
        return glide(from, changes, share -> mix(changes.start(), changes.end(), share), 1, octaves, pace);
    }

    static Glide sweeping(Cascade from, Cascade to, Pace pace) {
        Changes changes = Changes.between(from, to);
        double octaves = Analogue.widestOctaves(changes.start(), changes.end());
        return glide(
                from,
                changes,
                share -> Analogue.mix(changes.start(), changes.end(), share),
                legs(octaves),
                octaves,
                pace);
    }

    /** Births at once, the moves, then a wait for what dies, and a second move for what is born in its place. */
    private static Glide glide(
            Cascade from, Changes changes, DoubleFunction<double[]> path, int legs, double octaves, Pace pace) {
        boolean straight = legs == 1;
        GlideDraft shortestWay = new GlideDraft(changes.start());
        walk(shortestWay, path, legs, straight, 0, false);
        double wish = pace.frames(from.sampleRateHz(), (double) most(shortestWay.shortest()), octaves);
        GlideDraft draft = new GlideDraft(changes.first());
        if (changes.hasBirths()) {
            draft.swap(changes.start());
        }
        walk(draft, path, legs, straight, wish, pace.isGentle());
        long[] shortest = straight ? shortestWay.shortest() : draft.shortest();
        if (changes.holdFrames() > 0) {
            draft.hold(changes.holdFrames());
            draft.swap(changes.swapped());
        }
        if (changes.hasExchanges()) {
            walk(draft, share -> mix(changes.swapped(), changes.last(), share), 1, true, wish, pace.isGentle());
        }
        return draft.finish(
                from, cascade(from.sampleRateHz(), changes.last()), shortest, straight, changes.exchanged());
    }

    private static int legs(double octaves) {
        return (int) Math.max(1, Math.min(MOST_LEGS, Math.ceil(2 * octaves)));
    }

    static Glide along(CascadeDesign design, Setting from, Setting to, Pace pace) {
        Cascade first = design.design(from.frequencyHz(), from.q(), from.gainDb());
        Cascade last = design.design(to.frequencyHz(), to.q(), to.gainDb());
        requireAlike(first, first, from);
        requireAlike(first, last, to);
        double octaves = from.octavesTo(to);
        int legs = legs(octaves);
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

    private static void requireAlike(Cascade first, Cascade knot, Setting at) {
        Objects.requireNonNull(knot, () -> "design returned null at " + at);
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

    static void put(double[] flat, int slot, Section section) {
        int at = slot * WIDTH;
        flat[at] = section.b0();
        flat[at + 1] = section.b1();
        flat[at + 2] = section.b2();
        flat[at + 3] = section.a1();
        flat[at + 4] = section.a2();
    }
}
