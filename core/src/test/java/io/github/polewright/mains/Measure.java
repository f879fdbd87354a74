package io.github.polewright.mains;

/** Figures of merit. */
final class Measure {

    private Measure() {}

    static double power(double[] x, int from, int to) {
        double sum = 0;
        for (int n = from; n < to; n++) {
            sum += x[n] * x[n];
        }
        return sum / Math.max(1, to - from);
    }

    static double db(double powerRatio) {
        return 10 * Math.log10(powerRatio);
    }

    /** Scale-invariant signal to distortion ratio in dB (Le Roux, Wisdom, Erdogan and Hershey, 2019). */
    static double siSdr(double[] clean, double[] output, int from, int to) {
        double cross = 0;
        double square = 0;
        for (int n = from; n < to; n++) {
            cross += clean[n] * output[n];
            square += clean[n] * clean[n];
        }
        double scale = cross / square;
        double error = 0;
        for (int n = from; n < to; n++) {
            double e = output[n] - scale * clean[n];
            error += e * e;
        }
        return db(scale * scale * square / error);
    }

    /** Power of the difference over a range. */
    static double differencePower(double[] a, double[] b, int from, int to) {
        double sum = 0;
        for (int n = from; n < to; n++) {
            sum += (a[n] - b[n]) * (a[n] - b[n]);
        }
        return sum / Math.max(1, to - from);
    }

    static double[] add(double[] a, double[] b) {
        double[] sum = new double[Math.min(a.length, b.length)];
        for (int n = 0; n < sum.length; n++) {
            sum[n] = a[n] + b[n];
        }
        return sum;
    }
}
