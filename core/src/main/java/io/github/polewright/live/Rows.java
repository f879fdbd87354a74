package io.github.polewright.live;

import static io.github.polewright.live.Arithmetic.mulAdd;

/**
 * Runs a piece frame by frame, all channels at once, for cascades of many channels. Keeps nothing between pieces:
 * stages and states come from the engine's arrays and go back to them. The audio thread's own.
 */
final class Rows {

    private static final int LEAST_CHANNELS = 32;
    private static final int LEAST_SECTIONS = 8;

    private final int channels;
    private final int sections;
    /** Stages in this frame, one frame ago and two frames ago; the rows change places from frame to frame. */
    private double[][] x;

    private double[][] x1;
    private double[][] x2;
    /** The same of the states of transposed direct form II. */
    private double[][] w;

    private double[][] w1;
    private double[][] w2;

    Rows(boolean transposed, int channels, int sections) {
        this.channels = channels;
        this.sections = sections;
        int states = transposed ? sections : 0;
        x = new double[sections + 1][channels];
        x1 = new double[sections + 1][channels];
        x2 = new double[sections + 1][channels];
        w = new double[states][channels];
        w1 = new double[states][channels];
        w2 = new double[states][channels];
    }

    /**
     * Whether this is at least a tenth faster than going channel by channel: turning the slab takes as long as rows save
     * in four sections of 32 channels.
     */
    static boolean pay(int channels, int sections) {
        return channels >= LEAST_CHANNELS && sections >= LEAST_SECTIONS;
    }

    /** Steady, direct form I. */
    void direct(double[] slab, int frames, int untilGuard, double[] c, double[] old, double[] next) {
        take(old, x1, x2);
        int guard = untilGuard - 1;
        for (int i = 0; i < frames; i++) {
            RawRows.gather(slab, i, x[0]);
            for (int s = 0, k = 0; s < sections; s++, k += 5) {
                RawRows.direct(
                        x[s + 1], x[s], x1[s], x2[s], x1[s + 1], x2[s + 1], c[k], c[k + 1], c[k + 2], -c[k + 3],
                        -c[k + 4]);
            }
            RawRows.scatter(x[sections], slab, i);
            turnStages();
            if (i == guard) {
                guard += Guard.FRAMES;
                guard(x1, x2);
            }
        }
        give(next, x1, x2);
    }

    /** Gliding, whatever the form. */
    void glide(
            double[] slab,
            int frames,
            int untilGuard,
            double[] c,
            double[] step,
            int passed,
            double[] old,
            double[] next) {
        take(old, x1, x2);
        int guard = untilGuard - 1;
        for (int i = 0; i < frames; i++) {
            RawRows.gather(slab, i, x[0]);
            double t = passed + 1 + i;
            for (int s = 0, k = 0; s < sections; s++, k += 5) {
                double b0 = mulAdd(step[k], t, c[k]), b1 = mulAdd(step[k + 1], t, c[k + 1]);
                double b2 = mulAdd(step[k + 2], t, c[k + 2]);
                double a1 = -mulAdd(step[k + 3], t, c[k + 3]), a2 = -mulAdd(step[k + 4], t, c[k + 4]);
                RawRows.direct(x[s + 1], x[s], x1[s], x2[s], x1[s + 1], x2[s + 1], b0, b1, b2, a1, a2);
            }
            RawRows.scatter(x[sections], slab, i);
            turnStages();
            if (i == guard) {
                guard += Guard.FRAMES;
                guard(x1, x2);
            }
        }
        give(next, x1, x2);
    }

    /** Steady, transposed direct form II. */
    void transposed(
            double[] slab, int frames, int untilGuard, double[] c, double[] states, double[] old, double[] next) {
        take(old, x1, x2);
        take(states, w1, w2);
        int guard = untilGuard - 1;
        for (int i = 0; i < frames; i++) {
            RawRows.gather(slab, i, x[0]);
            for (int s = 0, k = 0; s < sections; s++, k += 5) {
                double b0 = c[k], a1 = -c[k + 3], a2 = -c[k + 4];
                double e1 = mulAdd(a1, b0, c[k + 1]), e2 = mulAdd(a2, b0, c[k + 2]);
                RawRows.transposedOutput(x[s + 1], x[s], w1[s], b0);
                RawRows.transposedState(w[s], x[s], x1[s], w1[s], w2[s], e1, e2, a1, a2);
            }
            RawRows.scatter(x[sections], slab, i);
            turnStages();
            turnStates();
            if (i == guard) {
                guard += Guard.FRAMES;
                guard(w1, w2);
            }
        }
        give(next, x1, x2);
        give(states, w1, w2);
    }

    private void take(double[] from, double[][] last, double[][] beforeLast) {
        for (int i = 0; i < last.length; i++) {
            System.arraycopy(from, 2 * i * channels, last[i], 0, channels);
            System.arraycopy(from, (2 * i + 1) * channels, beforeLast[i], 0, channels);
        }
    }

    private void give(double[] to, double[][] last, double[][] beforeLast) {
        for (int i = 0; i < last.length; i++) {
            System.arraycopy(last[i], 0, to, 2 * i * channels, channels);
            System.arraycopy(beforeLast[i], 0, to, (2 * i + 1) * channels, channels);
        }
    }

    private void turnStages() {
        double[][] free = x2;
        x2 = x1;
        x1 = x;
        x = free;
    }

    private void turnStates() {
        double[][] free = w2;
        w2 = w1;
        w1 = w;
        w = free;
    }

    private static void guard(double[][] last, double[][] beforeLast) {
        for (int i = 0; i < last.length; i++) {
            RawRows.guard(last[i], beforeLast[i]);
        }
    }
}
