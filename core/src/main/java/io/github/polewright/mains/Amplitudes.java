package io.github.polewright.mains;

import java.util.Arrays;

/** Scalar Kalman filters for the lines' complex amplitudes (derived for this project). */
final class Amplitudes {

    private static final double QUIET = 1e-30;
    private static final double MEAN_SECONDS = 0.2;
    /** Relative drift of a line's power a second. */
    private static final double DRIFT = 1e-3;

    private static final double LEAST_DRIFT = 0.02;
    private static final double CHANGE_DRIFT = 0.02;
    /** Six times what noise alone leaves in {@link #meanPower} of its own power. */
    private static final double CHANGE_RATIO = 6 * 0.07;

    private static final double LEAST_LEVEL = 0.4;
    private static final double SURE = 4.5;

    private final LineBank bank;
    private final Innovation innovation;
    private final double[] variance;
    private final double[] meanRe;
    private final double[] meanIm;
    private final boolean[] changed;
    private double lastLevel;
    private boolean stepped;

    Amplitudes(LineBank bank, Innovation innovation) {
        this.bank = bank;
        this.innovation = innovation;
        variance = bank.variance;
        meanRe = new double[bank.size()];
        meanIm = new double[bank.size()];
        changed = new boolean[bank.size()];
    }

    void reset() {
        Arrays.fill(variance, 0);
        Arrays.fill(meanRe, 0);
        Arrays.fill(meanIm, 0);
        Arrays.fill(changed, false);
        lastLevel = 0;
        stepped = false;
    }

    /** The first tick cannot tell a line from programme: half of it is taken for each. */
    void adoptFirst() {
        for (int i = 0; i < bank.size(); i++) {
            innovation.adoptFirst(i);
            bank.re[i] = 0.5 * bank.newRe[i];
            bank.im[i] = 0.5 * bank.newIm[i];
            variance[i] = 0.5 * innovation.noise[i];
        }
    }

    /** Takes a tick after the phase was moved by {@code radians} of the fundamental. */
    void update(double radians, double seconds, boolean phaseSettled) {
        double keep = Math.min(1, seconds / MEAN_SECONDS);
        for (int k = 0; k < bank.lines; k++) {
            double turn = (k + 1) * radians;
            for (int i = k; i < bank.size(); i += bank.lines) {
                meanRe[i] += keep * (bank.newRe[i] - meanRe[i]);
                meanIm[i] += keep * (bank.newIm[i] - meanIm[i]);
                move(i, turn, seconds);
            }
        }
        followLevel(phaseSettled);
    }

    private void move(int i, double turn, double seconds) {
        double noise = innovation.worst[i];
        if (noise <= 0) {
            return;
        }
        double usual = innovation.noise[i];
        double mean = meanPower(i);
        changed[i] = mean > CHANGE_RATIO * usual;
        double drift = DRIFT * seconds * Math.max(bank.power(i), LEAST_DRIFT * usual);
        double prior = variance[i] + drift + (changed[i] ? CHANGE_DRIFT * mean : 0);
        double gain = prior / (prior + noise);
        variance[i] = (1 - gain) * prior;
        double re = bank.re[i];
        double im = bank.im[i];
        bank.re[i] = quiet(re + gain * (bank.newRe[i] + im * turn));
        bank.im[i] = quiet(im + gain * (bank.newIm[i] - re * turn));
    }

    /**
     * Where two ticks agree that all lines rose or fell together, all follow at once. Not while the phase runs away from
     * the loop: that looks like a fall.
     */
    private void followLevel(boolean phaseSettled) {
        double level = Math.max(-1, Math.min(1, innovation.level()));
        double proof = level * level * 2 * innovation.levelInformation();
        double now = phaseSettled && Math.abs(level) > LEAST_LEVEL && proof > SURE ? level : 0;
        stepped = now * lastLevel > 0;
        if (stepped) {
            double step = Math.abs(now) < Math.abs(lastLevel) ? now : lastLevel;
            for (int i = 0; i < bank.size(); i++) {
                variance[i] += 0.25 * bank.power(i);
                bank.re[i] *= 1 + step;
                bank.im[i] *= 1 + step;
                meanRe[i] = 0;
                meanIm[i] = 0;
            }
        }
        lastLevel = stepped ? 0 : now;
    }

    private static double quiet(double value) {
        return Math.abs(value) < QUIET ? 0 : value;
    }

    /** Whether all lines rose or fell at once at the last tick. */
    boolean stepped() {
        return stepped;
    }

    /** The power of the smoothed innovation: it leaves zero when a line changes. */
    double meanPower(int i) {
        return meanRe[i] * meanRe[i] + meanIm[i] * meanIm[i];
    }

    boolean changed(int i) {
        return changed[i];
    }

    /** Error variance of a line's amplitude. */
    double variance(int i) {
        return variance[i];
    }
}
