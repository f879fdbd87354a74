package io.github.polewright.mains;

import java.util.Objects;

/** Checks of a block at the edge, before anything changes. */
final class Blocks {

    static final int MOST_CHANNELS = 64;

    private Blocks() {}

    static int channels(int channels) {
        if (channels < 1 || channels > MOST_CHANNELS) {
            throw new IllegalArgumentException("channels is " + channels + "; it must be from 1 to " + MOST_CHANNELS);
        }
        return channels;
    }

    static int lines(int lines) {
        if (lines < 2 || lines > Rates.MOST_LINES) {
            throw new IllegalArgumentException("lines is " + lines + "; it must be from 2 to " + Rates.MOST_LINES);
        }
        return lines;
    }

    static void range(int offset, int frames, int channels, int length) {
        if (frames < 0) {
            throw new IndexOutOfBoundsException("frames is " + frames + "; it must not be negative");
        }
        long end = offset + (long) frames * channels;
        if (offset < 0 || end > length) {
            throw new IndexOutOfBoundsException(
                    "samples " + offset + " to " + end + " were asked for; the array holds 0 to " + length);
        }
    }

    static void planar(float[][] data, int channels, int offset, int frames) {
        if (data.length != channels) {
            throw new IllegalArgumentException("an array of " + data.length + " channels; it must have " + channels);
        }
        for (float[] channel : data) {
            range(offset, frames, 1, channel.length);
        }
    }

    /** Refuses ranges that overlap without being the same. */
    static void overlap(Object source, int sourceOffset, Object destination, int destinationOffset, long samples) {
        Objects.requireNonNull(source, "source");
        Objects.requireNonNull(destination, "destination");
        if (source == destination
                && sourceOffset != destinationOffset
                && Math.abs((long) sourceOffset - destinationOffset) < samples) {
            throw new IllegalArgumentException("source at " + sourceOffset + " and destination at " + destinationOffset
                    + " overlap in one array; they must be the same range or apart");
        }
    }
}
