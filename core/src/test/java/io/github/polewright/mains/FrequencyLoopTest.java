package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The loop alone, on phases that the test makes: against the filter that is told how the frequency wanders. */
class FrequencyLoopTest {

    private static final double TICK = 0.02;
    private static final double TURN = 2 * Math.PI * TICK;

    private final FrequencyLoop loop = new FrequencyLoop();
    private final Random random = new Random(7);
    private double hertz = 50;
    private double off;

    /** One tick of a source at a frequency, seen through noise. */
    private void tick(double sourceHz, double information) {
        loop.predict(TICK);
        off += TURN * (sourceHz - loop.frequencyHz());
        double seen = off + random.nextGaussian() * Math.sqrt(0.5 / information);
        off -= loop.correct(seen, information, TICK);
    }

    /**
     * Standard deviation of the frequency after a tick in the stationary two-state Kalman filter that knows the drift, by
     * iterating the Riccati equation (Kalman, 1960) until it stands.
     */
    private static double best(double drift, double information) {
        double a = 1;
        double b = 0;
        double d = 1;
        for (int n = 0; n < 20_000; n++) {
            double a1 = a + 2 * TURN * b + TURN * TURN * d;
            double b1 = b + TURN * d;
            double d1 = d + drift * TICK;
            double s = a1 + 0.5 / information;
            a = a1 - a1 * a1 / s;
            b = b1 - a1 * b1 / s;
            d = d1 - b1 * b1 / s;
        }
        return Math.sqrt(d);
    }

    /** Drifts in hertz squared a second; the last one is that of a quiet grid, where learning must not lead astray. */
    @ParameterizedTest
    @CsvSource({"2e-3, 2, 1.04", "2e-3, 20, 1.04", "2e-3, 200, 1.04", "1e-4, 200, 1.25"})
    void comesNearTheFilterThatIsToldTheDrift(double drift, double information, double most) {
        loop.start(hertz);
        double square = 0;
        double expected = 0;
        int count = 0;
        for (int n = 0; n < 60_000; n++) {
            tick(hertz, information);
            hertz += random.nextGaussian() * Math.sqrt(drift * TICK);
            if (n > 2000) {
                square += Math.pow(loop.frequencyHz() - hertz, 2);
                expected += Math.pow(loop.uncertaintyHz(), 2);
                count++;
            }
        }
        double rms = Math.sqrt(square / count);
        double ratio = rms / best(drift, information);
        assertTrue(ratio < most, "rms error is " + ratio + " times the least");
        double told = Math.sqrt(expected / count) / rms;
        assertTrue(told > 1 && told < 3, "the uncertainty is " + told + " times the rms error");
    }

    /** On a ramp the filter lags: it must know, or what is removed is removed beside the line. */
    @Test
    void onARampTheUncertaintyCoversTheLag() {
        loop.start(hertz);
        for (int n = 0; n < 500; n++) {
            tick(hertz, 200);
        }
        double calm = loop.uncertaintyHz();
        assertTrue(loop.isSettled());
        double lag = 0;
        double told = 0;
        for (int n = 0; n < 150; n++) {
            tick(hertz, 200);
            hertz += 1 * TICK;
            if (n >= 50) {
                lag += Math.abs(loop.frequencyHz() - hertz) / 100;
                told += loop.uncertaintyHz() / 100;
            }
        }
        assertFalse(loop.isSettled());
        assertTrue(told > lag, told + " Hz beside a lag of " + lag);
        for (int n = 0; n < 250; n++) {
            tick(hertz, 200);
        }
        assertTrue(loop.isSettled());
        assertTrue(loop.uncertaintyHz() < 2 * calm, loop.uncertaintyHz() + " Hz, 5 s later, beside " + calm);
    }

    @Test
    void oneAbsurdPhaseMovesTheFrequencyByAFifthOfAHertzAtMost() {
        loop.start(50);
        for (int n = 0; n < 10; n++) {
            loop.predict(TICK);
            double before = loop.frequencyHz();
            loop.correct(n % 3 == 0 ? -1e6 : 1e6, 1e9, TICK);
            assertTrue(Math.abs(loop.frequencyHz() - before) <= 0.2 + 1e-12, "moved to " + loop.frequencyHz());
        }
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, Double.NaN})
    void withoutInformationNothingMoves(double information) {
        loop.start(50);
        loop.predict(TICK);
        double before = loop.uncertaintyHz();
        assertEquals(0, loop.correct(0.3, information, TICK));
        assertEquals(50, loop.frequencyHz());
        assertEquals(before, loop.uncertaintyHz());
    }
}
