package io.github.polewright.bench.measure;

import java.util.Arrays;

/**
 * What each block of one and the same passage costs by itself: the least of many repeats, which the machine's other work
 * cannot raise. Only blocks that always do the same work in the same place can be measured so.
 */
public final class LeastTimes {

    private static final double NANOS_PER_MICRO = 1000;

    private final long[] least;

    /**
     * Nothing measured yet.
     *
     * @param blocks of the passage, at least 1
     */
    public LeastTimes(int blocks) {
        least = new long[blocks];
        Arrays.fill(least, Long.MAX_VALUE);
    }

    /**
     * Counts a time.
     *
     * @param block its place in the passage
     * @param nanos what it took this time
     */
    public void record(int block, long nanos) {
        least[block] = Math.min(least[block], nanos);
    }

    /**
     * The mean over the passage.
     *
     * @return microseconds
     */
    public double meanMicros() {
        return Arrays.stream(least).average().orElse(0) / NANOS_PER_MICRO;
    }

    /**
     * The dearest block.
     *
     * @return microseconds
     */
    public double worstMicros() {
        return Arrays.stream(least).max().orElse(0) / NANOS_PER_MICRO;
    }
}
