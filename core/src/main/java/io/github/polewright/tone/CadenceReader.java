package io.github.polewright.tone;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;

/**
 * Finds call-progress signals: tones together, by frequency and cadence.
 *
 * <p>A cadence counts as found after the number of cycles asked for, less its last pause; tones count as present while at
 * least half of the power up to 3 kHz is theirs. Intervals are measured within about 10 ms.
 *
 * <p><b>Caution</b> Networks differ and signals are imitated. Never let a reading alone raise or silence an alarm, or decide
 * whether an emergency call goes through.
 *
 * <p><b>Units</b> frames of the input rate since the start; levels in dBFS. <b>Threads</b> one audio thread feeds; one
 * other may drain with {@link #poll(CadenceEvent)}; both are wait-free. <b>Allocation</b> none after building.
 * <b>Errors</b> arguments are checked before a sample is touched. <b>Numbers</b> as in {@link ToneMeter}.
 */
public final class CadenceReader {

    private final ToneBank bank;
    private final Intake intake;
    private final CadenceTracker[] trackers;
    private final RecordRing ring;

    private CadenceReader(Builder built) {
        if (built.cadences.isEmpty()) {
            throw new IllegalArgumentException("a reader of 0 cadences; it must have at least 1");
        }
        List<Tone> tones = new ArrayList<>();
        for (Cadence cadence : built.cadences) {
            for (double hertz : cadence.frequenciesHz()) {
                tones.add(Tone.byWidth(hertz, CadenceTracker.WIDTH_HZ));
            }
        }
        bank = new ToneBank(built.sampleRateHz, tones, this::hop);
        intake = new Intake(built.channels, built.channel, bank.frontEnd(), bank);
        ring = new RecordRing(built.eventCapacity, 4, 0);
        trackers = new CadenceTracker[built.cadences.size()];
        double floor = Math.pow(10, built.thresholdDbfs / 10);
        int first = 0;
        for (int k = 0; k < trackers.length; k++) {
            Cadence cadence = built.cadences.get(k);
            trackers[k] = new CadenceTracker(cadence, first, bank.hopSeconds(), floor, built.cycles);
            first += cadence.frequenciesHz().length;
        }
    }

    /**
     * Settings for a reader, each with a default; the cadences are to be named.
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
            int change = trackers[k].hop(powers, meanSquare, index);
            if (change != 0) {
                write(k, trackers[k], change < 0);
            }
        }
    }

    private void write(int cadence, CadenceTracker tracker, boolean isEnd) {
        int slot = ring.claim();
        if (slot < 0) {
            return;
        }
        int a = ring.firstLong(slot);
        ring.longs[a] = isEnd ? 1 : 0;
        ring.longs[a + 1] = cadence;
        ring.longs[a + 2] = bank.frameOf(tracker.firstTone, (double) tracker.start());
        ring.longs[a + 3] = isEnd ? bank.frameOf(tracker.firstTone, (double) tracker.end()) : -1;
        ring.publish();
    }

    /**
     * Takes the oldest event that waits. Wait-free, allocates nothing; for one draining thread.
     *
     * @param event filled if there is one, else left alone
     * @return whether there was one
     */
    public boolean poll(CadenceEvent event) {
        Objects.requireNonNull(event, "event");
        int slot = ring.oldest();
        if (slot < 0) {
            return false;
        }
        int a = ring.firstLong(slot);
        event.fill(ring.longs[a] != 0, (int) ring.longs[a + 1], ring.longs[a + 2], ring.longs[a + 3]);
        ring.free();
        return true;
    }

    /** Starts anew: silence, frame 0. For the audio thread; events that wait, and counts, stay. */
    public void reset() {
        intake.reset();
        bank.reset();
        for (CadenceTracker tracker : trackers) {
            tracker.reset();
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

    /** Settings of a {@link CadenceReader}; one thread, allocates. */
    public static final class Builder {

        private final double sampleRateHz;
        private final List<Cadence> cadences = new ArrayList<>();
        private int channels = 1;
        private int channel;
        private int cycles = 2;
        private double thresholdDbfs = -40;
        private int eventCapacity = 64;

        private Builder(double sampleRateHz) {
            Tone.check("sampleRateHz", sampleRateHz, 8000, 192000);
            this.sampleRateHz = sampleRateHz;
        }

        /**
         * One more cadence.
         *
         * @param cadence the cadence
         * @return this
         */
        public Builder cadence(Cadence cadence) {
            cadences.add(Objects.requireNonNull(cadence, "cadence"));
            return this;
        }

        /**
         * How many cycles make a cadence; 2 unless set.
         *
         * @param cycles 1 to 10
         * @return this
         * @throws IllegalArgumentException if the value is outside its range
         */
        public Builder cycles(int cycles) {
            if (cycles < 1 || cycles > 10) {
                throw new IllegalArgumentException("cycles is " + cycles + "; it must be 1 to 10");
            }
            this.cycles = cycles;
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
         * The level from which a tone counts as on; −40 dBFS unless set.
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
         * How many events wait at most; 64 unless set.
         *
         * @param eventCapacity 1 to 2^20
         * @return this
         */
        public Builder eventCapacity(int eventCapacity) {
            this.eventCapacity = eventCapacity;
            return this;
        }

        /**
         * Builds the reader.
         *
         * @return a reader at frame 0
         * @throws IllegalArgumentException if there is no cadence, the channel isn't one of
         *     the frame's, or the event capacity is out of range
         */
        public CadenceReader build() {
            return new CadenceReader(this);
        }
    }
}
