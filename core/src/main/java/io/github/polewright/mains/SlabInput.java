package io.github.polewright.mains;

import io.github.polewright.slab.Slab;

/** The input since the last look of the analysis, one array a channel; full after a fixed number of frames. */
final class SlabInput {

    final double[][] data;
    final int frames;
    private int position;

    SlabInput(Rates rates, int channels) {
        frames = rates.slabFrames;
        data = new double[channels][frames];
    }

    /** Where the next frame goes. */
    int position() {
        return position;
    }

    /** How many of so many frames fit. */
    int room(int wanted) {
        return Math.min(wanted, frames - position);
    }

    /** Copies the first frames of a loaded slab. */
    void take(double[] planes, int count) {
        for (int c = 0; c < data.length; c++) {
            System.arraycopy(planes, c * Slab.FRAMES, data[c], position, count);
        }
    }

    /** Moves on; true when it is full and starts again. */
    boolean advance(int count) {
        position += count;
        if (position < frames) {
            return false;
        }
        position = 0;
        return true;
    }

    void reset() {
        position = 0;
    }
}
