package io.github.polewright.inspect;

import io.github.polewright.Cascade;
import io.github.polewright.Section;

/** The sum of the sizes of a cascade's impulse response. */
final class WorstOutput {

    private static final double MOST_FRAMES = 1e8;
    private static final double NEGLIGIBLE = 1e-12;
    private static final double SUBNORMAL_GUARD = 1e-290;

    private WorstOutput() {}

    static double of(Cascade cascade, double slowestDecay) {
        if (!cascade.isStable()) {
            return Double.POSITIVE_INFINITY;
        }
        double ringFrames = Math.log(1000) / slowestDecay;
        if (ringFrames > MOST_FRAMES) {
            throw new IllegalStateException(
                    "the cascade rings for " + ringFrames + " frames; it must be at most " + MOST_FRAMES);
        }
        // A stretch in which the slowest pole falls by 60 dB: once one adds next to nothing, all later ones add less.
        int stretch = (int) ringFrames + 64 + 2 * cascade.sectionCount();
        double[] state = new double[2 * cascade.sectionCount()];
        double sum = Math.abs(step(cascade, state, 1));
        double added = sum;
        while (added > NEGLIGIBLE * sum || added == sum) {
            added = 0;
            for (int i = 0; i < stretch; i++) {
                added += Math.abs(step(cascade, state, 0));
            }
            sum += added;
            if (sum == 0) {
                break;
            }
        }
        return sum;
    }

    /** One frame through all sections, transposed direct form II. */
    private static double step(Cascade cascade, double[] state, double input) {
        double sample = input;
        for (int i = 0; i < cascade.sectionCount(); i++) {
            Section section = cascade.section(i);
            double output = section.b0() * sample + state[2 * i];
            double first = section.b1() * sample - section.a1() * output + state[2 * i + 1];
            double second = section.b2() * sample - section.a2() * output;
            state[2 * i] = Math.abs(first) < SUBNORMAL_GUARD ? 0 : first;
            state[2 * i + 1] = Math.abs(second) < SUBNORMAL_GUARD ? 0 : second;
            sample = output;
        }
        return sample;
    }
}
