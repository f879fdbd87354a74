package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Hum alone, of a few lines, over a floor that is hardly there: an idle line input. Twenty seconds suffice for the slow
 * proof of two lines, two for the quick one. Scene invented; derived for this project.
 */
class FewLinesTest {

    private static final double RATE_HZ = 16_000;

    @ParameterizedTest
    @CsvSource({"2, 0, 20", "2, 1e-4, 20", "3, 0, 2", "3, 1e-6, 2", "3, 1e-4, 2", "3, 1e-3, 2", "4, 1e-5, 2", "12, 0, 2"
    })
    void areFoundInNearSilence(int lines, double noise, double mostSeconds) {
        for (int seed = 1; seed <= 3; seed++) {
            double mainsHz = seed % 2 == 0 ? 50.03 : 59.97;
            double[] amplitudes = new double[lines];
            for (int k = 0; k < lines; k++) {
                amplitudes[k] = 0.02 / (k + 1);
            }
            Hum hum = Hum.of(RATE_HZ, Hum.wander(RATE_HZ, mostSeconds, mainsHz, 0.01, 60, seed), amplitudes, seed);
            Random random = new Random(seed);
            double[] input = new double[hum.samples.length];
            for (int n = 0; n < input.length; n++) {
                input[n] = hum.samples[n] + noise * random.nextGaussian();
            }
            HumRemover remover = HumRemover.of(RATE_HZ, 1);
            remover.process(input, 0, new double[input.length], 0, input.length);
            assertEquals(MainsState.FOLLOWING, remover.reading().state(), "seed " + seed);
            double error = remover.reading().frequencyHz() - hum.frequencyHz[input.length - 1];
            assertTrue(Math.abs(error) < 0.02, "seed " + seed + ": " + error + " Hz");
        }
    }
}
