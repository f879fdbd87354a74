package io.github.polewright.samples.survey;

import java.util.Arrays;
import org.jtransforms.fft.DoubleFFT_1D;

/**
 * The spectrum of a short window of one channel, tapered by a Hann window, from 0 Hz to a top frequency. Amplitudes are
 * those of sines, phases count from the window's centre.
 */
final class Snapshot {

    // The main lobe of a Hann window reaches 2 bins, a line between bins and its skirts 3.
    private static final int FLOOR_FROM_BINS = 3;
    private static final int FLOOR_TO_BINS = 10;
    private static final int REACH_BINS = 16;
    // Mean over median of the power of noise, which is spread exponentially.
    private static final double MEAN_OVER_MEDIAN = 1 / Math.log(2);
    // -150 dB: below the last bit of 24, where only rounding is left.
    private static final double LEAST_FLOOR = 1e-15;

    private final double binHz;
    private final float[] real;
    private final float[] imaginary;
    private final double[] floors;

    /** Overwrites the samples. */
    Snapshot(double[] samples, DoubleFFT_1D transform, double sampleRateHz, double topHz) {
        int length = samples.length;
        double mean = Arrays.stream(samples).average().orElse(0);
        for (int n = 0; n < length; n++) {
            samples[n] = (samples[n] - mean) * (0.5 - 0.5 * Math.cos(2 * Math.PI * n / length));
        }
        transform.realForward(samples);
        binHz = sampleRateHz / length;
        int bins = Math.min((length - 1) / 2, (int) Math.ceil(topHz / binHz) + REACH_BINS);
        real = new float[bins];
        imaginary = new float[bins];
        floors = new double[bins + 1];
        // The window sums to length / 2 and a sine gives half its amplitude to each of two bins.
        double scale = 4.0 / length;
        for (int m = 1; m < bins; m++) {
            double toCentre = m % 2 == 0 ? scale : -scale;
            real[m] = (float) (samples[2 * m] * toCentre);
            imaginary[m] = (float) (samples[2 * m + 1] * toCentre);
        }
    }

    /** The complex amplitude at any frequency, from the bins around it by the sampling theorem, faded out with
     * distance so that what lies there stays out. */
    void amplitude(double frequencyHz, double[] realAndImaginary) {
        double place = frequencyHz / binHz;
        int from = Math.max(1, (int) Math.floor(place) - REACH_BINS + 1);
        int to = Math.min(real.length - 1, (int) Math.floor(place) + REACH_BINS);
        double sumReal = 0;
        double sumImaginary = 0;
        // sin(pi (place - m)) is the same for every m but for its sign.
        double sine = Math.sin(Math.PI * (place - from)) / Math.PI;
        for (int m = from; m <= to; m++, sine = -sine) {
            double away = (place - m) / REACH_BINS;
            double taper = (1 - away * away) * (1 - away * away);
            double weight = Math.abs(place - m) < 1e-9 ? 1 : taper * sine / (place - m);
            sumReal += weight * real[m];
            sumImaginary += weight * imaginary[m];
        }
        realAndImaginary[0] = sumReal;
        realAndImaginary[1] = sumImaginary;
    }

    /** The squared amplitude at any frequency. */
    double power(double frequencyHz) {
        double[] value = new double[2];
        amplitude(frequencyHz, value);
        return value[0] * value[0] + value[1] * value[1];
    }

    double binHz() {
        return binHz;
    }

    /** The mean power, in squared amplitude, of what lies beside a line but not under it. */
    double floor(double frequencyHz) {
        int centre = (int) Math.min(real.length, Math.round(frequencyHz / binHz));
        if (floors[centre] == 0) {
            floors[centre] = floorAround(centre);
        }
        return floors[centre];
    }

    private double floorAround(int centre) {
        double[] powers = new double[2 * (FLOOR_TO_BINS - FLOOR_FROM_BINS + 1)];
        int count = 0;
        for (int away = FLOOR_FROM_BINS; away <= FLOOR_TO_BINS; away++) {
            for (int m : new int[] {centre - away, centre + away}) {
                if (m >= 2 && m < real.length) {
                    powers[count++] = real[m] * real[m] + imaginary[m] * imaginary[m];
                }
            }
        }
        if (count == 0) {
            return LEAST_FLOOR;
        }
        Arrays.sort(powers, 0, count);
        double median = (powers[(count - 1) / 2] + powers[count / 2]) / 2;
        return Math.max(LEAST_FLOOR, median * MEAN_OVER_MEDIAN);
    }

    /** From squared amplitude of noise to its power in a band of 1 Hz: a Hann window is 1.5 bins wide to noise. */
    double powerInOneHertz(double floor) {
        return floor / 2 / (1.5 * binHz);
    }
}
