package io.github.polewright.live;

import static io.github.polewright.live.Arithmetic.mulAdd;

import io.github.polewright.slab.Slab;

/**
 * The steady loops of transposed direct form II. With {@code e1 = b1 - a1 b0} and {@code e2 = b2 - a2 b0} its two
 * states obey {@code y = b0 x + s1}, {@code s1' = -a1 s1 + e1 x + s2}, {@code s2' = -a2 s1 + e2 x}. Here the second is
 * put into the first, {@code s1' = -a1 s1 - a2 s1Before + e1 x + e2 xBefore}: the loop then waits for one multiply-add
 * a frame, where the textbook step waits for two.
 *
 * <p>A section keeps {@code s1} at {@code 2k} and the {@code s1} of a frame before at {@code 2k + 1}, times the channel
 * count, plus the channel. Stages are kept as in {@link RawDirectForm1}; a glide starts from these.
 */
final class RawTransposed {

    private RawTransposed() {}

    /** One channel, one section. */
    static void one(
            double[] x,
            int from,
            int frames,
            int untilGuard,
            double[] c,
            int section,
            double[] s,
            double[] old,
            double[] next,
            int channels,
            int channel) {
        int k = 5 * section;
        double b0 = c[k], a1 = -c[k + 3], a2 = -c[k + 4];
        double e1 = mulAdd(a1, b0, c[k + 1]), e2 = mulAdd(a2, b0, c[k + 2]);
        int h = 2 * section * channels + channel;
        double w1 = s[h], w2 = s[h + channels], x1 = old[h];
        keepTail(x, from, frames, old, next, h, channels);
        int i = from, end = from + frames, guard = from + untilGuard;
        while (i < end) {
            for (int stop = Math.min(end, guard); i < stop; i++) {
                double in = x[i];
                x[i] = mulAdd(b0, in, w1);
                double w = mulAdd(a1, w1, mulAdd(a2, w2, mulAdd(e1, in, e2 * x1)));
                w2 = w1;
                w1 = w;
                x1 = in;
            }
            if (i == guard) {
                guard += Guard.FRAMES;
                if (Guard.tiny(w1, w2)) {
                    w1 = w2 = 0;
                }
            }
        }
        s[h] = w1;
        s[h + channels] = w2;
        keepTail(x, from, frames, old, next, h + 2 * channels, channels);
    }

    /** One channel, two sections. */
    static void pair(
            double[] x,
            int from,
            int frames,
            int untilGuard,
            double[] c,
            int section,
            double[] s,
            double[] old,
            double[] next,
            int channels,
            int channel) {
        int k = 5 * section;
        double b0 = c[k], a1 = -c[k + 3], a2 = -c[k + 4];
        double e1 = mulAdd(a1, b0, c[k + 1]), e2 = mulAdd(a2, b0, c[k + 2]);
        double d0 = c[k + 5], c1 = -c[k + 8], c2 = -c[k + 9];
        double f1 = mulAdd(c1, d0, c[k + 6]), f2 = mulAdd(c2, d0, c[k + 7]);
        int h = 2 * section * channels + channel;
        double w1 = s[h], w2 = s[h + channels], v1 = s[h + 2 * channels], v2 = s[h + 3 * channels];
        double x1 = old[h], y1 = old[h + 2 * channels], y2 = old[h + 3 * channels];
        keepTail(x, from, frames, old, next, h, channels);
        int i = from, end = from + frames, guard = from + untilGuard;
        while (i < end) {
            for (int stop = Math.min(end, guard); i < stop; i++) {
                double in = x[i];
                double y = mulAdd(b0, in, w1);
                double w = mulAdd(a1, w1, mulAdd(a2, w2, mulAdd(e1, in, e2 * x1)));
                x[i] = mulAdd(d0, y, v1);
                double v = mulAdd(c1, v1, mulAdd(c2, v2, mulAdd(f1, y, f2 * y1)));
                w2 = w1;
                w1 = w;
                x1 = in;
                v2 = v1;
                v1 = v;
                y2 = y1;
                y1 = y;
            }
            if (i == guard) {
                guard += Guard.FRAMES;
                if (Guard.tiny(w1, w2)) {
                    w1 = w2 = 0;
                }
                if (Guard.tiny(v1, v2)) {
                    v1 = v2 = 0;
                }
            }
        }
        s[h] = w1;
        s[h + channels] = w2;
        s[h + 2 * channels] = v1;
        s[h + 3 * channels] = v2;
        next[h + 2 * channels] = y1;
        next[h + 3 * channels] = y2;
        keepTail(x, from, frames, old, next, h + 4 * channels, channels);
    }

    /** Two channels, one section. */
    static void stereo(
            double[] x,
            int from,
            int frames,
            int untilGuard,
            double[] c,
            int section,
            double[] s,
            double[] old,
            double[] next,
            int channels,
            int channel) {
        int k = 5 * section;
        double b0 = c[k], a1 = -c[k + 3], a2 = -c[k + 4];
        double e1 = mulAdd(a1, b0, c[k + 1]), e2 = mulAdd(a2, b0, c[k + 2]);
        int h = 2 * section * channels + channel, g = h + 1;
        double w1 = s[h], w2 = s[h + channels], v1 = s[g], v2 = s[g + channels];
        double x1 = old[h], u1 = old[g];
        keepTail(x, from, frames, old, next, h, channels);
        keepTail(x, from + Slab.FRAMES, frames, old, next, g, channels);
        int i = from, end = from + frames, guard = from + untilGuard;
        while (i < end) {
            for (int stop = Math.min(end, guard); i < stop; i++) {
                double in = x[i];
                x[i] = mulAdd(b0, in, w1);
                double w = mulAdd(a1, w1, mulAdd(a2, w2, mulAdd(e1, in, e2 * x1)));
                w2 = w1;
                w1 = w;
                x1 = in;
                in = x[i + Slab.FRAMES];
                x[i + Slab.FRAMES] = mulAdd(b0, in, v1);
                w = mulAdd(a1, v1, mulAdd(a2, v2, mulAdd(e1, in, e2 * u1)));
                v2 = v1;
                v1 = w;
                u1 = in;
            }
            if (i == guard) {
                guard += Guard.FRAMES;
                if (Guard.tiny(w1, w2)) {
                    w1 = w2 = 0;
                }
                if (Guard.tiny(v1, v2)) {
                    v1 = v2 = 0;
                }
            }
        }
        s[h] = w1;
        s[h + channels] = w2;
        s[g] = v1;
        s[g + channels] = v2;
        keepTail(x, from, frames, old, next, h + 2 * channels, channels);
        keepTail(x, from + Slab.FRAMES, frames, old, next, g + 2 * channels, channels);
    }

    /** Keeps the last two samples of a stage that the slab still holds. */
    private static void keepTail(double[] x, int from, int frames, double[] old, double[] next, int h, int channels) {
        next[h + channels] = frames > 1 ? x[from + frames - 2] : old[h];
        next[h] = x[from + frames - 1];
    }
}
