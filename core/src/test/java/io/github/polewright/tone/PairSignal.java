package io.github.polewright.tone;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;

/** Builds tone pairs one after another, remembers where, and adds noise; frequencies typed in from ITU-T Q.23. */
final class PairSignal {

    static final String SYMBOLS = "123A456B789C*0#D";
    static final double[] LOW_HZ = {697, 770, 852, 941};
    static final double[] HIGH_HZ = {1209, 1336, 1477, 1633};

    /** What was sent: the frames are where the tone starts and where it has ended. */
    record Sent(char symbol, double startFrame, double endFrame) {}

    final double rateHz;
    final List<Sent> sent = new ArrayList<>();
    private final SplittableRandom random;
    private double[] samples = new double[1 << 16];
    private int length;

    PairSignal(double rateHz, long seed) {
        this.rateHz = rateHz;
        random = new SplittableRandom(seed);
    }

    PairSignal pause(double seconds) {
        grow((int) Math.round(seconds * rateHz));
        return this;
    }

    /** Levels in dBFS of each tone; errors as a share of nominal plus hertz. */
    PairSignal pair(char symbol, double lowHz, double highHz, double lowDb, double highDb, double seconds) {
        int start = length;
        tone(lowHz, lowDb, seconds, start);
        tone(highHz, highDb, seconds, start);
        sent.add(new Sent(symbol, start, length));
        return this;
    }

    PairSignal pair(char symbol, double levelDb, double seconds) {
        int i = SYMBOLS.indexOf(symbol);
        return pair(symbol, LOW_HZ[i / 4], HIGH_HZ[i % 4], levelDb, levelDb, seconds);
    }

    PairSignal tone(double hertz, double levelDb, double seconds) {
        tone(hertz, levelDb, seconds, length);
        return this;
    }

    private void tone(double hertz, double levelDb, double seconds, int start) {
        int count = (int) Math.round(seconds * rateHz);
        if (start + count > length) {
            grow(start + count - length);
        }
        double amplitude = Math.pow(10, levelDb / 20);
        double phase = 2 * Math.PI * random.nextDouble();
        double step = 2 * Math.PI * hertz / rateHz;
        for (int i = 0; i < count; i++) {
            samples[start + i] += amplitude * Math.sin(phase + step * i);
        }
    }

    /** A steady sinusoid under everything so far. */
    PairSignal under(double hertz, double levelDb) {
        tone(hertz, levelDb, length / rateHz, 0);
        return this;
    }

    private void grow(int count) {
        if (length + count > samples.length) {
            samples = Arrays.copyOf(samples, Math.max(2 * samples.length, length + count));
        }
        length += count;
    }

    /** White Gaussian noise whose power within 4 kHz is so many dB below that of a pair of tones at this level. */
    PairSignal noise(double pairLevelDb, double signalToNoiseDb) {
        double pairPower = Math.pow(10, pairLevelDb / 10);
        double power = pairPower * Math.pow(10, -signalToNoiseDb / 10) * rateHz / 8000;
        double deviation = Math.sqrt(power);
        for (int i = 0; i < length; i += 2) {
            double radius = deviation * Math.sqrt(-2 * Math.log(1 - random.nextDouble()));
            double angle = 2 * Math.PI * random.nextDouble();
            samples[i] += radius * Math.cos(angle);
            if (i + 1 < length) {
                samples[i + 1] += radius * Math.sin(angle);
            }
        }
        return this;
    }

    /** What a converter would do to samples beyond full scale. */
    PairSignal clipped() {
        for (int i = 0; i < length; i++) {
            samples[i] = Math.max(-1, Math.min(1, samples[i]));
        }
        return this;
    }

    double random(double least, double most) {
        return least + (most - least) * random.nextDouble();
    }

    float[] frames() {
        float[] frames = new float[length];
        for (int i = 0; i < length; i++) {
            frames[i] = (float) samples[i];
        }
        return frames;
    }

    double[] samples() {
        return Arrays.copyOf(samples, length);
    }
}
