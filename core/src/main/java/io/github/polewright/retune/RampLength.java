package io.github.polewright.retune;

/**
 * How many frames a straight ramp needs so that what it adds is gone when it ends. Derived for this project.
 *
 * <p>A state without input is bounded by e^(d/2) sigma^N after N frames, so N = d / ln(1/sigma^2) would leave it no
 * larger than before. That does not bound the output for a bounded input: repeated changes can then still be timed so
 * that the output grows without limit. Only the share kappa = 1/2 of the frozen decay is therefore spent on changes, and
 * the other half is left to the input.
 */
final class RampLength {

    /** kappa, the share of the frozen decay that changes may use up. */
    static final double SHARE = 0.5;

    private RampLength() {}

    /** d / (kappa ln(1/max(a2, c2))), not rounded; with sigma^2 in place of a2 where poles are real. */
    static double frames(double distance, double a1, double a2, double c1, double c2) {
        if (distance == 0) {
            return 0;
        }
        double decay = Poles.leastDecay(a1, a2, c1, c2);
        return distance / (SHARE * -2 * Math.log1p(-decay));
    }

    /** What the bucket loses in one frame, kappa ln(1/sigma), from below and without a logarithm. */
    static double leak(double leastDecay) {
        return SHARE * 2 * leastDecay / (2 - leastDecay);
    }
}
