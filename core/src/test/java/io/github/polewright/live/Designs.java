package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/** Cascades to test with, built from formulas written out here, apart from the design room. */
final class Designs {

    static final double RATE_HZ = 48_000;

    private Designs() {}

    /** All-pass-form peak: tan(pi BW/fs) sets the width exactly (common practice, no source). */
    static Section resonator(double centreHz, double widthHz) {
        double t = Math.tan(Math.PI * widthHz / RATE_HZ);
        double a2 = (1 - t) / (1 + t);
        double a1 = -(1 + a2) * Math.cos(2 * Math.PI * centreHz / RATE_HZ);
        return Section.of((1 - a2) / 2, 0, -(1 - a2) / 2, a1, a2);
    }

    /** All-pass-form notch: 1 minus the peak. */
    static Section notch(double centreHz, double widthHz) {
        double t = Math.tan(Math.PI * widthHz / RATE_HZ);
        double a2 = (1 - t) / (1 + t);
        double a1 = -(1 + a2) * Math.cos(2 * Math.PI * centreHz / RATE_HZ);
        return Section.of((1 + a2) / 2, a1, (1 + a2) / 2, a1, a2);
    }

    /** Second-order low-pass by the bilinear transform of 1/(s² + s/q + 1). */
    static Section lowPass(double cornerHz, double q) {
        double w = 2 * Math.PI * cornerHz / RATE_HZ;
        double alpha = Math.sin(w) / (2 * q);
        double b = (1 - Math.cos(w)) / 2;
        return Section.normalized(b, 2 * b, b, 1 + alpha, -2 * Math.cos(w), 1 - alpha);
    }

    /** First-order section with one real pole, gain 1 at DC. */
    static Section onePole(double pole) {
        return Section.of(1 - pole, 0, 0, -pole, 0);
    }

    static Cascade cascade(Section... sections) {
        return Cascade.of(RATE_HZ, sections);
    }

    /** A mixed cascade of any length: peaks, notches, low-passes and one-poles at random places. */
    static Cascade mixed(long seed, int sections) {
        SplittableRandom random = new SplittableRandom(seed);
        List<Section> list = new ArrayList<>();
        for (int i = 0; i < sections; i++) {
            double hz = 200 * Math.pow(80, random.nextDouble());
            switch (random.nextInt(4)) {
                case 0 -> list.add(notch(hz, hz / 4));
                case 1 -> list.add(lowPass(8_000 + hz / 4, 0.6 + random.nextDouble()));
                case 2 -> list.add(onePole(random.nextDouble() - 0.5));
                default -> {
                    Section peak = resonator(hz, hz / 2);
                    // 1 + peak: a boost of 6 dB that leaves the rest of the band alone.
                    list.add(Section.of(1 + peak.b0(), peak.a1(), peak.b2() + peak.a2(), peak.a1(), peak.a2()));
                }
            }
        }
        return Cascade.of(RATE_HZ, list);
    }
}
