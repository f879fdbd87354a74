package io.github.polewright.bench.measure;

import io.github.polewright.bench.report.Curve;
import java.util.ArrayList;
import java.util.List;
import org.HdrHistogram.Histogram;

/** Block times in a histogram of three significant digits. Recording allocates nothing. */
public final class Times {

    private static final long LONGEST_NANOS = 100_000_000_000L;
    private static final int DIGITS = 3;
    private static final double NANOS_PER_MICRO = 1000;

    private final Histogram histogram = new Histogram(LONGEST_NANOS, DIGITS);

    /**
     * Counts a time.
     *
     * @param nanos below 0 counts as 0, above 100 s as 100 s
     */
    public void record(long nanos) {
        histogram.recordValue(Math.max(0, Math.min(nanos, LONGEST_NANOS)));
    }

    /**
     * Counts a time more than once.
     *
     * @param nanos as in {@link #record(long)}
     * @param count how often
     */
    public void record(long nanos, long count) {
        histogram.recordValueWithCount(Math.max(0, Math.min(nanos, LONGEST_NANOS)), count);
    }

    /**
     * How many times were counted.
     *
     * @return a count
     */
    public long count() {
        return histogram.getTotalCount();
    }

    /**
     * The time that only a share of the blocks exceeds.
     *
     * @param percent 0 to 100
     * @return microseconds
     */
    public double micros(double percent) {
        return histogram.getValueAtPercentile(percent) / NANOS_PER_MICRO;
    }

    /**
     * The longest.
     *
     * @return microseconds
     */
    public double longestMicros() {
        return histogram.getMaxValue() / NANOS_PER_MICRO;
    }

    /**
     * The mean.
     *
     * @return microseconds, 0 where nothing was counted
     */
    public double meanMicros() {
        return histogram.getTotalCount() == 0 ? 0 : histogram.getMean() / NANOS_PER_MICRO;
    }

    /**
     * The distribution, four points an octave of rarity.
     *
     * @param name of the situation
     * @return from the fastest block to the slowest
     */
    public Curve curve(String name) {
        List<Double> oneIn = new ArrayList<>();
        List<Double> micros = new ArrayList<>();
        double most = Math.max(1, count());
        for (double rarity = 1; rarity < most; rarity *= Math.pow(2, 0.25)) {
            oneIn.add(rarity);
            micros.add(micros(100 * (1 - 1 / rarity)));
        }
        oneIn.add(most);
        micros.add(longestMicros());
        return new Curve(name, count(), oneIn, micros);
    }
}
