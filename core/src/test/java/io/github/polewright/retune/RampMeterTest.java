package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.SplittableRandom;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The audio thread's shared measure of a ramp against the two single ones, complex, real and mixed poles alike. */
final class RampMeterTest {

    private static final int RAMPS = 20_000;

    /** Widths from 1e-6 to 1 of the unit circle's radius, next to each other and far apart. */
    @ParameterizedTest
    @ValueSource(doubles = {1e-6, 1e-3, 0.1, 1})
    void agreesWithTheSingleMeasures(double gap) {
        SplittableRandom random = new SplittableRandom(20_261_201);
        RampMeter meter = new RampMeter();
        for (int i = 0; i < RAMPS; i++) {
            double[] first = poles(random, gap);
            double[] second = (i & 1) == 0 ? poles(random, gap) : near(first, random, gap);
            meter.measure(first[0], first[1], second[0], second[1]);
            double distance = Distance.upperBound(first[0], first[1], second[0], second[1]);
            double leak = Bucket.leak(first[0], first[1], second[0], second[1]);
            assertEquals(distance, meter.distance(), 1e-9 * distance, "distance of ramp " + i);
            assertEquals(leak, meter.leak(), 1e-9 * leak, "leak of ramp " + i);
        }
    }

    private static double[] poles(SplittableRandom random, double gap) {
        double radius = 1 - gap * random.nextDouble(0.01, 0.99);
        if (random.nextInt(4) == 0) {
            double other = 1 - gap * random.nextDouble(0.01, 0.99);
            return new double[] {-radius - other, radius * other};
        }
        double angle = random.nextDouble(1e-4, Math.PI - 1e-4);
        return new double[] {-2 * radius * Math.cos(angle), radius * radius};
    }

    private static double[] near(double[] poles, SplittableRandom random, double gap) {
        double a2 = Math.min(1 - 1e-3 * gap, poles[1] + 0.001 * gap * random.nextDouble(-1, 1));
        double middle = poles[0] / (1 + poles[1]);
        return new double[] {middle * (1 + a2), a2};
    }
}
