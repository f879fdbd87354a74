package io.github.polewright.mains;

import java.util.Arrays;

/** The last 1024 proposal samples of every channel, and a copy of the first 1024 after sound began. */
final class Recent {

    static final int LENGTH = Transform.POINTS;

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
        ring = new double[channels][LENGTH];
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
        next = (next + 1) % LENGTH;
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

    /** Sample {@code index} of the last {@code length}, oldest first. */
    double at(int channel, int index, int length) {
        return ring[channel][(next - length + index + LENGTH) % LENGTH];
    }

    void copyLast(int channel, double[] destination) {
        System.arraycopy(ring[channel], next, destination, 0, LENGTH - next);
        System.arraycopy(ring[channel], 0, destination, LENGTH - next, next);
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
