package io.github.polewright.samples.scene;

import java.util.Random;

/**
 * An invented scene of two channels: a voice-like sound that glides through syllables with pauses, plucked strings and
 * brushed taps. Everything is computed; nothing is a recording.
 *
 * <p>Strings: K. Karplus and A. Strong, "Digital Synthesis of Plucked-String and Drum Timbres", Computer Music Journal
 * 7(2), 1983. Voice: pulses through three resonances, derived for this project.
 */
public final class Scene {

    private static final double[] STRINGS_HZ = {196.3, 262.1, 329.9, 393.2, 440.8};
    private static final double[][] VOWELS_HZ = {{730, 1090, 2440}, {530, 1840, 2480}, {300, 870, 2240}};

    private final double sampleRateHz;
    private final double[] frames;
    private final Random random = new Random(19);

    private Scene(double sampleRateHz, double seconds) {
        this.sampleRateHz = sampleRateHz;
        frames = new double[2 * (int) Math.round(sampleRateHz * seconds)];
    }

    /** Interleaved frames of two channels, peaking at about a quarter of full scale. */
    public static double[] of(double sampleRateHz, double seconds) {
        Scene scene = new Scene(sampleRateHz, seconds);
        scene.voice(seconds);
        scene.strings(seconds);
        scene.taps(seconds);
        double peak = 0;
        for (double sample : scene.frames) {
            peak = Math.max(peak, Math.abs(sample));
        }
        for (int i = 0; i < scene.frames.length; i++) {
            scene.frames[i] *= 0.25 / peak;
        }
        return scene.frames;
    }

    private void add(double seconds, double left, double right, double[] sound) {
        int from = (int) Math.round(seconds * sampleRateHz);
        for (int n = 0; n < sound.length && 2 * (from + n) < frames.length; n++) {
            frames[2 * (from + n)] += left * sound[n];
            frames[2 * (from + n) + 1] += right * sound[n];
        }
    }

    private void voice(double seconds) {
        double at = 0.4;
        int syllable = 0;
        while (at < seconds - 0.5) {
            double length = 0.12 + 0.2 * random.nextDouble();
            double pitchHz = 105 + 50 * random.nextDouble();
            double glide = 0.7 + 0.5 * random.nextDouble();
            add(at, 0.8, 0.7, syllable(length, pitchHz, glide, VOWELS_HZ[random.nextInt(VOWELS_HZ.length)]));
            syllable++;
            at += length + (syllable % 6 == 0 ? 0.7 + 0.6 * random.nextDouble() : 0.03);
        }
    }

    private double[] syllable(double seconds, double pitchHz, double glide, double[] vowelHz) {
        int length = (int) (seconds * sampleRateHz);
        double[] sound = new double[length];
        double phase = 0;
        for (int n = 0; n < length; n++) {
            double way = (double) n / length;
            phase += pitchHz * Math.pow(glide, way) / sampleRateHz;
            double pulse = 0;
            if (phase >= 1) {
                phase -= 1;
                pulse = 1;
            }
            sound[n] = Math.sin(Math.PI * way) * (pulse + 0.004 * random.nextGaussian());
        }
        double[] sum = new double[length];
        for (int i = 0; i < vowelHz.length; i++) {
            resonate(sound, vowelHz[i], 90 + 40 * i, 1.0 / (1 + i), sum);
        }
        return sum;
    }

    private void resonate(double[] source, double centreHz, double widthHz, double gain, double[] sum) {
        double radius = Math.exp(-Math.PI * widthHz / sampleRateHz);
        double turn = 2 * radius * Math.cos(2 * Math.PI * centreHz / sampleRateHz);
        double last = 0;
        double before = 0;
        for (int n = 0; n < source.length; n++) {
            double next = source[n] + turn * last - radius * radius * before;
            before = last;
            last = next;
            sum[n] += gain * next;
        }
    }

    private void strings(double seconds) {
        for (double at = 1.1; at < seconds - 1; at += 0.55 + 0.9 * random.nextDouble()) {
            double side = random.nextDouble();
            double hertz = STRINGS_HZ[random.nextInt(STRINGS_HZ.length)];
            add(at, 6 * (1 - side), 6 * side, pluck(1.4, hertz));
        }
    }

    private double[] pluck(double seconds, double hertz) {
        int period = (int) Math.round(sampleRateHz / hertz);
        double[] sound = new double[(int) (seconds * sampleRateHz)];
        double last = 0;
        for (int n = 0; n < sound.length; n++) {
            // Differences of noise, so that the string holds no DC.
            double noise = random.nextGaussian();
            double start = 0.5 * (noise - last);
            last = noise;
            sound[n] = n <= period ? start : 0.4985 * (sound[n - period] + sound[n - period - 1]);
        }
        int fade = sound.length / 5;
        for (int n = 0; n < fade; n++) {
            sound[sound.length - 1 - n] *= (double) n / fade;
        }
        return sound;
    }

    private void taps(double seconds) {
        for (double at = 0.2; at < seconds - 0.3; at += 0.9) {
            double[] sound = new double[(int) (0.08 * sampleRateHz)];
            for (int n = 0; n < sound.length; n++) {
                sound[n] = 3 * random.nextGaussian() * Math.exp(-8.0 * n / sound.length);
            }
            add(at, 0.5, 0.8, sound);
        }
    }
}
