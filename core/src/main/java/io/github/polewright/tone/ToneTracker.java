package io.github.polewright.tone;

import java.util.Arrays;

/**
 * On and off of one tone, from its power at every hop. The level is trusted three time constants after it passed the
 * threshold; the start is then where the amplitude passed half of it, the end where it fell below half.
 */
final class ToneTracker {

    private static final double SETTLED = 3;
    private static final double RELEASED = 2;
    private static final double FOLLOWING = 8;
    private static final double SOUND = 0.7;

    final int tone;
    private final double threshold;
    private final int settleHops;
    private final int releaseHops;
    private final double follow;
    private final double[] history;
    private int above;
    private int below;
    private boolean on;
    private double start;
    private double end;
    private double reference;

    ToneTracker(int tone, double decaySeconds, double hopSeconds, double threshold) {
        this.tone = tone;
        this.threshold = threshold;
        settleHops = Math.max(2, (int) Math.ceil(SETTLED * decaySeconds / hopSeconds));
        releaseHops = Math.max(2, (int) Math.ceil(RELEASED * decaySeconds / hopSeconds));
        follow = Math.min(1, hopSeconds / (FOLLOWING * decaySeconds));
        history = new double[2 * settleHops + 2];
    }

    void reset() {
        Arrays.fill(history, 0);
        above = 0;
        on = false;
    }

    /** Takes the power of a hop; 1 if the tone began by it, -1 if it has ended, else 0. */
    int hop(double power, long index) {
        history[(int) (index % history.length)] = power;
        if (on) {
            return followed(power, index) ? 0 : -1;
        }
        above = power >= threshold ? above + 1 : 0;
        if (above < settleHops) {
            return 0;
        }
        on = true;
        below = 0;
        reference = power;
        start = startBefore(index);
        return 1;
    }

    private double startBefore(long index) {
        double half = reference / 4;
        for (int ago = 1; ago < history.length; ago++) {
            double before = index < ago ? 0 : past(index - ago);
            if (before < half) {
                return index - ago + Crossing.between(before, past(index - ago + 1), half);
            }
        }
        return index - history.length;
    }

    private double past(long index) {
        return history[(int) (index % history.length)];
    }

    private boolean followed(double power, long index) {
        if (power >= reference / 4) {
            below = 0;
            if (power >= SOUND * reference) {
                reference += follow * (power - reference);
            }
            return true;
        }
        if (below++ == 0) {
            double before = index < 1 ? 0 : past(index - 1);
            end = index - 1 + Crossing.between(before, power, reference / 4);
        }
        if (below >= releaseHops) {
            on = false;
            above = 0;
            return false;
        }
        return true;
    }

    double start() {
        return start;
    }

    double end() {
        return end;
    }

    double power() {
        return reference;
    }
}
