package io.github.polewright.design;

import static org.junit.jupiter.api.Assertions.assertEquals;

import io.github.polewright.ExactGain;
import io.github.polewright.Section;
import io.github.polewright.Table;
import java.math.BigDecimal;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Notch and resonator, which share one all-pass. */
class AllPassFormTest {

    static List<Table.Row> scipy() {
        return Table.rows(AllPassFormTest.class, "notch_peak.csv", ",");
    }

    @ParameterizedTest
    @MethodSource("scipy")
    void coefficientsAsFromSciPy(Table.Row row) {
        double rate = row.number(1);
        double centreHz = row.number(2);
        double q = row.number(3);
        boolean notch = row.text(0).equals("iirnotch");
        Section expected = row.section(4);
        assertClose(expected, notch ? HumNotch.byQ(rate, centreHz, q) : Resonator.byQ(rate, centreHz, q));
        double widthHz = centreHz / q;
        assertClose(
                expected,
                notch ? HumNotch.byWidth(rate, centreHz, widthHz) : Resonator.byWidth(rate, centreHz, widthHz));
    }

    private static void assertClose(Section expected, Section actual) {
        assertEquals(expected.b0(), actual.b0(), 1e-13);
        assertEquals(expected.b1(), actual.b1(), 1e-13);
        assertEquals(expected.b2(), actual.b2(), 1e-13);
        assertEquals(expected.a1(), actual.a1(), 1e-13);
        assertEquals(expected.a2(), actual.a2(), 1e-13);
    }

    /** Edges from the half-angle of the width: {@code cos w1,2} of the all-pass at +-90 degrees, solved in doubles. */
    @ParameterizedTest
    @CsvSource({
        "48000, 50, 1",
        "48000, 50, 60",
        "48000, 12000, 3000",
        "48000, 23000, 1500",
        "8000, 697, 34.85",
        "44100, 100, 15000"
    })
    void edgesAreExactlyTheWidthApart(double rate, double centreHz, double widthHz) {
        Section notch = HumNotch.byWidth(rate, centreHz, widthHz);
        Section peak = Resonator.byWidth(rate, centreHz, widthHz);
        double low = edgeHz(notch, rate, centreHz, 0, 0.5);
        double high = edgeHz(notch, rate, centreHz, rate / 2, 0.5);
        assertEquals(widthHz, high - low, 1e-8 * widthHz);
        assertEquals(-3.010299956639812, ExactGain.db(rate, low, notch), 1e-7);
        assertEquals(-3.010299956639812, ExactGain.db(rate, low, peak), 1e-7);
        assertEquals(-3.010299956639812, ExactGain.db(rate, high, peak), 1e-7);
    }

    private static double edgeHz(Section notch, double rate, double centreHz, double endHz, double power) {
        double inside = centreHz;
        double outside = endHz;
        for (int i = 0; i < 60; i++) {
            double middle = (inside + outside) / 2;
            if (ExactGain.power(rate, middle, notch) < power) {
                inside = middle;
            } else {
                outside = middle;
            }
        }
        return inside;
    }

    /** Gain 1 at DC and Nyquist without any rounding: the coefficients' sums are equal as decimal numbers. */
    @ParameterizedTest
    @CsvSource({
        "48000, 50, 1",
        "192000, 50, 0.5",
        "44100, 59.94, 0.7",
        "8000, 3333.3, 17",
        "96000, 47000, 0.3",
        "48000, 9000, 11000",
        "44100, 5000, 9871.3",
        "48000, 7000, 10234.5",
        "48000, 9000, 20000"
    })
    void unityAtBothEndsToTheLastBit(double rate, double centreHz, double widthHz) {
        for (Section notch : List.of(
                HumNotch.byWidth(rate, centreHz, widthHz),
                HumNotch.byWidth(rate, centreHz, widthHz, 40),
                HumNotch.byWidth(rate, centreHz, widthHz, 3))) {
            BigDecimal even = exact(notch.b0()).add(exact(notch.b2()));
            assertEquals(0, even.compareTo(BigDecimal.ONE.add(exact(notch.a2()))));
            assertEquals(notch.b1(), notch.a1());
        }
        Section peak = Resonator.byWidth(rate, centreHz, widthHz);
        assertEquals(0, peak.b1());
        assertEquals(-peak.b0(), peak.b2());
        assertEquals(0, exact(peak.b0()).add(exact(peak.b0())).compareTo(BigDecimal.ONE.subtract(exact(peak.a2()))));
    }

    private static BigDecimal exact(double value) {
        return new BigDecimal(value);
    }

    @Test
    void centres() {
        Section notch = HumNotch.byWidth(48000, 12000, 100);
        assertEquals(0, ExactGain.power(48000, 12000, notch), 1e-25);
        assertEquals(1, ExactGain.power(48000, 12000, Resonator.byWidth(48000, 12000, 100)), 1e-13);
        assertEquals(1, ExactGain.power(48000, 50, Resonator.byWidth(48000, 50, 5)), 1e-12);
    }

    /** The residue of a line beside the centre is 2 d / width of its amplitude (first order in d). */
    @Test
    void aLineBesideTheCentreIsLeftInProportion() {
        Section notch = HumNotch.byWidth(48000, 50, 1);
        assertEquals(0.034, Math.sqrt(ExactGain.power(48000, 50.017, notch)), 5e-5);
    }

    @ParameterizedTest
    @CsvSource({"48000, 50, 1, 40", "48000, 50, 1, 6", "48000, 12000, 3000, 20", "192000, 60, 2, 60"})
    void depthLimit(double rate, double centreHz, double widthHz, double depthDb) {
        Section notch = HumNotch.byWidth(rate, centreHz, widthHz, depthDb);
        assertEquals(-depthDb, ExactGain.db(rate, centreHz, notch), 1e-6);
        double floorPower = Math.pow(10, -depthDb / 10);
        double low = edgeHz(notch, rate, centreHz, 0, (1 + floorPower) / 2);
        double high = edgeHz(notch, rate, centreHz, rate / 2, (1 + floorPower) / 2);
        assertEquals(widthHz, high - low, 1e-7 * widthHz);
        Section full = HumNotch.byWidth(rate, centreHz, widthHz);
        assertEquals(full.a1(), notch.a1());
        assertEquals(full.a2(), notch.a2());
        assertEquals(notch, HumNotch.byQ(rate, centreHz, centreHz / widthHz, depthDb));
    }
}
