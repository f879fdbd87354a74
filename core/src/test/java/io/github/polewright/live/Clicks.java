package io.github.polewright.live;

import org.jtransforms.fft.DoubleFFT_1D;

/** How much energy a change puts beside a tone, from a spectrum by JTransforms. */
final class Clicks {

    /** 1.4 s at 48 kHz: bins of 0.7 Hz. */
    static final int WINDOW = 1 << 16;

    /** Side lobes of a Kaiser window at this shape lie below -150 dB (J. Kaiser and R. Schafer, 1980). */
    private static final double KAISER_SHAPE = 20;

    private static final double[] KAISER = kaiser();

    private Clicks() {}

    /** Energy farther than a sixth of an octave from a tone of amplitude 1, in dB relative to the tone's. */
    static double besideDb(double[] signal, int centre, double toneHz, double rateHz) {
        double[] power = power(signal, centre - WINDOW / 2);
        double[] tone = new double[WINDOW];
        for (int i = 0; i < WINDOW; i++) {
            tone[i] = Math.sin(2 * Math.PI * toneHz * i / rateHz);
        }
        double whole = band(power(tone, 0), 0, rateHz / 2, rateHz);
        double low = toneHz * Math.pow(2, -1 / 6.0);
        double high = toneHz * Math.pow(2, 1 / 6.0);
        double beside = band(power, 0, low, rateHz) + band(power, high, rateHz / 2, rateHz);
        return 10 * Math.log10(beside / whole);
    }

    /** Energy of a band, in any unit. */
    static double band(double[] power, double lowHz, double highHz, double rateHz) {
        double sum = 0;
        for (int k = 0; k < power.length; k++) {
            double hz = k * rateHz / WINDOW;
            sum += hz >= lowHz && hz < highHz ? power[k] : 0;
        }
        return sum;
    }

    /** The power of each bin below half the sample rate, under a Kaiser window. */
    static double[] power(double[] signal, int first) {
        double[] windowed = new double[WINDOW];
        for (int i = 0; i < WINDOW; i++) {
            windowed[i] = signal[first + i] * KAISER[i];
        }
        new DoubleFFT_1D(WINDOW).realForward(windowed);
        double[] power = new double[WINDOW / 2];
        power[0] = windowed[0] * windowed[0];
        for (int k = 1; k < power.length; k++) {
            power[k] = 2 * (windowed[2 * k] * windowed[2 * k] + windowed[2 * k + 1] * windowed[2 * k + 1]);
        }
        return power;
    }

    private static double[] kaiser() {
        double[] window = new double[WINDOW];
        for (int i = 0; i < WINDOW; i++) {
            double u = 2 * (i + 0.5) / WINDOW - 1;
            window[i] = bessel(KAISER_SHAPE * Math.sqrt(1 - u * u)) / bessel(KAISER_SHAPE);
        }
        return window;
    }

    /** The modified Bessel function I0 by its power series. */
    private static double bessel(double x) {
        double sum = 1;
        double term = 1;
        for (int k = 1; term > 1e-17 * sum; k++) {
            term *= (x / (2 * k)) * (x / (2 * k));
            sum += term;
        }
        return sum;
    }
}
