package io.github.polewright.live;

import static io.github.polewright.live.Arithmetic.mulAdd;

/**
 * The steady loops of transposed direct form II, as a state-space step on the same two states:
 * {@code y = b0 x + s1}, {@code s1' = -a1 s1 + e1 x + s2}, {@code s2' = -a2 s1 + e2 x} with {@code e1 = b1 - a1 b0} and
 * {@code e2 = b2 - a2 b0}. One multiply-add shorter on the loop than the textbook step, which waits for its output.
 *
 * <p>The states of section {@code k} lie at {@code 2k} and {@code 2k + 1}, times the channel count, plus the channel.
 * The signal's last two samples at every stage are kept beside them (as in {@link RawDirectForm1}), since a glide
 * starts from these.
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
        double s1 = s[h], s2 = s[h + channels];
        keepTail(x, from, frames, old, next, h, channels);
        int i = from, end = from + frames, guard = from + untilGuard;
        while (i < end) {
            for (int stop = Math.min(end, guard); i < stop; i++) {
                double in = x[i];
                double y = mulAdd(b0, in, s1);
                double t = mulAdd(a1, s1, mulAdd(e1, in, s2));
                s2 = mulAdd(a2, s1, e2 * in);
                s1 = t;
                x[i] = y;
            }
            if (i == guard) {
                guard += Guard.FRAMES;
                if (Guard.tiny(s1, s2)) {
                    s1 = s2 = 0;
                }
            }
        }
        s[h] = s1;
        s[h + channels] = s2;
        keepTail(x, from, frames, old, next, h + 2 * channels, channels);
    }

    /** One channel, four sections. */
    static void quad(
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
        double g0 = c[k + 10], h1 = -c[k + 13], h2 = -c[k + 14];
        double j1 = mulAdd(h1, g0, c[k + 11]), j2 = mulAdd(h2, g0, c[k + 12]);
        double m0 = c[k + 15], n1 = -c[k + 18], n2 = -c[k + 19];
        double o1 = mulAdd(n1, m0, c[k + 16]), o2 = mulAdd(n2, m0, c[k + 17]);
        int h = 2 * section * channels + channel;
        double s1 = s[h], s2 = s[h + channels], t1 = s[h + 2 * channels], t2 = s[h + 3 * channels];
        double u1 = s[h + 4 * channels], u2 = s[h + 5 * channels];
        double v1 = s[h + 6 * channels], v2 = s[h + 7 * channels];
        keepTail(x, from, frames, old, next, h, channels);
        double y = old[h + 2 * channels], y2 = old[h + 3 * channels];
        double z = old[h + 4 * channels], z2 = old[h + 5 * channels];
        double w = old[h + 6 * channels], w2 = old[h + 7 * channels];
        int i = from, end = from + frames, guard = from + untilGuard;
        while (i < end) {
            for (int stop = Math.min(end, guard); i < stop; i++) {
                double in = x[i];
                y2 = y;
                z2 = z;
                w2 = w;
                y = mulAdd(b0, in, s1);
                double t = mulAdd(a1, s1, mulAdd(e1, in, s2));
                s2 = mulAdd(a2, s1, e2 * in);
                s1 = t;
                z = mulAdd(d0, y, t1);
                t = mulAdd(c1, t1, mulAdd(f1, y, t2));
                t2 = mulAdd(c2, t1, f2 * y);
                t1 = t;
                w = mulAdd(g0, z, u1);
                t = mulAdd(h1, u1, mulAdd(j1, z, u2));
                u2 = mulAdd(h2, u1, j2 * z);
                u1 = t;
                x[i] = mulAdd(m0, w, v1);
                t = mulAdd(n1, v1, mulAdd(o1, w, v2));
                v2 = mulAdd(n2, v1, o2 * w);
                v1 = t;
            }
            if (i == guard) {
                guard += Guard.FRAMES;
                if (Guard.tiny(s1, s2)) {
                    s1 = s2 = 0;
                }
                if (Guard.tiny(t1, t2)) {
                    t1 = t2 = 0;
                }
                if (Guard.tiny(u1, u2)) {
                    u1 = u2 = 0;
                }
                if (Guard.tiny(v1, v2)) {
                    v1 = v2 = 0;
                }
            }
        }
        s[h] = s1;
        s[h + channels] = s2;
        s[h + 2 * channels] = t1;
        s[h + 3 * channels] = t2;
        s[h + 4 * channels] = u1;
        s[h + 5 * channels] = u2;
        s[h + 6 * channels] = v1;
        s[h + 7 * channels] = v2;
        next[h + 2 * channels] = y;
        next[h + 3 * channels] = y2;
        next[h + 4 * channels] = z;
        next[h + 5 * channels] = z2;
        next[h + 6 * channels] = w;
        next[h + 7 * channels] = w2;
        keepTail(x, from, frames, old, next, h + 8 * channels, channels);
    }

    /** Keeps the last two samples of a stage that the slab still holds. */
    private static void keepTail(double[] x, int from, int frames, double[] old, double[] next, int h, int channels) {
        next[h + channels] = frames > 1 ? x[from + frames - 2] : old[h];
        next[h] = x[from + frames - 1];
    }
}
