package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.math.BigDecimal;
import java.math.MathContext;

/**
 * The textbook difference equation {@code y[n] = b0 x[n] + b1 x[n-1] + b2 x[n-2] - a1 y[n-1] - a2 y[n-2]}, section
 * after section over the whole stream, in far higher precision than the code under test.
 */
final class Oracle {

    private static final MathContext DIGITS = new MathContext(50);

    private Oracle() {}

    /** The signal at every stage: row 0 is the input, row k what section k - 1 makes of it, rounded to double. */
    static double[][] stages(Cascade cascade, double[] in) {
        double[][] stages = new double[cascade.sectionCount() + 1][];
        stages[0] = in;
        double[] high = in;
        double[] low = new double[in.length];
        for (int k = 0; k < cascade.sectionCount(); k++) {
            double[] nextHigh = new double[in.length];
            double[] nextLow = new double[in.length];
            section(cascade.section(k), high, low, nextHigh, nextLow);
            high = nextHigh;
            low = nextLow;
            stages[k + 1] = high;
        }
        return stages;
    }

    /** What the cascade makes of a stream that begins in silence. */
    static double[] filter(Cascade cascade, double[] in) {
        return stages(cascade, in)[cascade.sectionCount()];
    }

    private static void section(Section s, double[] xHigh, double[] xLow, double[] yHigh, double[] yLow) {
        TwoDoubles sum = new TwoDoubles();
        for (int n = 0; n < xHigh.length; n++) {
            sum.set(0, 0);
            sum.addProduct(s.b0(), xHigh[n], xLow[n]);
            if (n > 0) {
                sum.addProduct(s.b1(), xHigh[n - 1], xLow[n - 1]);
                sum.addProduct(-s.a1(), yHigh[n - 1], yLow[n - 1]);
            }
            if (n > 1) {
                sum.addProduct(s.b2(), xHigh[n - 2], xLow[n - 2]);
                sum.addProduct(-s.a2(), yHigh[n - 2], yLow[n - 2]);
            }
            yHigh[n] = sum.high;
            yLow[n] = sum.low;
        }
    }

    /** The same in decimal, 50 digits: slow, and only there to vouch for {@link #filter}. */
    static double[] filterInDecimal(Cascade cascade, double[] in) {
        BigDecimal[] signal = new BigDecimal[in.length];
        for (int n = 0; n < in.length; n++) {
            signal[n] = new BigDecimal(in[n]);
        }
        for (Section s : cascade.sections()) {
            signal = sectionInDecimal(s, signal);
        }
        double[] out = new double[in.length];
        for (int n = 0; n < in.length; n++) {
            out[n] = signal[n].doubleValue();
        }
        return out;
    }

    private static BigDecimal[] sectionInDecimal(Section s, BigDecimal[] x) {
        BigDecimal b0 = new BigDecimal(s.b0()), b1 = new BigDecimal(s.b1()), b2 = new BigDecimal(s.b2());
        BigDecimal a1 = new BigDecimal(s.a1()), a2 = new BigDecimal(s.a2());
        BigDecimal[] y = new BigDecimal[x.length];
        for (int n = 0; n < x.length; n++) {
            BigDecimal sum = b0.multiply(x[n]);
            if (n > 0) {
                sum = sum.add(b1.multiply(x[n - 1])).subtract(a1.multiply(y[n - 1]));
            }
            if (n > 1) {
                sum = sum.add(b2.multiply(x[n - 2])).subtract(a2.multiply(y[n - 2]));
            }
            y[n] = sum.round(DIGITS);
        }
        return y;
    }
}
