package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;

/** Which lines count, on amplitudes that the test sets: three lines in one channel, a tick every 20 ms. */
class PresenceTest {

    private static final double TICK = 0.02;

    private final LineBank bank = new LineBank(3, 1);
    private final Presence presence = new Presence(bank, new Amplitudes(bank, new Innovation(bank)));
    private final Random random = new Random(3);

    private void know(double... amplitudes) {
        System.arraycopy(amplitudes, 0, bank.re, 0, 3);
    }

    /** Ticks in which the lines are seen as they are known, through noise of such a spread. */
    private void run(double seconds, double sigma) {
        for (int n = 0; n < Math.round(seconds / TICK); n++) {
            for (int i = 0; i < 3; i++) {
                bank.newRe[i] = sigma * random.nextGaussian();
                bank.newIm[i] = sigma * random.nextGaussian();
            }
            presence.update(0, TICK);
        }
    }

    @Test
    void linesOverTheProgrammeAreThereAfterAFewTicks() {
        know(1, 1, 0);
        run(0.08, 0.05);
        assertEquals(0, presence.clearLines(), "four ticks tell no spread");
        run(0.12, 0.05);
        assertArrayEquals(new boolean[] {true, true, false}, presence.open);
        assertArrayEquals(new boolean[] {true, true, false}, presence.held);
        assertEquals(2, presence.clearLines());
        assertEquals(2, presence.clearPower(), 1e-12);
    }

    /** The spread is the programme's power a tick: twice the variance of a part, and the mean's own wobble of 2 per cent. */
    @Test
    void theSpreadIsTheProgrammesPower() {
        know(1, 0.1, 0);
        double[] mean = new double[3];
        run(2, 0.05);
        for (int n = 0; n < 2000; n++) {
            run(TICK, 0.05);
            for (int i = 0; i < 3; i++) {
                mean[i] += presence.spread[i] / 2000;
            }
        }
        for (double spread : mean) {
            assertEquals(1.02 * 2 * 0.05 * 0.05, spread, 0.1 * 2 * 0.05 * 0.05);
        }
    }

    /** A voice of five times the lines' amplitude hides them for two seconds: they are not gone. */
    @Test
    void linesUnderProgrammeStayHeld() {
        know(1, 1, 1);
        java.util.Arrays.fill(bank.variance, 10);
        run(1, 0.05);
        run(2, 5);
        assertFalse(presence.anyOpen());
        assertArrayEquals(new boolean[] {true, true, true}, presence.held);
        assertEquals(0, presence.goneShare());
    }

    /** Half a second for the smoothed amplitude to fall to an eighth in power, and 0.4 s to be sure of it. */
    @Test
    void aLineThatVanishesWhereItWouldBeSeenIsGone() {
        know(1, 1, 1);
        java.util.Arrays.fill(bank.variance, 10);
        run(1, 0.01);
        know(1, 0, 1);
        run(0.7, 0.01);
        assertTrue(presence.held[1]);
        run(0.4, 0.01);
        assertArrayEquals(new boolean[] {true, false, true}, presence.held);
        assertEquals(1 / 3.0, presence.goneShare(), 0.02);
    }

    /** Under 60 dB below the strongest a line is left alone; under 30 dB it is removed, but proves nothing. */
    @Test
    void weakLinesBesideAStrongOneCountLess() {
        know(1, Math.pow(10, -66 / 20.0), Math.pow(10, -36 / 20.0));
        run(1, 1e-6);
        assertArrayEquals(new boolean[] {true, false, true}, presence.held);
        assertEquals(1, presence.clearLines());
        know(1, Math.pow(10, -54 / 20.0), Math.pow(10, -24 / 20.0));
        run(1, 1e-6);
        assertArrayEquals(new boolean[] {true, true, true}, presence.held);
        assertEquals(2, presence.clearLines());
    }

    /** Known well from the programme's gaps, a line is clear while it does not stand out; else it is held and no more. */
    @Test
    void aLineKnownWellIsClearUnderProgramme() {
        know(1, 1, 1);
        run(1, 0.05);
        bank.variance[0] = 0.2;
        bank.variance[1] = 0.3;
        bank.variance[2] = 10;
        run(1, 5);
        assertFalse(presence.anyOpen());
        assertArrayEquals(
                new boolean[] {true, false, false},
                new boolean[] {presence.clear[0], presence.clear[1], presence.clear[2]});
    }

    /** The phase moves by a tenth of a radian a tick: amplitudes turn back by as many as their order, and stay as strong. */
    @Test
    void aMovingPhaseDoesNotBlurTheLines() {
        double moved = 0.1;
        for (int n = 0; n < 100; n++) {
            for (int k = 0; k < 3; k++) {
                bank.re[k] = Math.cos((k + 1) * moved * n);
                bank.im[k] = -Math.sin((k + 1) * moved * n);
            }
            presence.update(moved, TICK);
        }
        for (int k = 0; k < 3; k++) {
            assertEquals(1, presence.power(k), 1e-9);
            assertEquals(0, presence.spread[k], 1e-9);
        }
    }
}
