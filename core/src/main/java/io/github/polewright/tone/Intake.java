package io.github.polewright.tone;

import io.github.polewright.slab.Ranges;
import java.util.Objects;
import java.util.concurrent.atomic.AtomicLong;

/**
 * The way in: checks a block's arguments, picks one channel, replaces unusable samples and hands chunks to the front end
 * and on to the reader. Chunks end at every 32nd frame since the start, so that any cutting into blocks does the same.
 */
final class Intake {

    static final int CHUNK_FRAMES = 32;

    /** 300 dB above full scale: no sound, and small enough that no power of it overflows. */
    private static final double LARGEST = 1e15;

    private static final double SMALLEST = 1e-30;

    private final int channels;
    private final int channel;
    private final FrontEnd frontEnd;
    private final InnerSamples inner;
    private final double[] chunk = new double[CHUNK_FRAMES];
    private final AtomicLong replaced = new AtomicLong();
    private long frame;

    Intake(int channels, int channel, FrontEnd frontEnd, InnerSamples inner) {
        if (channels < 1) {
            throw new IllegalArgumentException("channels is " + channels + "; it must be at least 1");
        }
        if (channel < 0 || channel >= channels) {
            throw new IllegalArgumentException("channel is " + channel + "; it must be 0 to " + (channels - 1));
        }
        this.channels = channels;
        this.channel = channel;
        this.frontEnd = frontEnd;
        this.inner = inner;
    }

    long replacedSamples() {
        return replaced.getAcquire();
    }

    void reset() {
        frame = 0;
        frontEnd.reset();
    }

    void interleaved(float[] source, int offset, int frames) {
        Ranges.interleaved("source", source, offset, frames, channels);
        int next = offset + channel;
        for (int left = frames; left > 0; ) {
            int count = room(left);
            for (int i = 0; i < count; i++, next += channels) {
                chunk[i] = usable(source[next]);
            }
            pass(count);
            left -= count;
        }
    }

    void interleaved(double[] source, int offset, int frames) {
        Ranges.interleaved("source", source, offset, frames, channels);
        int next = offset + channel;
        for (int left = frames; left > 0; ) {
            int count = room(left);
            for (int i = 0; i < count; i++, next += channels) {
                chunk[i] = usable(source[next]);
            }
            pass(count);
            left -= count;
        }
    }

    void planar(float[][] source, int offset, int frames) {
        if (Objects.requireNonNull(source, "source").length != channels) {
            throw new IllegalArgumentException("source has " + source.length + " channels; it must have " + channels);
        }
        float[] row = source[channel];
        Ranges.interleaved("source[channel]", row, offset, frames, 1);
        int next = offset;
        for (int left = frames; left > 0; ) {
            int count = room(left);
            for (int i = 0; i < count; i++) {
                chunk[i] = usable(row[next++]);
            }
            pass(count);
            left -= count;
        }
    }

    private int room(int left) {
        return Math.min(left, CHUNK_FRAMES - (int) (frame % CHUNK_FRAMES));
    }

    /** Silence in place of what is no sample, and in place of what would only feed subnormals to the recursions. */
    private double usable(double sample) {
        double magnitude = Math.abs(sample);
        if (magnitude <= LARGEST) {
            return magnitude < SMALLEST ? 0 : sample;
        }
        replaced.setRelease(replaced.getPlain() + 1);
        return 0;
    }

    private void pass(int count) {
        int kept = frontEnd.process(chunk, count);
        frame += count;
        inner.take(chunk, kept);
        if (frame % CHUNK_FRAMES == 0) {
            frontEnd.guard();
            inner.guard();
        }
    }
}
