package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

/** What a subtraction takes, sample by sample, against cosines: lines that the test sets, and nothing coming in. */
class HumSubtractionTest {

    private static final double RATE = 8000;
    private static final double HZ = 50.3;
    private static final double TURN = 2 * Math.PI * HZ / RATE;

    private final Tracker tracker = new Tracker(Rates.of(RATE), 1, 2);
    private final LinePhasors phasors = new LinePhasors(tracker);
    private final HumSubtraction subtraction = new HumSubtraction(tracker, phasors, 0.02);
    private final int frames = tracker.rates.slabFrames;
    private final double[] data = new double[frames];
    private int slab;

    HumSubtractionTest() {
        Powers.of(TURN, phasors.turnRe, phasors.turnIm);
        Powers.of(TURN * frames, phasors.slabTurnRe, phasors.slabTurnIm);
    }

    /** The second line, of such an amplitude and phase at the first sample of all. */
    private double line(int n, double amplitude, double radians) {
        return amplitude * Math.cos(2 * TURN * n + radians);
    }

    private void run(boolean wanted, double amplitude, double radians) {
        phasors.re[1] = amplitude * Math.cos(2 * TURN * slab * frames + radians);
        phasors.im[1] = amplitude * Math.sin(2 * TURN * slab * frames + radians);
        java.util.Arrays.fill(data, 0);
        subtraction.prepare(new boolean[] {false, wanted});
        subtraction.run(0, data, 0, 0, frames);
        slab++;
    }

    private int at(int n) {
        return (slab - 1) * frames + n;
    }

    /** 20 ms are 160 frames: a straight ramp up, full strength, a straight ramp down, and nothing at all. */
    @Test
    void aLineIsTakenAndLeftInStraightRamps() {
        for (int turn = 0; turn < 2; turn++) {
            int start = slab * frames;
            for (int s = 0; s < 400 / frames; s++) {
                run(true, 0.3, 0.7);
                for (int n = 0; n < frames; n++) {
                    double gain = Math.min(1, (at(n) - start + 0.5) / 160);
                    assertEquals(-gain * line(at(n), 0.3, 0.7), data[n], 1e-12);
                }
            }
            int end = slab * frames;
            for (int s = 0; s < 400 / frames; s++) {
                run(false, 0.3, 0.7);
                for (int n = 0; n < frames; n++) {
                    double gain = Math.max(0, 1 - (at(n) - end + 0.5) / 160);
                    assertEquals(-gain * line(at(n), 0.3, 0.7), data[n], 1e-12);
                    assertEquals(gain == 0, data[n] == 0);
                }
            }
        }
    }

    /** The follower learns of another amplitude and phase: the change fades in over the slab, without a step. */
    @Test
    void aChangeFadesInOverASlab() {
        for (int s = 0; s < 400 / frames; s++) {
            run(true, 0.3, 0.7);
        }
        run(true, 0.5, -0.4);
        for (int n = 0; n < frames; n++) {
            double share = (n + 0.5) / frames;
            double expected = (1 - share) * line(at(n), 0.3, 0.7) + share * line(at(n), 0.5, -0.4);
            assertEquals(-expected, data[n], 1e-12);
        }
        run(true, 0.5, -0.4);
        for (int n = 0; n < frames; n++) {
            assertEquals(-line(at(n), 0.5, -0.4), data[n], 1e-12);
        }
    }
}
