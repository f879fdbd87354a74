package io.github.polewright.samples.retune;

import io.github.polewright.Section;

/** The usual way, for comparison: transposed direct form II, new coefficients from one sample to the next. */
final class HardSwap {

    private double s1;
    private double s2;

    void run(Section section, double[] samples, int from, int to) {
        for (int n = from; n < to; n++) {
            double x = samples[n];
            double y = section.b0() * x + s1;
            s1 = section.b1() * x - section.a1() * y + s2;
            s2 = section.b2() * x - section.a2() * y;
            samples[n] = y;
        }
    }
}
