package io.github.polewright.retune;

import io.github.polewright.Section;
import java.util.Objects;

/**
 * How far apart two stable sections are, in the two measures that bound what a change between them can do.
 *
 * <p>Every stable section is uniquely t = (1 - a2)/(1 + a2) above 0 and an angle with cos(omega) = -a1/(1 + a2).
 *
 * <p><b>Units</b> none. <b>Threads</b> any; no state. <b>Allocation</b> none for complex poles. <b>Errors</b> an unstable section is
 * refused. <b>Numbers</b> relative error of a few 1e-8 at 48 kHz and 1e-6 at 384 kHz for sections of 0.1 Hz width at
 * 5 Hz, set by the rounding of their coefficients.
 */
public final class Distance {

    private Distance() {}

    /**
     * The length d of the straight ramp of coefficients from one section to another, measured in the hyperbolic upper
     * half plane. A state that rings without input is multiplied by at most e^(d/2), in the norm that belongs to the
     * section, on its way along the ramp, whatever the number of frames.
     *
     * <p>For complex poles p and q it is the distance itself, sinh(d/2) = |p - q| / (2 sqrt(Im p Im q)): a straight
     * segment of (a1, a2) is a geodesic there. For real and nearly real poles it is an upper bound of the sum over the
     * frames, about a tenth too large, found by dividing the ramp until its pieces are nearly straight. Derived for this project.
     *
     * @param from where the ramp starts
     * @param to where it ends
     * @return d, 0 or more; 0 exactly where the denominators are equal
     * @throws IllegalArgumentException if a section is not stable
     */
    public static double between(Section from, Section to) {
        requireStable("from", from);
        requireStable("to", to);
        return between(from.a1(), from.a2(), to.a1(), to.a2());
    }

    /**
     * An upper bound of {@link #between} without logarithms: a few square roots for complex poles, some dozens for real
     * ones. For complex poles it is at most 3.5 % too large up to d = 7.
     *
     * @param from where the ramp starts
     * @param to where it ends
     * @return a number not below d
     * @throws IllegalArgumentException if a section is not stable
     */
    public static double upperBound(Section from, Section to) {
        requireStable("from", from);
        requireStable("to", to);
        return upperBound(from.a1(), from.a2(), to.a1(), to.a2());
    }

    /**
     * The share mu of the pair limit that a change uses: |sin((omega1 - omega2)/2)| / sqrt(t1 t2). Two stable sections
     * have a quadratic norm in which both contract if and only if mu is below 1; it then serves the whole straight
     * segment between them, walked in any manner or jumped. For equal widths: a change of centre of up to one -3 dB
     * bandwidth. It covers that one segment and no chain of several.
     *
     * <p>The condition is the one of Shorten and Narendra (2003) and of Akar and Narendra (2002) for two second-order
     * systems; the form in (t, omega), which for coefficients is
     * {@code 2 sqrt((1-a2)(1-c2)) > |sqrt((1+a1+a2)(1-c1+c2)) - sqrt((1+c1+c2)(1-a1+a2))|}, and the margin were derived
     * for this project: at mu the common norm contracts at 1 - mu of the frozen rate.
     *
     * @param first a stable section
     * @param second a stable section
     * @return mu, 0 or more
     * @throws IllegalArgumentException if a section is not stable
     */
    public static double hopFraction(Section first, Section second) {
        requireStable("first", first);
        requireStable("second", second);
        return hopFraction(first.a1(), first.a2(), second.a1(), second.a2());
    }

    static double hopFraction(double a1, double a2, double c1, double c2) {
        double numerator = 2 * Math.abs((a1 - c1) * (1 + c2) - c1 * (a2 - c2));
        double roots = Math.sqrt((1 + a1 + a2) * (1 - c1 + c2)) + Math.sqrt((1 + c1 + c2) * (1 - a1 + a2));
        return numerator / roots / (2 * Math.sqrt((1 - a2) * (1 - c2)));
    }

    static double between(double a1, double a2, double c1, double c2) {
        if (a1 == c1 && a2 == c2) {
            return 0;
        }
        if (Poles.areComplex(a1, a2) && Poles.areComplex(c1, c2)) {
            return 2 * asinh(halfSinh(a1, a2, c1, c2));
        }
        return new RealRamp().length(a1, a2, c1, c2);
    }

    static double upperBound(double a1, double a2, double c1, double c2) {
        return upperBound(a1, a2, c1, c2, new RealRamp());
    }

    /** For audio threads, which bring their own. */
    static double upperBound(double a1, double a2, double c1, double c2, RealRamp realRamp) {
        if (a1 == c1 && a2 == c2) {
            return 0;
        }
        if (Poles.areComplex(a1, a2) && Poles.areComplex(c1, c2)) {
            return 2 * asinhBound(halfSinh(a1, a2, c1, c2));
        }
        return realRamp.lengthBound(a1, a2, c1, c2);
    }

    /** One chord of homes, e^(d/2) of a single coefficient change, without logarithm. */
    static double growth(double halfSinh) {
        return halfSinh + Math.sqrt(1 + halfSinh * halfSinh);
    }

    /** sinh(d/2) of the straight line between two homes. */
    static double halfSinh(double a1, double a2, double c1, double c2) {
        double firstHeight = Poles.height(a1, a2);
        double secondHeight = Poles.height(c1, c2);
        double across = 0.5 * (a1 - c1);
        double up = secondHeight - firstHeight;
        if (Poles.areComplex(a1, a2) && Poles.areComplex(c1, c2)) {
            // The difference of the squares first: both heights are small and close to each other.
            up = ((c2 - a2) + 0.5 * across * (a1 + c1)) / (firstHeight + secondHeight);
        }
        return Math.sqrt((across * across + up * up) / (4 * firstHeight * secondHeight));
    }

    static double asinh(double x) {
        return Math.log1p(x + x * x / (1 + Math.sqrt(1 + x * x)));
    }

    /** asinh x from above: x itself, or 4 (r - 1)/sqrt(r) with r^4 = x + sqrt(1 + x^2), as ln z <= (z - 1)/sqrt(z). */
    static double asinhBound(double x) {
        if (x < 0.4) {
            return x;
        }
        double root = Math.sqrt(Math.sqrt(x + Math.sqrt(1 + x * x)));
        return 4 * (root - 1) / Math.sqrt(root) * (1 + 1e-14);
    }

    private static void requireStable(String name, Section section) {
        if (!Objects.requireNonNull(section, name).isStable()) {
            throw new IllegalArgumentException(
                    name + " is " + section + "; its poles must lie strictly inside the unit circle");
        }
    }
}
