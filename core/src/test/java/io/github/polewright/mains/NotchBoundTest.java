package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * What retuning can do to the notches: with nothing coming in, the amplitude a notch holds never grows, whatever the
 * order of frequencies, widths and turns. The bound is derived beside {@link NotchBank}; a direct form of the same
 * notches, hopping between 50 and 60 Hz, grows without limit.
 */
class NotchBoundTest {

    private static final double RATE = 8000;

    private final Tracker tracker = new Tracker(Rates.of(RATE), 1, 2);
    private final LinePhasors phasors = new LinePhasors(tracker);
    private final NotchBank notches = new NotchBank(tracker, phasors, 0.02);
    private final int frames = tracker.rates.slabFrames;
    private final double[] data = new double[frames];

    private void tune(double hz) {
        double turn = 2 * Math.PI * hz / RATE;
        Powers.of(turn, phasors.turnRe, phasors.turnIm);
    }

    private void run(boolean[] wanted) {
        notches.prepare(wanted);
        notches.run(0, data, 0, 0, frames);
    }

    private double held(int i) {
        return notches.amplitude(i);
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 1})
    void heldAmplitudeNeverGrowsWithoutInput(int line) {
        boolean[] wanted = {line == 0, line == 1};
        Random random = new Random(12);
        notches.width(line, 1);
        tune(50);
        for (int slab = 0; slab < 4000; slab++) {
            for (int n = 0; n < frames; n++) {
                data[n] = 0.3 * random.nextGaussian();
            }
            run(wanted);
        }
        double before = held(line);
        assertTrue(before > 1e-4, "the notch must hold something");
        double span = NotchBank.WIDEST_HZ / NotchBank.NARROWEST_HZ;
        for (int slab = 0; slab < 20_000; slab++) {
            tune(45 + 20 * random.nextDouble());
            notches.width(line, NotchBank.NARROWEST_HZ * Math.pow(span, random.nextDouble()));
            notches.rotate(random.nextDouble() - 0.5);
            Arrays.fill(data, 0);
            run(wanted);
            assertTrue(held(line) <= before * (1 + 1e-12), "it grew to " + held(line) / before);
            before = held(line);
        }
    }

    /** One input sample adds at most sqrt(t) c2 |u| = 2 t/(1 + t) |u| to what a notch holds: so little is let in. */
    @Test
    void oneSampleAddsNoMoreThanItsShare() {
        boolean[] wanted = {true, false};
        notches.width(0, 2);
        tune(50);
        Arrays.fill(data, 0);
        for (int slab = 0; slab < 10; slab++) {
            run(wanted);
        }
        data[frames - 1] = 1;
        run(wanted);
        double t = Math.tan(Math.PI * 2 / RATE);
        assertEquals(2 * t / (1 + t), held(0), 1e-15);
    }

    /** 50 and 60 Hz by turns, each for a quarter of the other's beat: a direct form of these grows 1.17 a period. */
    @Test
    void hoppingBetweenTwoFrequenciesStaysBounded() {
        boolean[] wanted = {true, false};
        notches.width(0, 1);
        double most = 0;
        for (int slab = 0; slab < 100_000; slab++) {
            tune(slab % 2 == 0 ? 50 : 60);
            for (int n = 0; n < frames; n++) {
                data[n] = Math.signum(Math.sin(0.31 * (slab * frames + n)));
            }
            run(wanted);
            for (double y : data) {
                most = Math.max(most, Math.abs(y));
            }
        }
        assertTrue(most < 2.5, "|y| reached " + most);
    }
}
