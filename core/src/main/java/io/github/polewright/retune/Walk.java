package io.github.polewright.retune;

import io.github.polewright.Cascade;
import java.util.Arrays;

/**
 * Goes along glides frame by frame on the audio thread: says for each stretch of frames from where and by which step the
 * coefficients move, holds them where the bucket does not admit the next segment yet, and lands exactly on each knot.
 *
 * <p>A stretch begins with {@link #next}. Coefficient c of its frame i (0 is its first) is
 * {@code fma(position() + 1 + i, steps()[c], bases()[c])}; coefficients change before the sample. While
 * {@link #isSettled()} is false the sections must run in direct form I arithmetic, whatever the form: the bounds of the
 * certificates hold for it, and it passes a constant exactly wherever both ends do.
 *
 * <p>A glide may be adopted in the middle of another. Slots that are where it begins follow it; any other slot goes
 * from where it is now to the same end, by a share that grows with time, and each of its segments is charged to the
 * bucket from here, by a bound of its distance that needs no logarithm. A slot that passes through is born with the
 * poles it is to have; one that shall pass through keeps its poles and fades to b = a.
 *
 * <p><b>Units</b> frames. <b>Threads</b> one, the audio thread. <b>Allocation</b> none after construction. <b>Numbers</b>
 * where a stretch is cut, by {@code mostFrames} or the caller's blocks, changes nothing.
 */
public final class Walk {

    private static final int WIDTH = Knots.WIDTH;

    private final double sampleRateHz;
    private final int slots;
    private final Bucket bucket;
    private final double[] bases;
    private final double[] steps;
    private final double[] origins;
    private final double[] goals;
    private final double[] distances;
    private final double[] leaks;
    private final boolean[] joined;
    private final boolean[] fading;

    private Glide glide;
    private boolean isSettled = true;
    private boolean isWalking;
    private int segment;
    private long behind;
    private int length;
    private int done;
    private int position;

    /**
     * A walk that stands still.
     *
     * @param start the running cascade, one section a slot
     * @param limit the limit of the bucket, such as {@link Bucket#USUAL_LIMIT}
     * @throws IllegalArgumentException if a section is not stable, or {@code limit} is not positive and finite
     */
    public Walk(Cascade start, double limit) {
        if (!start.isStable()) {
            throw new IllegalArgumentException("start is not stable: " + start);
        }
        sampleRateHz = start.sampleRateHz();
        slots = start.sectionCount();
        bucket = new Bucket(slots, limit);
        bases = GlidePlan.flat(start);
        steps = new double[bases.length];
        origins = new double[bases.length];
        goals = new double[bases.length];
        distances = new double[slots];
        leaks = new double[slots];
        joined = new boolean[slots];
        fading = new boolean[slots];
        glide = Glide.between(start, start, Pace.FOLLOWING);
        standStill();
    }

    /**
     * Takes over a glide from where the coefficients are now. Whatever was left of an earlier one is dropped.
     *
     * @param next the glide to walk
     * @throws IllegalArgumentException if its sample rate or number of sections is not the one of this walk
     */
    public void adopt(Glide next) {
        if (next.sectionCount() != slots || next.from().sampleRateHz() != sampleRateHz) {
            throw new IllegalArgumentException("next has " + next.sectionCount() + " sections at "
                    + next.from().sampleRateHz() + " Hz; it must have " + slots + " at " + sampleRateHz + " Hz");
        }
        stopHere();
        glide = next;
        segment = 0;
        behind = 0;
        System.arraycopy(bases, 0, origins, 0, bases.length);
        boolean allJoined = true;
        double[] first = next.knot(0);
        for (int slot = 0; slot < slots; slot++) {
            fading[slot] = false;
            joined[slot] = isSame(first, slot);
            if (!joined[slot]) {
                allJoined = false;
                enter(slot);
            }
        }
        isSettled = allJoined && next.isStill();
    }

    /**
     * Starts the next stretch, in which the coefficients move by even steps or stand still. The caller then runs all of
     * its frames.
     *
     * @param mostFrames how many frames it may have, at least 1
     * @return how many it has, from 1 to {@code mostFrames}
     */
    public int next(int mostFrames) {
        if (!isSettled && done == length) {
            land();
            prepare();
        }
        position = done;
        int frames = isSettled ? mostFrames : Math.min(mostFrames, length - done);
        done += isSettled ? 0 : frames;
        bucket.pass(frames);
        return frames;
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
     * The level G of a slot's bucket: recent changes have multiplied its state by at most e^G.
     *
     * @param slot its index
     * @return a natural logarithm, 0 or more
     */
    public double level(int slot) {
        return bucket.level(slot);
    }

    /** Arrives at once and empties the bucket: right only when the state of all sections is cleared too. */
    public void reset() {
        System.arraycopy(glide.knot(glide.segmentCount()), 0, bases, 0, bases.length);
        isSettled = true;
        standStill();
        bucket.clear();
    }

    private void standStill() {
        isWalking = false;
        length = 0;
        done = 0;
        Arrays.fill(steps, 0);
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
        for (int i = 0; i < bases.length; i++) {
            bases[i] = Math.fma(done, steps[i], bases[i]);
        }
        standStill();
    }

    private void land() {
        if (isWalking) {
            System.arraycopy(goals, 0, bases, 0, bases.length);
            behind += length;
            segment++;
            for (int slot = 0; slot < slots; slot++) {
                joined[slot] |= !fading[slot] && behind >= glide.movingFrames();
            }
        }
        isWalking = false;
        length = 0;
        done = 0;
        Arrays.fill(steps, 0);
    }

    private boolean isSame(double[] knot, int slot) {
        int at = slot * WIDTH;
        for (int i = at; i < at + WIDTH; i++) {
            if (bases[i] != knot[i]) {
                return false;
            }
        }
        return true;
    }

    /** A slot that is not where the glide begins. */
    private void enter(int slot) {
        int first = 0;
        while (glide.frames(first) == 0) {
            first++;
        }
        double[] knot = glide.knot(first + 1);
        int at = slot * WIDTH;
        fading[slot] = isPassThrough(knot, at);
        if (isPassThrough(bases, at)) {
            origins[at + 1] = knot[at + 3];
            origins[at + 2] = knot[at + 4];
            origins[at + 3] = knot[at + 3];
            origins[at + 4] = knot[at + 4];
            System.arraycopy(origins, at, bases, at, WIDTH);
        }
    }

    private static boolean isPassThrough(double[] knot, int at) {
        return knot[at] == 1 && knot[at + 1] == 0 && knot[at + 2] == 0 && knot[at + 3] == 0 && knot[at + 4] == 0;
    }

    private void prepare() {
        while (segment < glide.segmentCount() && glide.frames(segment) == 0) {
            swap();
        }
        if (segment == glide.segmentCount()) {
            isSettled = true;
            standStill();
            return;
        }
        boolean admitted = true;
        for (int slot = 0; slot < slots; slot++) {
            aim(slot);
            admitted &= bucket.admits(slot, distances[slot]);
        }
        if (admitted) {
            start();
        } else {
            hold();
        }
    }

    private void swap() {
        segment++;
        for (int slot = 0; slot < slots; slot++) {
            if (joined[slot]) {
                System.arraycopy(glide.knot(segment), slot * WIDTH, bases, slot * WIDTH, WIDTH);
            }
        }
    }

    /** Where the slot is at the end of the present segment, and what that costs. */
    private void aim(int slot) {
        int at = slot * WIDTH;
        double[] knot = glide.knot(segment + 1);
        if (joined[slot]) {
            System.arraycopy(knot, at, goals, at, WIDTH);
            distances[slot] = glide.distance(segment, slot);
            leaks[slot] = glide.leak(segment, slot);
            return;
        }
        double share = (double) (behind + glide.frames(segment)) / glide.movingFrames();
        for (int i = 0; i < WIDTH; i++) {
            goals[at + i] = Knots.mix(origins[at + i], knot[at + i], share);
        }
        if (fading[slot]) {
            goals[at] = Knots.mix(origins[at], 1, share);
            goals[at + 1] = Knots.mix(origins[at + 1], origins[at + 3], share);
            goals[at + 2] = Knots.mix(origins[at + 2], origins[at + 4], share);
            goals[at + 3] = origins[at + 3];
            goals[at + 4] = origins[at + 4];
        }
        distances[slot] = Distance.upperBound(bases[at + 3], bases[at + 4], goals[at + 3], goals[at + 4]);
        leaks[slot] = Bucket.leak(bases[at + 3], bases[at + 4], goals[at + 3], goals[at + 4]);
    }

    private void start() {
        length = glide.frames(segment);
        isWalking = true;
        for (int slot = 0; slot < slots; slot++) {
            bucket.charge(slot, distances[slot]);
            bucket.leakAt(slot, leaks[slot]);
        }
        for (int i = 0; i < steps.length; i++) {
            steps[i] = (goals[i] - bases[i]) / length;
        }
    }

    /** Stands still for as many frames as the fullest bucket needs. */
    private void hold() {
        standStill();
        for (int slot = 0; slot < slots; slot++) {
            length = Math.max(length, bucket.framesUntil(slot, distances[slot]));
        }
    }
}
