package io.github.polewright.mains;

/** A complex 1024-point discrete Fourier transform that is done one radix-2 stage a call, so that no block pays it all. */
final class Transform {

    static final int POINTS = 1024;
    static final int STAGES = 10;

    final double[] real = new double[POINTS];
    final double[] imaginary = new double[POINTS];
    private final double[] cosine = new double[POINTS / 2];
    private final double[] sine = new double[POINTS / 2];
    private final int[] reversed = new int[POINTS];

    Transform() {
        for (int i = 0; i < POINTS / 2; i++) {
            cosine[i] = Math.cos(2 * Math.PI * i / POINTS);
            sine[i] = -Math.sin(2 * Math.PI * i / POINTS);
        }
        for (int i = 0; i < POINTS; i++) {
            reversed[i] = Integer.reverse(i) >>> (32 - STAGES);
        }
    }

    /** Where input sample {@code index} must be put before the first stage. */
    int place(int index) {
        return reversed[index];
    }

    void stage(int stage) {
        int half = 1 << stage;
        int stride = (POINTS / 2) >> stage;
        for (int start = 0; start < POINTS; start += 2 * half) {
            for (int i = 0; i < half; i++) {
                int upper = start + i;
                int lower = upper + half;
                double c = cosine[i * stride];
                double s = sine[i * stride];
                double re = real[lower] * c - imaginary[lower] * s;
                double im = real[lower] * s + imaginary[lower] * c;
                real[lower] = real[upper] - re;
                imaginary[lower] = imaginary[upper] - im;
                real[upper] += re;
                imaginary[upper] += im;
            }
        }
    }
}
