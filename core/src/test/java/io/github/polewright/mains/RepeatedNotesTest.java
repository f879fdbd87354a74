package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * A bass out of tune that holds its first note from the first sample is hum by every measure, until it plays the note
 * again: all lines jump together, as hum does not. Two or three notes later it is let go, and stays as it is.
 */
class RepeatedNotesTest {

    private static final double RATE = 16000;
    private static final double FIRST_SECONDS = 2.2;

    @ParameterizedTest
    @CsvSource({"50.3, 0.5, 0.3", "50.3, 1.2, 1.5", "52.8, 0.8, 0.3", "57.1, 1.2, 0.3"})
    void aNoteThatIsPlayedAgainIsLetGo(double hz, double gapSeconds, double decay) {
        double[] bass = new double[(int) (9 * RATE)];
        Random random = new Random(4);
        Programme.note(bass, RATE, 0, FIRST_SECONDS, hz, 10, 0, random);
        for (double at = FIRST_SECONDS; at < 9; at += gapSeconds) {
            Programme.note(bass, RATE, at, gapSeconds, hz, 10, decay, random);
        }
        Trace trace = Trace.of(bass, RATE, Removal.SUBTRACTION);
        double end = FIRST_SECONDS + 3 * gapSeconds + 0.5;
        for (int r = (int) (end / Trace.STEP_SECONDS); r < trace.readings.length; r++) {
            assertFalse(Trace.isProven(trace.readings[r]), "taken for mains at " + r * Trace.STEP_SECONDS + " s");
        }
        for (int n = trace.sample(end + 0.1); n < bass.length; n++) {
            assertEquals(bass[n], trace.output[n]);
        }
    }
}
