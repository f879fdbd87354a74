package io.github.polewright.mains;

/** What the analysis filters do to a line, so that its amplitude can be told as it stands in the input. */
final class InputGain {

    private static final int TABLE = 512;

    private final double analysisHz;
    private final double[] lowPass;
    private final double half;
    private final double pole;
    private double re = 1;
    private double im;

    InputGain(Rates rates) {
        analysisHz = rates.analysisHz;
        lowPass = new double[TABLE + 2];
        double[] taps = Decimator.taps(rates);
        for (int i = 0; i < lowPass.length; i++) {
            lowPass[i] = WindowedSinc.gain(taps, 0.5 * i / TABLE / rates.factor);
        }
        pole = Decimator.pole(rates);
        half = (1 + pole) / 2;
    }

    private InputGain(InputGain like) {
        analysisHz = like.analysisHz;
        lowPass = like.lowPass;
        half = like.half;
        pole = like.pole;
    }

    /** One more for another line; the table is shared. */
    InputGain another() {
        return new InputGain(this);
    }

    /** Sets {@link #re} and {@link #im} to one over the filters' gain, delay not counted. */
    void at(double frequencyHz) {
        double position = Math.min(frequencyHz / analysisHz * 2 * TABLE, TABLE);
        int i = (int) position;
        double low = lowPass[i] + (position - i) * (lowPass[i + 1] - lowPass[i]);
        double w = 2 * Math.PI * frequencyHz / analysisHz;
        double c = Math.cos(w);
        double s = Math.sin(w);
        // (1 - pole z^-1) / (half (1 - z^-1)), by the conjugate of 1 - z^-1; squared, for there are two.
        double square = half * 2 * (1 - c);
        double onceRe = ((1 - pole * c) * (1 - c) + pole * s * s) / square;
        double onceIm = (pole * s * (1 - c) - (1 - pole * c) * s) / square;
        re = (onceRe * onceRe - onceIm * onceIm) / low;
        im = 2 * onceRe * onceIm / low;
    }

    double re() {
        return re;
    }

    double im() {
        return im;
    }
}
