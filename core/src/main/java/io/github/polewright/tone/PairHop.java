package io.github.polewright.tone;

import java.util.Arrays;

/**
 * What one hop says: powers, deviations and the three dimensionless tests. Nothing here needs a logarithm or an
 * arctangent.
 *
 * <p>{@code Y_k(n) conj(Y_k(n-1))}, turned back by the nominal advance of a hop, has the argument {@code 2 pi d h}: d is
 * the deviation from nominal, h the hop. Method and constants derived for this project.
 */
final class PairHop {

    /** Hops of powers kept, for the search of a start. */
    static final int HISTORY = 16;

    private static final int GROUP = 4;
    private static final double LEAST_SHARE = 0.80;
    private static final double GREATEST_SHARE = 1.08;

    /** A window holds its tone's power but for this loss of the Hann window off its centre: a fit over 9 hops. */
    private static final double LOSS_1 = 2.64624;

    private static final double LOSS_2 = 2.08924;
    private static final double LOSS_3 = 0.29785;

    private final PairTracker tracker;
    private final double[] turnReal = new double[PairSpectrum.TONES];
    private final double[] turnImaginary = new double[PairSpectrum.TONES];
    private final double[] tolerance = new double[PairSpectrum.TONES];
    private final double leastTwist;
    private final double greatestTwist;
    private final double floor;
    private final double[] lastReal = new double[PairSpectrum.TONES];
    private final double[] lastImaginary = new double[PairSpectrum.TONES];
    private final double[] advanceReal = new double[3 * PairSpectrum.TONES];
    private final double[] advanceImaginary = new double[3 * PairSpectrum.TONES];
    private final double[] history = new double[HISTORY * PairSpectrum.TONES];
    private long count;

    // The hop's findings, read by the tracker.
    int low;
    int high;
    boolean good;
    double energy;
    double lowPower;
    double highPower;

    PairHop(double hopSeconds, double[] frequenciesHz, PairLimits limits, PairTracker tracker) {
        this.tracker = tracker;
        for (int k = 0; k < PairSpectrum.TONES; k++) {
            double advance = 2 * Math.PI * frequenciesHz[k] * hopSeconds;
            turnReal[k] = Math.cos(advance);
            turnImaginary[k] = -Math.sin(advance);
            tolerance[k] = Math.tan(2 * Math.PI * hopSeconds * limits.hopToleranceHz(frequenciesHz[k]));
        }
        leastTwist = limits.leastHopTwist();
        greatestTwist = limits.greatestHopTwist();
        floor = limits.floorPower();
    }

    void reset() {
        Arrays.fill(lastReal, 0);
        Arrays.fill(lastImaginary, 0);
        Arrays.fill(advanceReal, 0);
        Arrays.fill(advanceImaginary, 0);
        Arrays.fill(history, 0);
        count = 0;
    }

    void take(double[] real, double[] imaginary, double meanSquare) {
        int now = (int) (count % HISTORY) * PairSpectrum.TONES;
        int slot = slot();
        for (int k = 0; k < PairSpectrum.TONES; k++) {
            double re = real[k];
            double im = imaginary[k];
            history[now + k] = re * re + im * im;
            double zr = re * lastReal[k] + im * lastImaginary[k];
            double zi = im * lastReal[k] - re * lastImaginary[k];
            advanceReal[slot + k] = zr * turnReal[k] - zi * turnImaginary[k];
            advanceImaginary[slot + k] = zr * turnImaginary[k] + zi * turnReal[k];
            lastReal[k] = re;
            lastImaginary[k] = im;
        }
        energy = meanSquare;
        low = strongest(now, 0);
        high = strongest(now, GROUP);
        judge(now);
        tracker.hop(this, count);
        count++;
    }

    private int strongest(int now, int first) {
        int best = first;
        for (int k = first + 1; k < first + GROUP; k++) {
            if (history[now + k] > history[now + best]) {
                best = k;
            }
        }
        return best;
    }

    private void judge(int now) {
        double lowSlope = slope(low);
        double highSlope = slope(high);
        lowPower = history[now + low] * withoutLoss(lowSlope);
        highPower = history[now + high] * withoutLoss(highSlope);
        double both = lowPower + highPower;
        good = Math.abs(lowSlope) <= tolerance[low]
                && Math.abs(highSlope) <= tolerance[high]
                && both >= 2 * LEAST_SHARE * energy
                && both <= 2 * GREATEST_SHARE * energy
                && highPower >= leastTwist * lowPower
                && highPower <= greatestTwist * lowPower
                && lowPower >= floor
                && highPower >= floor;
    }

    /** Tangent of the mean advance over three hops, or infinity beyond a quarter turn. */
    private double slope(int k) {
        double re = advanceReal[k] + advanceReal[PairSpectrum.TONES + k] + advanceReal[2 * PairSpectrum.TONES + k];
        double im = advanceImaginary[k]
                + advanceImaginary[PairSpectrum.TONES + k]
                + advanceImaginary[2 * PairSpectrum.TONES + k];
        return re > 0 ? im / re : Double.POSITIVE_INFINITY;
    }

    private static double withoutLoss(double slope) {
        // Beyond the widest tolerance the fit means nothing, and the hop is refused anyway.
        double u = Math.min(slope * slope, 1);
        return 1 + u * (LOSS_1 + u * (LOSS_2 + u * LOSS_3));
    }

    /** Power of a pair some hops ago, as its windows held it. */
    double pairPower(int lowTone, int highTone, int hopsAgo) {
        if (hopsAgo > count) {
            return 0;
        }
        int at = (int) ((count - hopsAgo) % HISTORY) * PairSpectrum.TONES;
        return history[at + lowTone] + history[at + highTone];
    }

    double tonePower(int tone) {
        return history[(int) (count % HISTORY) * PairSpectrum.TONES + tone];
    }

    double advanceReal(int tone) {
        return advanceReal[slot() + tone];
    }

    double advanceImaginary(int tone) {
        return advanceImaginary[slot() + tone];
    }

    private int slot() {
        return (int) (count % 3) * PairSpectrum.TONES;
    }
}
