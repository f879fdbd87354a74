package io.github.polewright;

/**
 * One second-order section, the five coefficients of
 *
 * <pre>H(z) = (b0 + b1 z^-1 + b2 z^-2) / (1 + a1 z^-1 + a2 z^-2)</pre>
 *
 * <p>A first-order section has {@code b2 = a2 = 0}. Coefficients are finite; stability is not required here, since an
 * analysis may want an unstable section, but {@link #isStable()} tells and everything that runs asks.
 *
 * <p><b>Units</b> none: coefficients belong to the sample rate of the {@link Cascade} that holds them. <b>Threads</b>
 * immutable. <b>Numbers</b> equality is of the coefficients' values, bit for bit, except that −0 equals 0.
 */
public final class Section {

    /** The section that changes nothing: {@code H(z) = 1}. */
    public static final Section PASS_THROUGH = new Section(1, 0, 0, 0, 0);

    private final double b0;
    private final double b1;
    private final double b2;
    private final double a1;
    private final double a2;

    private Section(double b0, double b1, double b2, double a1, double a2) {
        // Adding zero turns -0 into 0, so that equal filters are equal values.
        this.b0 = finite("b0", b0) + 0.0;
        this.b1 = finite("b1", b1) + 0.0;
        this.b2 = finite("b2", b2) + 0.0;
        this.a1 = finite("a1", a1) + 0.0;
        this.a2 = finite("a2", a2) + 0.0;
    }

    /**
     * A section from coefficients whose {@code a0} is 1.
     *
     * @param b0 numerator, z^0
     * @param b1 numerator, z^-1
     * @param b2 numerator, z^-2
     * @param a1 denominator, z^-1
     * @param a2 denominator, z^-2
     * @return the section
     * @throws IllegalArgumentException if a coefficient is NaN or infinite
     */
    public static Section of(double b0, double b1, double b2, double a1, double a2) {
        return new Section(b0, b1, b2, a1, a2);
    }

    /**
     * A section from coefficients with any {@code a0}, by which all others are divided.
     *
     * @param b0 numerator, z^0
     * @param b1 numerator, z^-1
     * @param b2 numerator, z^-2
     * @param a0 denominator, z^0, not 0
     * @param a1 denominator, z^-1
     * @param a2 denominator, z^-2
     * @return the section with {@code a0 = 1}
     * @throws IllegalArgumentException if a coefficient or a quotient is NaN or infinite, or {@code a0 == 0}
     */
    public static Section normalized(double b0, double b1, double b2, double a0, double a1, double a2) {
        if (finite("a0", a0) == 0) {
            throw new IllegalArgumentException("a0 is 0; it must be a finite number other than 0");
        }
        return new Section(b0 / a0, b1 / a0, b2 / a0, a1 / a0, a2 / a0);
    }

    private static double finite(String name, double value) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException(name + " is " + value + "; it must be finite");
        }
        return value;
    }

    /**
     * Numerator coefficient of z^0.
     *
     * @return b0
     */
    public double b0() {
        return b0;
    }

    /**
     * Numerator coefficient of z^-1.
     *
     * @return b1
     */
    public double b1() {
        return b1;
    }

    /**
     * Numerator coefficient of z^-2.
     *
     * @return b2
     */
    public double b2() {
        return b2;
    }

    /**
     * Denominator coefficient of z^-1.
     *
     * @return a1
     */
    public double a1() {
        return a1;
    }

    /**
     * Denominator coefficient of z^-2.
     *
     * @return a2
     */
    public double a2() {
        return a2;
    }

    /**
     * Whether both poles lie strictly inside the unit circle: {@code |a2| < 1} and {@code |a1| < 1 + a2} (the
     * stability triangle of a second-order recursion, Jury's criterion).
     *
     * @return true if every bounded input gives a bounded output
     */
    public boolean isStable() {
        return Math.abs(a2) < 1 && Math.abs(a1) < 1 + a2;
    }

    /**
     * This section followed by a constant gain.
     *
     * @param factor the gain as a linear factor; negative inverts the polarity
     * @return the section with its numerator multiplied
     * @throws IllegalArgumentException if the factor or a product is NaN or infinite
     */
    public Section scaledBy(double factor) {
        finite("factor", factor);
        return new Section(b0 * factor, b1 * factor, b2 * factor, a1, a2);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Section that
                && b0 == that.b0
                && b1 == that.b1
                && b2 == that.b2
                && a1 == that.a1
                && a2 == that.a2;
    }

    @Override
    public int hashCode() {
        int hash = Double.hashCode(b0);
        hash = 31 * hash + Double.hashCode(b1);
        hash = 31 * hash + Double.hashCode(b2);
        hash = 31 * hash + Double.hashCode(a1);
        return 31 * hash + Double.hashCode(a2);
    }

    /** The coefficients at full precision, for logs and bug reports. */
    @Override
    public String toString() {
        return "b " + b0 + " " + b1 + " " + b2 + " / a 1 " + a1 + " " + a2;
    }
}
