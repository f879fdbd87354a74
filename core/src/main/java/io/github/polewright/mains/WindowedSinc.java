package io.github.polewright.mains;

/** Linear-phase low-pass taps: a sinc under a Hamming window, unity at 0 Hz (common practice, no source). */
final class WindowedSinc {

    private WindowedSinc() {}

    /** @param corner the -6 dB frequency as a fraction of the sample rate, below 0.5 */
    static double[] taps(int count, double corner) {
        double[] taps = new double[count];
        double sum = 0;
        double middle = (count - 1) / 2.0;
        for (int i = 0; i < count; i++) {
            double t = i - middle;
            double sinc = t == 0 ? 2 * corner : Math.sin(2 * Math.PI * corner * t) / (Math.PI * t);
            taps[i] = sinc * (0.54 + 0.46 * Math.cos(Math.PI * t / (middle + 1)));
            sum += taps[i];
        }
        for (int i = 0; i < count; i++) {
            taps[i] /= sum;
        }
        return taps;
    }

    /** Gain of symmetric taps at a fraction of their sample rate. */
    static double gain(double[] taps, double frequency) {
        double middle = (taps.length - 1) / 2.0;
        double sum = 0;
        for (int i = 0; i < taps.length; i++) {
            sum += taps[i] * Math.cos(2 * Math.PI * frequency * (i - middle));
        }
        return sum;
    }
}
