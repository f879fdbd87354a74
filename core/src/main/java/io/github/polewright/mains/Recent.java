package io.github.polewright.mains;

import java.util.Arrays;

/** The last 1024 proposal samples of every channel, and a copy of the first 1024 after sound began. */
final class Recent {

    static final int LENGTH = Transform.POINTS;

    /** A power of two, and longer: what is read in slices must not be overwritten meanwhile. */
    private static final int RING = 2 * LENGTH;

    private static final double AUDIBLE = 1e-9;
    /** A quarter of a second of silence at most before the first sound. */
    private static final int LATEST = 250;

    final int channels;
    /** The first second of sound, {@code [channel][sample]}. */
    final double[][] first;

    private final double[][] ring;
    private int next;
    private int filled;
    private int firstCount;
    private int quietCount;
    private boolean sounding;

    Recent(int channels) {
        this.channels = channels;
        ring = new double[channels][RING];
        first = new double[channels][LENGTH];
    }

    void push(double[] samples) {
        for (int c = 0; c < channels; c++) {
            ring[c][next] = samples[c];
            sounding |= Math.abs(samples[c]) > AUDIBLE;
        }
        if (!sounding) {
            quietCount = Math.min(quietCount + 1, LATEST);
        } else if (firstCount < LENGTH) {
            for (int c = 0; c < channels; c++) {
                first[c][firstCount] = samples[c];
            }
            firstCount++;
        }
        next = (next + 1) % RING;
        filled = Math.min(filled + 1, LENGTH);
    }

    /** How many of the last samples are there. */
    int filled() {
        return filled;
    }

    /** False for ever where sound began late: what begins after silence may be a note. */
    boolean firstIsWhole() {
        return firstCount == LENGTH && quietCount < LATEST;
    }

    /** Sample {@code index} counted from {@code length} samples ago, oldest first. */
    double at(int channel, int index, int length) {
        return ring[channel][(next - length + index + 2 * RING) & (RING - 1)];
    }

    void copyLast(int channel, double[] destination) {
        int start = (next + LENGTH) & (RING - 1);
        int head = Math.min(LENGTH, RING - start);
        System.arraycopy(ring[channel], start, destination, 0, head);
        System.arraycopy(ring[channel], 0, destination, head, LENGTH - head);
    }

    void reset() {
        for (int c = 0; c < channels; c++) {
            Arrays.fill(ring[c], 0);
        }
        next = 0;
        filled = 0;
        firstCount = 0;
        quietCount = 0;
        sounding = false;
    }
}
