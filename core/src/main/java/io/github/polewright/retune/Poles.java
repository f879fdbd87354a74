package io.github.polewright.retune;

/**
 * The poles of {@code 1 + a1 z^-1 + a2 z^-2} as the certificate needs them, in forms that keep their relative accuracy
 * for poles next to z = 1. Derived for this project.
 *
 * <p>With m = -a1/2 and e = a2 - m^2 the pole pair is m +- i sqrt(e). Real and nearly real poles have no norm of their
 * own, so each set has a <em>home</em> w = m + ih in the upper half plane, h = max(sqrt|e|, (1 - rho)/2) with rho the
 * spectral radius. In the norm {@code |y1 - conj(w) y2| / sqrt(h)} one frame is the matrix [[m, -e/h], [h, m]], whose
 * largest singular value is sigma = (sqrt(4 m^2 + (h + e/h)^2) + |h - e/h|)/2 and always below 1 for a stable set. Where
 * h = sqrt(e) the home is the pole itself and sigma = sqrt(a2).
 */
final class Poles {

    private Poles() {}

    static boolean areStable(double a1, double a2) {
        return Math.abs(a2) < 1 && Math.abs(a1) < 1 + a2;
    }

    /** m, the real part of the home. */
    static double centre(double a1) {
        return -0.5 * a1;
    }

    /** e = a2 - m^2; from the denominator's values at z = 1 and -1, which are exact for poles close to either. */
    static double heightSquared(double a1, double a2) {
        double atEnds = (1 + a1 + a2) * (1 - a1 + a2);
        if (atEnds <= 0) {
            return a2 - 0.25 * a1 * a1;
        }
        double root = Math.sqrt(atEnds);
        double width = 1 - a2;
        return 0.25 * (root - width) * (root + width);
    }

    /** 1 - rho. */
    static double gap(double a1, double a2) {
        return gap(a1, a2, heightSquared(a1, a2));
    }

    private static double gap(double a1, double a2, double heightSquared) {
        if (heightSquared >= 0) {
            return (1 - a2) / (1 + Math.sqrt(a2));
        }
        double size = Math.abs(a1);
        return (1 - size + a2) / (1 - 0.5 * size + Math.sqrt(-heightSquared));
    }

    /** h, the imaginary part of the home. */
    static double height(double a1, double a2) {
        double heightSquared = heightSquared(a1, a2);
        return Math.max(Math.sqrt(Math.abs(heightSquared)), 0.5 * gap(a1, a2, heightSquared));
    }

    /** h, with a minus sign where the home is not the pole itself. */
    static double signedHeight(double a1, double a2) {
        double heightSquared = heightSquared(a1, a2);
        double root = Math.sqrt(Math.abs(heightSquared));
        double least = 0.5 * gap(a1, a2, heightSquared);
        return heightSquared > 0 && root >= least ? root : -Math.max(root, least);
    }

    /**
     * Whether the home is the pole itself. The sets for which this holds form a convex region of the (a1, a2) plane: a
     * straight ramp between two of them never leaves it.
     */
    static boolean areComplex(double a1, double a2) {
        double heightSquared = heightSquared(a1, a2);
        return heightSquared > 0 && Math.sqrt(heightSquared) >= 0.5 * gap(a1, a2, heightSquared);
    }

    /** 1 - sigma: the least share of the norm that one frame without input takes away. */
    static double decay(double a1, double a2) {
        double heightSquared = heightSquared(a1, a2);
        double gap = gap(a1, a2, heightSquared);
        double root = Math.sqrt(Math.abs(heightSquared));
        if (root >= 0.5 * gap) {
            return gap;
        }
        double height = 0.5 * gap;
        double ratio = heightSquared / height;
        return 1 - 0.5 * (Math.sqrt(a1 * a1 + (height + ratio) * (height + ratio)) + Math.abs(height - ratio));
    }

    /**
     * A lower bound of 1 - sigma on the whole straight ramp between two sets. The sets with rho below a value form a
     * triangle, so rho is largest at an end; and sigma is at most (1 + rho)/2.
     */
    static double leastDecay(double a1, double a2, double c1, double c2) {
        if (a1 == c1 && a2 == c2) {
            return decay(a1, a2);
        }
        double gap = Math.min(gap(a1, a2), gap(c1, c2));
        return areComplex(a1, a2) && areComplex(c1, c2) ? gap : 0.5 * gap;
    }

    /** omega in radians a sample, with cos(omega) = -a1 / (1 + a2). */
    static double angle(double a1, double a2) {
        return 2 * Math.atan2(Math.sqrt(1 + a1 + a2), Math.sqrt(1 - a1 + a2));
    }
}
