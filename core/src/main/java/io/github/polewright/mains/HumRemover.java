package io.github.polewright.mains;

import io.github.polewright.slab.Ranges;
import java.util.Objects;

/**
 * Finds mains hum in a stream by itself and removes it: 50 or 60 Hz or whatever a generator turns at, from 45 to 65 Hz,
 * with up to 20 harmonics, following as the frequency wanders. Only lines that are there are removed, and only once
 * they have behaved like mains.
 *
 * <p><b>Caution</b> Hum may be the sound of faulty wiring, a broken earth or a failing supply: the fault stays when its
 * sound is gone. Where equipment begins to hum, tingles or smells, switch it off and ask a licensed electrician. Not for
 * medical use: what is removed may be part of a signal somebody's health depends on.
 *
 * <p>Hum proves itself in about a second where it was there from the first sound, and in ten where it began later. Not
 * for a single tone (use a hum notch), and not for music that holds an unchanging bass note for ten seconds: such a note
 * is hum by every measure used. {@link Removal} tells the two ways.
 *
 * <p><b>Units</b> a frame is one sample of each channel. <b>Threads</b> {@code process} and {@link #reset} on one audio
 * thread; all else on any. <b>Allocation</b> none in {@code process}, which is wait-free; {@link #reading} allocates its
 * answer. <b>Numbers</b> zero latency; any cutting into blocks gives bit-identical output; a non-finite sample is
 * replaced by silence and counted.
 */
public final class HumRemover {

    private final int channels;
    private final RemovalEngine engine;

    private HumRemover(Builder builder) {
        channels = builder.channels;
        engine = new RemovalEngine(Rates.of(builder.sampleRateHz), channels, builder.lines);
        engine.way = builder.way;
    }

    /**
     * A remover of 20 lines by {@link Removal#SUBTRACTION}.
     *
     * @param sampleRateHz from 8000 to 192000
     * @param channels from 1 to 64
     * @return the remover, on, searching
     * @throws IllegalArgumentException if an argument is out of its range
     */
    public static HumRemover of(double sampleRateHz, int channels) {
        return builder(sampleRateHz, channels).build();
    }

    /**
     * Choices for a remover.
     *
     * @param sampleRateHz from 8000 to 192000
     * @param channels from 1 to 64
     * @return a builder
     * @throws IllegalArgumentException if an argument is out of its range
     */
    public static Builder builder(double sampleRateHz, int channels) {
        return new Builder(sampleRateHz, channels);
    }

    /** Choices for a remover. */
    public static final class Builder {

        private final double sampleRateHz;
        private final int channels;
        private int lines = Rates.MOST_LINES;
        private Removal way = Removal.SUBTRACTION;

        private Builder(double sampleRateHz, int channels) {
            this.sampleRateHz = Rates.of(sampleRateHz).sampleRateHz;
            this.channels = Limits.channels(channels);
        }

        /**
         * How many harmonics are followed and removed.
         *
         * @param count from 2 to 20
         * @return this
         * @throws IllegalArgumentException if {@code count} is out of its range
         */
        public Builder lines(int count) {
            lines = Limits.lines(count);
            return this;
        }

        /**
         * The way of removal.
         *
         * @param removal notches or subtraction
         * @return this
         */
        public Builder by(Removal removal) {
            way = Objects.requireNonNull(removal, "removal");
            return this;
        }

        /**
         * Makes the remover.
         *
         * @return the remover, on, searching
         */
        public HumRemover build() {
            return new HumRemover(this);
        }
    }

    /**
     * Removes hum from a block of interleaved frames. In place is allowed.
     *
     * @param source samples, channel after channel
     * @param sourceOffset index of the first sample
     * @param destination where the result goes
     * @param destinationOffset index of its first sample
     * @param frames how many frames
     * @throws IndexOutOfBoundsException if the frames do not lie in an array
     * @throws IllegalArgumentException if {@code frames < 0} or the two ranges overlap without being the same
     */
    public void process(float[] source, int sourceOffset, float[] destination, int destinationOffset, int frames) {
        Ranges.interleaved("source", source, sourceOffset, frames, channels);
        Ranges.interleaved("destination", destination, destinationOffset, frames, channels);
        Ranges.apart(source == destination, sourceOffset, destinationOffset, frames, channels);
        for (int done = 0; done < frames; ) {
            int count = engine.room(frames - done);
            engine.slab.load(source, sourceOffset + done * channels, count);
            engine.filter(count);
            engine.slab.store(destination, destinationOffset + done * channels, count);
            engine.advance(count);
            done += count;
        }
    }

    /**
     * Removes hum from a block of interleaved frames. In place is allowed.
     *
     * @param source samples, channel after channel
     * @param sourceOffset index of the first sample
     * @param destination where the result goes
     * @param destinationOffset index of its first sample
     * @param frames how many frames
     * @throws IndexOutOfBoundsException if the frames do not lie in an array
     * @throws IllegalArgumentException if {@code frames < 0} or the two ranges overlap without being the same
     */
    public void process(double[] source, int sourceOffset, double[] destination, int destinationOffset, int frames) {
        Ranges.interleaved("source", source, sourceOffset, frames, channels);
        Ranges.interleaved("destination", destination, destinationOffset, frames, channels);
        Ranges.apart(source == destination, sourceOffset, destinationOffset, frames, channels);
        for (int done = 0; done < frames; ) {
            int count = engine.room(frames - done);
            engine.slab.load(source, sourceOffset + done * channels, count);
            engine.filter(count);
            engine.slab.store(destination, destinationOffset + done * channels, count);
            engine.advance(count);
            done += count;
        }
    }

    /**
     * Removes hum from a block of planar channels. In place is allowed.
     *
     * @param source one array a channel
     * @param destination one array a channel
     * @param offset index of the first frame in source and destination
     * @param frames how many frames
     * @throws IllegalArgumentException if {@code frames < 0}, an argument has another number of channels, or one array
     *     serves two channels
     * @throws IndexOutOfBoundsException if the frames do not lie in every array
     */
    public void process(float[][] source, float[][] destination, int offset, int frames) {
        Ranges.planar(source, destination, offset, frames, channels);
        for (int done = 0; done < frames; ) {
            int count = engine.room(frames - done);
            engine.slab.load(source, offset + done, count);
            engine.filter(count);
            engine.slab.store(destination, offset + done, count);
            engine.advance(count);
            done += count;
        }
    }

    /**
     * Switches removal on or off, with a ramp of 20 ms. The follower goes on either way. Any thread; the audio thread
     * takes it up within one and a half milliseconds of signal (8 ms at 8 kHz).
     *
     * @param on whether hum is removed
     */
    public void switchTo(boolean on) {
        engine.on = on;
    }

    /** Lets hum through again, with a ramp of 20 ms: {@code switchTo(false)}. */
    public void off() {
        switchTo(false);
    }

    /**
     * Changes the way of removal, with a ramp of 20 ms. Any thread.
     *
     * @param removal notches or subtraction
     */
    public void by(Removal removal) {
        engine.way = Objects.requireNonNull(removal, "removal");
    }

    /**
     * What the follower knows now. Any thread; never blocks the audio thread.
     *
     * @return a reading whose values belong together
     */
    public MainsReading reading() {
        return engine.slot.read();
    }

    /**
     * How many non-finite samples, coming or going, were replaced by silence. Any thread; up to a slab late.
     *
     * @return a count since construction
     */
    public long replacedSamples() {
        return engine.replacedInputs + engine.replacedOutputs;
    }

    /**
     * How often a channel's notches overflowed and started again from zero. Any thread.
     *
     * @return a count since construction
     */
    public long restartedChannels() {
        return engine.restarted;
    }

    /** Forgets everything and searches anew, without a ramp. Audio thread only. */
    public void reset() {
        engine.reset();
    }
}
