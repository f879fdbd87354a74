package io.github.polewright.retune;

/**
 * Sections seen through the bilinear transform z^-1 = (1 - s)/(1 + s), as
 * {@code (n0 + n1 s + n2 s^2) / (d0 + d1 s + s^2)}. Every positive d0 and d1 is a stable section and the reverse, so any
 * mean of two sections taken there is stable. The geometric mean of two sections of one kind that differ in frequency, Q
 * and gain in decibels is the section of that kind at the mean log frequency, log Q and decibels. Derived for this
 * project.
 */
final class Analogue {

    private static final int WIDTH = Knots.WIDTH;
    private static final double SMALLEST_SHARE = 1e-12;

    private Analogue() {}

    /** A knot at a share of the way, exact at both ends; sections that are the same at both ends stay exactly so. */
    static double[] mix(double[] start, double[] end, double share) {
        if (share <= 0) {
            return start.clone();
        }
        double[] mixed = end.clone();
        for (int at = 0; share < 1 && at < mixed.length; at += WIDTH) {
            if (!Transparency.same(start, end, at)) {
                if (start[at + 3] == end[at + 3] && start[at + 4] == end[at + 4] && isFade(start, end, at)) {
                    straight(start, end, share, mixed, at);
                } else {
                    section(start, end, share, mixed, at);
                }
            }
        }
        return mixed;
    }

    /** Births and deaths, whose numerator alone moves and to or from b = a: a straight line keeps the poles exactly. */
    private static boolean isFade(double[] start, double[] end, int at) {
        return isTransparent(start, at) || isTransparent(end, at);
    }

    private static boolean isTransparent(double[] c, int at) {
        return c[at] == 1 && c[at + 1] == c[at + 3] && c[at + 2] == c[at + 4];
    }

    private static void straight(double[] start, double[] end, double share, double[] mixed, int at) {
        for (int i = at; i < at + WIDTH; i++) {
            mixed[i] = Knots.mix(start[i], end[i], share);
        }
    }

    private static void section(double[] start, double[] end, double share, double[] mixed, int at) {
        double one = low(1, start[at + 3], start[at + 4]);
        double other = low(1, end[at + 3], end[at + 4]);
        double oneHigh = high(1, start[at + 3], start[at + 4]);
        double otherHigh = high(1, end[at + 3], end[at + 4]);
        double d0 = mean(one / oneHigh, other / otherHigh, share);
        double d1 = mean(2 * (1 - start[at + 4]) / oneHigh, 2 * (1 - end[at + 4]) / otherHigh, share);
        double n0 = mean(
                low(start[at], start[at + 1], start[at + 2]) / oneHigh,
                low(end[at], end[at + 1], end[at + 2]) / otherHigh,
                share);
        double n1 = mean(2 * (start[at] - start[at + 2]) / oneHigh, 2 * (end[at] - end[at + 2]) / otherHigh, share);
        double n2 = mean(
                high(start[at], start[at + 1], start[at + 2]) / oneHigh,
                high(end[at], end[at + 1], end[at + 2]) / otherHigh,
                share);
        double size = d0 + d1 + 1;
        if (start[at + 3] != end[at + 3] || start[at + 4] != end[at + 4]) {
            mixed[at + 3] = 2 * (d0 - 1) / size;
            mixed[at + 4] = (d0 - d1 + 1) / size;
        }
        mixed[at] = (n0 + n1 + n2) / size;
        mixed[at + 1] = 2 * (n0 - n2) / size;
        mixed[at + 2] = (n0 - n1 + n2) / size;
    }

    /** How far the poles move, in octaves of the analogue frequency sqrt(d0). */
    static double widestOctaves(double[] start, double[] end) {
        double widest = 0;
        for (int at = 0; at < start.length; at += WIDTH) {
            double one = low(1, start[at + 3], start[at + 4]) / high(1, start[at + 3], start[at + 4]);
            double other = low(1, end[at + 3], end[at + 4]) / high(1, end[at + 3], end[at + 4]);
            widest = Math.max(widest, 0.5 * Math.abs(Math.log(other / one)) / Math.log(2));
        }
        return widest;
    }

    private static double low(double c0, double c1, double c2) {
        return c0 + c1 + c2;
    }

    private static double high(double c0, double c1, double c2) {
        return c0 - c1 + c2;
    }

    /** Geometric for numbers of one sign, straight where one is 0, or next to it by rounding, or of the other sign. */
    private static double mean(double one, double other, double share) {
        double ratio = other / one;
        if (ratio > SMALLEST_SHARE && ratio < 1 / SMALLEST_SHARE) {
            return one * Math.pow(ratio, share);
        }
        return Knots.mix(one, other, share);
    }
}
