package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.SplittableRandom;
import java.util.TreeSet;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Path lengths of real and nearly real poles against a slow reference in 34 digits, which follows the definition of the
 * home and cuts the ramp at the exact places where the poles meet.
 */
final class RealRampTest {

    private static final MathContext DIGITS = MathContext.DECIMAL128;
    private static final BigDecimal TWO = BigDecimal.valueOf(2);
    private static final BigDecimal FOUR = BigDecimal.valueOf(4);
    private static final double[] GAPS = {2e-3, 1e-2, 0.3, 1.5};
    private static final int RAMPS = 160;

    private record Home(BigDecimal centre, BigDecimal height) {

        double distance(Home other) {
            double across = centre.subtract(other.centre).doubleValue();
            double up = height.subtract(other.height).doubleValue();
            double product = height.doubleValue() * other.height.doubleValue();
            return 2 * Distance.asinh(Math.sqrt((across * across + up * up) / (4 * product)));
        }
    }

    private record Ramp(BigDecimal a1, BigDecimal a2, BigDecimal d1, BigDecimal d2) {

        static Ramp of(double a1, double a2, double c1, double c2) {
            BigDecimal first = new BigDecimal(a1);
            BigDecimal second = new BigDecimal(a2);
            return new Ramp(first, second, new BigDecimal(c1).subtract(first), new BigDecimal(c2).subtract(second));
        }

        Home at(double share) {
            BigDecimal s = new BigDecimal(share);
            BigDecimal m = a1.add(d1.multiply(s)).divide(TWO.negate(), DIGITS);
            BigDecimal product = a2.add(d2.multiply(s));
            BigDecimal e = product.subtract(m.multiply(m)).round(DIGITS);
            BigDecimal root = e.abs().sqrt(DIGITS);
            BigDecimal radius = e.signum() >= 0 ? product.sqrt(DIGITS) : m.abs().add(root);
            return new Home(m, root.max(BigDecimal.ONE.subtract(radius).divide(TWO, DIGITS)));
        }

        double length() {
            TreeSet<Double> cuts = new TreeSet<>();
            cuts.add(0.0);
            cuts.add(1.0);
            BigDecimal curve = d1.multiply(d1).divide(FOUR.negate(), DIGITS);
            BigDecimal slope = d2.subtract(a1.multiply(d1).divide(TWO, DIGITS));
            BigDecimal start = a2.subtract(a1.multiply(a1).divide(FOUR, DIGITS));
            BigDecimal discriminant =
                    slope.multiply(slope).subtract(curve.multiply(start).multiply(FOUR));
            if (curve.signum() != 0 && discriminant.signum() > 0) {
                BigDecimal root = discriminant.sqrt(DIGITS);
                BigDecimal twice = curve.multiply(TWO);
                cuts.add(slope.negate().add(root).divide(twice, DIGITS).doubleValue());
                cuts.add(slope.negate().subtract(root).divide(twice, DIGITS).doubleValue());
            }
            double sum = 0;
            double last = 0;
            for (double cut : cuts.subSet(0.0, false, 1.0, true)) {
                sum += length(last, at(last), cut, at(cut), 0);
                last = cut;
            }
            return sum;
        }

        private double length(double from, Home start, double to, Home end, int depth) {
            double middle = 0.5 * (from + to);
            Home half = at(middle);
            double parts = start.distance(half) + half.distance(end);
            boolean isFine = parts - start.distance(end) <= 2e-4 * parts + 1e-9;
            if ((depth > 5 && isFine) || depth > 45) {
                return parts;
            }
            return length(from, start, middle, half, depth + 1) + length(middle, half, to, end, depth + 1);
        }
    }

    /** Whole ways and small parts of them. */
    @ParameterizedTest
    @ValueSource(doubles = {1, 0.1, 0.01, 1e-4})
    void isNeverBelowTheLengthAndNotFarAbove(double share) {
        SplittableRandom random = new SplittableRandom(20_261_201);
        RealRamp meter = new RealRamp();
        for (int i = 0; i < RAMPS; i++) {
            double[] from = poles(random, GAPS[i % GAPS.length]);
            double[] to = poles(random, GAPS[i % GAPS.length]);
            double c1 = from[0] + share * (to[0] - from[0]);
            double c2 = from[1] + share * (to[1] - from[1]);
            double exact = Ramp.of(from[0], from[1], c1, c2).length();
            double length = meter.length(from[0], from[1], c1, c2);
            double bound = meter.lengthBound(from[0], from[1], c1, c2);
            assertTrue(length >= exact, "ramp " + i + ": " + length + " < " + exact);
            assertTrue(length <= 1.15 * exact + 2e-4, "ramp " + i + ": " + length + " far above " + exact);
            assertTrue(bound >= length, "ramp " + i + ": " + bound + " < " + length);
            assertTrue(bound <= 1.5 * exact + 2e-3, "ramp " + i + ": " + bound + " far above " + exact);
        }
    }

    /** A pair of real poles, now and then nearly a double one, or a complex pair close to the real axis. */
    private static double[] poles(SplittableRandom random, double gap) {
        double radius = 1 - gap * random.nextDouble(0.05, 0.95);
        if (random.nextInt(4) == 0) {
            double angle = random.nextBoolean() ? gap * random.nextDouble(1e-6, 1) : random.nextDouble(1e-6, Math.PI);
            return new double[] {-2 * radius * Math.cos(angle), radius * radius};
        }
        boolean isNearlyDouble = random.nextInt(3) == 0;
        double other =
                isNearlyDouble ? radius - 1e-4 * gap * random.nextDouble() : 1 - gap * random.nextDouble(0.05, 0.95);
        double sign = random.nextInt(8) == 0 ? -1 : 1;
        return new double[] {sign * (-radius - other), radius * other};
    }
}
