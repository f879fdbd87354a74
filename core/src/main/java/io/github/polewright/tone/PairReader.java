package io.github.polewright.tone;

import io.github.polewright.Section;
import io.github.polewright.design.Cookbook;
import io.github.polewright.design.HumNotch;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;

/**
 * Reads tone pairs of push-button dialling: the sixteen symbols of ITU-T Q.23, with a receiver's duties after ITU-T
 * Q.24.
 *
 * <p>Read are pairs within ±(1.5 % + 2 Hz) of nominal, at a twist of −8 to +4 dB, −3 to −28 dBFS a tone, 40 ms and longer,
 * 30 ms and more apart, with noise at −12 dB and less; refused are errors of ±3.5 % and more, tones of 23 ms and less, and
 * whatever else sounds with the pair. Interruptions of up to 10 ms are bridged. {@link PairLimits} changes these.
 *
 * <p><b>Caution</b> Speech and music hold tone pairs now and then (two clean notes inside the bands <i>are</i> a tone
 * pair), and a line can swallow one. Never let a reading alone raise or silence an alarm, place an emergency call or open
 * a door.
 *
 * <p><b>Units</b> frames of the input rate since the start; levels in dBFS. <b>Threads</b> one audio thread feeds; one
 * other thread may drain with {@link #poll(PairEvent)}; both are wait-free. <b>Allocation</b> none after building.
 * <b>Errors</b> arguments are checked before a sample is touched. <b>Numbers</b> a sample that isn't finite, or is beyond
 * ±1e15, counts as silence; any cutting of a stream into blocks gives the same events, bit for bit; silence leaves exact
 * zeros.
 */
public final class PairReader {

    private static final double[] FREQUENCIES_HZ = {697, 770, 852, 941, 1209, 1336, 1477, 1633};
    private static final String SYMBOLS = "123A456B789C*0#D";
    private static final double INNER_RATE_HZ = 8000;
    private static final double LOW_PASS_HZ = 3000;

    /** Below the telephone band, and low enough to leave the pairs alone: takes out DC and most of a hum. */
    private static final double HIGH_PASS_HZ = 150;

    private static final double DELAY_AT_HZ = 1000;

    private final Intake intake;
    private final FrontEnd frontEnd;
    private final PairSpectrum spectrum;
    private final PairHop hop;
    private final PairTracker tracker;
    private final RecordRing ring;
    private final double framesPerHop;
    private final double firstCentreFrames;
    private final double hzPerRadian;

    private PairReader(Builder built) {
        double rate = built.sampleRateHz;
        List<Section> first = new ArrayList<>(built.notches);
        first.add(Cookbook.highPass(rate, HIGH_PASS_HZ, Math.sqrt(0.5)));
        frontEnd = FrontEnd.of(
                rate,
                (int) Math.floor(rate / INNER_RATE_HZ),
                rate > INNER_RATE_HZ ? LOW_PASS_HZ : Double.POSITIVE_INFINITY,
                first);
        double innerRate = frontEnd.innerRateHz();
        int hopSamples = PairSpectrum.hopSamples(innerRate);
        double hopSeconds = hopSamples / innerRate;
        ring = new RecordRing(built.eventCapacity, 5, 6);
        tracker = new PairTracker(hopSeconds, FREQUENCIES_HZ, built.limits, new Records());
        hop = new PairHop(hopSeconds, FREQUENCIES_HZ, built.limits, tracker);
        spectrum = new PairSpectrum(innerRate, FREQUENCIES_HZ, hop);
        intake = new Intake(built.channels, built.channel, frontEnd, new Windows());
        framesPerHop = (double) hopSamples * frontEnd.factor();
        double centreSamples = hopSamples - (PairSpectrum.OVERLAP * hopSamples + 1) / 2.0;
        firstCentreFrames = centreSamples * frontEnd.factor() + 0.5 - frontEnd.delayFrames(DELAY_AT_HZ);
        hzPerRadian = 1 / (2 * Math.PI * hopSeconds);
    }

    /**
     * A reader of one channel of mono frames with {@link PairLimits#RECOMMENDED}.
     *
     * @param sampleRateHz 8000 to 192000 Hz
     * @return the reader
     * @throws IllegalArgumentException if {@code sampleRateHz} is outside its range
     */
    public static PairReader of(double sampleRateHz) {
        return builder(sampleRateHz).build();
    }

    /**
     * Settings for a reader, each with a default.
     *
     * @param sampleRateHz 8000 to 192000 Hz
     * @return the builder
     * @throws IllegalArgumentException if {@code sampleRateHz} is outside its range
     */
    public static Builder builder(double sampleRateHz) {
        return new Builder(sampleRateHz);
    }

    /**
     * Feeds interleaved frames. Wait-free, allocates nothing.
     *
     * @param source samples, any values
     * @param offset index of the first frame's first sample
     * @param frames how many frames
     * @throws IllegalArgumentException if {@code frames < 0}
     * @throws IndexOutOfBoundsException if the frames do not lie in {@code source}
     */
    public void process(float[] source, int offset, int frames) {
        intake.interleaved(source, offset, frames);
    }

    /**
     * Feeds interleaved frames. Wait-free, allocates nothing.
     *
     * @param source samples, any values
     * @param offset index of the first frame's first sample
     * @param frames how many frames
     * @throws IllegalArgumentException if {@code frames < 0}
     * @throws IndexOutOfBoundsException if the frames do not lie in {@code source}
     */
    public void process(double[] source, int offset, int frames) {
        intake.interleaved(source, offset, frames);
    }

    /**
     * Feeds planar frames, one array a channel. Wait-free, allocates nothing.
     *
     * @param source one array of samples for each channel; only the chosen one is read
     * @param offset index of the first frame
     * @param frames how many frames
     * @throws IllegalArgumentException if {@code frames < 0} or {@code source} hasn't one array for each channel
     * @throws IndexOutOfBoundsException if the frames do not lie in the chosen array
     */
    public void process(float[][] source, int offset, int frames) {
        intake.planar(source, offset, frames);
    }

    /**
     * Takes the oldest event that waits. Wait-free, allocates nothing; for one draining thread.
     *
     * @param event filled if there is one, else left alone
     * @return whether there was one
     */
    public boolean poll(PairEvent event) {
        Objects.requireNonNull(event, "event");
        int slot = ring.oldest();
        if (slot < 0) {
            return false;
        }
        int a = ring.firstLong(slot);
        int b = ring.firstDouble(slot);
        long[] longs = ring.longs;
        double[] doubles = ring.doubles;
        int symbol = (int) longs[a + 1];
        event.fill(longs[a] != 0, SYMBOLS.charAt(symbol), longs[a + 2], longs[a + 3], longs[a + 4]);
        event.fillLow(
                FREQUENCIES_HZ[symbol / 4],
                10 * Math.log10(doubles[b]),
                hzPerRadian * Math.atan2(doubles[b + 2], doubles[b + 1]));
        event.fillHigh(
                FREQUENCIES_HZ[4 + symbol % 4],
                10 * Math.log10(doubles[b + 3]),
                hzPerRadian * Math.atan2(doubles[b + 5], doubles[b + 4]));
        ring.free();
        return true;
    }

    /**
     * Starts anew: no symbol, no history, frame 0. For the audio thread; events that wait, and counts, stay.
     */
    public void reset() {
        intake.reset();
        spectrum.reset();
        hop.reset();
        tracker.reset();
    }

    /**
     * Events lost because the ring was full. Any thread.
     *
     * @return a count since building
     */
    public long droppedEvents() {
        return ring.dropped();
    }

    /**
     * Samples that were replaced by silence. Any thread.
     *
     * @return a count since building
     */
    public long replacedSamples() {
        return intake.replacedSamples();
    }

    /** For tests: whether nothing but exact zeros is left. */
    boolean isSilent() {
        return frontEnd.isSilent() && spectrum.isSilent();
    }

    private final class Windows implements InnerSamples {
        @Override
        public void take(double[] samples, int count) {
            spectrum.take(samples, count);
        }

        @Override
        public void guard() {
            // The windows forget by themselves.
        }
    }

    private final class Records implements PairSink {
        @Override
        public void began(PairSums symbol, double start, long index) {
            write(0, symbol, frameOf(start), -1, index);
        }

        @Override
        public void ended(PairSums symbol, double start, double end, long index) {
            write(1, symbol, frameOf(start), frameOf(end), index);
        }

        private long frameOf(double hops) {
            return Math.max(0, Math.round(firstCentreFrames + hops * framesPerHop));
        }

        private void write(long isEnd, PairSums symbol, long start, long end, long index) {
            int slot = ring.claim();
            if (slot < 0) {
                return;
            }
            int a = ring.firstLong(slot);
            ring.longs[a] = isEnd;
            ring.longs[a + 1] = 4L * symbol.low + symbol.high - 4;
            ring.longs[a + 2] = start;
            ring.longs[a + 3] = end;
            // The last sample of the window, kept by the front end, and the frame after it.
            ring.longs[a + 4] = (index + 1) * Math.round(framesPerHop) - frontEnd.factor() + 1;
            int b = ring.firstDouble(slot);
            ring.doubles[b] = symbol.meanLowPower();
            ring.doubles[b + 1] = symbol.lowReal;
            ring.doubles[b + 2] = symbol.lowImaginary;
            ring.doubles[b + 3] = symbol.meanHighPower();
            ring.doubles[b + 4] = symbol.highReal;
            ring.doubles[b + 5] = symbol.highImaginary;
            ring.publish();
        }
    }

    /** Settings of a {@link PairReader}; one thread, allocates. */
    public static final class Builder {

        private static final double NOTCH_WIDTH_HZ = 60;

        private final double sampleRateHz;
        private final List<Section> notches = new ArrayList<>();
        private int channels = 1;
        private int channel;
        private PairLimits limits = PairLimits.RECOMMENDED;
        private int eventCapacity = 256;

        private Builder(double sampleRateHz) {
            if (!(sampleRateHz >= 8000 && sampleRateHz <= 192000)) {
                throw new IllegalArgumentException("sampleRateHz is " + sampleRateHz + "; it must be 8000 to 192000");
            }
            this.sampleRateHz = sampleRateHz;
        }

        /**
         * Which channel of how many is read; channel 0 of 1 unless set.
         *
         * @param channel 0 is the first
         * @param channels in a frame, at least 1
         * @return this
         */
        public Builder channel(int channel, int channels) {
            this.channel = channel;
            this.channels = channels;
            return this;
        }

        /**
         * What is taken for a tone pair; {@link PairLimits#RECOMMENDED} unless set.
         *
         * @param limits the limits
         * @return this
         */
        public Builder limits(PairLimits limits) {
            this.limits = Objects.requireNonNull(limits, "limits");
            return this;
        }

        /**
         * How many events wait at most; 256 unless set.
         *
         * @param eventCapacity 1 to 2^20
         * @return this
         */
        public Builder eventCapacity(int eventCapacity) {
            this.eventCapacity = eventCapacity;
            return this;
        }

        /**
         * Tones that sound under the pairs, such as a dial tone, and are to be taken out first by notches of 60 Hz width.
         * None unless set: a pair then survives a dial tone of two whose every tone is 11 dB below the pair's.
         *
         * @param hertz 300 to 500 Hz each, so that the pairs keep their levels within 0.2 dB
         * @return this
         * @throws IllegalArgumentException if a frequency is outside its range
         */
        public Builder dialTone(double... hertz) {
            Objects.requireNonNull(hertz, "hertz");
            for (double one : hertz) {
                if (!(one >= 300 && one <= 500)) {
                    throw new IllegalArgumentException("hertz is " + one + "; it must be 300 to 500");
                }
            }
            notches.clear();
            for (double one : hertz) {
                notches.add(HumNotch.byWidth(sampleRateHz, one, NOTCH_WIDTH_HZ));
            }
            return this;
        }

        /**
         * Builds the reader.
         *
         * @return a reader at frame 0
         * @throws IllegalArgumentException if the channel isn't one of the frame's, or the event capacity is out of range
         */
        public PairReader build() {
            return new PairReader(this);
        }
    }
}
