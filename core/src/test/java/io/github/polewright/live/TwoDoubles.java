package io.github.polewright.live;

/**
 * A running sum in twice the precision of {@code double}, about 106 bits: Knuth's two-sum and Dekker's two-product
 * (T. J. Dekker, A floating-point technique for extending the available precision, Numer. Math. 18, 1971). No fused
 * multiply-add, so that it does not share the arithmetic under test.
 */
final class TwoDoubles {

    private static final double SPLITTER = 0x1p27 + 1;

    double high;
    double low;

    void set(double newHigh, double newLow) {
        high = newHigh;
        low = newLow;
    }

    /** Adds {@code factor * (h + l)}. */
    void addProduct(double factor, double h, double l) {
        double product = factor * h;
        double f1 = upper(factor), f2 = factor - f1;
        double h1 = upper(h), h2 = h - h1;
        double error = ((f1 * h1 - product) + f1 * h2 + f2 * h1) + f2 * h2;
        add(product, error + factor * l);
    }

    private void add(double h, double l) {
        double sum = high + h;
        double part = sum - high;
        double error = (high - (sum - part)) + (h - part);
        double rest = error + low + l;
        high = sum + rest;
        low = rest - (high - sum);
    }

    private static double upper(double value) {
        double scaled = SPLITTER * value;
        return scaled - (scaled - value);
    }
}
