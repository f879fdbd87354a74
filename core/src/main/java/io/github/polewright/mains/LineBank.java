package io.github.polewright.mains;

import java.util.Arrays;

/**
 * Every line's complex amplitude in every channel, on one running phase, and what a mains period (a <i>tick</i>) says
 * against it. Each analysis sample demodulates the residue, the input minus the lines known so far; a whole period
 * makes the harmonics orthogonal, and the residue leaves little to leak.
 *
 * <p>Arrays run over {@code channel * lines + line}, where line 0 is the fundamental.
 */
final class LineBank {

    final int lines;
    final int channels;
    final double[] re;
    final double[] im;
    /** Error variance of each amplitude. */
    final double[] variance;
    /** Innovation of the last tick. */
    final double[] newRe;

    final double[] newIm;
    private final double[] sumRe;
    private final double[] sumIm;
    private final double[] cosine;
    private final double[] sine;
    private final double[] turnRe;
    private final double[] turnIm;

    LineBank(int lines, int channels) {
        this.lines = lines;
        this.channels = channels;
        int size = lines * channels;
        re = new double[size];
        im = new double[size];
        variance = new double[size];
        newRe = new double[size];
        newIm = new double[size];
        sumRe = new double[size];
        sumIm = new double[size];
        cosine = new double[lines];
        sine = new double[lines];
        turnRe = new double[lines];
        turnIm = new double[lines];
    }

    int size() {
        return re.length;
    }

    void reset() {
        Arrays.fill(re, 0);
        Arrays.fill(im, 0);
        Arrays.fill(sumRe, 0);
        Arrays.fill(sumIm, 0);
    }

    /** Sets the oscillators: the phase of the fundamental now, and its step a sample, in radians. */
    void tune(double phase, double step) {
        Powers.of(phase, cosine, sine);
        Powers.of(step, turnRe, turnIm);
    }

    void sample(double[] x) {
        for (int c = 0; c < channels; c++) {
            demodulate(x[c], c * lines);
        }
        for (int k = 0; k < lines; k++) {
            double turned = cosine[k] * turnRe[k] - sine[k] * turnIm[k];
            sine[k] = cosine[k] * turnIm[k] + sine[k] * turnRe[k];
            cosine[k] = turned;
        }
    }

    private void demodulate(double x, int base) {
        double even = x;
        double odd = 0;
        int k = 0;
        for (; k + 1 < lines; k += 2) {
            even -= re[base + k] * cosine[k] - im[base + k] * sine[k];
            odd += re[base + k + 1] * cosine[k + 1] - im[base + k + 1] * sine[k + 1];
        }
        if (k < lines) {
            even -= re[base + k] * cosine[k] - im[base + k] * sine[k];
        }
        double residue = even - odd;
        for (k = 0; k < lines; k++) {
            sumRe[base + k] += residue * cosine[k];
            sumIm[base + k] -= residue * sine[k];
        }
    }

    /** Ends a tick of so many samples: the sums become innovations. */
    void close(int samples) {
        for (int i = 0; i < re.length; i++) {
            newRe[i] = 2 * sumRe[i] / samples;
            newIm[i] = 2 * sumIm[i] / samples;
            sumRe[i] = 0;
            sumIm[i] = 0;
        }
    }

    double power(int i) {
        return re[i] * re[i] + im[i] * im[i];
    }

    /** Squared amplitude of a channel's strongest line. */
    double strongest(int channel) {
        double most = 0;
        for (int i = channel * lines; i < (channel + 1) * lines; i++) {
            most = Math.max(most, power(i));
        }
        return most;
    }

    /** Mean power of all lines of all channels. */
    double meanPower() {
        double sum = 0;
        for (int i = 0; i < re.length; i++) {
            sum += 0.5 * power(i);
        }
        return sum;
    }
}
