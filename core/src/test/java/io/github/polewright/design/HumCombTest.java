package io.github.polewright.design;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.ExactGain;
import io.github.polewright.Section;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class HumCombTest {

    private static final double RATE = 48000;

    @Test
    void tenNarrowLinesUnlessToldOtherwise() {
        Cascade comb = HumComb.at(50).design(RATE);
        assertEquals(RATE, comb.sampleRateHz());
        assertEquals(10, comb.sectionCount());
        for (int i = 0; i < 10; i++) {
            assertEquals(HumNotch.byWidth(RATE, 50 * (i + 1), 0.5), comb.section(i));
        }
    }

    @Test
    void takesOutItsLinesAndLeavesTheRest() {
        Cascade comb = HumComb.at(60).lines(6).widthHz(1).design(RATE);
        for (int line = 1; line <= 6; line++) {
            assertTrue(ExactGain.power(60 * line, comb) < 1e-12, "line " + line);
            assertEquals(1, ExactGain.power(60 * line + 30, comb), 4e-3);
        }
        assertEquals(1, ExactGain.power(420, comb), 1e-3);
        assertEquals(1, ExactGain.power(0, comb), 1e-15);
        assertEquals(1, ExactGain.power(RATE / 2, comb), 1e-15);
    }

    @Test
    void evenOddAll() {
        HumComb comb = HumComb.at(50).lines(3);
        assertLines(comb.evenLines().design(RATE), 100, 200, 300);
        assertLines(comb.oddLines().design(RATE), 50, 150, 250);
        assertLines(comb.oddLines().allLines().design(RATE), 50, 100, 150);
    }

    private static void assertLines(Cascade comb, double... centresHz) {
        assertEquals(centresHz.length, comb.sectionCount());
        for (int i = 0; i < centresHz.length; i++) {
            assertEquals(HumNotch.byWidth(RATE, centresHz[i], 0.5), comb.section(i));
        }
    }

    @Test
    void widthsGrowWithTheLine() {
        Cascade comb =
                HumComb.at(50).lines(4).widthHz(0.4).widthGrowing().oddLines().design(RATE);
        for (int i = 0; i < 4; i++) {
            int line = 2 * i + 1;
            assertEquals(HumNotch.byWidth(RATE, 50.0 * line, 0.4 * line), comb.section(i));
        }
    }

    @Test
    void depthForEveryLine() {
        Cascade comb = HumComb.at(50).lines(5).depthDb(30).design(RATE);
        for (int i = 0; i < 5; i++) {
            Section notch = comb.section(i);
            assertEquals(-30, ExactGain.db(RATE, 50 * (i + 1), notch), 1e-6);
            assertEquals(HumNotch.byWidth(RATE, 50 * (i + 1), 0.5, 30), notch);
        }
    }

    /** Counts by hand: centres below half the rate, less half the width. */
    @ParameterizedTest
    @CsvSource({
        "1000, 50, 0.5, 9", // 500 is Nyquist itself
        "1001, 50, 0.5, 10", // 500 + 0.25 < 500.5
        "1001, 50, 1.5, 9", // 500 + 0.75 is above it
        "8000, 60, 0.5, 66",
        "130, 50, 0.5, 1"
    })
    void linesThatDoNotFitAreLeftOut(double rate, double fundamentalHz, double widthHz, int expected) {
        HumComb comb = HumComb.at(fundamentalHz).widthHz(widthHz);
        assertEquals(expected, comb.linesToNyquist().design(rate).sectionCount());
        assertEquals(1, comb.lines(1).design(rate).sectionCount());
    }

    /** Notches as wide as their distance are no comb; below that the lowest line always fits above 0. */
    @Test
    void aWidthOfTheFundamentalOrMoreIsRefused() {
        String refused = "widthHz is 50.0; it must be above 0 and below 50.0, the fundamental";
        HumComb comb = HumComb.at(50);
        assertEquals(
                refused,
                assertThrows(IllegalArgumentException.class, () -> comb.widthHz(50))
                        .getMessage());
        Cascade wide = comb.widthHz(Math.nextDown(50.0)).lines(2).design(RATE);
        assertEquals(HumNotch.byWidth(RATE, 50, Math.nextDown(50.0)), wide.section(0));
        assertEquals(2, wide.sectionCount());
        assertRefused(HumComb.at(0.4), RATE, "widthHz is 0.5; it must be above 0 and below 0.4");
        assertEquals(10, HumComb.at(0.4).widthHz(0.1).design(RATE).sectionCount());
    }

    @Test
    void refusesWhereNothingFits() {
        assertRefused(HumComb.at(4000), 8000, "fundamentalHz is 4000.0");
        assertRefused(HumComb.at(50).evenLines(), 150, "fundamentalHz is 50.0");
        assertRefused(HumComb.at(50).widthHz(1e-13), 48000, "widthHz is 1.0E-13");
    }

    private static void assertRefused(HumComb comb, double rate, String part) {
        String message = assertThrows(IllegalArgumentException.class, () -> comb.design(rate))
                .getMessage();
        assertTrue(message.contains(part), message);
    }

    @Test
    void aWishIsAValue() {
        HumComb wish = HumComb.at(50);
        HumComb changed = wish.lines(3).depthDb(40).widthHz(1).widthGrowing().evenLines();
        assertEquals(wish, HumComb.at(50));
        assertEquals(wish.hashCode(), HumComb.at(50).hashCode());
        assertEquals(
                changed,
                HumComb.at(50).evenLines().widthGrowing().widthHz(1).depthDb(40).lines(3));
        assertNotEquals(wish, wish.lines(11));
        assertNotEquals(wish, wish.widthHz(1));
        assertNotEquals(wish, wish.widthGrowing());
        assertNotEquals(wish, wish.oddLines());
        assertNotEquals(wish.evenLines(), wish.oddLines());
        assertNotEquals(wish, wish.depthDb(40));
        assertNotEquals(wish, HumComb.at(60));
        assertEquals("comb at 50.0 Hz, all lines, at most 10, width 0.5 Hz", wish.toString());
        assertEquals(
                "comb at 50.0 Hz, even lines, at most 3, width 1.0 Hz times the line, depth 40.0 dB",
                changed.toString());
        assertTrue(wish.oddLines().linesToNyquist().toString().contains("odd lines to Nyquist"));
    }
}
