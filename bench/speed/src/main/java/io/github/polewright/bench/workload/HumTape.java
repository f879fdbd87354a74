package io.github.polewright.bench.workload;

import java.util.SplittableRandom;

/**
 * Mains hum under faint noise, interleaved. It lasts a whole number of periods and of blocks, so it goes round without a
 * seam in the hum, and it is the same every time.
 */
public final class HumTape {

    /** Lines of the hum, the most a hum remover follows. */
    public static final int LINES = 20;

    private static final int MAINS_HZ = 50;
    private static final int LEAST_SECONDS = 8;
    private static final int MOST_SECONDS = 120;
    private static final long SEED = 5;

    private HumTape() {}

    /**
     * Makes the tape.
     *
     * @param sampleRateHz hertz
     * @param channels samples a frame
     * @param blockFrames frames a block
     * @return eight seconds or more
     * @throws IllegalArgumentException if whole periods and whole blocks do not meet within two minutes
     */
    public static float[] of(int sampleRateHz, int channels, int blockFrames) {
        int frames = frames(sampleRateHz, blockFrames);
        SplittableRandom random = new SplittableRandom(SEED);
        float[] tape = new float[frames * channels];
        for (int n = 0; n < frames; n++) {
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

    private static int frames(int sampleRateHz, int blockFrames) {
        long periods = sampleRateHz / gcd(sampleRateHz, MAINS_HZ);
        long round = periods / gcd(periods, blockFrames) * blockFrames;
        if (round > (long) MOST_SECONDS * sampleRateHz) {
            throw new IllegalArgumentException(blockFrames + " frames a block at " + sampleRateHz
                    + " Hz meet whole mains periods after " + round + " frames only; at most " + MOST_SECONDS
                    + " s are possible");
        }
        long least = (long) LEAST_SECONDS * sampleRateHz;
        return Math.toIntExact((least + round - 1) / round * round);
    }

    private static long gcd(long a, long b) {
        return b == 0 ? a : gcd(b, a % b);
    }
}
