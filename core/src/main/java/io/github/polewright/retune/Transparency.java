package io.github.polewright.retune;

/** Sections, five coefficients in a larger array, that let a signal or parts of it through unchanged. */
final class Transparency {

    private static final double GAIN_TOLERANCE = 0.1;

    private Transparency() {}

    static boolean same(double[] one, double[] other, int at) {
        for (int i = at; i < at + Knots.WIDTH; i++) {
            if (one[i] != other[i]) {
                return false;
            }
        }
        return true;
    }

    static boolean passesThrough(double[] c, int at) {
        return c[at] == 1 && c[at + 1] == 0 && c[at + 2] == 0 && c[at + 3] == 0 && c[at + 4] == 0;
    }

    /** b = a: the section passes its input through whatever its poles. */
    static void set(double[] c, int at, double a1, double a2) {
        c[at] = 1;
        c[at + 1] = a1;
        c[at + 2] = a2;
        c[at + 3] = a1;
        c[at + 4] = a2;
    }

    /**
     * Notches and bells: the gain is near 1 at both ends of the band, so that such a section may fade out and another
     * in. A low-pass or shelf that faded would let through what it is there to hold back.
     */
    static boolean opensBothEnds(double[] c, int at) {
        double low = (c[at] + c[at + 1] + c[at + 2]) / (1 + c[at + 3] + c[at + 4]);
        double high = (c[at] - c[at + 1] + c[at + 2]) / (1 - c[at + 3] + c[at + 4]);
        return Math.abs(low - 1) <= GAIN_TOLERANCE && Math.abs(high - 1) <= GAIN_TOLERANCE;
    }
}
