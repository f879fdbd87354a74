package io.github.polewright.tone;

import io.github.polewright.slab.Ranges;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.concurrent.atomic.AtomicLongArray;

/**
 * Levels of named tones, and when each began and ended.
 *
 * <p>Each tone has a resonator of gain 1 at its frequency. The meter hears one tone at a time in each ear: what else falls
 * within the width adds to the level, and neighbours two widths away still read about 12 dB below their own level. For
 * tone pairs use {@link PairReader}, for call-progress tones {@link CadenceReader}.
 *
 * <p><b>Caution</b> A level proves nothing about its source. Never let one alone raise or silence an alarm.
 *
 * <p><b>Units</b> frames of the input rate since the start; levels in dBFS (a full-scale sine is 0 dBFS). <b>Threads</b>
 * one audio thread feeds; one other may drain with {@link #poll(ToneEvent)}; any may read levels; all wait-free.
 * <b>Allocation</b> none after building. <b>Errors</b> arguments are checked before a sample is touched. <b>Numbers</b>
 * a sample that isn't finite, or is beyond ±1e15, counts as silence; any cutting of a stream into blocks gives the same
 * events and levels, bit for bit; after silence the state is exactly zero.
 */
public final class ToneMeter {

    private final List<Tone> tones;
    private final ToneBank bank;
    private final Intake intake;
    private final ToneTracker[] trackers;
    private final AtomicLongArray levels;
    private final RecordRing ring;

    private ToneMeter(Builder built) {
        tones = List.copyOf(built.tones);
        if (tones.isEmpty()) {
            throw new IllegalArgumentException("a meter of 0 tones; it must have at least 1");
        }
        bank = new ToneBank(built.sampleRateHz, tones, this::hop);
        intake = new Intake(built.channels, built.channel, bank.frontEnd(), bank);
        ring = new RecordRing(built.eventCapacity, 4, 1);
        levels = new AtomicLongArray(tones.size());
        trackers = new ToneTracker[tones.size()];
        for (int k = 0; k < trackers.length; k++) {
            double threshold = Math.pow(10, built.thresholdDbfs / 10);
            trackers[k] = new ToneTracker(k, tones.get(k).decaySeconds(), bank.hopSeconds(), threshold);
        }
    }

    /**
     * Settings for a meter, each with a default; the tones are to be named.
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

    private void hop(double[] powers, double meanSquare, long index) {
        for (int k = 0; k < trackers.length; k++) {
            levels.setRelease(k, Double.doubleToRawLongBits(powers[k]));
            int change = trackers[k].hop(powers[k], index);
            if (change != 0) {
                write(trackers[k], change < 0);
            }
        }
    }

    private void write(ToneTracker tracker, boolean isEnd) {
        int slot = ring.claim();
        if (slot < 0) {
            return;
        }
        int a = ring.firstLong(slot);
        ring.longs[a] = isEnd ? 1 : 0;
        ring.longs[a + 1] = tracker.tone;
        ring.longs[a + 2] = bank.frameOf(tracker.tone, tracker.start());
        ring.longs[a + 3] = isEnd ? bank.frameOf(tracker.tone, tracker.end()) : -1;
        ring.doubles[ring.firstDouble(slot)] = tracker.power();
        ring.publish();
    }

    /**
     * Takes the oldest event that waits. Wait-free, allocates nothing; for one draining thread.
     *
     * @param event filled if there is one, else left alone
     * @return whether there was one
     */
    public boolean poll(ToneEvent event) {
        Objects.requireNonNull(event, "event");
        int slot = ring.oldest();
        if (slot < 0) {
            return false;
        }
        int a = ring.firstLong(slot);
        double level = 10 * Math.log10(ring.doubles[ring.firstDouble(slot)]);
        event.fill(ring.longs[a] != 0, (int) ring.longs[a + 1], ring.longs[a + 2], ring.longs[a + 3], level);
        ring.free();
        return true;
    }

    /**
     * The level of a tone now, renewed every millisecond. Any thread, wait-free.
     *
     * @param tone index in {@link #tones()}
     * @return dBFS; negative infinity for silence
     * @throws IndexOutOfBoundsException if there is no such tone
     */
    public double levelDbfs(int tone) {
        Ranges.index("tone", tone, trackers.length);
        return 10 * Math.log10(Double.longBitsToDouble(levels.getAcquire(tone)));
    }

    /**
     * The tones in the order they were named.
     *
     * @return an unmodifiable list
     */
    public List<Tone> tones() {
        return tones;
    }

    /** Starts anew: silence, frame 0. For the audio thread; events that wait, and counts, stay. */
    public void reset() {
        intake.reset();
        bank.reset();
        for (int k = 0; k < trackers.length; k++) {
            trackers[k].reset();
            levels.setRelease(k, 0);
        }
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

    boolean isSilent() {
        return bank.isSilent();
    }

    /** Settings of a {@link ToneMeter}; one thread, allocates. */
    public static final class Builder {

        private final double sampleRateHz;
        private final List<Tone> tones = new ArrayList<>();
        private int channels = 1;
        private int channel;
        private double thresholdDbfs = -40;
        private int eventCapacity = 256;

        private Builder(double sampleRateHz) {
            Tone.check("sampleRateHz", sampleRateHz, 8000, 192000);
            this.sampleRateHz = sampleRateHz;
        }

        /**
         * One more tone.
         *
         * @param tone its upper edge below half the sample rate
         * @return this
         */
        public Builder tone(Tone tone) {
            tones.add(Objects.requireNonNull(tone, "tone"));
            return this;
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
         * The level from which a tone counts as on; −40 dBFS unless set. It is off once 6 dB below its own level.
         *
         * @param thresholdDbfs −200 to 0 dBFS
         * @return this
         * @throws IllegalArgumentException if the value is outside its range
         */
        public Builder threshold(double thresholdDbfs) {
            Tone.check("thresholdDbfs", thresholdDbfs, -200, 0);
            this.thresholdDbfs = thresholdDbfs;
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
         * Builds the meter.
         *
         * @return a meter at frame 0
         * @throws IllegalArgumentException if there is no tone, a tone reaches half the sample rate, the channel isn't one of
         *     the frame's, or the event capacity is out of range
         */
        public ToneMeter build() {
            return new ToneMeter(this);
        }
    }
}
