package io.github.polewright.live;

import static io.github.polewright.live.Arithmetic.mulAdd;

import io.github.polewright.slab.Slab;

/**
 * The loops for many channels: one frame of one section, all channels at once. The compiler turns such a loop into
 * vector instructions only where every array is indexed by the plain loop variable, hence a row an argument. The
 * arithmetic is that of {@link RawDirectForm1}, {@link RawGlide} and {@link RawTransposed}, bit for bit.
 */
final class RawRows {

    private RawRows() {}

    /** Direct form I: {@code y} from this frame's {@code x} and the last two of both. */
    static void direct(
            double[] y,
            double[] x,
            double[] x1,
            double[] x2,
            double[] y1,
            double[] y2,
            double b0,
            double b1,
            double b2,
            double a1,
            double a2) {
        for (int j = 0; j < y.length; j++) {
            y[j] = mulAdd(a1, y1[j], mulAdd(a2, y2[j], mulAdd(b0, x[j], mulAdd(b1, x1[j], b2 * x2[j]))));
        }
    }

    /** Transposed direct form II, output. */
    static void transposedOutput(double[] y, double[] x, double[] w1, double b0) {
        for (int j = 0; j < y.length; j++) {
            y[j] = mulAdd(b0, x[j], w1[j]);
        }
    }

    /** Transposed direct form II, state: {@code w} from its own last two and the last two of {@code x}. */
    static void transposedState(
            double[] w, double[] x, double[] x1, double[] w1, double[] w2, double e1, double e2, double a1, double a2) {
        for (int j = 0; j < w.length; j++) {
            w[j] = mulAdd(a1, w1[j], mulAdd(a2, w2[j], mulAdd(e1, x[j], e2 * x1[j])));
        }
    }

    /** Takes one frame out of the slab. */
    static void gather(double[] slab, int frame, double[] row) {
        int at = frame;
        for (int j = 0; j < row.length; j++) {
            row[j] = slab[at];
            at += Slab.FRAMES;
        }
    }

    /** Puts one frame into the slab. */
    static void scatter(double[] row, double[] slab, int frame) {
        int at = frame;
        for (int j = 0; j < row.length; j++) {
            slab[at] = row[j];
            at += Slab.FRAMES;
        }
    }

    /** Silences the channels in which both rows are tiny. */
    static void guard(double[] first, double[] second) {
        for (int j = 0; j < first.length; j++) {
            if (Guard.tiny(first[j], second[j])) {
                first[j] = 0;
                second[j] = 0;
            }
        }
    }
}
