package io.github.polewright.samples.survey;

import java.util.Arrays;

/**
 * Hum of one fundamental laid over one piece: how well it fits, and how strong each line is then.
 *
 * <p>A line that stands through the piece has one amplitude and a phase that turns evenly. Its best estimate is the sum
 * of the moments' amplitudes, turned back to the centre and weighted by one over the floor beside the line at that
 * moment, so that the quiet moments count; the squared size of that sum over the sum of the weights is the evidence, 1
 * on average where only noise is. Harmonic k turns k times as fast, so the sum of the evidence over the lines tells the
 * fundamental with weights of k squared and of the line's strength, as the least possible variance asks for.
 */
final class HumFit {

    private static final int MOST_SEARCHES = 8;
    private static final double LIKELY_EVIDENCE = 6;

    private final Piece piece;
    private final int channels;
    private final int harmonics;
    private double fundamentalHz;
    private final double[][][] real;
    private final double[][][] imaginary;
    private final double[][][] weight;

    HumFit(Piece piece, int channels, int harmonics, double fundamentalHz) {
        this.piece = piece;
        this.channels = channels;
        this.harmonics = harmonics;
        real = new double[channels][harmonics + 1][piece.moments()];
        imaginary = new double[channels][harmonics + 1][piece.moments()];
        weight = new double[channels][harmonics + 1][piece.moments()];
        moveTo(fundamentalHz);
    }

    int harmonics() {
        return harmonics;
    }

    double fundamentalHz() {
        return fundamentalHz;
    }

    Piece piece() {
        return piece;
    }

    private void moveTo(double newFundamentalHz) {
        fundamentalHz = newFundamentalHz;
        double[] value = new double[2];
        for (int c = 0; c < channels; c++) {
            for (int s = 0; s < piece.moments(); s++) {
                Snapshot snapshot = piece.snapshot(s, c);
                for (int k = 1; k <= harmonics; k++) {
                    snapshot.amplitude(k * fundamentalHz, value);
                    double turn = -2 * Math.PI * k * fundamentalHz * piece.secondsFromCentre(s);
                    double cos = Math.cos(turn);
                    double sin = Math.sin(turn);
                    real[c][k][s] = value[0] * cos - value[1] * sin;
                    imaginary[c][k][s] = value[0] * sin + value[1] * cos;
                    weight[c][k][s] = 1 / snapshot.floor(k * fundamentalHz);
                }
            }
        }
    }

    /** The amplitude of a line at the piece's centre, as real and imaginary part, and the evidence for it. */
    double[] line(int channel, int harmonic, double offsetHz) {
        double sumReal = 0;
        double sumImaginary = 0;
        double sumWeight = 0;
        double turnPerSecond = -2 * Math.PI * harmonic * offsetHz;
        double cos = Math.cos(turnPerSecond * piece.secondsFromCentre(0));
        double sin = Math.sin(turnPerSecond * piece.secondsFromCentre(0));
        double stepCos = Math.cos(turnPerSecond * piece.secondsApart());
        double stepSin = Math.sin(turnPerSecond * piece.secondsApart());
        for (int s = 0; s < piece.moments(); s++) {
            double w = weight[channel][harmonic][s];
            sumReal += w * (real[channel][harmonic][s] * cos - imaginary[channel][harmonic][s] * sin);
            sumImaginary += w * (real[channel][harmonic][s] * sin + imaginary[channel][harmonic][s] * cos);
            sumWeight += w;
            double turned = cos * stepCos - sin * stepSin;
            sin = sin * stepCos + cos * stepSin;
            cos = turned;
        }
        double evidence = (sumReal * sumReal + sumImaginary * sumImaginary) / sumWeight;
        return new double[] {sumReal / sumWeight, sumImaginary / sumWeight, evidence};
    }

    double evidence(int harmonic) {
        double sum = 0;
        for (int c = 0; c < channels; c++) {
            sum += line(c, harmonic, 0)[2];
        }
        return sum;
    }

    /** The lines that are probably there. */
    boolean[] likelyLines() {
        boolean[] likely = new boolean[harmonics + 1];
        for (int k = 1; k <= harmonics; k++) {
            likely[k] = evidence(k) > channels + LIKELY_EVIDENCE;
        }
        return likely;
    }

    /** Looks for the fundamental in steps around where it is; each line counts by its size, not its power, so that
     * one that is not hum but loud misleads less. */
    void searchByAllLines(double reachHz, double stepHz) {
        boolean[] all = new boolean[harmonics + 1];
        Arrays.fill(all, true);
        // A single strong line is so wide that the start may be off by more than the reach.
        for (int i = 0; i < MOST_SEARCHES; i++) {
            double from = fundamentalHz;
            search(reachHz, stepHz, all, true);
            if (Math.abs(fundamentalHz - from) < 0.9 * reachHz) {
                return;
            }
        }
    }

    /** Looks closely, by the lines that are there, each by its strength. */
    void searchByLines(boolean[] there, double reachHz, double stepHz) {
        search(reachHz, stepHz, there, false);
    }

    private void search(double reachHz, double stepHz, boolean[] lines, boolean bySize) {
        int steps = (int) Math.round(reachHz / stepHz);
        double[] score = new double[2 * steps + 1];
        // Without any line, all scores are alike and the fundamental stays.
        int best = steps;
        for (int i = 0; i < score.length; i++) {
            score[i] = score((i - steps) * stepHz, lines, bySize);
            if (score[i] > score[best]) {
                best = i;
            }
        }
        double vertex = 0;
        if (best > 0 && best < score.length - 1) {
            double bend = score[best - 1] - 2 * score[best] + score[best + 1];
            vertex = bend < 0 ? (score[best - 1] - score[best + 1]) / (2 * bend) : 0;
        }
        moveTo(fundamentalHz + (best - steps + vertex) * stepHz);
    }

    private double score(double offsetHz, boolean[] lines, boolean bySize) {
        double sum = 0;
        for (int k = 1; k <= harmonics; k++) {
            if (lines[k]) {
                double evidence = 0;
                for (int c = 0; c < channels; c++) {
                    evidence += line(c, k, offsetHz)[2];
                }
                sum += bySize ? Math.sqrt(evidence) : evidence;
            }
        }
        return sum;
    }

    /**
     * How steady a line is in one channel: of the moments whose floor is low enough to tell, those in which the line is
     * as strong as in the mean and turns with it.
     *
     * @return how many could tell, how many of them were steady
     */
    int[] steadyMoments(int channel, int harmonic) {
        double[] mean = line(channel, harmonic, 0);
        double size = Math.hypot(mean[0], mean[1]);
        int telling = 0;
        int steady = 0;
        for (int s = 0; s < piece.moments(); s++) {
            double noise = 1 / Math.sqrt(weight[channel][harmonic][s]);
            if (noise < size / 2) {
                telling++;
                double away =
                        Math.hypot(real[channel][harmonic][s] - mean[0], imaginary[channel][harmonic][s] - mean[1]);
                steady += away < 0.35 * size + 1.5 * noise ? 1 : 0;
            }
        }
        return new int[] {telling, steady};
    }

    /** How much more power is on a line than one bin to either side; in the skirt of a note it is less than 1. */
    double peakiness(int harmonic) {
        double centre = 0;
        double below = 0;
        double above = 0;
        for (int c = 0; c < channels; c++) {
            for (int s = 0; s < piece.moments(); s++) {
                Snapshot snapshot = piece.snapshot(s, c);
                double lineHz = harmonic * fundamentalHz;
                double w = weight[c][harmonic][s];
                centre += w * snapshot.power(lineHz);
                below += w * snapshot.power(lineHz - snapshot.binHz());
                above += w * snapshot.power(lineHz + snapshot.binHz());
            }
        }
        return centre / Math.max(below, above);
    }

    /** The power of what lies beside a line in a band of 1 Hz: the median over the moments, the mean over channels. */
    double floorPower(int harmonic) {
        double sum = 0;
        for (int c = 0; c < channels; c++) {
            double[] floors = new double[piece.moments()];
            for (int s = 0; s < floors.length; s++) {
                floors[s] = 1 / weight[c][harmonic][s];
            }
            Arrays.sort(floors);
            sum += piece.snapshot(0, c).powerInOneHertz(floors[floors.length / 2]);
        }
        return sum / channels;
    }
}
