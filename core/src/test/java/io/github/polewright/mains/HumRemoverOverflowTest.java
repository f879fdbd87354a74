package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

/** Samples near the ends of the number formats, while hum is being removed by notches: counted, and in the end forgotten. */
class HumRemoverOverflowTest {

    private static final double RATE = 16000;
    private static final int AT = 5 * 16000;

    private final Hum hum =
            Hum.of(RATE, Hum.wander(RATE, 26, 50.3, 0, 60, 3), new double[] {0.3, 0.2, 0.1, 0.1, 0.1, 0.1}, 3);
    private final double[] input = Measure.add(Programme.noise(RATE, 26, 1e-4, 5), hum.samples);
    private final HumRemover remover =
            HumRemover.builder(RATE, 1).by(Removal.NOTCHES).build();

    /** The largest doubles drive a notch's state out of range: it starts again, and removes hum again. */
    @Test
    void notchesThatOverflowStartAgain() {
        double[] output = new double[input.length];
        remover.process(input, 0, output, 0, AT);
        assertEquals(MainsState.FOLLOWING, remover.reading().state());
        assertEquals(0, remover.restartedChannels());
        for (int n = AT; n < AT + 16; n++) {
            input[n] = n % 2 == 0 ? Double.MAX_VALUE : -Double.MAX_VALUE;
        }
        remover.process(input, AT, output, AT, input.length - AT);
        assertEquals(1, remover.restartedChannels());
        // The burst lies in one slab of 20 frames, at whose end the states are cleared.
        assertTrue(remover.replacedSamples() <= 20, "replaced " + remover.replacedSamples());
        int from = 25 * 16000;
        double left = Measure.db(
                Measure.power(output, from, output.length) / Measure.power(hum.samples, from, output.length));
        assertTrue(left < -20, "left " + left + " dB");
        // Silence in its place would have left less than the noise.
        assertTrue(Measure.power(output, from, output.length) > 0.5e-8, "no sound at all");
    }

    /** A full-scale square at the line's frequency whose phase turns over overshoots its scale: floats cannot hold it. */
    @Test
    void whatTheOutputCannotHoldIsCounted() {
        float[] loud = new float[input.length];
        for (int n = 0; n < loud.length; n++) {
            loud[n] = (float) input[n];
        }
        int turn = AT + 8000;
        for (int n = AT; n < AT + 16000; n++) {
            boolean up = Math.sin(2 * Math.PI * 50.3 * (n - AT) / RATE) > 0 ^ n >= turn;
            loud[n] = up ? Float.MAX_VALUE : -Float.MAX_VALUE;
        }
        float[] output = new float[loud.length];
        remover.process(loud, 0, output, 0, AT);
        assertEquals(0, remover.replacedSamples());
        remover.process(loud, AT, output, AT, loud.length - AT);
        int silenced = 0;
        for (int n = AT; n < AT + 16000; n++) {
            assertTrue(Float.isFinite(output[n]));
            silenced += output[n] == 0 ? 1 : 0;
        }
        assertNotEquals(0, silenced);
        assertEquals(silenced, remover.replacedSamples());
    }
}
