package io.github.polewright.tone;

import io.github.polewright.Section;
import io.github.polewright.design.Cookbook;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Sections at the input rate, then every {@code factor}-th sample is kept: one channel, transposed direct form II. */
final class FrontEnd {

    private static final double SMALLEST = 1e-30;

    private final double sampleRateHz;
    private final int factor;
    private final Section[] sections;
    private final double[] state;
    private int skip;

    private FrontEnd(double sampleRateHz, int factor, List<Section> sections) {
        this.sampleRateHz = sampleRateHz;
        this.factor = factor;
        this.sections = sections.toArray(new Section[0]);
        this.state = new double[2 * sections.size()];
    }

    /**
     * Some sections, and a Butterworth low-pass of order 6 where there is something above it to keep out.
     *
     * @param factor keeps one sample of so many
     * @param lowPassHz corner of the low-pass; infinite for none
     * @param first run before the low-pass; one of them must take out DC
     */
    static FrontEnd of(double sampleRateHz, int factor, double lowPassHz, List<Section> first) {
        List<Section> sections = new ArrayList<>(first);
        if (lowPassHz < sampleRateHz / 2) {
            for (int i = 0; i < 3; i++) {
                double q = 0.5 / Math.sin((2 * i + 1) * Math.PI / 12);
                sections.add(Cookbook.lowPass(sampleRateHz, lowPassHz, q));
            }
        }
        return new FrontEnd(sampleRateHz, factor, sections);
    }

    int factor() {
        return factor;
    }

    double innerRateHz() {
        return sampleRateHz / factor;
    }

    void reset() {
        Arrays.fill(state, 0);
        skip = 0;
    }

    /** Filters {@code count} samples in place and packs those kept to the start; the number kept is the answer. */
    int process(double[] samples, int count) {
        for (int k = 0; k < sections.length; k++) {
            section(sections[k], 2 * k, samples, count);
        }
        int kept = 0;
        int next = skip;
        for (; next < count; next += factor) {
            samples[kept++] = samples[next];
        }
        skip = next - count;
        return kept;
    }

    private void section(Section c, int at, double[] samples, int count) {
        double b0 = c.b0();
        double b1 = c.b1();
        double b2 = c.b2();
        double a1 = c.a1();
        double a2 = c.a2();
        double s1 = state[at];
        double s2 = state[at + 1];
        for (int i = 0; i < count; i++) {
            double x = samples[i];
            double y = b0 * x + s1;
            s1 = b1 * x - a1 * y + s2;
            s2 = b2 * x - a2 * y;
            samples[i] = y;
        }
        state[at] = s1;
        state[at + 1] = s2;
    }

    void guard() {
        for (int i = 0; i < state.length; i++) {
            if (Math.abs(state[i]) < SMALLEST) {
                state[i] = 0;
            }
        }
    }

    boolean isSilent() {
        for (double value : state) {
            if (value != 0) {
                return false;
            }
        }
        return true;
    }

    /** Power gain of the sections at a frequency. */
    double powerGain(double frequencyHz) {
        double gain = 1;
        double w = 2 * Math.PI * frequencyHz / sampleRateHz;
        for (Section c : sections) {
            gain *= power(c.b0(), c.b1(), c.b2(), w) / power(1, c.a1(), c.a2(), w);
        }
        return gain;
    }

    private static double power(double c0, double c1, double c2, double w) {
        double re = c0 + c1 * Math.cos(w) + c2 * Math.cos(2 * w);
        double im = c1 * Math.sin(w) + c2 * Math.sin(2 * w);
        return re * re + im * im;
    }

    /** Group delay of the sections at a frequency, in frames of the input rate. */
    double delayFrames(double frequencyHz) {
        double delay = 0;
        double w = 2 * Math.PI * frequencyHz / sampleRateHz;
        for (Section c : sections) {
            delay += rampedShare(c.b0(), c.b1(), c.b2(), w) - rampedShare(1, c.a1(), c.a2(), w);
        }
        return delay;
    }

    /** Re of (sum of n c_n z^-n) / (sum of c_n z^-n), the group delay of a polynomial in z^-1. */
    private static double rampedShare(double c0, double c1, double c2, double w) {
        double re = c0 + c1 * Math.cos(w) + c2 * Math.cos(2 * w);
        double im = -c1 * Math.sin(w) - c2 * Math.sin(2 * w);
        double rampRe = c1 * Math.cos(w) + 2 * c2 * Math.cos(2 * w);
        double rampIm = -c1 * Math.sin(w) - 2 * c2 * Math.sin(2 * w);
        return (rampRe * re + rampIm * im) / (re * re + im * im);
    }
}
