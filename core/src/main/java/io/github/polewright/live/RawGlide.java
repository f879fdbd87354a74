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

    /** Two channels, one section: the coefficients are worked out once for both. */
    static void stereo(
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
        int h = 2 * section * channels + channel, g = h + 1;
        double x1 = old[h], x2 = old[h + channels], y1 = old[h + 2 * channels], y2 = old[h + 3 * channels];
        double u1 = old[g], u2 = old[g + channels], v1 = old[g + 2 * channels], v2 = old[g + 3 * channels];
        double t = passed + 1;
        int i = from, end = from + frames, guard = from + untilGuard;
        while (i < end) {
            for (int stop = Math.min(end, guard); i < stop; i++) {
                double n0 = mulAdd(b0Step, t, b0), n1 = mulAdd(b1Step, t, b1), n2 = mulAdd(b2Step, t, b2);
                double d1 = mulAdd(a1Step, t, a1), d2 = mulAdd(a2Step, t, a2);
                double in = x[i];
                double y = mulAdd(d1, y1, mulAdd(d2, y2, mulAdd(n0, in, mulAdd(n1, x1, n2 * x2))));
                x2 = x1;
                x1 = in;
                y2 = y1;
                y1 = y;
                x[i] = y;
                in = x[i + Slab.FRAMES];
                y = mulAdd(d1, v1, mulAdd(d2, v2, mulAdd(n0, in, mulAdd(n1, u1, n2 * u2))));
                u2 = u1;
                u1 = in;
                v2 = v1;
                v1 = y;
                x[i + Slab.FRAMES] = y;
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
