package io.github.polewright.tone;

import java.util.Arrays;
import java.util.SplittableRandom;

/** Invented music: chords, a melody, a bass and a beat in the tempered scale, a bar of two seconds at a time. */
final class PlayedMusic {

    /** How the notes sound: partials fall as a power of their number, with or without vibrato. */
    enum Style {
        ORGAN(1.0, 0, 0),
        PLUCKED(1.4, 0, 5),
        BOWED(1.0, 0.006, 0),
        FLUTE(2.5, 0.003, 0),
        SINE(20, 0, 0);

        final double slope;
        final double vibrato;
        final double decay;

        Style(double slope, double vibrato, double decay) {
            this.slope = slope;
            this.vibrato = vibrato;
            this.decay = decay;
        }
    }

    private static final double BAR_SECONDS = 2;
    private static final int TABLE = 1 << 14;
    private static final double[] SINE = new double[TABLE];
    private static final int[][] CHORDS = {{0, 4, 7}, {5, 9, 12}, {7, 11, 14}, {9, 12, 16}, {2, 5, 9}, {4, 7, 11}};
    private static final int[] SCALE = {0, 2, 4, 5, 7, 9, 11, 12, 14, 16, 17, 19};

    static {
        for (int i = 0; i < TABLE; i++) {
            SINE[i] = Math.sin(2 * Math.PI * i / TABLE);
        }
    }

    private final double rateHz;
    private final Style style;
    private final SplittableRandom random;
    private final double[] bar;

    PlayedMusic(double rateHz, Style style, long seed) {
        this.rateHz = rateHz;
        this.style = style;
        random = new SplittableRandom(seed);
        bar = new double[(int) (BAR_SECONDS * rateHz)];
    }

    /** The next bar; peaks stay near full scale. */
    double[] bar() {
        Arrays.fill(bar, 0);
        int key = random.nextInt(12);
        int[] chord = CHORDS[random.nextInt(CHORDS.length)];
        boolean chords = random.nextInt(4) > 0;
        if (chords) {
            for (int step : chord) {
                note(60 + key % 5 + step, 0, BAR_SECONDS, 0.1);
            }
        }
        if (random.nextInt(3) > 0) {
            note(36 + key % 5 + chord[0], 0, BAR_SECONDS, 0.15);
        }
        melody(key, 0.2);
        if (random.nextInt(3) == 0) {
            melody(key, 0.15);
        }
        if (random.nextInt(2) == 0) {
            beat();
        }
        return bar;
    }

    private void melody(int key, double size) {
        for (double at = 0; at < BAR_SECONDS; ) {
            double length = Math.min(BAR_SECONDS - at, 0.125 * (1 + random.nextInt(4)));
            if (random.nextInt(8) > 0) {
                note(67 + key % 8 + SCALE[random.nextInt(SCALE.length)], at, length, size);
            }
            at += length;
        }
    }

    /** A key's number as in MIDI, where 69 is 440 Hz. */
    private void note(int number, double from, double seconds, double size) {
        double hertz = 440 * Math.pow(2, (number - 69) / 12.0);
        int first = (int) (from * rateHz);
        int count = Math.min(bar.length - first, (int) (seconds * rateHz));
        for (int k = 1; k <= 10 && k * hertz < rateHz / 2; k++) {
            double partial = size / Math.pow(k, style.slope);
            if (partial > 1e-4) {
                partial(k * hertz, first, count, partial, k);
            }
        }
    }

    private void partial(double hertz, int first, int count, double size, int number) {
        double phase = random.nextDouble();
        double step = hertz / rateHz;
        double wobble = random.nextDouble();
        double fall = Math.exp(-style.decay * Math.sqrt(number) / rateHz);
        double level = size;
        int edge = (int) (0.01 * rateHz);
        for (int i = 0; i < count; i++) {
            double ramp = Math.min(1, Math.min((double) i, (double) (count - i)) / edge);
            bar[first + i] += ramp * level * SINE[(int) (phase * TABLE)];
            wobble += 5.5 / rateHz;
            wobble -= wobble >= 1 ? 1 : 0;
            phase += step * (1 + style.vibrato * SINE[(int) (wobble * TABLE)]);
            phase -= phase >= 1 ? 1 : 0;
            level *= fall;
        }
    }

    private void beat() {
        for (int n = 0; n < 8; n++) {
            int first = n * bar.length / 8;
            double level = n % 2 == 0 ? 0.2 : 0.1;
            double fall = Math.exp(-1 / (0.03 * rateHz));
            for (int i = first; i < Math.min(bar.length, first + (int) (0.2 * rateHz)); i++) {
                bar[i] += level * (2 * random.nextDouble() - 1);
                level *= fall;
            }
        }
    }
}
