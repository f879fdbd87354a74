package io.github.polewright.bench.contender;

import java.util.Arrays;

/**
 * The textbook Goertzel recursion for some tones: powers at the end of each rectangular window. Windows may overlap; each
 * then has recursions of its own, and a power comes every hop.
 */
public final class GoertzelBank {

    private final int windowFrames;
    private final int overlap;
    private final double[] doubleCosines;
    private final double[][] last;
    private final double[][] beforeLast;
    private final int[] position;
    private final double[] powers;

    /**
     * A bank at rest.
     *
     * @param sampleRateHz hertz
     * @param frequenciesHz the tones
     * @param hopFrames frames between two readings
     * @param overlap hops a window
     */
    public GoertzelBank(double sampleRateHz, double[] frequenciesHz, int hopFrames, int overlap) {
        this.windowFrames = hopFrames * overlap;
        this.overlap = overlap;
        doubleCosines = Arrays.stream(frequenciesHz)
                .map(hertz -> 2 * Math.cos(2 * Math.PI * hertz / sampleRateHz))
                .toArray();
        last = new double[overlap][frequenciesHz.length];
        beforeLast = new double[overlap][frequenciesHz.length];
        position = new int[overlap];
        for (int j = 0; j < overlap; j++) {
            position[j] = j * hopFrames;
        }
        powers = new double[frequenciesHz.length];
    }

    /**
     * Takes frames of one channel.
     *
     * @param samples read from index 0
     * @param frames how many
     */
    public void process(float[] samples, int frames) {
        for (int j = 0; j < overlap; j++) {
            for (int at = 0; at < frames; ) {
                int some = Math.min(frames - at, windowFrames - position[j]);
                for (int k = 0; k < doubleCosines.length; k++) {
                    recur(j, k, samples, at, some);
                }
                at += some;
                position[j] += some;
                if (position[j] == windowFrames) {
                    finish(j);
                }
            }
        }
    }

    private void recur(int j, int k, float[] samples, int at, int count) {
        double c = doubleCosines[k];
        double p = last[j][k];
        double q = beforeLast[j][k];
        for (int i = at; i < at + count; i++) {
            double s = c * p + (samples[i] - q);
            q = p;
            p = s;
        }
        last[j][k] = p;
        beforeLast[j][k] = q;
    }

    private void finish(int j) {
        double scale = 2.0 / windowFrames;
        for (int k = 0; k < doubleCosines.length; k++) {
            double p = last[j][k];
            double q = beforeLast[j][k];
            powers[k] = scale * scale * (p * p + q * q - doubleCosines[k] * p * q);
        }
        Arrays.fill(last[j], 0);
        Arrays.fill(beforeLast[j], 0);
        position[j] = 0;
    }

    /**
     * The power of a tone in the window that ended last.
     *
     * @param tone its index
     * @return squared amplitude
     */
    public double power(int tone) {
        return powers[tone];
    }
}
