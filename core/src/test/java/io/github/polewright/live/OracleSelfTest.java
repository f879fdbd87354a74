package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import io.github.polewright.Section;
import org.junit.jupiter.api.Test;

/** Vouches for the oracle itself: decimal arithmetic of 50 digits, and a closed form. */
class OracleSelfTest {

    @Test
    void agreesWithDecimalArithmeticToTheLastBit() {
        double[] in = Signals.noise(1, 1, 400)[0];
        for (int sections = 1; sections <= 5; sections++) {
            var cascade = Designs.mixed(sections, sections);
            double[] expected = Oracle.filterInDecimal(cascade, in);
            double[] actual = Oracle.filter(cascade, in);
            for (int n = 0; n < in.length; n++) {
                assertEquals(expected[n], actual[n], Math.ulp(expected[n]) / 2, "frame " + n);
            }
        }
    }

    /** A pole pair of radius r at angle w rings as r^n sin((n + 1) w) / sin w. */
    @Test
    void agreesWithTheClosedFormOfAPolePair() {
        double r = 0.99, w = 0.3;
        var cascade = Designs.cascade(Section.of(1, 0, 0, -2 * r * Math.cos(w), r * r));
        double[] expected = new double[500];
        for (int n = 0; n < expected.length; n++) {
            expected[n] = Math.pow(r, n) * Math.sin((n + 1) * w) / Math.sin(w);
        }
        assertArrayEquals(expected, Oracle.filter(cascade, Signals.impulse(500)), 1e-12);
    }
}
