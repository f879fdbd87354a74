package io.github.polewright.mains;

import java.util.Random;

/** Programme made for tests, free of hum and of any recording. */
final class Programme {

    private Programme() {}

    /**
     * Speech-like: syllables of a jittering glottal pulse train through three moving resonances, unvoiced bursts, gaps
     * within words and pauses between phrases (a source-filter sketch, derived for this project).
     */
    static double[] speech(double sampleRateHz, double seconds, long seed) {
        Random random = new Random(seed * 104729 + 7);
        int count = (int) Math.round(sampleRateHz * seconds);
        double[] out = new double[count];
        double voiceHz = 95 + 110 * random.nextDouble();
        int n = (int) (0.1 * sampleRateHz * random.nextDouble());
        while (n < count) {
            int syllables = 4 + random.nextInt(10);
            double declination = 1.15;
            for (int s = 0; s < syllables && n < count; s++) {
                int length = (int) (sampleRateHz * (0.1 + 0.14 * random.nextDouble()));
                boolean fricative = random.nextDouble() < 0.35;
                if (fricative) {
                    n = burst(out, n, (int) (0.07 * sampleRateHz), sampleRateHz, random);
                }
                double pitch = voiceHz * declination * (0.92 + 0.16 * random.nextDouble());
                n = vowel(out, n, length, pitch, sampleRateHz, random);
                n += (int) (sampleRateHz * 0.05 * random.nextDouble());
                declination *= 0.97;
            }
            n += (int) (sampleRateHz * (0.2 + 0.5 * random.nextDouble()));
        }
        return out;
    }

    private static int vowel(double[] out, int at, int length, double pitch, double rate, Random random) {
        double[] centre = {
            280 + 500 * random.nextDouble(), 900 + 1300 * random.nextDouble(), 2300 + 700 * random.nextDouble()
        };
        double[] width = {80, 110, 160};
        double[] gain = {1, 0.5, 0.25};
        double glide = (random.nextDouble() - 0.5) * 0.3;
        double level = 0.4 + 0.6 * random.nextDouble();
        double[][] state = new double[3][2];
        double phase = 0;
        double lowPass = 0;
        for (int i = 0; i < length && at + i < out.length; i++) {
            double t = (double) i / length;
            double f = pitch * (1 + glide * (t - 0.5)) * (1 + 0.01 * random.nextGaussian());
            phase += f / rate;
            double pulse = 0.02 * random.nextGaussian();
            if (phase >= 1) {
                phase -= 1;
                pulse += Math.sqrt(rate / f);
            }
            lowPass += Math.min(1, 2 * Math.PI * 400 / rate) * (pulse - lowPass);
            double sum = lowPass;
            for (int r = 0; r < 3; r++) {
                double radius = Math.exp(-Math.PI * width[r] / rate);
                double y = lowPass
                        + 2 * radius * Math.cos(2 * Math.PI * centre[r] / rate) * state[r][0]
                        - radius * radius * state[r][1];
                state[r][1] = state[r][0];
                state[r][0] = y;
                sum += gain[r] * y * (1 - radius) * 4;
            }
            out[at + i] += 0.3 * level * Math.sin(Math.PI * t) * sum;
        }
        return at + length;
    }

    private static int burst(double[] out, int at, int length, double rate, Random random) {
        double before = 0;
        for (int i = 0; i < length && at + i < out.length; i++) {
            double noise = random.nextGaussian();
            out[at + i] += 0.08 * Math.sin(Math.PI * i / length) * (noise - before);
            before = noise;
        }
        return at + length;
    }

    /** Plucked notes over a bass line; pitches of equal temperament. */
    static double[] plucked(double rate, double seconds, long seed) {
        Random random = new Random(seed * 15485863 + 3);
        double[] out = new double[(int) Math.round(rate * seconds)];
        double beat = 0.4 + 0.2 * random.nextDouble();
        for (double at = 0.05; at < seconds; at += beat) {
            note(out, rate, at, 2 * beat, pitch(24 + random.nextInt(20)), 12, 1.5, random);
            note(out, rate, at, beat, pitch(48 + random.nextInt(24)), 8, 3, random);
            note(out, rate, at + beat / 2, beat, pitch(55 + random.nextInt(24)), 6, 4, random);
        }
        return out;
    }

    /** Long chords over a held bass, each a second or two. */
    static double[] sustained(double rate, double seconds, long seed) {
        Random random = new Random(seed * 32452843 + 11);
        double[] out = new double[(int) Math.round(rate * seconds)];
        for (double at = 0.02; at < seconds; ) {
            double length = 1 + 1.2 * random.nextDouble();
            int root = 28 + random.nextInt(17);
            note(out, rate, at, length, pitch(root), 10, 0.2, random);
            note(out, rate, at, length, pitch(root + 19), 8, 0.2, random);
            note(out, rate, at, length, pitch(root + 28), 6, 0.2, random);
            at += length;
        }
        return out;
    }

    /** MIDI note numbers: 69 is A at 440 Hz. */
    static double pitch(int note) {
        return 440 * Math.pow(2, (note - 69) / 12.0);
    }

    /** One note of falling partials; {@code decay} in nepers a second, with 10 ms of attack and release. */
    static void note(
            double[] out, double rate, double at, double length, double hz, int partials, double decay, Random random) {
        int from = (int) (at * rate);
        int count = (int) (length * rate);
        double level = 0.1 + 0.1 * random.nextDouble();
        for (int k = 1; k <= partials && k * hz < 0.45 * rate; k++) {
            double amplitude = level * Math.pow(k, -0.8);
            double phase = 2 * Math.PI * random.nextDouble();
            for (int i = 0; i < count && from + i < out.length; i++) {
                double t = i / rate;
                double edge = Math.min(1, Math.min(t, length - t) / 0.01);
                out[from + i] += amplitude * edge * Math.exp(-decay * t) * Math.sin(2 * Math.PI * k * hz * t + phase);
            }
        }
    }

    static double[] noise(double rate, double seconds, double sigma, long seed) {
        Random random = new Random(seed);
        double[] out = new double[(int) Math.round(rate * seconds)];
        for (int n = 0; n < out.length; n++) {
            out[n] = sigma * random.nextGaussian();
        }
        return out;
    }
}
