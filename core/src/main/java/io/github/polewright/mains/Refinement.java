package io.github.polewright.mains;

/**
 * Sharpens a proposed fundamental: each harmonic is demodulated over two halves of the last second, and the common
 * phase step between the halves corrects the frequency. One harmonic's half is one slice.
 */
final class Refinement {

    private static final int PASSES = 3;
    private static final int HALF = Recent.LENGTH / 2;
    private static final double MOST_STEP_HZ = 0.15;

    private final double proposalHz;
    private final double[][] copy;
    private final double[] hann = new double[HALF];
    private final double[] real;
    private final double[] imaginary;
    private double frequencyHz;
    private double numerator;
    private double denominator;
    private int slice;

    Refinement(double proposalHz, int channels) {
        this.proposalHz = proposalHz;
        copy = new double[channels][Recent.LENGTH];
        real = new double[channels];
        imaginary = new double[channels];
        for (int i = 0; i < HALF; i++) {
            hann[i] = 0.5 - 0.5 * Math.cos(2 * Math.PI * (i + 0.5) / HALF);
        }
    }

    void begin(double fromHz, Recent recent) {
        frequencyHz = fromHz;
        slice = 0;
        numerator = 0;
        denominator = 0;
        for (int c = 0; c < copy.length; c++) {
            recent.copyLast(c, copy[c]);
        }
    }

    double frequencyHz() {
        return frequencyHz;
    }

    /** Does one slice; true when all are done. */
    boolean advance() {
        int harmonic = slice / 2 % LineScore.HARMONICS + 1;
        demodulate(harmonic, slice % 2 == 1);
        slice++;
        if (slice % (2 * LineScore.HARMONICS) == 0) {
            double step = denominator > 0 ? numerator / denominator * proposalHz / (2 * Math.PI * HALF) : 0;
            frequencyHz += Math.max(-MOST_STEP_HZ, Math.min(MOST_STEP_HZ, step));
            numerator = 0;
            denominator = 0;
        }
        return slice == PASSES * 2 * LineScore.HARMONICS;
    }

    private void demodulate(int harmonic, boolean later) {
        double w = 2 * Math.PI * harmonic * frequencyHz / proposalHz;
        double turnReal = Math.cos(w);
        double turnImaginary = -Math.sin(w);
        int offset = later ? HALF : 0;
        for (int c = 0; c < copy.length; c++) {
            double re = Math.cos(w * offset);
            double im = -Math.sin(w * offset);
            double sumReal = 0;
            double sumImaginary = 0;
            for (int i = 0; i < HALF; i++) {
                double x = copy[c][offset + i] * hann[i];
                sumReal += x * re;
                sumImaginary += x * im;
                double turned = re * turnReal - im * turnImaginary;
                im = re * turnImaginary + im * turnReal;
                re = turned;
            }
            if (later) {
                numerator += harmonic * (sumImaginary * real[c] - sumReal * imaginary[c]);
                denominator +=
                        harmonic * harmonic * Math.hypot(real[c], imaginary[c]) * Math.hypot(sumReal, sumImaginary);
            }
            real[c] = sumReal;
            imaginary[c] = sumImaginary;
        }
    }
}
