package io.github.polewright.design;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.ExactGain;
import io.github.polewright.Section;
import io.github.polewright.Table;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

class CookbookTest {

    /** The note's own formulas in another language, each checked against a bilinear transform of its prototype. */
    static List<Table.Row> note() {
        return Table.rows(CookbookTest.class, "cookbook.csv", ",");
    }

    @ParameterizedTest
    @MethodSource("note")
    void coefficientsOfTheNote(Table.Row row) {
        Section expected = row.section(5);
        Section actual = byName(row.text(0), row.number(1), row.number(2), row.number(3), row.number(4));
        assertAll(
                () -> assertClose(expected.b0(), actual.b0()),
                () -> assertClose(expected.b1(), actual.b1()),
                () -> assertClose(expected.b2(), actual.b2()),
                () -> assertClose(expected.a1(), actual.a1()),
                () -> assertClose(expected.a2(), actual.a2()));
    }

    @Test
    void theTableHoldsEveryShape() {
        assertEquals(36, note().size());
        assertEquals(9, note().stream().map(row -> row.text(0)).distinct().count());
    }

    private static void assertClose(double expected, double actual) {
        assertEquals(expected, actual, 1e-9 * Math.abs(expected));
    }

    private static Section byName(String name, double rate, double hertz, double q, double gainDb) {
        return switch (name) {
            case "lpf" -> Cookbook.lowPass(rate, hertz, q);
            case "hpf" -> Cookbook.highPass(rate, hertz, q);
            case "bpf_skirt" -> Cookbook.bandPassSkirt(rate, hertz, q);
            case "bpf_0db" -> Cookbook.bandPassPeak(rate, hertz, q);
            case "notch" -> Cookbook.notch(rate, hertz, q);
            case "apf" -> Cookbook.allPass(rate, hertz, q);
            case "peaking" -> Cookbook.peaking(rate, hertz, q, gainDb);
            case "lowshelf" -> Cookbook.lowShelf(rate, hertz, q, gainDb);
            case "highshelf" -> Cookbook.highShelf(rate, hertz, q, gainDb);
            default -> throw new AssertionError(name);
        };
    }

    /** Gains that follow from the prototypes: DC and Nyquist map to s = 0 and infinity, the centre to s = j. */
    @ParameterizedTest
    @CsvSource({"48000, 1000, 0.7071067811865476, 6", "48000, 40, 3, -9", "44100, 15000, 0.5, 12", "96000, 50, 12, 3.5"
    })
    void exactGains(double rate, double hertz, double q, double gainDb) {
        double gain = Math.pow(10, gainDb / 20);
        double half = Math.sqrt(gain);
        assertGains(Cookbook.lowPass(rate, hertz, q), rate, hertz, 1, q, 0);
        assertGains(Cookbook.highPass(rate, hertz, q), rate, hertz, 0, q, 1);
        assertGains(Cookbook.bandPassSkirt(rate, hertz, q), rate, hertz, 0, q, 0);
        assertGains(Cookbook.bandPassPeak(rate, hertz, q), rate, hertz, 0, 1, 0);
        assertGains(Cookbook.notch(rate, hertz, q), rate, hertz, 1, 0, 1);
        assertGains(Cookbook.allPass(rate, hertz, q), rate, hertz, 1, 1, 1);
        assertGains(Cookbook.peaking(rate, hertz, q, gainDb), rate, hertz, 1, gain, 1);
        assertGains(Cookbook.lowShelf(rate, hertz, q, gainDb), rate, hertz, gain, half, 1);
        assertGains(Cookbook.highShelf(rate, hertz, q, gainDb), rate, hertz, 1, half, gain);
    }

    private static void assertGains(Section section, double rate, double hertz, double dc, double mid, double top) {
        assertEquals(dc, Math.sqrt(ExactGain.power(rate, 0, section)), 1e-9);
        assertEquals(mid, Math.sqrt(ExactGain.power(rate, hertz, section)), 1e-9 * Math.max(1, mid));
        assertEquals(top, Math.sqrt(ExactGain.power(rate, rate / 2, section)), 1e-9);
    }

    @ParameterizedTest
    @CsvSource({"48000, 3000, 0.7, 12", "44100, 60, 2, -20"})
    void peakingIsUndoneByItsOpposite(double rate, double hertz, double q, double gainDb) {
        Section up = Cookbook.peaking(rate, hertz, q, gainDb);
        Section down = Cookbook.peaking(rate, hertz, q, -gainDb);
        for (double f = 0; f <= rate / 2; f += rate / 37) {
            assertEquals(1, ExactGain.power(rate, f, up) * ExactGain.power(rate, f, down), 1e-9);
        }
    }

    @Test
    void zeroDecibelsChangesNothing() {
        for (Section flat : List.of(
                Cookbook.peaking(48000, 1000, 2, 0),
                Cookbook.lowShelf(48000, 1000, 0.7, 0),
                Cookbook.highShelf(48000, 1000, 0.7, 0))) {
            assertEquals(flat.b1(), flat.a1(), 1e-15);
            assertEquals(flat.b2(), flat.a2(), 1e-15);
            assertEquals(1, flat.b0(), 1e-15);
        }
    }

    /**
     * A low-pass of 1/128 Hz at 192 kHz: {@code b0 = sin^2(w0/2) / (1 + alpha)} has 15 digits left only if
     * {@code 1 - cos w0} is not taken as a difference. Expected value from the power series of sine.
     */
    @Test
    void lowCornersKeepTheirDigits() {
        double half = Math.PI / 128 / 192000;
        double sin = half - half * half * half / 6;
        double alpha = half * (1 - 2 * half * half / 3) / 0.7;
        double expected = sin * sin / (1 + alpha);
        assertEquals(expected, Cookbook.lowPass(192000, 1.0 / 128, 0.7).b0(), 1e-14 * expected);
        Section high = Cookbook.highPass(192000, 96000 - 1.0 / 128, 0.7);
        assertEquals(expected, high.b0(), 1e-14 * expected);
    }

    /**
     * Widths measured by root search on the note's formulas: the bandwidth formula is not exact after the transform.
     */
    @ParameterizedTest
    @CsvSource({"0.1, 0.099998", "1, 0.997976", "2, 1.983098"})
    void octavesAsMeasured(double octaves, double measured) {
        double q = Cookbook.qOfOctaves(48000, 3000, octaves);
        Section band = Cookbook.bandPassPeak(48000, 3000, q);
        double low = halfPowerHz(band, 3000, 1);
        double high = halfPowerHz(band, 3000, 23999);
        assertEquals(measured, Math.log(high / low) / Math.log(2), 6e-7);
    }

    private static double halfPowerHz(Section section, double insideHz, double outsideHz) {
        double inside = insideHz;
        double outside = outsideHz;
        for (int i = 0; i < 60; i++) {
            double middle = (inside + outside) / 2;
            if (ExactGain.power(48000, middle, section) > 0.5) {
                inside = middle;
            } else {
                outside = middle;
            }
        }
        return inside;
    }

    /** Values worked by hand from {@code 1/Q = sqrt((A + 1/A)(1/S - 1) + 2)}. */
    @Test
    void slopes() {
        assertEquals(Math.sqrt(0.5), Cookbook.qOfSlope(1, 12), 1e-15);
        assertEquals(Math.sqrt(0.5), Cookbook.qOfSlope(1, -3), 1e-15);
        assertEquals(0.5, Cookbook.qOfSlope(0.5, 0), 1e-15); // sqrt(2 (2 - 1) + 2) = 2
        double a = Math.pow(10, 12.0 / 40);
        assertEquals(1 / Math.sqrt((a + 1 / a) * 0.25 + 2), Cookbook.qOfSlope(0.8, 12), 1e-15);
        assertTrue(Cookbook.qOfSlope(2, 6) > 1);
    }

    /** A slope of 1 is monotonic, a steeper one overshoots (the note's definition of the parameter). */
    @Test
    void slopeOneIsTheSteepestMonotonicOne() {
        assertTrue(overshootDb(1) < 1e-9);
        assertTrue(overshootDb(1.2) > 0.01);
    }

    private static double overshootDb(double slope) {
        Section shelf = Cookbook.lowShelf(48000, 500, Cookbook.qOfSlope(slope, 12), 12);
        double most = 0;
        for (double f = 0; f <= 24000; f += 100) {
            double db = ExactGain.db(48000, f, shelf);
            most = Math.max(most, Math.max(db - 12, -db));
        }
        return most;
    }
}
