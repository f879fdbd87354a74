package io.github.polewright.slab;

import java.nio.FloatBuffer;

/**
 * Up to {@link #FRAMES} frames of samples as {@code double}, one plane a channel: sample {@code i} of channel {@code c}
 * lies at {@code c * FRAMES + i}.
 *
 * <p>Loading contains what the filters must never see: a non-finite sample becomes 0 and is counted, a {@code double}
 * below {@link #TINY} becomes 0 without a word (a {@code float} cannot be a subnormal {@code double}). Storing contains
 * what the caller must never hear: a sample that is not finite in the destination's format becomes 0 and is counted.
 *
 * <p><b>Threads</b> the audio thread only. <b>Allocation</b> none after construction. <b>Errors</b> none: ranges are the
 * caller's duty ({@link Ranges}).
 */
public final class Slab {

    /** The most frames a slab holds. */
    public static final int FRAMES = 64;

    /** Magnitudes below this, 600 dB under full scale, are taken for zero, so that no state turns subnormal. */
    public static final double TINY = 1e-30;

    private final int channels;
    private final double[] samples;
    private long replacedInputs;
    private long replacedOutputs;

    /**
     * An empty slab.
     *
     * @param channels at least 1
     */
    public Slab(int channels) {
        this.channels = channels;
        this.samples = new double[channels * FRAMES];
    }

    /**
     * The samples themselves.
     *
     * @return plane after plane, {@link #FRAMES} values each
     */
    public double[] samples() {
        return samples;
    }

    /**
     * Non-finite input samples replaced by 0 so far.
     *
     * @return a count
     */
    public long replacedInputs() {
        return replacedInputs;
    }

    /**
     * Output samples replaced by 0 so far, since they were not finite in the destination's format.
     *
     * @return a count
     */
    public long replacedOutputs() {
        return replacedOutputs;
    }

    /**
     * Fills the slab from interleaved frames.
     *
     * @param source interleaved samples
     * @param offset of the first sample
     * @param frames at most {@link #FRAMES}
     */
    public void load(float[] source, int offset, int frames) {
        if (channels == 1) {
            double[] to = samples;
            for (int i = 0; i < frames; i++) {
                to[i] = contained(source[offset + i]);
            }
            return;
        }
        for (int channel = 0; channel < channels; channel++) {
            int from = offset + channel;
            int to = channel * FRAMES;
            for (int end = to + frames; to < end; to++, from += channels) {
                samples[to] = contained(source[from]);
            }
        }
    }

    /**
     * Fills the slab from interleaved frames.
     *
     * @param source interleaved samples
     * @param offset of the first sample
     * @param frames at most {@link #FRAMES}
     */
    public void load(double[] source, int offset, int frames) {
        if (channels == 1) {
            double[] to = samples;
            for (int i = 0; i < frames; i++) {
                to[i] = contained(source[offset + i]);
            }
            return;
        }
        for (int channel = 0; channel < channels; channel++) {
            int from = offset + channel;
            int to = channel * FRAMES;
            for (int end = to + frames; to < end; to++, from += channels) {
                samples[to] = contained(source[from]);
            }
        }
    }

    /**
     * Fills the slab from planar frames.
     *
     * @param source one array a channel
     * @param offset of the first frame in every array
     * @param frames at most {@link #FRAMES}
     */
    public void load(float[][] source, int offset, int frames) {
        for (int channel = 0; channel < channels; channel++) {
            float[] plane = source[channel];
            int to = channel * FRAMES;
            for (int i = 0; i < frames; i++) {
                samples[to + i] = contained(plane[offset + i]);
            }
        }
    }

    /**
     * Fills the slab from interleaved frames.
     *
     * @param source interleaved samples, read by absolute index
     * @param offset of the first sample
     * @param frames at most {@link #FRAMES}
     */
    public void load(FloatBuffer source, int offset, int frames) {
        for (int channel = 0; channel < channels; channel++) {
            int from = offset + channel;
            int to = channel * FRAMES;
            for (int end = to + frames; to < end; to++, from += channels) {
                samples[to] = contained(source.get(from));
            }
        }
    }

    /**
     * Empties the slab into interleaved frames.
     *
     * @param destination interleaved samples
     * @param offset of the first sample
     * @param frames as many as were loaded
     */
    public void store(float[] destination, int offset, int frames) {
        if (channels == 1) {
            double[] from = samples;
            for (int i = 0; i < frames; i++) {
                destination[offset + i] = narrowed(from[i]);
            }
            return;
        }
        for (int channel = 0; channel < channels; channel++) {
            int to = offset + channel;
            int from = channel * FRAMES;
            for (int end = from + frames; from < end; from++, to += channels) {
                destination[to] = narrowed(samples[from]);
            }
        }
    }

    /**
     * Empties the slab into interleaved frames.
     *
     * @param destination interleaved samples
     * @param offset of the first sample
     * @param frames as many as were loaded
     */
    public void store(double[] destination, int offset, int frames) {
        if (channels == 1) {
            double[] from = samples;
            for (int i = 0; i < frames; i++) {
                destination[offset + i] = finite(from[i]);
            }
            return;
        }
        for (int channel = 0; channel < channels; channel++) {
            int to = offset + channel;
            int from = channel * FRAMES;
            for (int end = from + frames; from < end; from++, to += channels) {
                destination[to] = finite(samples[from]);
            }
        }
    }

    /**
     * Empties the slab into planar frames.
     *
     * @param destination one array a channel
     * @param offset of the first frame in every array
     * @param frames as many as were loaded
     */
    public void store(float[][] destination, int offset, int frames) {
        for (int channel = 0; channel < channels; channel++) {
            float[] plane = destination[channel];
            int from = channel * FRAMES;
            for (int i = 0; i < frames; i++) {
                plane[offset + i] = narrowed(samples[from + i]);
            }
        }
    }

    /**
     * Empties the slab into interleaved frames.
     *
     * @param destination interleaved samples, written by absolute index
     * @param offset of the first sample
     * @param frames as many as were loaded
     */
    public void store(FloatBuffer destination, int offset, int frames) {
        for (int channel = 0; channel < channels; channel++) {
            int to = offset + channel;
            int from = channel * FRAMES;
            for (int end = from + frames; from < end; from++, to += channels) {
                destination.put(to, narrowed(samples[from]));
            }
        }
    }

    private double contained(float sample) {
        if (Math.abs(sample) <= Float.MAX_VALUE) {
            return sample;
        }
        replacedInputs++;
        return 0;
    }

    private double contained(double sample) {
        double size = Math.abs(sample);
        if (size >= TINY && size <= Double.MAX_VALUE) {
            return sample;
        }
        if (!(size < TINY)) {
            replacedInputs++;
        }
        return 0;
    }

    private float narrowed(double sample) {
        float narrow = (float) sample;
        if (Math.abs(narrow) <= Float.MAX_VALUE) {
            return narrow;
        }
        replacedOutputs++;
        return 0;
    }

    private double finite(double sample) {
        if (Math.abs(sample) <= Double.MAX_VALUE) {
            return sample;
        }
        replacedOutputs++;
        return 0;
    }
}
