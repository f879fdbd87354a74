package io.github.polewright.mains;

import java.util.Arrays;

/**
 * A notch a line and channel, {@code (1 + A)/2} with the second-order all-pass A in the normalised lattice (P. A.
 * Regalia, from memory): with u the input, s2 = (1-t)/(1+t), t = tan(pi width/rate), c2 = sqrt(1-s2^2), w the line,
 *
 * <pre>A = s2 u + c2 x2;  f = c2 u - s2 x2;  x1' = sin(w) f + cos(w) x1;  x2' = -cos(w) f + sin(w) x1</pre>
 *
 * <p>Why retuning cannot blow up: the state turns by an orthogonal matrix times diag(1, -s2), so at any frequency its
 * norm never grows by itself; input adds at most c2 |u|. A steady line of phasor v holds the state at
 * {@code (Im v, -Re v)/sqrt(t)}. A change of width rescales the state by {@code sqrt(t before / t after)}, so that
 * {@code sqrt(t) |x|}, the line's amplitude as the notch holds it, stays what it was: it never grows without input
 * whatever the order of frequency and width changes, and the factor itself never exceeds sqrt(4 Hz / 0.25 Hz) = 4.
 * The same relation sets the state from the follower's phasor when a notch is switched on: it opens without ringing in.
 */
final class NotchBank {

    static final double NARROWEST_HZ = 0.25;
    static final double WIDEST_HZ = 4;
    private static final double QUIET = 1e-30;

    private final LinePhasors phasors;
    private final int lines;
    private final double sampleRateHz;
    private final int frames;
    private final double halfStep;
    private final double[] half;
    private final double[] halfTurn;
    private final double[] widthHz;
    private final double[] tangent;
    private final double[] s2;
    private final double[] c2;
    private final double[] x1;
    private final double[] x2;
    private final double[] cosine;
    private final double[] sine;

    NotchBank(Tracker tracker, LinePhasors phasors, double rampSeconds) {
        this.phasors = phasors;
        lines = tracker.bank.lines;
        sampleRateHz = tracker.rates.sampleRateHz;
        frames = tracker.rates.slabFrames;
        halfStep = 0.5 * frames / (rampSeconds * sampleRateHz);
        int size = tracker.bank.size();
        half = new double[size];
        halfTurn = new double[size];
        widthHz = new double[size];
        tangent = new double[size];
        s2 = new double[size];
        c2 = new double[size];
        x1 = new double[size];
        x2 = new double[size];
        cosine = new double[lines];
        sine = new double[lines];
    }

    void reset() {
        Arrays.fill(half, 0);
        Arrays.fill(halfTurn, 0);
        Arrays.fill(x1, 0);
        Arrays.fill(x2, 0);
    }

    boolean isOpen(int i) {
        return half[i] > 0;
    }

    double widthHz(int i) {
        return widthHz[i];
    }

    /** The amplitude a notch holds: the norm that no retuning makes grow. */
    double amplitude(int i) {
        return Math.sqrt(tangent[i]) * Math.hypot(x1[i], x2[i]);
    }

    /** Sets a line's width; the amplitude it holds stays. */
    void width(int i, double hz) {
        double before = tangent[i];
        widthHz[i] = hz;
        tangent[i] = Math.tan(Math.PI * hz / sampleRateHz);
        s2[i] = (1 - tangent[i]) / (1 + tangent[i]);
        c2[i] = 2 * Math.sqrt(tangent[i]) / (1 + tangent[i]);
        if (half[i] > 0) {
            double factor = Math.sqrt(before / tangent[i]);
            x1[i] *= factor;
            x2[i] *= factor;
        }
    }

    /** Sets the amplitude a notch holds to what the follower knows. */
    void adopt(int i) {
        double scale = 1 / Math.sqrt(tangent[i]);
        x1[i] = scale * phasors.im[i];
        x2[i] = -scale * phasors.re[i];
    }

    /** Turns the amplitudes all notches hold as the follower turns its phase: a rotation, so no norm grows. */
    void rotate(double radians) {
        Powers.of(radians, cosine, sine);
        for (int i = 0; i < half.length; i++) {
            int k = i % lines;
            double turned = x1[i] * cosine[k] - x2[i] * sine[k];
            x2[i] = x1[i] * sine[k] + x2[i] * cosine[k];
            x1[i] = turned;
        }
    }

    /** The same for all notches that run. */
    void adoptOpen() {
        for (int i = 0; i < half.length; i++) {
            if (half[i] > 0) {
                adopt(i);
            }
        }
    }

    /** Prepares the next slab; {@code wanted} tells the lines to remove. */
    void prepare(boolean[] wanted) {
        for (int i = 0; i < half.length; i++) {
            half[i] += halfTurn[i] * frames;
            double target = wanted[i] ? 0.5 : 0;
            if (Math.abs(target - half[i]) < 1e-9) {
                half[i] = target;
            }
            if (half[i] == 0 && wanted[i]) {
                adopt(i);
            }
            double move = Math.max(-halfStep, Math.min(halfStep, target - half[i]));
            halfTurn[i] = move / frames;
            x1[i] = Math.abs(x1[i]) < QUIET ? 0 : x1[i];
            x2[i] = Math.abs(x2[i]) < QUIET ? 0 : x2[i];
        }
    }

    /** Filters frames in place; the first of them is frame {@code from} of the slab. */
    void run(int channel, double[] data, int offset, int from, int count) {
        for (int k = 0; k < lines; k++) {
            int i = channel * lines + k;
            if (half[i] > 0 || halfTurn[i] > 0) {
                section(i, k, data, offset, from, count);
            }
        }
    }

    private void section(int i, int k, double[] data, int offset, int from, int count) {
        double sine = phasors.turnIm[k];
        double cosine = phasors.turnRe[k];
        double s = s2[i];
        double c = c2[i];
        double turn = halfTurn[i];
        double mix = half[i] + halfTurn[i] * from;
        double a = x1[i];
        double b = x2[i];
        for (int n = offset; n < offset + count; n++) {
            double u = data[n];
            double f = c * u - s * b;
            data[n] = u + (mix + turn * (n - offset)) * (s * u + c * b - u);
            double next = sine * f + cosine * a;
            b = sine * a - cosine * f;
            a = next;
        }
        x1[i] = a;
        x2[i] = b;
    }

    /** Whether a channel's states are finite; if not they are cleared. */
    boolean isSound(int channel) {
        boolean sound = true;
        for (int i = channel * lines; i < (channel + 1) * lines; i++) {
            if (!(Math.abs(x1[i]) + Math.abs(x2[i]) < Double.POSITIVE_INFINITY)) {
                x1[i] = 0;
                x2[i] = 0;
                sound = false;
            }
        }
        return sound;
    }
}
