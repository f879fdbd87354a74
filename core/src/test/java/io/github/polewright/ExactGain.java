package io.github.polewright;

import java.math.BigDecimal;
import java.math.MathContext;

/**
 * The power gain {@code |H|^2} of stored coefficients in decimal arithmetic of 60 digits, with its own sine and cosine
 * (power series): an oracle that shares nothing with the code under test.
 */
public final class ExactGain {

    private static final MathContext DIGITS = new MathContext(60);
    private static final BigDecimal TWO_PI =
            new BigDecimal("6.28318530717958647692528676655900576839433879875021164194988918461563");

    private ExactGain() {}

    public static double power(double sampleRateHz, double hertz, Section section) {
        BigDecimal w = TWO_PI.multiply(new BigDecimal(hertz), DIGITS).divide(new BigDecimal(sampleRateHz), DIGITS);
        BigDecimal numerator = squared(w, section.b0(), section.b1(), section.b2());
        return numerator
                .divide(squared(w, 1, section.a1(), section.a2()), DIGITS)
                .doubleValue();
    }

    public static double power(double hertz, Cascade cascade) {
        double power = 1;
        for (Section section : cascade.sections()) {
            power *= power(cascade.sampleRateHz(), hertz, section);
        }
        return power;
    }

    public static double db(double sampleRateHz, double hertz, Section section) {
        return 10 * Math.log10(power(sampleRateHz, hertz, section));
    }

    private static BigDecimal squared(BigDecimal w, double c0, double c1, double c2) {
        BigDecimal real = new BigDecimal(c0)
                .add(new BigDecimal(c1).multiply(series(w, 0)))
                .add(new BigDecimal(c2).multiply(series(w.add(w), 0)));
        BigDecimal imaginary =
                new BigDecimal(c1).multiply(series(w, 1)).add(new BigDecimal(c2).multiply(series(w.add(w), 1)));
        return real.multiply(real, DIGITS).add(imaginary.multiply(imaginary, DIGITS), DIGITS);
    }

    /** Cosine from power 0, sine from power 1. */
    private static BigDecimal series(BigDecimal x, int power) {
        BigDecimal term = power == 0 ? BigDecimal.ONE : x;
        BigDecimal sum = BigDecimal.ZERO;
        for (int n = power; n < 120; n += 2) {
            sum = sum.add(term, DIGITS);
            BigDecimal next = BigDecimal.valueOf((n + 1L) * (n + 2L));
            term = term.multiply(x, DIGITS)
                    .multiply(x, DIGITS)
                    .divide(next, DIGITS)
                    .negate();
        }
        return sum;
    }
}
