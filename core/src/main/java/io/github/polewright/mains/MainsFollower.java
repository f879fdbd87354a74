package io.github.polewright.mains;

import io.github.polewright.slab.Ranges;
import io.github.polewright.slab.Slab;

/**
 * Finds the mains frequency in the hum of a stream and follows it: from all usable harmonics together, in all channels
 * together (so that hum in opposite phase counts too), wherever the fundamental lies from 45 to 65 Hz. It changes no
 * sample; {@link HumRemover} is the same follower with a removal behind it.
 *
 * <p>Not for hum of a single line, which cannot be told from a tone, and not for a measuring or a medical instrument. A
 * bass note that sounds from the first sample with ten seconds of unchanging harmonics is hum by every measure used.
 *
 * <p><b>Units</b> hertz; a frame is one sample of each channel. <b>Threads</b> {@code follow} on one audio thread;
 * {@link #reading} on any thread. <b>Allocation</b> none in {@code follow}, which is wait-free; {@link #reading}
 * allocates its answer. <b>Numbers</b> any cutting into blocks gives the same readings; a non-finite sample counts as
 * silence.
 */
public final class MainsFollower {

    private final int channels;
    private final Slab slab;
    private final SlabInput input;
    private final Tracker tracker;
    private final LinePhasors phasors;
    private final ReadingSlot slot;

    private MainsFollower(double sampleRateHz, int channels, int lines) {
        Rates rates = Rates.of(sampleRateHz);
        this.channels = Limits.channels(channels);
        slab = new Slab(channels);
        input = new SlabInput(rates, channels);
        tracker = new Tracker(rates, channels, Limits.lines(lines));
        phasors = new LinePhasors(tracker);
        slot = new ReadingSlot(tracker, phasors);
    }

    /**
     * A follower of 20 lines.
     *
     * @param sampleRateHz from 8000 to 192000
     * @param channels from 1 to 64
     * @return the follower, searching
     * @throws IllegalArgumentException if an argument is out of its range
     */
    public static MainsFollower of(double sampleRateHz, int channels) {
        return new MainsFollower(sampleRateHz, channels, Rates.MOST_LINES);
    }

    /**
     * A follower of fewer lines, for less work.
     *
     * @param sampleRateHz from 8000 to 192000
     * @param channels from 1 to 64
     * @param lines the highest harmonic used, from 2 to 20
     * @return the follower, searching
     * @throws IllegalArgumentException if an argument is out of its range
     */
    public static MainsFollower of(double sampleRateHz, int channels, int lines) {
        return new MainsFollower(sampleRateHz, channels, lines);
    }

    /**
     * Listens to a block of interleaved frames.
     *
     * @param source samples, finite or not, channel after channel
     * @param offset index of the first sample
     * @param frames how many frames
     * @throws IllegalArgumentException if {@code frames < 0}
     * @throws IndexOutOfBoundsException if the frames do not lie in the array
     */
    public void follow(float[] source, int offset, int frames) {
        Ranges.interleaved("source", source, offset, frames, channels);
        for (int done = 0; done < frames; ) {
            int count = input.room(frames - done);
            slab.load(source, offset + done * channels, count);
            advance(count);
            done += count;
        }
    }

    /**
     * Listens to a block of interleaved frames.
     *
     * @param source samples, finite or not, channel after channel
     * @param offset index of the first sample
     * @param frames how many frames
     * @throws IllegalArgumentException if {@code frames < 0}
     * @throws IndexOutOfBoundsException if the frames do not lie in the array
     */
    public void follow(double[] source, int offset, int frames) {
        Ranges.interleaved("source", source, offset, frames, channels);
        for (int done = 0; done < frames; ) {
            int count = input.room(frames - done);
            slab.load(source, offset + done * channels, count);
            advance(count);
            done += count;
        }
    }

    /**
     * Listens to a block of planar channels.
     *
     * @param source one array a channel
     * @param offset index of the first frame
     * @param frames how many frames
     * @throws IllegalArgumentException if {@code frames < 0} or {@code source} has another number of channels
     * @throws IndexOutOfBoundsException if the frames do not lie in every array
     */
    public void follow(float[][] source, int offset, int frames) {
        Ranges.planar(source, source, offset, frames, channels);
        for (int done = 0; done < frames; ) {
            int count = input.room(frames - done);
            slab.load(source, offset + done, count);
            advance(count);
            done += count;
        }
    }

    private void advance(int count) {
        input.take(slab.samples(), count);
        if (input.advance(count)) {
            MainsState before = tracker.proof.state();
            tracker.slab(input.data);
            if (tracker.ticked() || before != tracker.proof.state()) {
                phasors.retune();
                slot.publish();
            }
        }
    }

    /**
     * What is known now. Any thread; never blocks the audio thread.
     *
     * @return a reading whose values belong together
     */
    public MainsReading reading() {
        return slot.read();
    }

    /** Forgets everything and searches anew. Audio thread only. */
    public void reset() {
        input.reset();
        tracker.reset();
        slot.publish();
    }
}
