package io.github.polewright.live;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.FloatBuffer;

/** Every way a block of samples is handed to a live cascade, so that one test can walk all of them. */
enum SampleFormat {
    FLOATS {
        @Override
        void process(LiveCascade live, double[][] in, double[][] out, int first, int frames) {
            int channels = in.length;
            float[] block = new float[frames * channels];
            for (int i = 0; i < block.length; i++) {
                block[i] = (float) in[i % channels][first + i / channels];
            }
            float[] result = new float[block.length];
            live.process(block, 0, result, 0, frames);
            for (int i = 0; i < block.length; i++) {
                out[i % channels][first + i / channels] = result[i];
            }
        }
    },
    DOUBLES {
        @Override
        void process(LiveCascade live, double[][] in, double[][] out, int first, int frames) {
            int channels = in.length;
            double[] block = new double[frames * channels];
            for (int i = 0; i < block.length; i++) {
                block[i] = in[i % channels][first + i / channels];
            }
            double[] result = new double[block.length];
            live.process(block, 0, result, 0, frames);
            for (int i = 0; i < block.length; i++) {
                out[i % channels][first + i / channels] = result[i];
            }
        }
    },
    PLANES {
        @Override
        void process(LiveCascade live, double[][] in, double[][] out, int first, int frames) {
            int channels = in.length;
            float[][] block = new float[channels][frames];
            for (int c = 0; c < channels; c++) {
                for (int i = 0; i < frames; i++) {
                    block[c][i] = (float) in[c][first + i];
                }
            }
            float[][] result = new float[channels][frames];
            live.process(block, result, 0, frames);
            for (int c = 0; c < channels; c++) {
                for (int i = 0; i < frames; i++) {
                    out[c][first + i] = result[c][i];
                }
            }
        }
    },
    BUFFERS {
        @Override
        void process(LiveCascade live, double[][] in, double[][] out, int first, int frames) {
            int channels = in.length;
            FloatBuffer block = direct(frames * channels);
            for (int i = 0; i < frames * channels; i++) {
                block.put(i, (float) in[i % channels][first + i / channels]);
            }
            FloatBuffer result = direct(frames * channels);
            live.process(block, result, frames);
            for (int i = 0; i < frames * channels; i++) {
                out[i % channels][first + i / channels] = result.get(i);
            }
        }
    };

    /** Filters frames {@code first} and on of planar {@code in} into the same frames of planar {@code out}. */
    abstract void process(LiveCascade live, double[][] in, double[][] out, int first, int frames);

    /** Whether samples come out rounded to {@code float}. */
    boolean narrow() {
        return this != DOUBLES;
    }

    static FloatBuffer direct(int samples) {
        return ByteBuffer.allocateDirect(4 * samples)
                .order(ByteOrder.nativeOrder())
                .asFloatBuffer();
    }
}
