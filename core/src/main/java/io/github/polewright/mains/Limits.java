package io.github.polewright.mains;

/** Checks at construction. */
final class Limits {

    static final int MOST_CHANNELS = 64;

    private Limits() {}

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
}
