package io.github.polewright.mains;

/** The frames between two looks of the analysis, one array of doubles a channel; non-finite samples become 0. */
final class Slab {

    final double[][] data;
    final int frames;
    private final int channels;
    private int position;
    private long replaced;

    Slab(Rates rates, int channels) {
        this.channels = channels;
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

    /** Moves on; true when the slab is full and starts again. */
    boolean advance(int count) {
        position += count;
        if (position < frames) {
            return false;
        }
        position = 0;
        return true;
    }

    void load(float[] source, int offset, int count) {
        for (int c = 0; c < channels; c++) {
            double[] to = data[c];
            for (int n = 0, i = offset + c; n < count; n++, i += channels) {
                to[position + n] = finite(source[i]);
            }
        }
    }

    void load(double[] source, int offset, int count) {
        for (int c = 0; c < channels; c++) {
            double[] to = data[c];
            for (int n = 0, i = offset + c; n < count; n++, i += channels) {
                to[position + n] = finite(source[i]);
            }
        }
    }

    void load(float[][] source, int offset, int count) {
        for (int c = 0; c < channels; c++) {
            double[] to = data[c];
            float[] from = source[c];
            for (int n = 0; n < count; n++) {
                to[position + n] = finite(from[offset + n]);
            }
        }
    }

    private double finite(double sample) {
        if (Math.abs(sample) < Double.POSITIVE_INFINITY) {
            return sample;
        }
        replaced++;
        return 0;
    }

    long replaced() {
        return replaced;
    }

    void reset() {
        position = 0;
    }
}
