package io.github.polewright.bench.workload;

import java.util.SplittableRandom;

/**
 * Mains hum under faint noise, interleaved. It lasts a whole number of periods, so it goes round without a seam in the
 * hum, and it is the same every time.
 */
public final class HumTape {

    /** Lines of the hum, the most a hum remover follows. */
    public static final int LINES = 20;

    private static final double MAINS_HZ = 50;
    private static final int SECONDS = 8;
    private static final long SEED = 5;

    private HumTape() {}

    /**
     * Makes the tape.
     *
     * @param sampleRateHz hertz
     * @param channels samples a frame
     * @return eight seconds
     */
    public static float[] of(int sampleRateHz, int channels) {
        SplittableRandom random = new SplittableRandom(SEED);
        float[] tape = new float[SECONDS * sampleRateHz * channels];
        for (int n = 0; n < SECONDS * sampleRateHz; n++) {
            double hum = 0;
            for (int k = 1; k <= LINES; k++) {
                hum += 0.02 / Math.sqrt(k) * Math.sin(2 * Math.PI * k * MAINS_HZ * n / sampleRateHz + k * k);
            }
            for (int c = 0; c < channels; c++) {
                tape[n * channels + c] = (float) (hum + 0.02 * (random.nextDouble() - 0.5));
            }
        }
        return tape;
    }
}
