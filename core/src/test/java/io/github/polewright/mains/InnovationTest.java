package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What the lines say together and what is made of it, on ticks that the test sets. */
class InnovationTest {

    private static final double TICK = 0.02;
    private static final double OPEN = 0.01;

    private LineBank bank = new LineBank(1, 1);
    private Innovation innovation = new Innovation(bank);
    private Amplitudes amplitudes = new Amplitudes(bank, innovation);
    private final Random random = new Random(5);
    private int ticks;

    private void lines(int lines, int channels) {
        bank = new LineBank(lines, channels);
        innovation = new Innovation(bank);
        amplitudes = new Amplitudes(bank, innovation);
        java.util.Arrays.fill(bank.re, 1);
        ticks = 0;
    }

    /** A tick in which all lines stand at a level and a phase of the fundamental, under the same noise in each channel. */
    private void see(double level, double radians, double sigma, boolean running) {
        for (int k = 0; k < bank.lines; k++) {
            double re = level * Math.cos((k + 1) * radians) + sigma * random.nextGaussian();
            double im = level * Math.sin((k + 1) * radians) + sigma * random.nextGaussian();
            for (int i = k; i < bank.size(); i += bank.lines) {
                bank.newRe[i] = re - bank.re[i];
                bank.newIm[i] = im - bank.im[i];
            }
        }
        innovation.evaluate(++ticks, TICK, OPEN, running);
    }

    private void calm(int count) {
        for (int n = 0; n < count; n++) {
            see(1, 0, 0.01, false);
        }
    }

    @Test
    void aSmallPhaseErrorIsFoundByItsSlope() {
        lines(8, 1);
        calm(100);
        see(1, 0.002, 0, false);
        assertEquals(0.002, innovation.radians(), 1e-5);
    }

    /** Far from lock the eighth line has turned by more than half a turn. */
    @ParameterizedTest
    @ValueSource(doubles = {-0.5, -0.2, 0.1, 0.4, 0.7})
    void aLargePhaseErrorIsFoundWhileTheFrequencyRuns(double radians) {
        lines(8, 1);
        calm(100);
        see(1, radians, 0, true);
        assertEquals(radians, innovation.radians(), 1e-3);
    }

    /** The Cramer-Rao bound of a common phase: the sum of k^2 |A|^2 over the noise power of each line (Kay, 1993). */
    @Test
    void informationIsThatOfTheBound() {
        lines(12, 1);
        calm(200);
        double mean = 0;
        for (int n = 0; n < 4000; n++) {
            see(1, 0, 0.01, false);
            mean += 1 / innovation.phaseInformation() / 4000;
        }
        // 1 + 4 + ... + 144 = 650. The common phase, taken out, lowers what is left; the larger of
        // the mean noise and the last raises it: by e^-1 on average, if the mean were exact.
        double bound = 650 / (2 * 0.01 * 0.01);
        assertTrue(mean * bound > 0.7 && mean * bound < 1.7, "times the bound: " + mean * bound);
    }

    /** Programme may be the same in all channels: twice the channels then tell no more. */
    @Test
    void theSameNoiseInTwoChannelsTellsNoMoreThanInOne() {
        double[] information = new double[2];
        double[] level = new double[2];
        for (int channels = 1; channels <= 2; channels++) {
            random.setSeed(9);
            lines(4, channels);
            calm(200);
            information[channels - 1] = innovation.phaseInformation();
            level[channels - 1] = innovation.levelInformation();
        }
        assertEquals(information[0], information[1], 1e-9 * information[0]);
        assertEquals(level[0], level[1], 1e-9 * level[0]);
    }

    /** A voice sets in: at the very first tick its lines weigh by its power and not by the calm before. */
    @Test
    void aBurstWeighsLittleAtOnce() {
        lines(4, 1);
        calm(200);
        double before = innovation.phaseInformation();
        for (int i = 0; i < bank.size(); i++) {
            bank.newRe[i] = 2;
            bank.newIm[i] = -2;
        }
        innovation.evaluate(++ticks, TICK, OPEN, false);
        assertTrue(innovation.phaseInformation() < before / 1000, "kept " + innovation.phaseInformation() / before);
        // Four lines of 1 under 8 at least of power each.
        assertTrue(innovation.phaseInformation() < (1 + 4 + 9 + 16) / 8.0);
    }

    @Test
    void aLineLessKnownThanItsPowerSaysNothingOfThePhase() {
        lines(2, 1);
        calm(100);
        bank.variance[1] = 1.1;
        calm(1);
        double first = innovation.phaseInformation();
        assertEquals(1 / innovation.worst[0], first, 1e-9 * first);
    }

    /** What the phase explains is not taken for a change of the lines as well. */
    @Test
    void aPhaseThatWasMovedLeavesTheAmplitudesAlone() {
        lines(5, 1);
        calm(100);
        java.util.Arrays.fill(bank.variance, 0.01);
        see(1, 0.003, 0, false);
        amplitudes.update(0.003, TICK, true);
        for (int k = 0; k < 5; k++) {
            assertEquals(1, bank.re[k], 2e-4);
            assertEquals(0, bank.im[k], 2e-4, "line " + (k + 1));
        }
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, 0.4, 1.8})
    void linesThatRiseOrFallTogetherAreFollowedAtTheSecondTick(double level) {
        lines(6, 1);
        calm(200);
        see(level, 0, 0.01, false);
        amplitudes.update(0, TICK, true);
        assertFalse(amplitudes.stepped());
        assertEquals(1, bank.re[3], 0.1, "one tick alone may be the programme");
        see(level, 0, 0.01, false);
        amplitudes.update(0, TICK, true);
        assertTrue(amplitudes.stepped());
        for (int i = 0; i < 6; i++) {
            assertEquals(level, bank.re[i], 0.1);
        }
    }

    @Test
    void oneTickAloneIsNoStep() {
        lines(6, 1);
        calm(200);
        for (int n = 0; n < 20; n++) {
            see(n % 5 == 0 ? 0.2 : 1, 0, 0.01, false);
            amplitudes.update(0, TICK, true);
            assertFalse(amplitudes.stepped());
        }
        assertEquals(1, bank.re[2], 0.1);
    }

    /** A phase that runs away makes all lines seem to fall. */
    @Test
    void whileThePhaseRunsNothingSteps() {
        lines(6, 1);
        calm(200);
        for (int n = 0; n < 5; n++) {
            see(0, 0, 0.01, false);
            amplitudes.update(0, TICK, false);
            assertFalse(amplitudes.stepped());
        }
    }

    /** The first tick cannot tell a line from programme: half of it is taken for each. */
    @Test
    void theFirstTickIsHalfBelieved() {
        bank = new LineBank(2, 1);
        innovation = new Innovation(bank);
        amplitudes = new Amplitudes(bank, innovation);
        bank.newRe[0] = 0.6;
        bank.newIm[1] = -0.8;
        amplitudes.adoptFirst();
        assertArrayEquals(new double[] {0.3, 0}, bank.re);
        assertArrayEquals(new double[] {0, -0.4}, bank.im);
        assertArrayEquals(new double[] {0.36, 0.64}, innovation.noise, 1e-15);
        assertArrayEquals(new double[] {0.18, 0.32}, bank.variance, 1e-15);
    }
}
