package io.github.polewright.live;

import static io.github.polewright.live.Arithmetic.mulAdd;

import io.github.polewright.slab.Slab;

/**
 * The loops of a glide: direct form I, whatever the cascade's form, with all five coefficients another in every frame.
 * In frame {@code i} of a segment a coefficient is {@code start + i * step}, counted from 1; multiplying instead of
 * adding up leaves no drift. Stages and guard are as in {@link RawDirectForm1}.
 */
final class RawGlide {

    private RawGlide() {}

    /** One channel, one section. */
    static void one(
            double[] x,
            int from,
            int frames,
            int untilGuard,
            double[] c,
            double[] step,
            int passed,
            int section,
            double[] old,
            double[] next,
            int channels,
            int channel) {
        int k = 5 * section;
        double b0 = c[k], b1 = c[k + 1], b2 = c[k + 2], a1 = -c[k + 3], a2 = -c[k + 4];
        double b0Step = step[k], b1Step = step[k + 1], b2Step = step[k + 2];
        double a1Step = -step[k + 3], a2Step = -step[k + 4];
        int h = 2 * section * channels + channel;
        double x1 = old[h], x2 = old[h + channels], y1 = old[h + 2 * channels], y2 = old[h + 3 * channels];
        double t = passed + 1;
        int i = from, end = from + frames, guard = from + untilGuard;
        while (i < end) {
            for (int stop = Math.min(end, guard); i < stop; i++) {
                double in = x[i];
                double y = mulAdd(mulAdd(b1Step, t, b1), x1, mulAdd(b2Step, t, b2) * x2);
                y = mulAdd(mulAdd(b0Step, t, b0), in, y);
                y = mulAdd(mulAdd(a1Step, t, a1), y1, mulAdd(mulAdd(a2Step, t, a2), y2, y));
                x2 = x1;
                x1 = in;
                y2 = y1;
                y1 = y;
                x[i] = y;
                t += 1;
            }
            if (i == guard) {
                guard += Guard.FRAMES;
                if (Guard.tiny(x1, x2)) {
                    x1 = x2 = 0;
                }
                if (Guard.tiny(y1, y2)) {
                    y1 = y2 = 0;
                }
            }
        }
        next[h] = x1;
        next[h + channels] = x2;
        next[h + 2 * channels] = y1;
        next[h + 3 * channels] = y2;
    }

    /**
     * One section's coefficients in every frame of a piece, for all channels to read. Worked out in the loop of two
     * channels instead, they and their steps would not fit the 16 registers that many processors have.
     *
     * @param t one more than the frames of the segment that are behind each frame
     */
    static void coefficients(double[][] moving, double[] t, int frames, double[] start, double[] step, int section) {
        int k = 5 * section;
        fill(
                moving[0],
                moving[1],
                moving[2],
                moving[3],
                moving[4],
                t,
                frames,
                start[k],
                start[k + 1],
                start[k + 2],
                -start[k + 3],
                -start[k + 4],
                step[k],
                step[k + 1],
                step[k + 2],
                -step[k + 3],
                -step[k + 4]);
    }

    /** A method of its own, with every array indexed by the plain loop variable: so the compiler uses vectors. */
    private static void fill(
            double[] b0s,
            double[] b1s,
            double[] b2s,
            double[] a1s,
            double[] a2s,
            double[] t,
            int frames,
            double b0,
            double b1,
            double b2,
            double a1,
            double a2,
            double b0Step,
            double b1Step,
            double b2Step,
            double a1Step,
            double a2Step) {
        for (int i = 0; i < frames; i++) {
            double at = t[i];
            b0s[i] = mulAdd(b0Step, at, b0);
            b1s[i] = mulAdd(b1Step, at, b1);
            b2s[i] = mulAdd(b2Step, at, b2);
            a1s[i] = mulAdd(a1Step, at, a1);
            a2s[i] = mulAdd(a2Step, at, a2);
        }
    }

    /** Two channels, one section. */
    static void stereo(
            double[] x,
            int from,
            int frames,
            int untilGuard,
            double[][] moving,
            int section,
            double[] old,
            double[] next,
            int channels,
            int channel) {
        double[] b0s = moving[0], b1s = moving[1], b2s = moving[2], a1s = moving[3], a2s = moving[4];
        int h = 2 * section * channels + channel, g = h + 1;
        double x1 = old[h], x2 = old[h + channels], y1 = old[h + 2 * channels], y2 = old[h + 3 * channels];
        double u1 = old[g], u2 = old[g + channels], v1 = old[g + 2 * channels], v2 = old[g + 3 * channels];
        int i = 0, guard = untilGuard;
        while (i < frames) {
            for (int stop = Math.min(frames, guard); i < stop; i++) {
                double b0 = b0s[i], b1 = b1s[i], b2 = b2s[i], a1 = a1s[i], a2 = a2s[i];
                double in = x[from + i];
                double y = mulAdd(a1, y1, mulAdd(a2, y2, mulAdd(b0, in, mulAdd(b1, x1, b2 * x2))));
                x2 = x1;
                x1 = in;
                y2 = y1;
                y1 = y;
                x[from + i] = y;
                in = x[from + i + Slab.FRAMES];
                y = mulAdd(a1, v1, mulAdd(a2, v2, mulAdd(b0, in, mulAdd(b1, u1, b2 * u2))));
                u2 = u1;
                u1 = in;
                v2 = v1;
                v1 = y;
                x[from + i + Slab.FRAMES] = y;
            }
            if (i == guard) {
                guard += Guard.FRAMES;
                if (Guard.tiny(x1, x2)) {
                    x1 = x2 = 0;
                }
                if (Guard.tiny(y1, y2)) {
                    y1 = y2 = 0;
                }
                if (Guard.tiny(u1, u2)) {
                    u1 = u2 = 0;
                }
                if (Guard.tiny(v1, v2)) {
                    v1 = v2 = 0;
                }
            }
        }
        next[h] = x1;
        next[h + channels] = x2;
        next[h + 2 * channels] = y1;
        next[h + 3 * channels] = y2;
        next[g] = u1;
        next[g + channels] = u2;
        next[g + 2 * channels] = v1;
        next[g + 3 * channels] = v2;
    }
}
