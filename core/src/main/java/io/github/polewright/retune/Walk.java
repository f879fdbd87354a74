package io.github.polewright.retune;

import io.github.polewright.Cascade;
import io.github.polewright.slab.Ranges;
import java.util.Arrays;
import java.util.Objects;

/**
 * Goes along glides frame by frame on the audio thread: says for each stretch of frames from where and by which step the
 * coefficients move, holds them where the bucket does not admit the next segment yet, and lands exactly on each knot.
 *
 * <p>A stretch begins with {@link #next} and ends with {@link #arrive}. Coefficient c of its frame i (0 is its first) is
 * {@code bases()[c] + (position() + 1 + i) * steps()[c]}; coefficients change before the sample. While
 * {@link #isSettled()} is false the sections must run in direct form I arithmetic, whatever the form: the bounds of the
 * certificates hold for it, and it passes a constant exactly wherever both ends do.
 *
 * <p>A glide may be adopted in the middle of another. Slots that are where it begins follow it; any other slot goes from
 * where it is now to the same end, in as many times the glide's frames as that distance needs, and each of its segments
 * is charged to the bucket from here. A slot that passes through is born with the poles it is to have; one that shall
 * pass through keeps its poles, fades to b = a and is freed once it rings no more. A notch or bell farther than d = 0.7
 * from its target is not dragged there: it fades, waits until it rings no more, and the target is born in its slot.
 *
 * <p><b>Units</b> frames. <b>Threads</b> one, the audio thread. <b>Allocation</b> none after construction. <b>Numbers</b>
 * where a stretch is cut, by {@code mostFrames} or the caller's blocks, changes nothing.
 */
public final class Walk {

    private static final int WIDTH = Knots.WIDTH;

    private final double sampleRateHz;
    private final int slots;
    private final Bucket bucket;
    private final SlotAims aims;
    private final double[] bases;
    private final double[] steps;

    private Glide glide;
    private boolean isSettled = true;
    private boolean isWalking;
    private boolean isMoving;
    private boolean isWaiting;
    private boolean isRising;
    private int segment;
    private int length;
    private int done;
    private int position;
    private long planned;
    private long walked;
    private long held;
    private double highestLevel;

    /**
     * A walk that stands still.
     *
     * @param start the running cascade, one section a slot
     * @param limit the limit of the bucket, such as {@link Bucket#USUAL_LIMIT}
     * @throws IllegalArgumentException if a section is not stable, or {@code limit} is not positive and finite
     */
    public Walk(Cascade start, double limit) {
        if (!Objects.requireNonNull(start, "start").isStable()) {
            throw new IllegalArgumentException("start is not stable: " + start);
        }
        sampleRateHz = start.sampleRateHz();
        slots = start.sectionCount();
        bucket = new Bucket(slots, limit);
        bases = GlidePlan.flat(start);
        steps = new double[bases.length];
        aims = new SlotAims(slots, bases);
        glide = Glide.between(start, start, Pace.FOLLOWING);
        standStill();
    }

    /**
     * Takes over a glide from where the coefficients are now. Whatever was left of an earlier one is dropped.
     *
     * @param next the glide to walk
     * @return false, with nothing changed, if its sample rate or number of sections is not the one of this walk
     */
    public boolean adopt(Glide next) {
        Objects.requireNonNull(next, "next");
        if (next.sectionCount() != slots || next.sampleRateHz() != sampleRateHz) {
            return false;
        }
        stopHere();
        glide = next;
        segment = 0;
        isWaiting = false;
        isRising = false;
        boolean allJoined = aims.enter(next);
        highestLevel = 0;
        for (int slot = 0; slot < slots; slot++) {
            highestLevel = Math.max(highestLevel, bucket.level(slot));
        }
        planned = aims.plannedFrames(next);
        walked = 0;
        isSettled = allJoined && next.isStill();
        if (isSettled) {
            standStill();
        }
        return true;
    }

    /**
     * Starts the next stretch, in which the coefficients move by even steps or stand still. The caller then runs all of
     * its frames.
     *
     * @param mostFrames how many frames it may have, at least 1
     * @return how many it has, from 1 to {@code mostFrames}
     */
    public int next(int mostFrames) {
        arrive();
        if (!isSettled && done == length) {
            prepare();
        }
        position = done;
        int frames = isSettled ? mostFrames : Math.min(mostFrames, length - done);
        done += isSettled ? 0 : frames;
        bucket.pass(frames);
        return frames;
    }

    /**
     * Ends a stretch whose frames have been run: where it led to a knot, the coefficients now are that knot's, and after
     * the last one the walk has settled.
     */
    public void arrive() {
        if (isSettled || done < length) {
            return;
        }
        land();
        if (isOver()) {
            isSettled = true;
            standStill();
        }
    }

    /**
     * Where in its segment the present stretch begins.
     *
     * @return how many frames of the segment come before it
     */
    public int position() {
        return position;
    }

    /**
     * The coefficients at the start of the segment, b0, b1, b2, a1, a2 a slot.
     *
     * @return the walk's own array, to be read only
     */
    public double[] bases() {
        return bases;
    }

    /**
     * By how much the coefficients move in one frame; all 0 while they are held or settled.
     *
     * @return the walk's own array, to be read only
     */
    public double[] steps() {
        return steps;
    }

    /**
     * Whether the coefficients have arrived.
     *
     * @return false during a glide, also while it is held back
     */
    public boolean isSettled() {
        return isSettled;
    }

    /**
     * Whether the coefficients stand still in the present stretch: settled, held back, or waiting for a section to ring
     * no more.
     *
     * @return true if every step is 0
     */
    public boolean isStandingStill() {
        return !isMoving;
    }

    /**
     * Frames until the walk has settled, if nothing is held back on the way.
     *
     * @return frames, 0 once settled
     */
    public long framesLeft() {
        return isSettled ? 0 : Math.max(1, planned - walked - (isWalking ? done : 0));
    }

    /**
     * Frames for which the bucket has held coefficients back since the walk began.
     *
     * @return a count that only grows
     */
    public long framesHeld() {
        return held + (isSettled || isWalking ? 0 : done);
    }

    /**
     * The highest level any slot's bucket has reached since the latest glide was adopted: changes of whatever age have
     * multiplied the state of every section by at most e to this power.
     *
     * @return a natural logarithm, 0 or more
     */
    public double highestLevel() {
        return highestLevel;
    }

    /**
     * The level G of a slot's bucket: recent changes have multiplied its state by at most e^G.
     *
     * @param slot its index
     * @return a natural logarithm, 0 or more
     */
    public double level(int slot) {
        Ranges.index("slot", slot, slots);
        return bucket.level(slot);
    }

    /** Arrives at once and empties the bucket: right only when the state of all sections is cleared too. */
    public void reset() {
        System.arraycopy(glide.knot(glide.segmentCount()), 0, bases, 0, bases.length);
        isSettled = true;
        standStill();
        bucket.clear();
    }

    private void stop() {
        isWalking = false;
        isMoving = false;
        length = 0;
        done = 0;
        Arrays.fill(steps, 0);
    }

    /** Stops for some time, in which the buckets lose what sections lose that stand still. */
    private void standStill() {
        stop();
        for (int slot = 0; slot < slots; slot++) {
            double a1 = bases[slot * WIDTH + 3];
            double a2 = bases[slot * WIDTH + 4];
            bucket.leakAt(slot, Bucket.leak(a1, a2, a1, a2));
        }
    }

    private void stopHere() {
        if (done == length) {
            land();
        }
        if (!isWalking) {
            held += done;
        }
        for (int i = 0; i < bases.length; i++) {
            bases[i] += done * steps[i];
        }
        stop();
    }

    private void land() {
        if (isWalking) {
            System.arraycopy(aims.goals(), 0, bases, 0, bases.length);
            walked += length;
            if (isWaiting || isRising) {
                finishTail();
            } else {
                aims.pass(glide, segment);
                segment++;
            }
        } else {
            held += length;
        }
        stop();
    }

    /** After the wait the freed slots pass through and the exchanged ones rise, after the rise all is done. */
    private void finishTail() {
        isRising = isWaiting && aims.exchange(glide);
        isWaiting = false;
    }

    private boolean isOver() {
        while (segment < glide.segmentCount() && glide.knots().frames(segment) == 0) {
            segment++;
            aims.swap(glide, segment);
        }
        return segment == glide.segmentCount() && !isRising && !aims.isRinging();
    }

    private void prepare() {
        if (isOver()) {
            isSettled = true;
            standStill();
        } else if (isRising) {
            aims.rise(glide);
            start(aims.risingFrames(glide));
        } else if (segment == glide.segmentCount()) {
            isWaiting = true;
            aims.stay();
            start(aims.decayFrames());
        } else if (aims.aim(glide, segment, bucket)) {
            start(aims.frames(glide, segment));
        } else {
            hold();
        }
    }

    private void start(int frames) {
        length = frames;
        isWalking = true;
        highestLevel = Math.max(highestLevel, aims.charge(bucket));
        double[] goals = aims.goals();
        double share = 1.0 / length;
        for (int i = 0; i < steps.length; i++) {
            steps[i] = share * (goals[i] - bases[i]);
        }
        isMoving = !Arrays.equals(goals, bases);
    }

    /** Stands still for as many frames as the fullest bucket needs. */
    private void hold() {
        standStill();
        length = aims.framesUntilAdmitted(bucket);
    }
}
