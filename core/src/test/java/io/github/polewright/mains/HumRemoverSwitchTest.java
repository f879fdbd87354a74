package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * Switching on, off and over. The stream is hum of steady lines and next to nothing else, so that what leaves the remover
 * is hum times one minus the gain of the removal: a straight ramp of 20 ms, by the documentation of the switch.
 */
class HumRemoverSwitchTest {

    private static final double RATE = 16000;
    private static final double RAMP_SECONDS = 0.02;
    private static final double[] LINES = {0.3, 0.2, 0.1, 0.1, 0.1, 0.1};

    private final Hum hum = Hum.of(RATE, Hum.wander(RATE, 8, 50.3, 0, 60, 3), LINES, 3);
    private final double[] input = Measure.add(Programme.noise(RATE, 8, 1e-4, 5), hum.samples);
    private final double[] output = new double[input.length];
    private int done;

    private void run(HumRemover remover, double toSeconds) {
        int to = (int) Math.round(toSeconds * RATE);
        remover.process(input, done, output, done, to - done);
        done = to;
    }

    /** The part of the hum that is left in a piece, by least squares. */
    private double left(double fromSeconds, double toSeconds) {
        double cross = 0;
        double square = 0;
        for (int n = (int) (fromSeconds * RATE); n < (int) (toSeconds * RATE); n++) {
            cross += output[n] * hum.samples[n];
            square += hum.samples[n] * hum.samples[n];
        }
        return cross / square;
    }

    private double leftDb(double fromSeconds, double toSeconds) {
        int from = (int) (fromSeconds * RATE);
        int to = (int) (toSeconds * RATE);
        return Measure.db(Measure.power(output, from, to) / Measure.power(hum.samples, from, to));
    }

    /** A removal takes up a switch at its next slab, at most 1.5 ms later. */
    private void assertRamp(double at, double start, double end) {
        for (double middle = 0.003; middle < RAMP_SECONDS; middle += 0.002) {
            double share = (middle - 0.0012) / RAMP_SECONDS;
            double expected = start + (end - start) * share;
            assertEquals(expected, left(at + middle - 0.001, at + middle + 0.001), 0.08, "after " + middle + " s");
        }
        assertEquals(end, left(at + 0.023, at + 0.1), 0.05);
    }

    @ParameterizedTest
    @EnumSource(Removal.class)
    void offAndOnAreStraightRamps(Removal way) {
        HumRemover remover = HumRemover.builder(RATE, 1).by(way).build();
        run(remover, 5);
        assertTrue(leftDb(4.5, 5) < -40, "left " + leftDb(4.5, 5) + " dB");
        remover.switchTo(false);
        run(remover, 6);
        assertRamp(5, 0, 1);
        remover.switchTo(true);
        run(remover, 7);
        assertRamp(6, 1, 0);
        assertTrue(leftDb(6.1, 7) < -40, "left " + leftDb(6.1, 7) + " dB");
    }

    /**
     * What one way lets go the other takes. A notch that opens under a subtraction hears half the hum for 20 ms, which
     * at 1 Hz of width costs its state 0.5 * pi * 0.02 = 3 per cent, 30 dB down.
     */
    @ParameterizedTest
    @CsvSource({"NOTCHES, SUBTRACTION", "SUBTRACTION, NOTCHES"})
    void theOtherWayTakesOverWithoutHumBetween(Removal first, Removal second) {
        HumRemover remover = HumRemover.builder(RATE, 1).by(first).build();
        run(remover, 5);
        remover.by(second);
        run(remover, 8);
        double most = Double.NEGATIVE_INFINITY;
        for (double at = 5; at < 5.05; at += 0.005) {
            most = Math.max(most, leftDb(at, at + 0.01));
        }
        assertTrue(most < -25, "left " + most + " dB in between");
        assertTrue(leftDb(7, 8) < -40, "left " + leftDb(7, 8) + " dB");
    }

    /** After the ramp the other way works alone: its output is that of a remover which never knew the first. */
    @Test
    void theOtherWayIsWhatWasAskedFor() {
        HumRemover remover = HumRemover.builder(RATE, 1).by(Removal.NOTCHES).build();
        run(remover, 5);
        remover.by(Removal.SUBTRACTION);
        run(remover, 8);
        assertEquals(MainsState.FOLLOWING, remover.reading().state());
        double[] alone = new double[input.length];
        HumRemover.builder(RATE, 1).by(Removal.SUBTRACTION).build().process(input, 0, alone, 0, input.length);
        for (int n = (int) (5.03 * RATE); n < output.length; n++) {
            assertEquals(alone[n], output[n], 1e-12);
        }
    }

    /** The sixth line is not asked for: it stays as it is, and no reading tells of it. */
    @Test
    void onlySoManyLinesAreRemovedAsAskedFor() {
        double[] heard = input.clone();
        HumRemover remover = HumRemover.builder(RATE, 1).lines(5).build();
        remover.process(heard, 0, heard, 0, heard.length);
        assertEquals(5, remover.reading().lines());
        // The noise and five lines leave next to nothing; a sine of amplitude 0.1 has a power of 0.005.
        int from = (int) (4 * RATE);
        assertEquals(Measure.db(0.005), Measure.db(Measure.power(heard, from, heard.length)), 0.05);
    }
}
