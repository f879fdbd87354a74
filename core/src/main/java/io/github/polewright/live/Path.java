package io.github.polewright.live;

/**
 * Where the coefficients are to go: an immutable list of knots, each with the frames from the one before it. Handed
 * from a control thread to the audio thread, whole.
 */
final class Path {

    private final long number;
    private final int[] frames;
    private final double[][] knots;

    /**
     * A path; the arrays are taken over, not copied.
     *
     * @param number one more than the path it follows in the slot
     * @param frames to each knot, at least 1 each
     * @param knots five coefficients a section, all sections of the live cascade
     */
    Path(long number, int[] frames, double[][] knots) {
        this.number = number;
        this.frames = frames;
        this.knots = knots;
    }

    long number() {
        return number;
    }

    int knotCount() {
        return frames.length;
    }

    int frames(int knot) {
        return frames[knot];
    }

    double[] knot(int knot) {
        return knots[knot];
    }
}
