package io.github.polewright.retune;

/**
 * Where each slot of a walk is to be at the next knot, what that costs, and what becomes of slots that are not where the
 * adopted glide begins. The audio thread's own; it reads and swaps the walk's coefficients in place.
 */
final class SlotAims {

    private static final int WIDTH = Knots.WIDTH;

    /** Farther than this a notch or bell is exchanged rather than dragged. */
    private static final double FARTHEST = Pairing.FARTHEST;

    /** ln of a million: the amplitude left of what still rings when a slot is freed is -120 dB. */
    private static final double DECAY_NEPERS = 13.815510557964274;

    private static final double LONGEST_FRAMES = 1 << 30;

    /** Follows the glide's knots. */
    private static final int JOINED = 0;
    /** Goes from where it is to the glide's knots, by a share that grows with time. */
    private static final int MIXING = 1;
    /** Goes from where it is straight to the glide's end. */
    private static final int STRAIGHT = 2;
    /** Fades to b = a and is freed. */
    private static final int FADING = 3;
    /** Fades to b = a, and then the target is born in it. */
    private static final int EXCHANGING = 4;

    private final double[] bases;
    private final double[] origins;
    private final double[] goals;
    private final double[] distances;
    private final double[] leaks;
    private final int[] ways;
    private final RampMeter meter = new RampMeter();
    private double slowdown;
    private long behind;
    private boolean isRinging;
    private boolean isExchanging;

    SlotAims(int slots, double[] bases) {
        this.bases = bases;
        origins = new double[bases.length];
        goals = new double[bases.length];
        distances = new double[slots];
        leaks = new double[slots];
        ways = new int[slots];
    }

    double[] goals() {
        return goals;
    }

    /** Whether slots have faded, or will, that have to ring out after the glide. */
    boolean isRinging() {
        return isRinging;
    }

    /** Chooses the way of every slot; true if all of them are where the glide begins. */
    boolean enter(Glide glide) {
        System.arraycopy(bases, 0, origins, 0, bases.length);
        slowdown = 1;
        behind = 0;
        isRinging = false;
        isExchanging = false;
        boolean allJoined = true;
        for (int slot = 0; slot < ways.length; slot++) {
            ways[slot] = Transparency.same(bases, glide.knot(0), slot * WIDTH) ? JOINED : way(glide, slot);
            allJoined &= ways[slot] == JOINED;
        }
        return allJoined;
    }

    private int way(Glide glide, int slot) {
        int at = slot * WIDTH;
        double[] end = glide.knot(glide.segmentCount());
        if (Transparency.passesThrough(end, at)) {
            isRinging = true;
            return FADING;
        }
        if (Transparency.passesThrough(bases, at)) {
            Transparency.set(bases, at, end[at + 3], end[at + 4]);
            System.arraycopy(bases, at, origins, at, WIDTH);
            return STRAIGHT;
        }
        measure(slot, end);
        if (distances[slot] > FARTHEST
                && Transparency.opensBothEnds(bases, at)
                && Transparency.opensBothEnds(end, at)) {
            isRinging = true;
            isExchanging = true;
            return EXCHANGING;
        }
        double frames = 0.5 * distances[slot] / leaks[slot] + 1;
        if (frames > slowdown * glide.movingFrames() && !mayJump(end, at)) {
            slowdown = frames / glide.movingFrames();
        }
        return glide.isExchanged(slot) ? STRAIGHT : MIXING;
    }

    private boolean mayJump(double[] end, int at) {
        return Distance.hopFraction(bases[at + 3], bases[at + 4], end[at + 3], end[at + 4]) <= GlidePlan.HOP_FRACTION;
    }

    /** The frames of one segment, for slots that have farther to go than the glide knew. */
    int frames(Glide glide, int segment) {
        return atMost(Math.ceil(glide.knots().frames(segment) * slowdown));
    }

    int risingFrames(Glide glide) {
        return atMost(Math.ceil(Math.max(1, glide.movingFrames()) * slowdown));
    }

    private static int atMost(double frames) {
        return (int) Math.min(LONGEST_FRAMES, frames);
    }

    /** How long the whole walk takes, if it is never held back. */
    long plannedFrames(Glide glide) {
        long frames = isRinging ? decayFrames() : 0;
        frames += isExchanging ? risingFrames(glide) : 0;
        for (int segment = 0; segment < glide.segmentCount(); segment++) {
            frames += frames(glide, segment);
        }
        return frames;
    }

    /** Aims at the end of a segment; false if a bucket does not admit that yet. */
    boolean aim(Glide glide, int segment, Bucket bucket) {
        boolean admitted = true;
        double share = (double) (behind + glide.knots().frames(segment)) / glide.movingFrames();
        for (int slot = 0; slot < ways.length; slot++) {
            if (ways[slot] == JOINED) {
                System.arraycopy(glide.knot(segment + 1), slot * WIDTH, goals, slot * WIDTH, WIDTH);
                distances[slot] = glide.distances()[segment][slot];
                leaks[slot] = glide.leaks()[segment][slot];
            } else {
                aimAlone(glide, segment, slot, share);
            }
            admitted &= bucket.admits(slot, distances[slot]);
        }
        return admitted;
    }

    private void aimAlone(Glide glide, int segment, int slot, double share) {
        int at = slot * WIDTH;
        if (ways[slot] == FADING || ways[slot] == EXCHANGING) {
            goals[at] = Knots.mix(origins[at], 1, share);
            goals[at + 1] = Knots.mix(origins[at + 1], origins[at + 3], share);
            goals[at + 2] = Knots.mix(origins[at + 2], origins[at + 4], share);
            goals[at + 3] = origins[at + 3];
            goals[at + 4] = origins[at + 4];
        } else {
            mix(glide.knot(ways[slot] == STRAIGHT ? glide.segmentCount() : segment + 1), at, share);
        }
        if (ways[slot] != MIXING || behind > 0 || share < 1) {
            measure(slot, goals);
        }
    }

    private void mix(double[] knot, int at, double share) {
        if (share >= 1) {
            System.arraycopy(knot, at, goals, at, WIDTH);
            return;
        }
        for (int i = at; i < at + WIDTH; i++) {
            goals[i] = Knots.mix(origins[i], knot[i], share);
        }
    }

    private void measure(int slot, double[] end) {
        int at = slot * WIDTH;
        meter.measure(bases[at + 3], bases[at + 4], end[at + 3], end[at + 4]);
        distances[slot] = meter.distance();
        leaks[slot] = meter.leak();
    }

    /** Charges every slot for the segment ahead; the highest level that makes. */
    double charge(Bucket bucket) {
        double highest = 0;
        for (int slot = 0; slot < ways.length; slot++) {
            bucket.charge(slot, distances[slot]);
            bucket.leakAt(slot, leaks[slot]);
            highest = Math.max(highest, bucket.level(slot));
        }
        return highest;
    }

    int framesUntilAdmitted(Bucket bucket) {
        int frames = 1;
        for (int slot = 0; slot < ways.length; slot++) {
            frames = Math.max(frames, bucket.framesUntil(slot, distances[slot]));
        }
        return frames;
    }

    /** A segment is behind; slots that came from elsewhere have joined when the last coefficient has stopped. */
    void pass(Glide glide, int segment) {
        behind += glide.knots().frames(segment);
        for (int slot = 0; slot < ways.length; slot++) {
            if (behind >= glide.movingFrames() && (ways[slot] == MIXING || ways[slot] == STRAIGHT)) {
                ways[slot] = JOINED;
            }
        }
    }

    /** Takes over a knot that follows in no time. */
    void swap(Glide glide, int knot) {
        for (int slot = 0; slot < ways.length; slot++) {
            if (ways[slot] == JOINED) {
                System.arraycopy(glide.knot(knot), slot * WIDTH, bases, slot * WIDTH, WIDTH);
            }
        }
    }

    /** Until all that has faded rings no more. */
    int decayFrames() {
        double frames = 1;
        for (int slot = 0; slot < ways.length; slot++) {
            if (ways[slot] >= FADING) {
                double decay = Poles.decay(bases[slot * WIDTH + 3], bases[slot * WIDTH + 4]);
                frames = Math.max(frames, Math.ceil(DECAY_NEPERS / decay));
            }
        }
        return atMost(frames);
    }

    /** All slots stay where they are. */
    void stay() {
        System.arraycopy(bases, 0, goals, 0, bases.length);
        for (int slot = 0; slot < ways.length; slot++) {
            measure(slot, goals);
        }
    }

    /** What has faded rings no more: frees slots, and gives those that wait their target's poles; true if some rise. */
    boolean exchange(Glide glide) {
        double[] end = glide.knot(glide.segmentCount());
        boolean rises = isExchanging;
        for (int slot = 0; slot < ways.length; slot++) {
            int at = slot * WIDTH;
            if (ways[slot] == FADING) {
                System.arraycopy(end, at, bases, at, WIDTH);
            } else if (ways[slot] == EXCHANGING) {
                Transparency.set(bases, at, end[at + 3], end[at + 4]);
            }
        }
        isRinging = false;
        isExchanging = false;
        return rises;
    }

    /** All slots go to the glide's end, where all but the exchanged ones are. */
    void rise(Glide glide) {
        System.arraycopy(glide.knot(glide.segmentCount()), 0, goals, 0, goals.length);
        for (int slot = 0; slot < ways.length; slot++) {
            measure(slot, goals);
        }
    }
}
