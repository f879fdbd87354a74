package io.github.polewright.live;

import java.util.SplittableRandom;

/** Test signals, planar. All values are exact in {@code float}, so that every sample format sees the same stream. */
final class Signals {

    private Signals() {}

    /** White noise in −1 to 1, another for every channel. */
    static double[][] noise(long seed, int channels, int frames) {
        double[][] noise = new double[channels][frames];
        for (int c = 0; c < channels; c++) {
            SplittableRandom random = new SplittableRandom(seed * 1_000 + c);
            for (int i = 0; i < frames; i++) {
                noise[c][i] = (float) (2 * random.nextDouble() - 1);
            }
        }
        return noise;
    }

    static double[] impulse(int frames) {
        double[] impulse = new double[frames];
        impulse[0] = 1;
        return impulse;
    }
}
