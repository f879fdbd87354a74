package io.github.polewright.samples.survey;

import java.util.ArrayList;
import java.util.List;

/** Which lines of a fitted hum are there, and whether together they are hum. */
final class Verdict {

    // For 40 lines of mere noise to reach this once is one chance in several thousands.
    private static final double LEAST_EVIDENCE = 12;
    // On a line alone it is 4.
    private static final double LEAST_PEAKINESS = 1;
    private static final double STEADY_SHARE = 0.75;
    private static final double TELLING_SHARE = 0.25;
    private static final int TELLING_MOMENTS = 3;
    private static final int LOW_HARMONICS = 10;
    private static final double ALONE_EVIDENCE = 300;
    private static final double ALONE_STEADY_SHARE = 0.9;

    private final List<HumFit> fits;
    private final int channels;
    private final int harmonics;
    private final double[] evidence;
    private final double[] steadyShare;
    private final boolean[] there;

    Verdict(List<HumFit> fits, int channels) {
        this.fits = fits;
        this.channels = channels;
        harmonics = fits.get(0).harmonics();
        evidence = new double[harmonics + 1];
        steadyShare = new double[harmonics + 1];
        there = new boolean[harmonics + 1];
        for (int k = 1; k <= harmonics; k++) {
            judge(k);
        }
    }

    private void judge(int harmonic) {
        int moments = 0;
        int most = 0;
        int telling = 0;
        int steady = 0;
        double peakiness = 0;
        for (HumFit fit : fits) {
            peakiness += fit.peakiness(harmonic) / fits.size();
            evidence[harmonic] += fit.evidence(harmonic) / fits.size();
            moments += fit.piece().moments();
        }
        for (int c = 0; c < channels; c++) {
            int tellingHere = 0;
            for (HumFit fit : fits) {
                int[] counts = fit.steadyMoments(c, harmonic);
                tellingHere += counts[0];
                steady += counts[1];
            }
            telling += tellingHere;
            most = Math.max(most, tellingHere);
        }
        steadyShare[harmonic] = telling == 0 ? 0 : (double) steady / telling;
        // Noise alone adds 1 a channel.
        there[harmonic] = evidence[harmonic] - channels >= LEAST_EVIDENCE
                && peakiness >= LEAST_PEAKINESS
                && most >= Math.max(TELLING_MOMENTS, TELLING_SHARE * moments)
                && steadyShare[harmonic] >= STEADY_SHARE;
    }

    boolean[] there() {
        return there.clone();
    }

    double steadyShare(int harmonic) {
        return steadyShare[harmonic];
    }

    /**
     * Two of the low lines make hum, unless all of them are multiples of a third or higher one, as a note's would be.
     * A single line does only if it is the first or the second, strong and very steady.
     */
    boolean isHum() {
        List<Integer> low = new ArrayList<>();
        for (int k = 1; k <= Math.min(harmonics, LOW_HARMONICS); k++) {
            if (there[k]) {
                low.add(k);
            }
        }
        if (low.size() >= 2) {
            return low.stream().reduce(0, Verdict::commonDivisor) <= 2;
        }
        return low.size() == 1
                && low.get(0) <= 2
                && evidence[low.get(0)] >= ALONE_EVIDENCE
                && steadyShare[low.get(0)] >= ALONE_STEADY_SHARE;
    }

    double score() {
        double sum = 0;
        for (int k = 1; k <= harmonics; k++) {
            sum += there[k] ? Math.log1p(evidence[k]) : 0;
        }
        return sum;
    }

    private static int commonDivisor(int a, int b) {
        return b == 0 ? a : commonDivisor(b, a % b);
    }
}
