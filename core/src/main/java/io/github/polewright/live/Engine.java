package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.retune.Bucket;
import io.github.polewright.retune.Walk;
import io.github.polewright.slab.Slab;
import org.jspecify.annotations.Nullable;

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
    private final Walk walk;
    private final OutputGain gain;
    private final @Nullable Rows rows;
    private final double[] states;
    /** One section's coefficients, frame by frame, while they glide. */
    private final double[][] moving = new double[5][Slab.FRAMES];

    private final double[] ticks = new double[Slab.FRAMES];
    private double[] old;
    private double[] next;
    private boolean signalsLead;
    private long clock;
    private long restarts;

    /** Starts silent and settled on a cascade of one section a slot. */
    Engine(Form form, int channels, Cascade start, int gainFrames) {
        this.transposed = form == Form.TRANSPOSED_DIRECT_FORM_2;
        this.channels = channels;
        this.sections = start.sectionCount();
        this.slab = new Slab(channels);
        this.samples = slab.samples();
        this.walk = new Walk(start, Bucket.USUAL_LIMIT);
        this.gain = new OutputGain(gainFrames);
        this.rows = Rows.pay(channels, sections) ? new Rows(transposed, channels, sections) : null;
        this.states = new double[2 * sections * channels];
        this.old = new double[2 * (sections + 1) * channels];
        this.next = new double[old.length];
    }

    Slab slab() {
        return slab;
    }

    Walk walk() {
        return walk;
    }

    OutputGain gain() {
        return gain;
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

    /** Begins a piece: to the next multiple of 64, to the next knot, or to the block's end. It is to be run whole. */
    int nextPiece(int left) {
        int toSlabEnd = Slab.FRAMES - (int) (clock & (Slab.FRAMES - 1));
        return walk.next(Math.min(left, toSlabEnd));
    }

    /** Filters what the slab holds, in place. */
    void run(int frames) {
        int untilGuard = Guard.framesUntil(clock);
        boolean steadyTransposed = transposed && walk.isSettled();
        if (steadyTransposed && signalsLead) {
            statesFromSignals();
        }
        signalsLead = !steadyTransposed;
        if (rows != null) {
            runRows(rows, frames, untilGuard, steadyTransposed);
        } else if (steadyTransposed) {
            runTransposed(frames, untilGuard);
        } else if (walk.isStandingStill()) {
            runDirect(frames, untilGuard);
        } else {
            glide(frames, untilGuard);
        }
        double[] swap = old;
        old = next;
        next = swap;
        amplify(frames);
        walk.arrive();
        clock += frames;
        if ((clock & (Slab.FRAMES - 1)) == 0) {
            contain();
        }
    }

    private void amplify(int frames) {
        for (int channel = 0; channel < channels; channel++) {
            gain.apply(samples, channel * Slab.FRAMES, frames);
        }
        gain.advance(frames);
    }

    private void runRows(Rows all, int frames, int untilGuard, boolean steadyTransposed) {
        double[] c = walk.bases();
        if (steadyTransposed) {
            all.transposed(samples, frames, untilGuard, c, states, old, next);
        } else if (walk.isStandingStill()) {
            all.direct(samples, frames, untilGuard, c, old, next);
        } else {
            all.glide(samples, frames, untilGuard, c, walk.steps(), walk.position(), old, next);
        }
    }

    private void runDirect(int frames, int untilGuard) {
        double[] c = walk.bases();
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
        double[] c = walk.bases();
        int channel = 0;
        for (; channel + 2 <= channels; channel += 2) {
            int from = channel * Slab.FRAMES;
            for (int section = 0; section < sections; section++) {
                RawTransposed.stereo(
                        samples, from, frames, untilGuard, c, section, states, old, next, channels, channel);
            }
        }
        if (channel < channels) {
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
        double[] c = walk.bases();
        double[] step = walk.steps();
        int passed = walk.position();
        int last = channels - 1;
        if (channels > 1) {
            for (int i = 0; i < frames; i++) {
                ticks[i] = passed + 1 + i;
            }
        }
        for (int section = 0; section < sections; section++) {
            if (channels > 1) {
                RawGlide.coefficients(moving, ticks, frames, c, step, section);
            }
            for (int channel = 0; channel < last; channel += 2) {
                int from = channel * Slab.FRAMES;
                RawGlide.stereo(samples, from, frames, untilGuard, moving, section, old, next, channels, channel);
            }
            if ((channels & 1) != 0) {
                int from = last * Slab.FRAMES;
                RawGlide.one(samples, from, frames, untilGuard, c, step, passed, section, old, next, channels, last);
            }
        }
    }

    /** The states of transposed direct form II that belong to the signals' last two samples; no division. */
    private void statesFromSignals() {
        double[] c = walk.bases();
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
