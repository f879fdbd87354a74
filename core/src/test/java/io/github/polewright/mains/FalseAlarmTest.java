package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertFalse;

import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Programme without hum: nothing may ever be removed. */
class FalseAlarmTest {

    private static final double RATE = 16000;

    @Test
    void speechIsLeftAlone() {
        assertUntouched("speech-like", Programme.speech(RATE, 60, 5001));
    }

    @Tag("slow")
    @Test
    void twentyMinutesOfSpeechAreLeftAlone() {
        for (int seed = 0; seed < 20; seed++) {
            assertUntouched("speech-like " + seed, Programme.speech(RATE, 60, 6000 + seed));
        }
    }

    @Test
    void musicIsLeftAlone() {
        for (int seed = 0; seed < 3; seed++) {
            assertUntouched("plucked " + seed, Programme.plucked(RATE, 30, 700 + seed));
            assertUntouched("sustained " + seed, Programme.sustained(RATE, 30, 800 + seed));
        }
    }

    /** Exactly 50 and 60 Hz and their octaves are among them: they begin after silence, as programme does. */
    @ParameterizedTest
    @ValueSource(doubles = {46.25, 49, 50, 51.91, 55, 58.27, 60, 61.74, 100, 110, 120})
    void notesHeldEightSecondsAreLeftAlone(double hz) {
        double[] held = new double[(int) (9.5 * RATE)];
        Programme.note(held, RATE, 0.7, 8, hz, 10, 0, new Random(3));
        assertUntouched("held " + hz, held);
    }

    @ParameterizedTest
    @ValueSource(doubles = {46.25, 49, 51.91, 55, 58.27, 61.74, 110})
    void temperedNotesFromTheFirstSampleAreLeftAlone(double hz) {
        double[] held = new double[(int) (8 * RATE)];
        Programme.note(held, RATE, 0, 8, hz, 10, 0, new Random(4));
        assertUntouched("held from the first sample " + hz, held);
    }

    @ParameterizedTest
    @ValueSource(doubles = {50, 55, 58.27, 60, 100, 120, 1000})
    void singleSinesAreLeftAlone(double hz) {
        double[] sine = new double[(int) (20 * RATE)];
        for (int n = 0; n < sine.length; n++) {
            sine[n] = 0.3 * Math.sin(2 * Math.PI * hz * n / RATE);
        }
        assertUntouched("sine " + hz, sine);
    }

    @Test
    void sweepNoiseAndSilenceAreLeftAlone() {
        double[] sweep = new double[(int) (24 * RATE)];
        double phase = 0;
        for (int n = 0; n < sweep.length; n++) {
            phase += 2 * Math.PI * 20 * Math.pow(50, (double) n / sweep.length) / RATE;
            sweep[n] = 0.3 * Math.sin(phase);
        }
        assertUntouched("sweep", sweep);
        assertUntouched("noise", Programme.noise(RATE, 30, 0.1, 1));
        assertUntouched("silence", new double[(int) (10 * RATE)]);
    }

    private static void assertUntouched(String name, double[] input) {
        Trace trace = Trace.of(input, RATE, Removal.SUBTRACTION);
        assertFalse(trace.followingAfter(0) >= 0, name + " was taken for mains at " + trace.followingAfter(0) + " s");
        for (int n = 0; n < input.length; n++) {
            assertFalse(input[n] != trace.output[n], name + " was changed");
        }
    }
}
