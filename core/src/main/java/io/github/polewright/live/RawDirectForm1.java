package io.github.polewright.live;

import static io.github.polewright.live.Arithmetic.mulAdd;

import io.github.polewright.slab.Slab;

/**
 * The steady loops of direct form I. Sections are numbered along the cascade; stage {@code k} is the signal that
 * section {@code k} reads and section {@code k - 1} wrote, with its last two samples at {@code 2k} (one frame ago) and
 * {@code 2k + 1} (two frames ago), times the channel count, plus the channel. A loop reads these from {@code old} and
 * writes them to {@code next}, so that the loop behind it still finds the stage as it was before this piece.
 *
 * <p>Every loop sets both samples of a stage to 0 where both are tiny, {@code untilGuard} frames into the piece and
 * every 32 frames after that, in the same way whatever is fused: the outputs are the same bit for bit.
 */
final class RawDirectForm1 {

    private RawDirectForm1() {}

    /** One channel, one section. */
    static void one(
            double[] x,
            int from,
            int frames,
            int untilGuard,
            double[] c,
            int section,
            double[] old,
            double[] next,
            int channels,
            int channel) {
        int k = 5 * section;
        double b0 = c[k], b1 = c[k + 1], b2 = c[k + 2], a1 = -c[k + 3], a2 = -c[k + 4];
        int h = 2 * section * channels + channel;
        double x1 = old[h], x2 = old[h + channels], y1 = old[h + 2 * channels], y2 = old[h + 3 * channels];
        int i = from, end = from + frames, guard = from + untilGuard;
        while (i < end) {
            for (int stop = Math.min(end, guard); i < stop; i++) {
                double in = x[i];
                double y = mulAdd(a1, y1, mulAdd(a2, y2, mulAdd(b0, in, mulAdd(b1, x1, b2 * x2))));
                x2 = x1;
                x1 = in;
                y2 = y1;
                y1 = y;
                x[i] = y;
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

    /** One channel, two sections: their delay lines share the signal between them. */
    static void pair(
            double[] x,
            int from,
            int frames,
            int untilGuard,
            double[] c,
            int section,
            double[] old,
            double[] next,
            int channels,
            int channel) {
        int k = 5 * section;
        double b0 = c[k], b1 = c[k + 1], b2 = c[k + 2], a1 = -c[k + 3], a2 = -c[k + 4];
        double d0 = c[k + 5], d1 = c[k + 6], d2 = c[k + 7], c1 = -c[k + 8], c2 = -c[k + 9];
        int h = 2 * section * channels + channel;
        double x1 = old[h], x2 = old[h + channels], y1 = old[h + 2 * channels], y2 = old[h + 3 * channels];
        double z1 = old[h + 4 * channels], z2 = old[h + 5 * channels];
        int i = from, end = from + frames, guard = from + untilGuard;
        while (i < end) {
            for (int stop = Math.min(end, guard); i < stop; i++) {
                double in = x[i];
                double y = mulAdd(a1, y1, mulAdd(a2, y2, mulAdd(b0, in, mulAdd(b1, x1, b2 * x2))));
                double z = mulAdd(c1, z1, mulAdd(c2, z2, mulAdd(d0, y, mulAdd(d1, y1, d2 * y2))));
                x2 = x1;
                x1 = in;
                y2 = y1;
                y1 = y;
                z2 = z1;
                z1 = z;
                x[i] = z;
            }
            if (i == guard) {
                guard += Guard.FRAMES;
                if (Guard.tiny(x1, x2)) {
                    x1 = x2 = 0;
                }
                if (Guard.tiny(y1, y2)) {
                    y1 = y2 = 0;
                }
                if (Guard.tiny(z1, z2)) {
                    z1 = z2 = 0;
                }
            }
        }
        next[h] = x1;
        next[h + channels] = x2;
        next[h + 2 * channels] = y1;
        next[h + 3 * channels] = y2;
        next[h + 4 * channels] = z1;
        next[h + 5 * channels] = z2;
    }

    /** Two channels, one section. */
    static void stereo(
            double[] x,
            int from,
            int frames,
            int untilGuard,
            double[] c,
            int section,
            double[] old,
            double[] next,
            int channels,
            int channel) {
        int k = 5 * section;
        double b0 = c[k], b1 = c[k + 1], b2 = c[k + 2], a1 = -c[k + 3], a2 = -c[k + 4];
        int h = 2 * section * channels + channel, g = h + 1;
        double x1 = old[h], x2 = old[h + channels], y1 = old[h + 2 * channels], y2 = old[h + 3 * channels];
        double u1 = old[g], u2 = old[g + channels], v1 = old[g + 2 * channels], v2 = old[g + 3 * channels];
        int i = from, end = from + frames, guard = from + untilGuard;
        while (i < end) {
            for (int stop = Math.min(end, guard); i < stop; i++) {
                double in = x[i];
                double y = mulAdd(a1, y1, mulAdd(a2, y2, mulAdd(b0, in, mulAdd(b1, x1, b2 * x2))));
                x2 = x1;
                x1 = in;
                y2 = y1;
                y1 = y;
                x[i] = y;
                in = x[i + Slab.FRAMES];
                y = mulAdd(a1, v1, mulAdd(a2, v2, mulAdd(b0, in, mulAdd(b1, u1, b2 * u2))));
                u2 = u1;
                u1 = in;
                v2 = v1;
                v1 = y;
                x[i + Slab.FRAMES] = y;
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
