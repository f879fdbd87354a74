package io.github.polewright.samples;

import java.util.Random;

/** Sounds for tests, one channel each. */
public final class Sounds {

    private Sounds() {}

    public static double[] noise(double sampleRateHz, double seconds, double size, long seed) {
        Random random = new Random(seed);
        double[] sound = new double[(int) Math.round(sampleRateHz * seconds)];
        for (int n = 0; n < sound.length; n++) {
            sound[n] = size * random.nextGaussian();
        }
        return sound;
    }

    /** Lines on multiples of a fundamental: sizes[k - 1] is the amplitude of harmonic k; phases are by chance. */
    public static double[] hum(double sampleRateHz, double seconds, double fundamentalHz, double[] sizes, long seed) {
        Random random = new Random(seed);
        double[] sound = new double[(int) Math.round(sampleRateHz * seconds)];
        for (int k = 1; k <= sizes.length; k++) {
            double phase = 2 * Math.PI * random.nextDouble();
            for (int n = 0; n < sound.length; n++) {
                sound[n] += sizes[k - 1] * Math.sin(2 * Math.PI * k * fundamentalHz * n / sampleRateHz + phase);
            }
        }
        return sound;
    }

    /** Notes of the tempered scale with six partials, each held for half a second to two and a half. */
    public static double[] notes(double sampleRateHz, double seconds, long seed) {
        Random random = new Random(seed);
        double[] sound = new double[(int) Math.round(sampleRateHz * seconds)];
        for (int voice = 0; voice < 3; voice++) {
            int at = 0;
            while (at < sound.length) {
                int length = (int) (sampleRateHz * (0.5 + 2 * random.nextDouble()));
                double hertz = 55 * Math.pow(2, random.nextInt(36) / 12.0);
                for (int n = 0; n < length && at + n < sound.length; n++) {
                    double envelope = Math.min(1, 20.0 * n / length) * Math.min(1, 10.0 * (length - n) / length);
                    for (int k = 1; k <= 6; k++) {
                        sound[at + n] += 0.1 / k * envelope * Math.sin(2 * Math.PI * k * hertz * n / sampleRateHz);
                    }
                }
                at += length;
            }
        }
        return sound;
    }

    public static double[] sine(double sampleRateHz, double seconds, double hertz, double size) {
        return hum(sampleRateHz, seconds, hertz, new double[] {size}, 1);
    }

    public static double[] sum(double[]... sounds) {
        double[] sum = sounds[0].clone();
        for (int i = 1; i < sounds.length; i++) {
            for (int n = 0; n < sum.length; n++) {
                sum[n] += sounds[i][n];
            }
        }
        return sum;
    }

    public static double[] plus(double[] sound, double constant) {
        double[] sum = sound.clone();
        for (int n = 0; n < sum.length; n++) {
            sum[n] += constant;
        }
        return sum;
    }

    public static double[] scaled(double[] sound, double factor) {
        double[] scaled = sound.clone();
        for (int n = 0; n < scaled.length; n++) {
            scaled[n] *= factor;
        }
        return scaled;
    }

    public static double[] interleaved(double[]... channels) {
        double[] frames = new double[channels.length * channels[0].length];
        for (int i = 0; i < frames.length; i++) {
            frames[i] = channels[i % channels.length][i / channels.length];
        }
        return frames;
    }

    public static double rms(double[] sound) {
        double sum = 0;
        for (double value : sound) {
            sum += value * value;
        }
        return Math.sqrt(sum / sound.length);
    }
}
