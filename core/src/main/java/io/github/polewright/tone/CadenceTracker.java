package io.github.polewright.tone;

import java.util.Arrays;

/**
 * One cadence: whether its tones are there at a hop, intervals from that, and how many intervals in a row fit. For every
 * interval of the pattern it counts how long a matching chain ends there, so a pattern is found wherever it is joined.
 */
final class CadenceTracker {

    static final double WIDTH_HZ = 20;

    /** Share of the power that is the tones': at one half, rise and fall are told equally late. */
    private static final double LEAST_SHARE = 0.5;

    private static final double LEAST_BALANCE = 0.05;
    private static final double SETTLE_SECONDS = 0.03;
    private static final double SLACK_SECONDS = 0.010;

    final int firstTone;
    private final int toneCount;
    private final double floor;
    private final boolean unbroken;
    private final double[] least;
    private final double[] most;
    private final int settleHops;
    private final int neededIntervals;
    private int[] chain;
    private int[] nextChain;
    private long[] chainStart;
    private long[] nextChainStart;

    private boolean present;
    private int changing;
    private long since;
    private boolean known;
    private boolean on;
    private long start;
    private long end;

    CadenceTracker(Cadence cadence, int firstTone, double hopSeconds, double floor, int cycles) {
        this.firstTone = firstTone;
        this.floor = floor;
        double[] seconds = cadence.intervalsSeconds();
        toneCount = cadence.frequenciesHz().length;
        unbroken = cadence.isUnbroken();
        int length = seconds.length;
        least = new double[length];
        most = new double[length];
        for (int i = 0; i < length; i++) {
            double slack = cadence.tolerance() * seconds[i] + SLACK_SECONDS;
            least[i] = unbroken ? seconds[i] / hopSeconds : (seconds[i] - slack) / hopSeconds;
            most[i] = unbroken ? Double.POSITIVE_INFINITY : (seconds[i] + slack) / hopSeconds;
        }
        settleHops = (int) Math.ceil(SETTLE_SECONDS / hopSeconds);
        // The last off would add its whole length to the wait and tells little.
        neededIntervals = cycles * length - 1;
        chain = new int[length];
        nextChain = new int[length];
        chainStart = new long[length];
        nextChainStart = new long[length];
    }

    void reset() {
        Arrays.fill(chain, 0);
        present = false;
        changing = 0;
        since = 0;
        known = false;
        on = false;
    }

    /** 1 if the cadence was found by this hop, -1 if it has ended, else 0. */
    int hop(double[] powers, double meanSquare, long index) {
        if (isHeard(powers, meanSquare) == present) {
            changing = 0;
            return waited(index);
        }
        if (++changing < settleHops) {
            return 0;
        }
        long change = index - settleHops + 1;
        int answer = interval(change);
        present = !present;
        since = change;
        known = true;
        changing = 0;
        return answer;
    }

    private boolean isHeard(double[] powers, double meanSquare) {
        double sum = 0;
        double weakest = Double.POSITIVE_INFINITY;
        for (int k = firstTone; k < firstTone + toneCount; k++) {
            sum += powers[k];
            weakest = Math.min(weakest, powers[k]);
        }
        return weakest >= floor && weakest >= LEAST_BALANCE * sum && sum >= 2 * LEAST_SHARE * meanSquare;
    }

    /** An interval goes on: it may make an unbroken cadence, or be too long for any pattern. */
    private int waited(long index) {
        double length = index - since;
        if (unbroken) {
            if (present && known && !on && length >= least[0]) {
                on = true;
                start = since;
                return 1;
            }
            return 0;
        }
        if (!on) {
            return 0;
        }
        for (int i = present ? 0 : 1; i < most.length; i += 2) {
            int before = i == 0 ? most.length - 1 : i - 1;
            if (chain[before] > 0 && length <= most[i]) {
                return 0;
            }
        }
        return ended(since);
    }

    /** An interval is complete at a change. */
    private int interval(long change) {
        if (unbroken) {
            return on && present ? ended(change) : 0;
        }
        double length = change - since;
        int longest = 0;
        for (int i = 0; i < chain.length; i++) {
            int before = i == 0 ? chain.length - 1 : i - 1;
            boolean fits = known && present == (i % 2 == 0) && length >= least[i] && length <= most[i];
            // A chain begins with the tone: a pause alone says nothing.
            nextChain[i] = fits && (present || chain[before] > 0) ? chain[before] + 1 : 0;
            nextChainStart[i] = chain[before] > 0 ? chainStart[before] : since;
            if (nextChain[i] > longest) {
                longest = nextChain[i];
                start = on ? start : nextChainStart[i];
            }
        }
        swap();
        if (on) {
            return longest == 0 ? ended(since) : 0;
        }
        on = longest >= neededIntervals;
        return on ? 1 : 0;
    }

    private void swap() {
        int[] counts = chain;
        chain = nextChain;
        nextChain = counts;
        long[] starts = chainStart;
        chainStart = nextChainStart;
        nextChainStart = starts;
    }

    private int ended(long at) {
        on = false;
        end = at;
        Arrays.fill(chain, 0);
        return -1;
    }

    long start() {
        return start;
    }

    long end() {
        return end;
    }
}
