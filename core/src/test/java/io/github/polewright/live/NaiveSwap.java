package io.github.polewright.live;

import io.github.polewright.Section;

/** What is compared with: one section whose coefficients change without care. */
final class NaiveSwap {

    private NaiveSwap() {}

    /** Direct form I; new coefficients from one frame to the next. */
    static double[] hard(Section before, Section after, int at, double[] in) {
        double[] out = new double[in.length];
        double x1 = 0, x2 = 0, y1 = 0, y2 = 0;
        for (int n = 0; n < in.length; n++) {
            Section s = n < at ? before : after;
            double y = s.b0() * in[n] + s.b1() * x1 + s.b2() * x2 - s.a1() * y1 - s.a2() * y2;
            x2 = x1;
            x1 = in[n];
            y2 = y1;
            y1 = y;
            out[n] = y;
        }
        return out;
    }

    /** Transposed direct form II; coefficients go in a straight line, a step at every block's start. */
    static double[] transposedByBlocks(
            Section before, Section after, int at, int frames, int blockFrames, double[] in) {
        double[] out = new double[in.length];
        double s1 = 0, s2 = 0;
        for (int n = 0; n < in.length; n++) {
            double done = Math.floor((double) (n - at) / blockFrames + 1) * blockFrames / frames;
            double u = n < at ? 0 : Math.min(1, done);
            double y = mix(before.b0(), after.b0(), u) * in[n] + s1;
            double a1 = mix(before.a1(), after.a1(), u);
            double a2 = mix(before.a2(), after.a2(), u);
            s1 = mix(before.b1(), after.b1(), u) * in[n] - a1 * y + s2;
            s2 = mix(before.b2(), after.b2(), u) * in[n] - a2 * y;
            out[n] = y;
        }
        return out;
    }

    private static double mix(double from, double to, double share) {
        return from + (to - from) * share;
    }
}
