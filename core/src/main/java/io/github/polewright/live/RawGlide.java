package io.github.polewright.live;

import static io.github.polewright.live.Arithmetic.mulAdd;

import io.github.polewright.slab.Slab;

/**
 * The loops of a glide: direct form I, whatever the cascade's form, with all five coefficients another in every frame.
 * The coefficients are laid out beforehand, so that this part vectorizes and all channels share it.
 */
final class RawGlide {

    private RawGlide() {}

    /**
     * Lays out a section's coefficients: frame {@code i} of the piece gets {@code start + (passed + 1 + i) * step}.
     * Multiplying instead of adding up leaves no drift.
     */
    static void layOut(double[] ramp, double[] start, double[] step, int section, int passed, int frames) {
        for (int j = 0; j < 5; j++) {
            double first = start[5 * section + j];
            double slope = step[5 * section + j];
            int plane = j * Slab.FRAMES;
            for (int i = 0; i < frames; i++) {
                ramp[plane + i] = mulAdd(passed + 1 + i, slope, first);
            }
        }
    }

    /** One channel, one section; arguments as in {@link RawDirectForm1}. */
    static void one(
            double[] x,
            int from,
            int frames,
            int untilGuard,
            double[] ramp,
            int section,
            double[] old,
            double[] next,
            int channels,
            int channel) {
        int h = 2 * section * channels + channel;
        double x1 = old[h], x2 = old[h + channels], y1 = old[h + 2 * channels], y2 = old[h + 3 * channels];
        int i = 0, guard = untilGuard;
        while (i < frames) {
            for (int stop = Math.min(frames, guard); i < stop; i++) {
                double in = x[from + i];
                double b0 = ramp[i], b1 = ramp[Slab.FRAMES + i], b2 = ramp[2 * Slab.FRAMES + i];
                double a1 = -ramp[3 * Slab.FRAMES + i], a2 = -ramp[4 * Slab.FRAMES + i];
                double y = mulAdd(a1, y1, mulAdd(a2, y2, mulAdd(b0, in, mulAdd(b1, x1, b2 * x2))));
                x2 = x1;
                x1 = in;
                y2 = y1;
                y1 = y;
                x[from + i] = y;
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
}
