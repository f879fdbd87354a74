package io.github.polewright.live;

import io.github.polewright.slab.Slab;

/**
 * Runs all sections over a slab: keeps the states, chooses the loops, walks the coefficients. The audio thread's own.
 *
 * <p>The absolute frame count, not the blocks, decides where states are guarded and checked, so any way of cutting a
 * stream gives the same output bit for bit.
 */
final class Engine {

    private final boolean transposed;
    private final int channels;
    private final int sections;
    private final Slab slab;
    private final double[] samples;
    private final Course course;
    private final double[] states;
    private double[] old;
    private double[] next;
    private long clock;
    private long restarts;

    Engine(Form form, int channels, int sections, Path initial) {
        this.transposed = form == Form.TRANSPOSED_DIRECT_FORM_2;
        this.channels = channels;
        this.sections = sections;
        this.slab = new Slab(channels);
        this.samples = slab.samples();
        this.course = new Course(initial, 5 * sections);
        this.states = new double[2 * sections * channels];
        this.old = new double[2 * (sections + 1) * channels];
        this.next = new double[old.length];
    }

    Slab slab() {
        return slab;
    }

    Course course() {
        return course;
    }

    /** Channels that were set back to silence, since their state was no longer finite. */
    long restarts() {
        return restarts;
    }

    /** Silences all states and starts counting frames anew; coefficients go on as they were. */
    void reset() {
        java.util.Arrays.fill(states, 0);
        java.util.Arrays.fill(old, 0);
        java.util.Arrays.fill(next, 0);
        clock = 0;
    }

    /** Frames that may be run in one piece: to the next multiple of 64, to the next knot, or to the block's end. */
    int pieceFrames(int left) {
        int toSlabEnd = Slab.FRAMES - (int) (clock & (Slab.FRAMES - 1));
        return Math.min(Math.min(left, toSlabEnd), course.framesToKnot());
    }

    /** Filters what the slab holds, in place. */
    void run(int frames) {
        int untilGuard = Guard.framesUntil(clock);
        if (course.gliding()) {
            glide(frames, untilGuard);
        } else if (transposed) {
            runTransposed(frames, untilGuard);
        } else {
            runDirect(frames, untilGuard);
        }
        double[] swap = old;
        old = next;
        next = swap;
        if (course.gliding() && course.advance(frames) && transposed) {
            statesFromSignals();
        }
        clock += frames;
        if ((clock & (Slab.FRAMES - 1)) == 0) {
            contain();
        }
    }

    private void runDirect(int frames, int untilGuard) {
        double[] c = course.coefficients();
        int channel = 0;
        for (; channel + 2 <= channels; channel += 2) {
            int from = channel * Slab.FRAMES;
            for (int section = 0; section < sections; section++) {
                RawDirectForm1.stereo(samples, from, frames, untilGuard, c, section, old, next, channels, channel);
            }
        }
        if (channel < channels) {
            int from = channel * Slab.FRAMES;
            int section = 0;
            for (; section + 2 <= sections; section += 2) {
                RawDirectForm1.pair(samples, from, frames, untilGuard, c, section, old, next, channels, channel);
            }
            if (section < sections) {
                RawDirectForm1.one(samples, from, frames, untilGuard, c, section, old, next, channels, channel);
            }
        }
    }

    private void runTransposed(int frames, int untilGuard) {
        double[] c = course.coefficients();
        for (int channel = 0; channel < channels; channel++) {
            int from = channel * Slab.FRAMES;
            int section = 0;
            for (; section + 2 <= sections; section += 2) {
                RawTransposed.pair(samples, from, frames, untilGuard, c, section, states, old, next, channels, channel);
            }
            if (section < sections) {
                RawTransposed.one(samples, from, frames, untilGuard, c, section, states, old, next, channels, channel);
            }
        }
    }

    private void glide(int frames, int untilGuard) {
        double[] c = course.coefficients();
        double[] step = course.step();
        int passed = course.passed();
        for (int section = 0; section < sections; section++) {
            int channel = 0;
            for (; channel + 2 <= channels; channel += 2) {
                RawGlide.stereo(
                        samples,
                        channel * Slab.FRAMES,
                        frames,
                        untilGuard,
                        c,
                        step,
                        passed,
                        section,
                        old,
                        next,
                        channels,
                        channel);
            }
            if (channel < channels) {
                RawGlide.one(
                        samples,
                        channel * Slab.FRAMES,
                        frames,
                        untilGuard,
                        c,
                        step,
                        passed,
                        section,
                        old,
                        next,
                        channels,
                        channel);
            }
        }
    }

    /** The states of transposed direct form II that belong to the signals' last two samples; no division. */
    private void statesFromSignals() {
        double[] c = course.coefficients();
        for (int section = 0; section < sections; section++) {
            int k = 5 * section;
            for (int channel = 0; channel < channels; channel++) {
                int h = 2 * section * channels + channel;
                double x1 = old[h], x2 = old[h + channels];
                double y1 = old[h + 2 * channels], y2 = old[h + 3 * channels];
                states[h] = c[k + 1] * x1 - c[k + 3] * y1 + (c[k + 2] * x2 - c[k + 4] * y2);
                states[h + channels] = y1 - c[k] * x1;
            }
        }
    }

    /** Restarts every channel whose state is not finite. */
    private void contain() {
        for (int channel = 0; channel < channels; channel++) {
            if (!finite(old, channel) || !finite(states, channel)) {
                silence(old, channel);
                silence(states, channel);
                restarts++;
            }
        }
    }

    private boolean finite(double[] values, int channel) {
        double sum = 0;
        for (int i = channel; i < values.length; i += channels) {
            // Zero for every finite value, NaN for any other.
            sum += values[i] * 0;
        }
        return sum == 0;
    }

    private void silence(double[] values, int channel) {
        for (int i = channel; i < values.length; i += channels) {
            values[i] = 0;
        }
    }
}
