package io.github.polewright.mains;

import java.util.Arrays;

/**
 * The common phase error that all lines together make most likely, found by a look at a grid and two Newton steps: far
 * from lock the high lines have turned by more than a radian, and a linear estimate would trust them most.
 */
final class PhaseLikelihood {

    private static final double REACH_RADIANS = 0.8;
    private static final double MOST_LINEAR_RADIANS = 0.5;
    /** Grid points to a radian of the highest line. */
    private static final double FINENESS = 2;

    private static final int NEWTON_STEPS = 2;

    private final int lines;
    private final int points;
    private final double gridStep;
    private final double[] re;
    private final double[] im;
    private final double[] turnRe;
    private final double[] turnIm;
    private final double[] startRe;
    private final double[] startIm;
    private final double[] nowRe;
    private final double[] nowIm;

    PhaseLikelihood(int lines) {
        this.lines = lines;
        points = 2 * (int) Math.ceil(REACH_RADIANS * FINENESS * lines) + 1;
        gridStep = 2 * REACH_RADIANS / (points - 1);
        re = new double[lines];
        im = new double[lines];
        turnRe = new double[lines];
        turnIm = new double[lines];
        startRe = new double[lines];
        startIm = new double[lines];
        nowRe = new double[lines];
        nowIm = new double[lines];
        Powers.of(-gridStep, turnRe, turnIm);
        Powers.of(REACH_RADIANS, startRe, startIm);
    }

    void clear() {
        Arrays.fill(re, 0);
        Arrays.fill(im, 0);
    }

    /** Adds an observation times the conjugate of what was expected, over the noise power. */
    void add(int line, double real, double imaginary) {
        re[line] += real;
        im[line] += imaginary;
    }

    /** The likeliest error over the whole grid; {@code variance} is that of the phase beforehand. */
    double search(double variance) {
        for (int k = 0; k < lines; k++) {
            nowRe[k] = re[k] * startRe[k] - im[k] * startIm[k];
            nowIm[k] = re[k] * startIm[k] + im[k] * startRe[k];
        }
        double best = Double.NEGATIVE_INFINITY;
        double place = 0;
        for (int p = 0; p < points; p++) {
            double radians = p * gridStep - REACH_RADIANS;
            double sum = 0;
            for (int k = 0; k < lines; k++) {
                sum += nowRe[k];
                double turned = nowRe[k] * turnRe[k] - nowIm[k] * turnIm[k];
                nowIm[k] = nowRe[k] * turnIm[k] + nowIm[k] * turnRe[k];
                nowRe[k] = turned;
            }
            double likelihood = 2 * sum - 0.5 * radians * radians / variance;
            if (likelihood > best) {
                best = likelihood;
                place = radians;
            }
        }
        return refine(place, variance);
    }

    /** The error by its slope at zero, right while every line has turned little. */
    double linear(double information) {
        double slope = 0;
        for (int k = 0; k < lines; k++) {
            slope += (k + 1) * im[k];
        }
        double place = information > 0 ? slope / information : 0;
        return Math.max(-MOST_LINEAR_RADIANS, Math.min(MOST_LINEAR_RADIANS, place));
    }

    /** The likeliest error near a known one. */
    double refine(double radians, double variance) {
        double place = radians;
        for (int step = 0; step < NEWTON_STEPS; step++) {
            Powers.of(-place, nowRe, nowIm);
            double slope = -place / variance;
            double curve = 1 / variance;
            for (int k = 0; k < lines; k++) {
                double order = k + 1;
                slope += 2 * order * (re[k] * nowIm[k] + im[k] * nowRe[k]);
                curve += 2 * order * order * (re[k] * nowRe[k] - im[k] * nowIm[k]);
            }
            if (curve > 0) {
                place += Math.max(-gridStep, Math.min(gridStep, slope / curve));
            }
        }
        return Math.max(-REACH_RADIANS, Math.min(REACH_RADIANS, place));
    }
}
