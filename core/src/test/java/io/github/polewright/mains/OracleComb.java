package io.github.polewright.mains;

/** A comb that is told the true phase: each line is demodulated by it, smoothed half the width wide, and subtracted. */
final class OracleComb {

    static final double[] WIDTHS_HZ = {0.25, 0.5, 1, 2, 4};

    private OracleComb() {}

    static double[] remove(double[] input, Hum hum, double widthHz) {
        double[] output = input.clone();
        double pace = 1 - Math.exp(-Math.PI * widthHz / hum.sampleRateHz);
        for (int k = 1; k <= hum.lines; k++) {
            double re = 0;
            double im = 0;
            for (int n = 0; n < output.length; n++) {
                double c = Math.cos(k * hum.phase[n]);
                double s = Math.sin(k * hum.phase[n]);
                double x = output[n];
                re += pace * (2 * x * c - re);
                im += pace * (-2 * x * s - im);
                output[n] = x - (re * c - im * s);
            }
        }
        return output;
    }
}
