package io.github.polewright.mains;

import java.util.Arrays;

/**
 * What all lines say together: the common phase error, the common level error, and how noisy each line is. Lines weigh
 * by their Fisher information, so a line under the programme weighs little by itself (derived for this project).
 */
final class Innovation {

    private static final double NOISE_SECONDS = 0.25;
    private static final double LEAST_PRIOR = 0.05;
    private static final double PRIOR_FACTOR = 4;
    /** A line less known than this says nothing of the phase: it may be a tone beside it, which only pulls. */
    private static final double KNOWN = 1;

    private static final double FLAT = 1;

    /** Innovation power a tick, smoothed, without the common phase error. */
    final double[] noise;
    /** The larger of {@link #noise} and the last innovation's power: instant attack, slow release. */
    final double[] worst;

    private final LineBank bank;
    private final double[] offRe;
    private final double[] offIm;
    private final PhaseLikelihood likelihood;
    private double radians;
    private double phaseInformation;
    private double level;
    private double levelInformation;

    Innovation(LineBank bank) {
        this.bank = bank;
        noise = new double[bank.size()];
        worst = new double[bank.size()];
        offRe = new double[bank.size()];
        offIm = new double[bank.size()];
        likelihood = new PhaseLikelihood(bank.lines);
    }

    void reset() {
        Arrays.fill(noise, 0);
        Arrays.fill(worst, 0);
    }

    /** Takes the first tick as noise, which later ones outweigh. */
    void adoptFirst(int i) {
        noise[i] = bank.newRe[i] * bank.newRe[i] + bank.newIm[i] * bank.newIm[i];
        worst[i] = noise[i];
    }

    /** Evaluates tick number {@code tick}, from 1; {@code phaseVariance} is what the loop leaves open beforehand. */
    void evaluate(int tick, double seconds, double phaseVariance, boolean running) {
        double wide = Math.max(LEAST_PRIOR * LEAST_PRIOR, PRIOR_FACTOR * PRIOR_FACTOR * phaseVariance);
        gather(noise);
        double first = running ? likelihood.search(wide) : likelihood.linear(phaseInformation);
        double keep = Math.max(1.0 / (tick + 1), Math.min(1, seconds / NOISE_SECONDS));
        double numerator = 0;
        levelInformation = 0;
        for (int k = 0; k < bank.lines; k++) {
            double cosine = Math.cos((k + 1) * first);
            double sine = -Math.sin((k + 1) * first);
            for (int i = k; i < bank.size(); i += bank.lines) {
                learn(i, cosine, sine, keep);
                if (worst[i] > 0) {
                    numerator += (offRe[i] * bank.re[i] + offIm[i] * bank.im[i]) / worst[i];
                    levelInformation += bank.power(i) / worst[i];
                }
            }
        }
        level = levelInformation > 0 ? numerator / levelInformation : 0;
        gather(worst);
        radians = running ? likelihood.refine(first, FLAT) : likelihood.linear(phaseInformation);
    }

    private void learn(int i, double cosine, double sine, double keep) {
        double fullRe = bank.re[i] + bank.newRe[i];
        double fullIm = bank.im[i] + bank.newIm[i];
        offRe[i] = fullRe * cosine - fullIm * sine - bank.re[i];
        offIm[i] = fullRe * sine + fullIm * cosine - bank.im[i];
        double power = offRe[i] * offRe[i] + offIm[i] * offIm[i];
        noise[i] += keep * (power - noise[i]);
        worst[i] = Math.max(noise[i], power);
    }

    private void gather(double[] weights) {
        likelihood.clear();
        phaseInformation = 0;
        for (int k = 0; k < bank.lines; k++) {
            double order = k + 1;
            for (int i = k; i < bank.size(); i += bank.lines) {
                if (weights[i] > 0 && bank.power(i) > KNOWN * bank.variance[i]) {
                    double cross = bank.newIm[i] * bank.re[i] - bank.newRe[i] * bank.im[i];
                    double along = bank.newRe[i] * bank.re[i] + bank.newIm[i] * bank.im[i];
                    likelihood.add(k, (bank.power(i) + along) / weights[i], cross / weights[i]);
                    phaseInformation += order * order * bank.power(i) / weights[i];
                }
            }
        }
    }

    /** Common phase error of the fundamental. */
    double radians() {
        return radians;
    }

    /** One over twice the variance of {@link #radians}, where programme may be the same in all channels. */
    double phaseInformation() {
        return phaseInformation / bank.channels;
    }

    /** Common relative level error: -1 where the hum has stopped, 0 where it is as known. */
    double level() {
        return level;
    }

    /** One over twice the variance of {@link #level}, where programme may be the same in all channels. */
    double levelInformation() {
        return levelInformation / bank.channels;
    }
}
