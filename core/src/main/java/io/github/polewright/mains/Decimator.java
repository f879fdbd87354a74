package io.github.polewright.mains;

import java.util.Arrays;

/** One channel's way from the sample rate to the analysis rate: low-pass, keep every n-th, high-pass. */
final class Decimator {

    /** Two of them: what lies below the mains leaks into a tick's fundamental. */
    private static final double HIGH_PASS_HZ = 30;

    private static final double LOUDEST = 1e9;
    private static final double QUIET = 1e-30;

    private final int factor;
    private final double[] taps;
    private final double[] history;
    private final double pole;
    private double before;
    private double held;
    private double beforeHeld;
    private double heldTwice;

    Decimator(Rates rates) {
        factor = rates.factor;
        taps = taps(rates);
        history = new double[taps.length - 1 + rates.slabFrames];
        pole = pole(rates);
    }

    static double[] taps(Rates rates) {
        return WindowedSinc.taps(8 * rates.factor + 1, 0.475 / rates.factor);
    }

    /** Frames from the input to the middle of the taps. */
    static int delayFrames(Rates rates) {
        return 4 * rates.factor;
    }

    static double pole(Rates rates) {
        return Math.exp(-2 * Math.PI * HIGH_PASS_HZ / rates.analysisHz);
    }

    /** Takes one slab of finite samples and writes its analysis samples. */
    void run(double[] slab, int frames, double[] analysis) {
        int past = taps.length - 1;
        for (int i = 0; i < frames; i++) {
            double u = slab[i];
            history[past + i] = u > LOUDEST ? LOUDEST : Math.max(u, -LOUDEST);
        }
        int half = past / 2;
        int step = 0;
        for (int end = factor - 1; end < frames; end += factor) {
            double sum = taps[half] * history[end + half];
            for (int i = 0; i < half; i++) {
                sum += taps[i] * (history[end + i] + history[end + past - i]);
            }
            held = quiet(pole * held + 0.5 * (1 + pole) * (sum - before));
            before = sum;
            heldTwice = quiet(pole * heldTwice + 0.5 * (1 + pole) * (held - beforeHeld));
            beforeHeld = held;
            analysis[step++] = heldTwice;
        }
        System.arraycopy(history, frames, history, 0, past);
    }

    private static double quiet(double value) {
        return Math.abs(value) < QUIET ? 0 : value;
    }

    void reset() {
        Arrays.fill(history, 0);
        before = 0;
        held = 0;
        beforeHeld = 0;
        heldTwice = 0;
    }
}
