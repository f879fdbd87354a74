package io.github.polewright.inspect;

/**
 * A complex number.
 *
 * @param real the real part
 * @param imaginary the imaginary part
 */
public record Complex(double real, double imaginary) {

    /**
     * The absolute value, without overflow on the way.
     *
     * @return at least 0
     */
    public double magnitude() {
        return Math.hypot(real, imaginary);
    }

    /**
     * The argument.
     *
     * @return radians, from -pi to pi
     */
    public double argument() {
        return Math.atan2(imaginary, real);
    }

    Complex times(Complex other) {
        return new Complex(
                real * other.real - imaginary * other.imaginary, real * other.imaginary + imaginary * other.real);
    }

    Complex dividedBy(Complex other) {
        double scale = other.magnitude();
        double re = other.real / scale;
        double im = other.imaginary / scale;
        return new Complex((real * re + imaginary * im) / scale, (imaginary * re - real * im) / scale);
    }
}
