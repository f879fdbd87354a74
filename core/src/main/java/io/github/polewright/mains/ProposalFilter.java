package io.github.polewright.mains;

import java.util.Arrays;

/** From the analysis rate to a quarter of it, all channels together. */
final class ProposalFilter {

    private static final int TAPS = 129;

    private final double[] taps = WindowedSinc.taps(TAPS, 0.49 / Rates.PROPOSAL_FACTOR);
    private final double[][] history;
    private final double[] output;
    private int count;

    ProposalFilter(int channels) {
        history = new double[channels][2 * TAPS];
        output = new double[channels];
    }

    /** Takes one sample a channel; true when {@link #output} holds a new one. */
    boolean push(double[] sample) {
        int place = count % TAPS;
        count++;
        for (int c = 0; c < output.length; c++) {
            history[c][place] = sample[c];
            history[c][place + TAPS] = sample[c];
        }
        if (count % Rates.PROPOSAL_FACTOR != 0) {
            return false;
        }
        for (int c = 0; c < output.length; c++) {
            double sum = 0;
            for (int i = 0; i < TAPS; i++) {
                sum += taps[i] * history[c][place + 1 + i];
            }
            output[c] = sum;
        }
        if (count == TAPS * Rates.PROPOSAL_FACTOR) {
            count = 0;
        }
        return true;
    }

    double[] output() {
        return output;
    }

    void reset() {
        for (double[] channel : history) {
            Arrays.fill(channel, 0);
        }
        count = 0;
    }
}
