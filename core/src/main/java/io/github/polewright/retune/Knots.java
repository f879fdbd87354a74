package io.github.polewright.retune;

/** Coefficient sets and the frames between them; never changed after the glide is made. */
final class Knots {

    static final int WIDTH = 5;

    private final int[] frames;
    private final double[][] coefficients;

    /** Takes the arrays as they are. */
    Knots(int[] frames, double[][] coefficients) {
        this.frames = frames;
        this.coefficients = coefficients;
    }

    int segmentCount() {
        return frames.length;
    }

    int frames(int segment) {
        return frames[segment];
    }

    long totalFrames() {
        long total = 0;
        for (int length : frames) {
            total += length;
        }
        return total;
    }

    double[] at(int knot) {
        return coefficients[knot];
    }

    double[] last() {
        return coefficients[frames.length];
    }

    /** Follows one section frame by frame along the whole path, in direct form I arithmetic with |x| at most 1. */
    double forcedBound(int section) {
        int at = section * WIDTH;
        int first = 0;
        while (first < frames.length && frames[first] == 0) {
            first++;
        }
        double[] c = coefficients[first];
        ForcedBound bound = new ForcedBound(c[at], c[at + 1], c[at + 2], c[at + 3], c[at + 4]);
        double worst = bound.rest();
        for (int segment = first; segment < frames.length; segment++) {
            if (frames[segment] == 0) {
                // What rang is gone, and another section begins where the signal passes through.
                double[] next = coefficients[segment + 1];
                bound = new ForcedBound(next[at], next[at + 1], next[at + 2], next[at + 3], next[at + 4]);
            } else {
                worst = Math.max(worst, along(bound, segment, at));
            }
        }
        return Math.max(worst, bound.rest());
    }

    private double along(ForcedBound bound, int segment, int at) {
        double[] c = coefficients[segment];
        double[] n = coefficients[segment + 1];
        double share = 1.0 / frames[segment];
        double worst = 0;
        for (int i = 1; i <= frames[segment]; i++) {
            double s = i == frames[segment] ? 1 : i * share;
            bound.change(
                    mix(c[at], n[at], s),
                    mix(c[at + 1], n[at + 1], s),
                    mix(c[at + 2], n[at + 2], s),
                    mix(c[at + 3], n[at + 3], s),
                    mix(c[at + 4], n[at + 4], s));
            bound.step();
            worst = Math.max(worst, bound.output());
        }
        return worst;
    }

    /** Exact at both ends. */
    static double mix(double from, double to, double share) {
        // Not fused: where the hardware has no such instruction, Math.fma allocates, and audio threads come here.
        return share >= 1 ? to : share * (to - from) + from;
    }
}
