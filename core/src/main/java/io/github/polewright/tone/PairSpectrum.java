package io.github.polewright.tone;

import java.util.Arrays;

/**
 * Hann-windowed Goertzel recursions at the eight frequencies, one window finished every hop.
 *
 * <p>A window is nine hops long, so nine windows run staggered: the work is the same for every sample, where one window
 * over the last nine hops would bring it in a lump. Finite memory: 18 ms of silence leave exact zeros.
 */
final class PairSpectrum {

    static final int TONES = 8;
    static final int OVERLAP = 9;

    private static final double HOP_SECONDS = 0.002;

    private final PairHop hop;
    private final int hopSamples;
    private final int windowSamples;
    private final double[] window;
    private final double[] cosine = new double[TONES];
    private final double[] sine = new double[TONES];
    private final double[] last = new double[OVERLAP * TONES];
    private final double[] beforeLast = new double[OVERLAP * TONES];
    private final double[] energy = new double[OVERLAP];
    private final double[] windowed = new double[Intake.CHUNK_FRAMES];
    private final double[] real = new double[TONES];
    private final double[] imaginary = new double[TONES];
    private int position;

    PairSpectrum(double rateHz, double[] frequenciesHz, PairHop hop) {
        this.hop = hop;
        hopSamples = hopSamples(rateHz);
        windowSamples = OVERLAP * hopSamples;
        window = new double[windowSamples];
        for (int i = 0; i < windowSamples; i++) {
            // Scaled to the sum 1, so that a sum of squares under it is a mean square.
            window[i] = (1 - Math.cos(2 * Math.PI * (i + 0.5) / windowSamples)) / windowSamples;
        }
        for (int k = 0; k < TONES; k++) {
            cosine[k] = Math.cos(2 * Math.PI * frequenciesHz[k] / rateHz);
            sine[k] = Math.sin(2 * Math.PI * frequenciesHz[k] / rateHz);
        }
    }

    static int hopSamples(double rateHz) {
        return (int) Math.round(HOP_SECONDS * rateHz);
    }

    void reset() {
        Arrays.fill(last, 0);
        Arrays.fill(beforeLast, 0);
        Arrays.fill(energy, 0);
        position = 0;
    }

    boolean isSilent() {
        double sum = 0;
        for (int i = 0; i < last.length; i++) {
            sum += Math.abs(last[i]) + Math.abs(beforeLast[i]);
        }
        return sum == 0;
    }

    void take(double[] samples, int count) {
        int at = 0;
        while (at < count) {
            int some = Math.min(count - at, hopSamples - position % hopSamples);
            for (int j = 0; j < OVERLAP; j++) {
                int start = position + j * hopSamples;
                weigh(j, start >= windowSamples ? start - windowSamples : start, samples, at, some);
                advance(j * TONES, some);
                advance(j * TONES + TONES / 2, some);
            }
            at += some;
            position += some;
            if (position % hopSamples == 0) {
                finish(OVERLAP - position / hopSamples);
                position = position == windowSamples ? 0 : position;
            }
        }
    }

    private void weigh(int j, int start, double[] samples, int at, int count) {
        double sum = energy[j];
        for (int i = 0; i < count; i++) {
            double x = samples[at + i];
            double v = window[start + i] * x;
            windowed[i] = v;
            sum += v * x;
        }
        energy[j] = sum;
    }

    /** Four recursions of one window at once: their chains are independent, and all their state fits the registers. */
    private void advance(int base, int count) {
        int tone = base % TONES;
        double c0 = 2 * cosine[tone];
        double c1 = 2 * cosine[tone + 1];
        double c2 = 2 * cosine[tone + 2];
        double c3 = 2 * cosine[tone + 3];
        double p0 = last[base];
        double p1 = last[base + 1];
        double p2 = last[base + 2];
        double p3 = last[base + 3];
        double q0 = beforeLast[base];
        double q1 = beforeLast[base + 1];
        double q2 = beforeLast[base + 2];
        double q3 = beforeLast[base + 3];
        for (int i = 0; i < count; i++) {
            double v = windowed[i];
            double s0 = c0 * p0 + (v - q0);
            double s1 = c1 * p1 + (v - q1);
            double s2 = c2 * p2 + (v - q2);
            double s3 = c3 * p3 + (v - q3);
            q0 = p0;
            q1 = p1;
            q2 = p2;
            q3 = p3;
            p0 = s0;
            p1 = s1;
            p2 = s2;
            p3 = s3;
        }
        last[base] = p0;
        last[base + 1] = p1;
        last[base + 2] = p2;
        last[base + 3] = p3;
        beforeLast[base] = q0;
        beforeLast[base + 1] = q1;
        beforeLast[base + 2] = q2;
        beforeLast[base + 3] = q3;
    }

    private void finish(int j) {
        for (int k = 0; k < TONES; k++) {
            double p = last[j * TONES + k];
            double q = beforeLast[j * TONES + k];
            real[k] = 2 * (p - q * cosine[k]);
            imaginary[k] = 2 * q * sine[k];
            last[j * TONES + k] = 0;
            beforeLast[j * TONES + k] = 0;
        }
        double finished = energy[j];
        energy[j] = 0;
        hop.take(real, imaginary, finished);
    }
}
