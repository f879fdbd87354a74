package io.github.polewright.mains;

import java.util.Arrays;

/**
 * Subtracts the lines as the follower knows them. The hum of a slab is generated ahead by one two-term recursion a line
 * (y[n+1] = 2 cos w y[n] - y[n-1], restarted each slab, so that rounding cannot grow); where a line's phasor has
 * changed, the difference fades in over the slab.
 */
final class HumSubtraction {

    private final LinePhasors phasors;
    private final int lines;
    private final int frames;
    private final double gainStep;
    private final double[] gain;
    private final double[] re;
    private final double[] im;
    /** The hum of the current slab, {@code [channel][frame]}. */
    private final double[][] hum;

    private final double[] steady;
    private final double[] fresh;
    private boolean idle = true;

    HumSubtraction(Tracker tracker, LinePhasors phasors, double rampSeconds) {
        this.phasors = phasors;
        lines = tracker.bank.lines;
        frames = tracker.rates.slabFrames;
        gainStep = frames / (rampSeconds * tracker.rates.sampleRateHz);
        int size = tracker.bank.size();
        gain = new double[size];
        re = new double[size];
        im = new double[size];
        steady = new double[frames];
        fresh = new double[frames];
        hum = new double[tracker.channels()][frames];
    }

    void reset() {
        Arrays.fill(gain, 0);
        Arrays.fill(re, 0);
        Arrays.fill(im, 0);
        for (double[] channel : hum) {
            Arrays.fill(channel, 0);
        }
        idle = true;
    }

    /** Prepares the next slab; {@code wanted} tells the lines to remove. */
    void prepare(boolean[] wanted) {
        boolean quiet = true;
        for (int i = 0; i < gain.length; i++) {
            double target = wanted[i] ? 1 : 0;
            gain[i] += Math.max(-gainStep, Math.min(gainStep, target - gain[i]));
            quiet &= gain[i] == 0 && re[i] == 0 && im[i] == 0;
        }
        if (quiet && idle) {
            return;
        }
        idle = quiet;
        for (int c = 0; c < hum.length; c++) {
            Arrays.fill(steady, 0);
            Arrays.fill(fresh, 0);
            for (int k = 0; k < lines; k++) {
                line(c * lines + k, k);
            }
            double[] out = hum[c];
            for (int n = 0; n < frames; n++) {
                out[n] = steady[n] + fresh[n] * (n + 0.5) / frames;
            }
        }
    }

    private void line(int i, int k) {
        double changeRe = gain[i] * phasors.re[i] - re[i];
        double changeIm = gain[i] * phasors.im[i] - im[i];
        double scale = re[i] * re[i] + im[i] * im[i];
        if (scale > 0) {
            generate(re[i], im[i], k, steady);
        }
        if (changeRe * changeRe + changeIm * changeIm > 1e-18 * scale) {
            generate(changeRe, changeIm, k, fresh);
            re[i] += changeRe;
            im[i] += changeIm;
        }
        advance(i, k);
    }

    private void generate(double startRe, double startIm, int k, double[] sum) {
        double twice = 2 * phasors.turnRe[k];
        double now = startRe;
        double before = startRe * phasors.turnRe[k] + startIm * phasors.turnIm[k];
        for (int n = 0; n < frames; n++) {
            sum[n] += now;
            double next = twice * now - before;
            before = now;
            now = next;
        }
    }

    /** Carries the phasor to the next slab. */
    private void advance(int i, int k) {
        double slabRe = phasors.slabTurnRe[k];
        double slabIm = phasors.slabTurnIm[k];
        double turned = re[i] * slabRe - im[i] * slabIm;
        im[i] = re[i] * slabIm + im[i] * slabRe;
        re[i] = turned;
        if (gain[i] == 0) {
            re[i] = 0;
            im[i] = 0;
        }
    }

    /** Filters frames in place; the first of them is frame {@code from} of the slab. */
    void run(int channel, double[] data, int offset, int from, int count) {
        if (idle) {
            return;
        }
        double[] h = hum[channel];
        for (int n = 0; n < count; n++) {
            data[offset + n] -= h[from + n];
        }
    }
}
