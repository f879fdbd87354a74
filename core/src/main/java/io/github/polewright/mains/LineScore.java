package io.github.polewright.mains;

import java.util.Arrays;

/**
 * How much a spectrum looks like a comb on each fundamental from 45 to 65 Hz: the sum over seven harmonics of the log
 * ratio of line to floor, averaged over past spectra (derived for this project).
 *
 * <p>Works in slices: {@link #floor} some bins a call, {@link #grid} some fundamentals a call, then
 * {@link #accumulate} and {@link #judge}.
 */
final class LineScore {

    static final int HARMONICS = 7;
    static final int GRID = 1001;
    static final double STEP_HZ = 0.02;
    static final int FLOOR_SLICES = 10;
    static final int GRID_SLICES = 10;
    static final int BINS = 520;

    private static final int FIRST_BIN = 40;
    private static final double MOST_RATIO = 6;
    /** Median of the exponential law: the floor is a median, the mean is 1.44 times as much. */
    private static final double MEAN_OF_MEDIAN = 1.44;

    /** A top stands at least so many times above what is a lobe away. */
    private static final double SKIRT = 2;

    private static final double AWAY_HZ = 0.8;

    private final double binHz;
    private final double[] power = new double[BINS + 40];
    private final double[] ratio = new double[BINS + 1];
    private final double[] fresh = new double[GRID];
    private final double[] score = new double[GRID];
    private final SlidingMedian median = new SlidingMedian(40);
    private int reach;
    /** Beyond the main lobe of the window. */
    private int lobe;

    private int peak;
    private double peakHz;
    private double peakHeight;

    LineScore(double proposalHz) {
        binHz = proposalHz / Transform.POINTS;
    }

    void clear() {
        Arrays.fill(score, 0);
    }

    /** Starts a spectrum that comes from {@code length} samples. */
    void begin(int length) {
        Arrays.fill(ratio, 0);
        boolean isLong = length >= Transform.POINTS * 3 / 4;
        reach = isLong ? 8 : 16;
        lobe = isLong ? 3 : 6;
    }

    /** Takes one channel's spectrum out of a transform of two real channels packed as real and imaginary part. */
    void unpack(Transform transform, boolean second) {
        double[] re = transform.real;
        double[] im = transform.imaginary;
        for (int b = 0; b < power.length; b++) {
            int mirror = (Transform.POINTS - b) % Transform.POINTS;
            double r = second ? im[b] + im[mirror] : re[b] + re[mirror];
            double i = second ? re[mirror] - re[b] : im[b] - im[mirror];
            power[b] = r * r + i * i;
        }
        median.clear();
        for (int b = FIRST_BIN - reach; b < FIRST_BIN + reach; b++) {
            median.add(power[b]);
        }
    }

    void floor(int slice) {
        int width = (BINS - FIRST_BIN) / FLOOR_SLICES;
        for (int b = FIRST_BIN + slice * width; b < FIRST_BIN + (slice + 1) * width; b++) {
            median.add(power[b + reach]);
            // In near silence a line's skirt stands high above the floor for many bins; only its top is a line.
            double skirt = Math.max(power[b - lobe], power[b + lobe]);
            double floor = Math.max(median.median() * MEAN_OF_MEDIAN, SKIRT * skirt);
            median.remove(power[b - reach]);
            if (power[b] > 0) {
                ratio[b] += floor > 0 ? Math.min(Math.log1p(power[b] / floor), MOST_RATIO) : MOST_RATIO;
            }
        }
    }

    void grid(int slice) {
        int from = slice * GRID / GRID_SLICES;
        int to = (slice + 1) * GRID / GRID_SLICES;
        for (int g = from; g < to; g++) {
            double position = (Rates.LOWEST_MAINS_HZ + STEP_HZ * g) / binHz;
            double sum = 0;
            for (int k = 1; k <= HARMONICS; k++) {
                double at = k * position;
                int b = (int) at;
                sum += ratio[b] + (at - b) * (ratio[b + 1] - ratio[b]);
            }
            fresh[g] = sum;
        }
    }

    /** Adds the new score to the old ones times {@code keep}. */
    void accumulate(double keep) {
        double mean = 0;
        for (double s : fresh) {
            mean += s / GRID;
        }
        peak = 0;
        for (int g = 0; g < GRID; g++) {
            score[g] = keep * score[g] + fresh[g] - mean;
            if (score[g] > score[peak]) {
                peak = g;
            }
        }
    }

    /** The peak over the rms away from it. */
    double judge() {
        double square = 0;
        int count = 0;
        int away = (int) (AWAY_HZ / STEP_HZ);
        for (int g = 0; g < GRID; g++) {
            if (Math.abs(g - peak) > away) {
                square += score[g] * score[g];
                count++;
            }
        }
        place();
        return square > 0 ? peakHeight / Math.sqrt(square / count) : 0;
    }

    private void place() {
        double shift = 0;
        if (peak > 0 && peak < GRID - 1) {
            double curve = score[peak - 1] - 2 * score[peak] + score[peak + 1];
            shift = curve < 0 ? 0.5 * (score[peak - 1] - score[peak + 1]) / curve : 0;
        }
        peakHz = Rates.LOWEST_MAINS_HZ + STEP_HZ * (peak + shift);
        peakHeight = score[peak];
    }

    double peakHz() {
        return peakHz;
    }
}
