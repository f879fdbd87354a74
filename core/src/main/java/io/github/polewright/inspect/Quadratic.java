package io.github.polewright.inspect;

import java.util.List;

/**
 * The polynomial {@code c0 + c1 z^-1 + c2 z^-2}, evaluated and solved so that nothing cancels near {@code z = 1} and
 * {@code z = -1}, where low and high filters have their poles.
 */
record Quadratic(double c0, double c1, double c2) {

    /**
     * {@code z} times the polynomial at a point of the unit circle: {@code (c0 + c2) cos w + c1 + j (c0 - c2) sin w},
     * the real part taken from the value at 1 or at -1, whichever is nearer. The factor {@code z} falls out of ratios.
     */
    Complex at(UnitPoint point) {
        double real = point.nearerToOne()
                ? sum(c0, c1, c2) - (c0 + c2) * point.fromOne()
                : (c0 + c2) * point.fromMinusOne() - sum(c0, -c1, c2);
        return new Complex(real, (c0 - c2) * point.sin());
    }

    /**
     * The derivative by {@code w} of the phase of {@link #at}, which is 1 less the polynomial's group delay:
     * {@code (c0 - c2) (c0 + c2 + c1 cos w) / |at|^2} (derived for this project). At a zero on the unit circle the jump
     * of the phase is left out; at {@code z = 1} and {@code z = -1} this is the limit.
     */
    double phaseSlopeAt(UnitPoint point) {
        double difference = c0 - c2;
        if (difference == 0) {
            return 0;
        }
        double magnitude = at(point).magnitude();
        if (magnitude == 0) {
            return (c0 + c2) / (2 * difference);
        }
        double turned = point.nearerToOne()
                ? sum(c0, c1, c2) - c1 * point.fromOne()
                : sum(c0, -c1, c2) + c1 * point.fromMinusOne();
        return difference / magnitude * (turned / magnitude);
    }

    /**
     * The roots in {@code z} of the first {@code degree + 1} coefficients; fewer where leading ones are 0.
     *
     * @param degree 0, 1 or 2
     */
    List<Complex> roots(int degree) {
        if (degree == 0 || (c0 == 0 && degree == 1)) {
            return List.of();
        }
        if (degree == 1) {
            return List.of(new Complex(0.0 - c1 / c0, 0));
        }
        if (c0 == 0) {
            return new Quadratic(c1, c2, 0).roots(1);
        }
        double half = c1 / 2;
        double square = discriminant();
        if (square < 0) {
            double imaginary = Math.sqrt(-square) / Math.abs(c0);
            double real = 0.0 - half / c0;
            return List.of(new Complex(real, imaginary), new Complex(real, -imaginary));
        }
        // The root of larger size first; the other from their product, so it does not cancel.
        double outer = 0.0 - (half + Math.copySign(Math.sqrt(square), half));
        double inner = outer == 0 ? 0 : c2 / outer;
        return List.of(new Complex(outer / c0, 0), new Complex(inner, 0));
    }

    /** {@code (c1 / 2)^2 - c0 c2} to about an ulp, by fused products (Kahan). */
    double discriminant() {
        double half = c1 / 2;
        double left = half * half;
        double right = c0 * c2;
        return (left - right) + (Math.fma(half, half, -left) - Math.fma(c0, c2, -right));
    }

    /**
     * For {@code c0 = 1} and both roots inside the unit circle: minus the logarithm of the larger root's size. Infinite
     * where both roots are 0.
     */
    double slowestDecay() {
        double square = discriminant();
        if (square < 0) {
            return -Math.log(c2) / 2;
        }
        double half = Math.abs(c1) / 2;
        double root = Math.sqrt(square);
        if (half >= 1) {
            return -Math.log1p(half - 1 + root);
        }
        // The larger root less 1, from the polynomial's value at 1 or -1.
        return -Math.log1p(-sum(1, -Math.abs(c1), c2) / (1 - half + root));
    }

    /** The sum, correct but for the last bit. */
    static double sum(double a, double b, double c) {
        double first = a + b;
        double second = first + c;
        return second + (sumError(a, b, first) + sumError(first, c, second));
    }

    /** Knuth's error-free sum. */
    private static double sumError(double a, double b, double sum) {
        double part = sum - a;
        return (a - (sum - part)) + (b - part);
    }
}
