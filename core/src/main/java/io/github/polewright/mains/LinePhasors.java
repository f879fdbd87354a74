package io.github.polewright.mains;

/** The lines as they stand in the input at the first frame of the next slab: full-rate phasors from the analysis. */
final class LinePhasors {

    final double[] re;
    final double[] im;
    /** Unit phasors of one frame's step a line. */
    final double[] turnRe;

    final double[] turnIm;
    /** The same for a slab's step. */
    final double[] slabTurnRe;

    final double[] slabTurnIm;
    private final Tracker tracker;
    private final LineBank bank;
    private final InputGain[] gains;
    private final double[] cosine;
    private final double[] sine;

    LinePhasors(Tracker tracker) {
        this.tracker = tracker;
        bank = tracker.bank;
        re = new double[bank.size()];
        im = new double[bank.size()];
        turnRe = new double[bank.lines];
        turnIm = new double[bank.lines];
        slabTurnRe = new double[bank.lines];
        slabTurnIm = new double[bank.lines];
        cosine = new double[bank.lines];
        sine = new double[bank.lines];
        Powers.of(0, turnRe, turnIm);
        Powers.of(0, slabTurnRe, slabTurnIm);
        InputGain gain = new InputGain(tracker.rates);
        gains = new InputGain[bank.lines];
        for (int k = 0; k < gains.length; k++) {
            gains[k] = gain.another();
        }
    }

    /** After a tick: the frequency has changed. */
    void retune() {
        double hz = tracker.loop.frequencyHz();
        double turn = 2 * Math.PI * hz / tracker.rates.sampleRateHz;
        Powers.of(turn, turnRe, turnIm);
        Powers.of(turn * tracker.rates.slabFrames, slabTurnRe, slabTurnIm);
        for (int k = 0; k < gains.length; k++) {
            gains[k].at((k + 1) * hz);
        }
    }

    /** At the start of a slab. */
    void place() {
        Powers.of(tracker.nextPhase(), cosine, sine);
        for (int k = 0; k < bank.lines; k++) {
            double gRe = gains[k].re() * cosine[k] - gains[k].im() * sine[k];
            double gIm = gains[k].re() * sine[k] + gains[k].im() * cosine[k];
            for (int i = k; i < re.length; i += bank.lines) {
                re[i] = bank.re[i] * gRe - bank.im[i] * gIm;
                im[i] = bank.re[i] * gIm + bank.im[i] * gRe;
            }
        }
    }

    /** A line's amplitude in the input over its amplitude in the analysis. */
    double inputOverAnalysis(int line) {
        return Math.hypot(gains[line].re(), gains[line].im());
    }
}
