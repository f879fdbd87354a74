package io.github.polewright.retune;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.Arrays;

/** Moves the sections of a finished glide to the slots where a running cascade has them. */
final class SlotOrder {

    private static final int WIDTH = Knots.WIDTH;

    private SlotOrder() {}

    static Glide arrange(Glide glide, Cascade running) {
        if (running.sampleRateHz() != glide.from().sampleRateHz()) {
            throw new RefusedGlideException(
                    -1,
                    "the glide's sampleRateHz is " + glide.from().sampleRateHz() + "; it must be "
                            + running.sampleRateHz());
        }
        Pairing pairing = Pairing.of(running, glide.from());
        int[] sources = new int[running.sectionCount()];
        for (int slot = 0; slot < sources.length; slot++) {
            sources[slot] = pairing.target(slot);
        }
        placeTheRest(glide, running, sources);
        Knots knots = knots(glide, sources);
        double freeLeak = Bucket.leak(0, 0, 0, 0);
        Certificate[] certificates = new Certificate[sources.length];
        for (int slot = 0; slot < sources.length; slot++) {
            certificates[slot] = sources[slot] < 0
                    ? new Certificate(slot, Certificate.Rule.STILL, 0, 1, 0, knots)
                    : glide.certificate(sources[slot]).inSlot(slot, knots);
        }
        double rate = running.sampleRateHz();
        return new Glide(
                GlidePlan.cascade(rate, knots.at(0)),
                GlidePlan.cascade(rate, knots.last()),
                knots,
                rows(glide.distances(), sources, 0),
                rows(glide.leaks(), sources, freeLeak),
                glide.movingFrames(),
                certificates);
    }

    /** Sections that pass through at the first knot are no part of a pairing; those that become something need a slot. */
    private static void placeTheRest(Glide glide, Cascade running, int[] sources) {
        for (int section = 0; section < glide.sectionCount(); section++) {
            boolean starts = !glide.from().section(section).equals(Section.PASS_THROUGH);
            if (starts || glide.target().section(section).equals(Section.PASS_THROUGH)) {
                continue;
            }
            int slot = 0;
            while (slot < sources.length
                    && (sources[slot] >= 0 || !running.section(slot).equals(Section.PASS_THROUGH))) {
                slot++;
            }
            if (slot == sources.length) {
                throw new RefusedGlideException(section, "born in a cascade that has no free slot for it");
            }
            sources[slot] = section;
        }
    }

    private static Knots knots(Glide glide, int[] sources) {
        int[] frames = new int[glide.segmentCount()];
        double[][] knots = new double[frames.length + 1][];
        for (int i = 0; i < knots.length; i++) {
            if (i < frames.length) {
                frames[i] = glide.frames(i);
            }
            knots[i] = GlidePlan.flat(Cascade.of(
                    glide.from().sampleRateHz(),
                    Arrays.stream(sources).mapToObj(x -> Section.PASS_THROUGH).toList()));
            for (int slot = 0; slot < sources.length; slot++) {
                if (sources[slot] >= 0) {
                    System.arraycopy(glide.knot(i), sources[slot] * WIDTH, knots[i], slot * WIDTH, WIDTH);
                }
            }
        }
        return new Knots(frames, knots);
    }

    private static double[][] rows(double[][] rows, int[] sources, double free) {
        double[][] moved = new double[rows.length][sources.length];
        for (int i = 0; i < rows.length; i++) {
            for (int slot = 0; slot < sources.length; slot++) {
                moved[i][slot] = sources[slot] < 0 ? free : rows[i][sources[slot]];
            }
        }
        return moved;
    }
}
