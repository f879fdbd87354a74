package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;

/**
 * How far a cascade in {@code double} may lie from the exact difference equation, from the standard model of rounding
 * (N. Higham, Accuracy and Stability of Numerical Algorithms, 2nd ed., section 2.2): every operation errs by at most
 * u = 2^-53 of its result. What section k errs by in a sample then runs through {@code 1/A_k} and all sections behind,
 * and no further than the sum of that response's magnitudes. Rigorous to first order in u; fused or not.
 */
final class RoundingBound {

    private static final double UNIT = 0x1p-53;

    /** What the guard may have taken away: states below 1e-30, far under any bound that is asked for. */
    private static final double GUARDED = 1e-24;

    private RoundingBound() {}

    /** The bound on every output sample, given the exact signal at every stage. */
    static double of(Cascade cascade, Form form, double[][] stages) {
        double bound = GUARDED;
        int frames = stages[0].length;
        for (int k = 0; k < cascade.sectionCount(); k++) {
            Section s = cascade.section(k);
            double injected = form == Form.DIRECT_FORM_1
                    ? direct(s, peak(stages[k]), peak(stages[k + 1]))
                    : transposed(s, peak(stages[k]), peak(stages[k + 1]));
            bound += injected * magnitudeSum(cascade, k, frames);
        }
        return bound;
    }

    /** Five products and four sums, nine roundings at most, each of no more than the sum of the magnitudes. */
    private static double direct(Section s, double x, double y) {
        double in = Math.abs(s.b0()) + Math.abs(s.b1()) + Math.abs(s.b2());
        double back = Math.abs(s.a1()) + Math.abs(s.a2());
        return 9 * UNIT * (in * x + back * y);
    }

    /**
     * Thirteen roundings at most in the two states and the coefficients e1 and e2, none of more than the sum of the
     * magnitudes that enter it, with |s1| &lt;= |y| + |b0 x| and |s2| &lt;= |b2 x| + |a2 y|; and two in the output,
     * which pass through A before they meet the response of 1/A.
     */
    private static double transposed(Section s, double x, double y) {
        double s1 = y + Math.abs(s.b0()) * x;
        double s2 = Math.abs(s.b2()) * x + Math.abs(s.a2()) * y;
        double back = Math.abs(s.a1()) + Math.abs(s.a2());
        double in = (Math.abs(s.b0()) * back + Math.abs(s.b1()) + Math.abs(s.b2())) * x;
        double output = Math.abs(s.b0()) * x + s1;
        return UNIT * (13 * (back * s1 + s2 + in) + 2 * (1 + back) * output);
    }

    /** The sum of magnitudes of the response of 1/A of section k and all of the sections behind it. */
    private static double magnitudeSum(Cascade cascade, int k, int frames) {
        Section s = cascade.section(k);
        Cascade rest = Cascade.of(cascade.sampleRateHz(), Section.of(1, 0, 0, s.a1(), s.a2()));
        if (k + 1 < cascade.sectionCount()) {
            rest = rest.then(
                    Cascade.of(cascade.sampleRateHz(), cascade.sections().subList(k + 1, cascade.sectionCount())));
        }
        double sum = 0;
        for (double value : Oracle.filter(rest, Signals.impulse(frames))) {
            sum += Math.abs(value);
        }
        return sum;
    }

    static double peak(double[] values) {
        double peak = 0;
        for (double value : values) {
            peak = Math.max(peak, Math.abs(value));
        }
        return peak;
    }
}
