package io.github.polewright.mains;

import java.util.Random;

/** Hum made for tests: lines on one true phase whose frequency wanders. */
final class Hum {

    final double sampleRateHz;
    final double[] samples;
    /** Phase of the fundamental in radians at every sample. */
    final double[] phase;
    /** Frequency in hertz at every sample. */
    final double[] frequencyHz;

    final int lines;

    private Hum(double sampleRateHz, double[] frequencyHz, double[] amplitudes, long seed) {
        this.sampleRateHz = sampleRateHz;
        this.frequencyHz = frequencyHz;
        lines = amplitudes.length;
        phase = new double[frequencyHz.length];
        samples = new double[frequencyHz.length];
        Random random = new Random(seed);
        double[] start = random.doubles(lines, 0, 2 * Math.PI).toArray();
        double running = random.nextDouble() * 2 * Math.PI;
        for (int n = 0; n < phase.length; n++) {
            phase[n] = running;
            running += 2 * Math.PI * frequencyHz[n] / sampleRateHz;
        }
        for (int k = 0; k < lines; k++) {
            if (amplitudes[k] != 0) {
                for (int n = 0; n < phase.length; n++) {
                    samples[n] += amplitudes[k] * Math.cos((k + 1) * phase[n] + start[k]);
                }
            }
        }
    }

    static Hum of(double sampleRateHz, double[] frequencyHz, double[] amplitudes, long seed) {
        return new Hum(sampleRateHz, frequencyHz, amplitudes, seed);
    }

    /** Frequency around a mean: a first-order Gauss-Markov walk that starts at its stationary spread. */
    static double[] wander(double sampleRateHz, double seconds, double meanHz, double sigmaHz, double tau, long seed) {
        Random random = new Random(seed * 7919 + 13);
        int count = (int) Math.round(sampleRateHz * seconds);
        double[] track = new double[count];
        double off = sigmaHz * random.nextGaussian();
        double keep = Math.exp(-1 / (tau * sampleRateHz));
        double kick = sigmaHz * Math.sqrt(1 - keep * keep);
        for (int n = 0; n < count; n++) {
            track[n] = meanHz + off;
            off = keep * off + kick * random.nextGaussian();
        }
        return track;
    }

    /** Frequency that ramps between two times and stays at its ends. */
    static double[] ramp(double sampleRateHz, double seconds, double fromHz, double toHz, double start, double end) {
        double[] track = new double[(int) Math.round(sampleRateHz * seconds)];
        for (int n = 0; n < track.length; n++) {
            double share = Math.max(0, Math.min(1, (n / sampleRateHz - start) / (end - start)));
            track[n] = fromHz + share * (toHz - fromHz);
        }
        return track;
    }

    /** Amplitudes that fall slowly, with a random part of +-4 dB. */
    static double[] mixed(int lines, long seed) {
        Random random = new Random(seed * 31 + 5);
        double[] amplitudes = new double[lines];
        for (int k = 0; k < lines; k++) {
            amplitudes[k] = Math.pow(k + 1, -0.7) * Math.pow(10, (random.nextDouble() * 8 - 4) / 20);
        }
        return amplitudes;
    }

    static double[] flat(int lines) {
        double[] amplitudes = new double[lines];
        java.util.Arrays.fill(amplitudes, 1);
        return amplitudes;
    }

    /** The even lines of a full-wave rectifier, 1/(4 k^2 - 1) by the Fourier series of |sin|, and a little fundamental. */
    static double[] rectifier(int lines) {
        double[] amplitudes = new double[lines];
        for (int k = 2; k <= lines; k += 2) {
            amplitudes[k - 1] = 1.0 / (k * (double) k - 1);
        }
        amplitudes[0] = 0.1;
        return amplitudes;
    }

    static double[] odd(int lines) {
        double[] amplitudes = new double[lines];
        for (int k = 1; k <= lines; k += 2) {
            amplitudes[k - 1] = 1.0 / k;
        }
        return amplitudes;
    }

    /** Scales so that the hum's power is {@code levelDb} over the programme's. */
    Hum scaledTo(double[] programme, double levelDb) {
        double factor = Math.sqrt(Measure.power(programme, 0, programme.length)
                / Measure.power(samples, 0, samples.length)
                * Math.pow(10, levelDb / 10));
        for (int n = 0; n < samples.length; n++) {
            samples[n] *= factor;
        }
        return this;
    }
}
