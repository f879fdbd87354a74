package io.github.polewright.samples.report;

import io.github.polewright.Cascade;
import io.github.polewright.Section;

/** The size of a cascade's response, from its coefficients at z = exp(j w). */
final class ResponseCurve {

    // A zero lies on the line itself; a chart needs an end.
    private static final double LEAST = 1e-5;

    private ResponseCurve() {}

    static double decibels(Cascade cascade, double frequencyHz) {
        double angle = 2 * Math.PI * frequencyHz / cascade.sampleRateHz();
        double product = 1;
        for (Section section : cascade.sections()) {
            product *=
                    size(section.b0(), section.b1(), section.b2(), angle) / size(1, section.a1(), section.a2(), angle);
        }
        return 20 * Math.log10(Math.max(LEAST, product));
    }

    private static double size(double c0, double c1, double c2, double angle) {
        double real = c0 + c1 * Math.cos(angle) + c2 * Math.cos(2 * angle);
        double imaginary = c1 * Math.sin(angle) + c2 * Math.sin(2 * angle);
        return Math.hypot(real, imaginary);
    }
}
