package io.github.polewright.bench.workload;

import io.github.polewright.bench.contender.GoertzelBank;
import io.github.polewright.tone.Cadence;
import io.github.polewright.tone.CadenceReader;
import io.github.polewright.tone.PairReader;
import io.github.polewright.tone.Tone;
import io.github.polewright.tone.ToneMeter;

/** What listens for tones in one channel. */
public enum Listener {

    /** The reader of tone pairs. */
    PAIR_READER("pair reader") {
        @Override
        public Listening begin(double sampleRateHz) {
            return PairReader.of(sampleRateHz)::process;
        }
    },

    /** Eight named tones, their levels every millisecond. */
    METER_8("meter of 8 tones") {
        @Override
        public Listening begin(double sampleRateHz) {
            ToneMeter.Builder wish = ToneMeter.builder(sampleRateHz);
            for (double hertz : EIGHT_HZ) {
                wish.tone(Tone.byWidth(hertz, WIDTH_HZ));
            }
            return wish.build()::process;
        }
    },

    /** One named tone, its level every millisecond. */
    METER_1("meter of 1 tone") {
        @Override
        public Listening begin(double sampleRateHz) {
            return ToneMeter.builder(sampleRateHz)
                    .tone(Tone.byWidth(EIGHT_HZ[0], WIDTH_HZ))
                    .build()::process;
        }
    },

    /** Three cadences of two tones. */
    CADENCES_3("reader of 3 cadences") {
        @Override
        public Listening begin(double sampleRateHz) {
            return CadenceReader.builder(sampleRateHz)
                    .cadence(Cadence.of(new double[] {480, 620}, 0.5, 0.5))
                    .cadence(Cadence.of(new double[] {440, 480}, 2, 4))
                    .cadence(Cadence.unbroken(new double[] {350, 440}, 1))
                    .build()::process;
        }
    },

    /** Textbook Goertzel recursions for the same eight tones, their powers every 18 ms. */
    GOERTZEL_18_MS("Goertzel, 8 tones, a reading every 18 ms") {
        @Override
        public Listening begin(double sampleRateHz) {
            return goertzel(sampleRateHz, 1);
        }
    },

    /** The same with windows that overlap: powers every 2 ms. */
    GOERTZEL_2_MS("Goertzel, 8 tones, a reading every 2 ms") {
        @Override
        public Listening begin(double sampleRateHz) {
            return goertzel(sampleRateHz, 9);
        }
    };

    /** Takes blocks. */
    public interface Listening {

        /**
         * Takes a block.
         *
         * @param samples of one channel
         * @param offset the first
         * @param frames how many
         */
        void process(float[] samples, int offset, int frames);
    }

    private static final double[] EIGHT_HZ = {697, 770, 852, 941, 1209, 1336, 1477, 1633};
    private static final double WIDTH_HZ = 40;
    private static final double WINDOW_SECONDS = 0.018;

    private final String title;

    Listener(String title) {
        this.title = title;
    }

    /**
     * What it is called in a table.
     *
     * @return a few words
     */
    public String title() {
        return title;
    }

    /**
     * A fresh one.
     *
     * @param sampleRateHz hertz
     * @return what takes blocks
     */
    public abstract Listening begin(double sampleRateHz);

    /**
     * Whether it is the library's, not a textbook's.
     *
     * @return false for the textbook recursions
     */
    public boolean isOurs() {
        return this != GOERTZEL_18_MS && this != GOERTZEL_2_MS;
    }

    private static Listening goertzel(double sampleRateHz, int overlap) {
        int hop = (int) Math.round(WINDOW_SECONDS * sampleRateHz / overlap);
        GoertzelBank bank = new GoertzelBank(sampleRateHz, EIGHT_HZ, hop, overlap);
        return (samples, offset, frames) -> bank.process(samples, frames);
    }
}
