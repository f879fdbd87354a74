package io.github.polewright.design;

import io.github.polewright.Section;

/** The checks every design makes before it computes, and the one it makes after. */
final class Check {

    private Check() {}

    static void sampleRate(double sampleRateHz) {
        positive("sampleRateHz", sampleRateHz);
    }

    static void positive(String name, double value) {
        if (!(value > 0 && value < Double.POSITIVE_INFINITY)) {
            throw refused(name, value, "positive and finite");
        }
    }

    static void finite(String name, double value) {
        if (!Double.isFinite(value)) {
            throw refused(name, value, "finite");
        }
    }

    /** A frequency or a width of the band, with the sample rate already checked. */
    static void belowNyquist(String name, double hertz, double sampleRateHz) {
        if (!(hertz > 0 && hertz < sampleRateHz / 2)) {
            throw refused(name, hertz, "above 0 and below " + sampleRateHz / 2 + ", half the sample rate");
        }
    }

    /** A quality factor that stands for the width {@code centreHz / q}. */
    static void quality(double q, double centreHz, double sampleRateHz) {
        positive("q", q);
        double widthHz = centreHz / q;
        if (!(widthHz > 0 && widthHz < sampleRateHz / 2)) {
            throw refused(
                    "q",
                    q,
                    "finite and above " + 2 * centreHz / sampleRateHz
                            + ", where the width centreHz / q is half the sample rate");
        }
    }

    /** Extreme but legal wishes may round to a pole on the unit circle; the parameter to blame is named. */
    static Section stable(Section section, String name, double value, String range) {
        if (!section.isStable()) {
            throw refused(name, value, range + "; the poles round to the unit circle or beyond");
        }
        return section;
    }

    static IllegalArgumentException refused(String name, double value, String range) {
        return new IllegalArgumentException(name + " is " + value + "; it must be " + range);
    }
}
