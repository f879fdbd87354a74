package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Lines in all places: the highest ones, those of one channel alone, and those that are too weak to touch. */
class HumRemoverLinesTest {

    private static final double RATE = 16000;

    private static Hum hum(double hz, double[] amplitudes) {
        return Hum.of(RATE, Hum.wander(RATE, 6, hz, 0, 60, 3), amplitudes, 3);
    }

    private static double[] all(double amplitude) {
        double[] amplitudes = new double[20];
        java.util.Arrays.fill(amplitudes, amplitude);
        return amplitudes;
    }

    /** The twentieth line of 64 Hz lies in the fall of the analysis' low-pass, and of the search's: both must not show. */
    @ParameterizedTest
    @ValueSource(doubles = {47, 64})
    void twentyLinesAreToldAndRemoved(double hz) {
        Hum hum = hum(hz, all(0.02));
        double[] output = Measure.add(Programme.noise(RATE, 6, 1e-4, 5), hum.samples);
        HumRemover remover = HumRemover.of(RATE, 1);
        remover.process(output, 0, output, 0, output.length);
        for (int k = 1; k <= 20; k++) {
            assertEquals(20 * Math.log10(0.02), remover.reading().levelDb(k, 0), 0.05, "line " + k);
        }
        int from = 5 * 16000;
        double left = Measure.db(
                Measure.power(output, from, output.length) / Measure.power(hum.samples, from, output.length));
        assertTrue(left < -50, "left " + left + " dB");
    }

    /** Hum on one of several inputs, as from one bad cable; the others stay as they are, bit for bit. */
    @ParameterizedTest
    @CsvSource({"2, 0", "2, 1", "3, 1", "3, 2"})
    void oneChannelAloneIsFoundAndTheOthersAreUntouched(int channels, int humming) {
        double[] hum = hum(50.3, new double[] {0.3, 0.2, 0.1, 0.1, 0.1, 0.1}).samples;
        double[] input = new double[channels * hum.length];
        for (int n = 0; n < hum.length; n++) {
            input[n * channels + humming] = hum[n];
        }
        double[] output = new double[input.length];
        HumRemover remover = HumRemover.of(RATE, channels);
        remover.process(input, 0, output, 0, hum.length);
        MainsReading reading = remover.reading();
        assertEquals(MainsState.FOLLOWING, reading.state());
        assertEquals(50.3, reading.frequencyHz(), 0.003);
        for (int c = 0; c < channels; c++) {
            double level = reading.levelDb(1, c);
            assertEquals(c == humming ? 20 * Math.log10(0.3) : Double.NEGATIVE_INFINITY, level, 0.1, "channel " + c);
            for (int n = 5 * 16000; n < hum.length; n++) {
                assertEquals(0, output[n * channels + c], c == humming ? 1e-3 : 0);
            }
        }
    }

    /**
     * Lines that are not in the hum: a sixth of a second of noise of -40 dB holds 0.01 * sqrt(4 / (16000 / 6)) = -68 dB
     * beside a line, so a reading from a longer look tells of nothing over -60 dB there.
     */
    @Test
    void linesThatAreNotThereAreNotTold() {
        double[] amplitudes = {0.3, 0, 0.2, 0, 0.1, 0, 0.1, 0, 0.1};
        Hum hum = hum(50.3, amplitudes);
        double[] programme = Programme.noise(RATE, 6, 0.01, 5);
        double[] input = Measure.add(programme, hum.samples);
        HumRemover remover = HumRemover.of(RATE, 1);
        double[] output = new double[input.length];
        remover.process(input, 0, output, 0, input.length);
        assertEquals(MainsState.FOLLOWING, remover.reading().state());
        for (int k = 1; k <= 20; k++) {
            boolean there = k <= amplitudes.length && amplitudes[k - 1] > 0;
            double told = remover.reading().levelDb(k, 0);
            if (there) {
                assertEquals(20 * Math.log10(amplitudes[k - 1]), told, 0.1, "line " + k);
            } else {
                assertTrue(told < -60, "line " + k + " is told at " + told + " dB");
            }
        }
    }
}
