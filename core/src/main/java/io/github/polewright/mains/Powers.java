package io.github.polewright.mains;

/** The harmonics' unit phasors. */
final class Powers {

    private Powers() {}

    /** Writes {@code e^(j (k + 1) angle)} for every k. */
    static void of(double angle, double[] cosine, double[] sine) {
        double c = Math.cos(angle);
        double s = Math.sin(angle);
        double re = c;
        double im = s;
        for (int k = 0; k < cosine.length; k++) {
            cosine[k] = re;
            sine[k] = im;
            double turned = re * c - im * s;
            im = re * s + im * c;
            re = turned;
        }
    }
}
