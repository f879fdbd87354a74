package io.github.polewright.retune;

/**
 * What a straight ramp of one section costs: {@link Distance#upperBound} and {@link Bucket#leak} in one pass, since both
 * rest on the same roots. A retune in the middle of a glide asks for them in every slot, on the audio thread, whose own
 * this is.
 */
final class RampMeter {

    private final RealRamp realRamp = new RealRamp();
    private double distance;
    private double leak;

    /** A number not below d. */
    double distance() {
        return distance;
    }

    /** The loss in one frame, from below. */
    double leak() {
        return leak;
    }

    /** Measures the ramp from (a1, a2) to (c1, c2), both stable. */
    void measure(double a1, double a2, double c1, double c2) {
        double firstSquared = Poles.heightSquared(a1, a2);
        double secondSquared = Poles.heightSquared(c1, c2);
        if (!(isClearlyComplex(firstSquared, a2) && isClearlyComplex(secondSquared, c2))) {
            distance = Distance.upperBound(a1, a2, c1, c2, realRamp);
            leak = Bucket.leak(a1, a2, c1, c2);
            return;
        }
        double first = Math.sqrt(firstSquared);
        double second = Math.sqrt(secondSquared);
        double across = 0.5 * (a1 - c1);
        double up = ((c2 - a2) + 0.5 * across * (a1 + c1)) / (first + second);
        distance = 2 * Distance.asinhBound(Math.sqrt((across * across + up * up) / (4 * first * second)));
        double product = Math.max(a2, c2);
        double rest = 1 + Math.sqrt(product);
        leak = RampLength.SHARE * 2 * (1 - product) / (rest * rest);
    }

    /** Stricter than {@link Poles#areComplex}, without its root and division: 1 - rho is at most 1 - a2. */
    private static boolean isClearlyComplex(double heightSquared, double a2) {
        double width = 1 - a2;
        return heightSquared >= 0.25 * width * width;
    }
}
