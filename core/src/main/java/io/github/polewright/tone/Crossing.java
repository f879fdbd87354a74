package io.github.polewright.tone;

/** Where between two hops an amplitude passes a threshold, by a straight line. */
final class Crossing {

    private Crossing() {}

    /** All three are powers; 0 is the hop before, 1 the hop after. */
    static double between(double before, double after, double threshold) {
        double from = Math.sqrt(before);
        double step = Math.sqrt(after) - from;
        return step == 0 ? 1 : Math.max(0, Math.min(1, (Math.sqrt(threshold) - from) / step));
    }
}
