package io.github.polewright;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class SectionTest {

    private static final Section SECTION = Section.of(1, 2, 3, -0.5, 0.25);

    @Test
    void keepsItsCoefficients() {
        assertEquals(1, SECTION.b0());
        assertEquals(2, SECTION.b1());
        assertEquals(3, SECTION.b2());
        assertEquals(-0.5, SECTION.a1());
        assertEquals(0.25, SECTION.a2());
    }

    @Test
    void dividesByTheLeadingCoefficient() {
        assertEquals(SECTION, Section.normalized(4, 8, 12, 4, -2, 1));
        assertEquals(SECTION, Section.normalized(-4, -8, -12, -4, 2, -1));
    }

    @Test
    void equalityIsOfEveryCoefficient() {
        assertEquals(SECTION, Section.of(1, 2, 3, -0.5, 0.25));
        assertEquals(SECTION.hashCode(), Section.of(1, 2, 3, -0.5, 0.25).hashCode());
        assertNotEquals(SECTION, Section.of(1.5, 2, 3, -0.5, 0.25));
        assertNotEquals(SECTION, Section.of(1, 2.5, 3, -0.5, 0.25));
        assertNotEquals(SECTION, Section.of(1, 2, 3.5, -0.5, 0.25));
        assertNotEquals(SECTION, Section.of(1, 2, 3, -0.75, 0.25));
        assertNotEquals(SECTION, Section.of(1, 2, 3, -0.5, Math.nextUp(0.25)));
        assertNotEquals(SECTION, "b 1.0 2.0 3.0 / a 1 -0.5 0.25");
    }

    @Test
    void negativeZeroIsZero() {
        Section negative = Section.of(1, -0.0, -0.0, -0.0, -0.0);
        assertEquals(Section.PASS_THROUGH, negative);
        assertEquals(Section.PASS_THROUGH.hashCode(), negative.hashCode());
        assertEquals(Section.PASS_THROUGH.toString(), negative.toString());
    }

    @Test
    void textShowsEveryDigit() {
        assertEquals("b 1.0 2.0 3.0 / a 1 -0.5 0.25", SECTION.toString());
        assertTrue(Section.of(0.1 + 0.2, 0, 0, 0, 0).toString().contains("0.30000000000000004"));
    }

    @Test
    void scalesTheNumeratorOnly() {
        assertEquals(Section.of(-2, -4, -6, -0.5, 0.25), SECTION.scaledBy(-2));
        assertThrows(IllegalArgumentException.class, () -> SECTION.scaledBy(Double.NaN));
        assertThrows(IllegalArgumentException.class, () -> SECTION.scaledBy(Double.MAX_VALUE));
    }

    /** Poles by hand: {@code z^2 + a1 z + a2 = (z - p)(z - q)}. */
    @ParameterizedTest
    @CsvSource({
        "0, 0, true",
        "-1.8, 0.81, true", // 0.9 twice
        "-1.9, 0.9, false", // 1 and 0.9
        "1.9, 0.9, false", // -1 and -0.9
        "0, 1, false", // +-j
        "0, -1, false", // 1 and -1
        "0, 0.99, true",
        "-2.5, 1, false", // 2 and 0.5
        "-1, 0, false",
        "1, 0, false",
        "-0.999, 0, true",
        "0, 1.5, false",
        "-0.5, -0.6, false" // 1.06 and -0.56
    })
    void stableInsideTheTriangle(double a1, double a2, boolean stable) {
        assertEquals(stable, Section.of(1, 0, 0, a1, a2).isStable());
    }

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
    void refusesWhatIsNotFinite(double bad) {
        for (int place = 0; place < 5; place++) {
            double[] c = new double[5];
            c[place] = bad;
            String message = assertThrows(
                            IllegalArgumentException.class, () -> Section.of(c[0], c[1], c[2], c[3], c[4]))
                    .getMessage();
            String name = new String[] {"b0", "b1", "b2", "a1", "a2"}[place];
            assertEquals(name + " is " + bad + "; it must be finite", message);
        }
        assertThrows(IllegalArgumentException.class, () -> Section.normalized(1, 0, 0, bad, 0, 0));
    }

    @Test
    void refusesALeadingZero() {
        String message = assertThrows(IllegalArgumentException.class, () -> Section.normalized(1, 0, 0, 0, 0, 0))
                .getMessage();
        assertTrue(message.startsWith("a0 is 0"), message);
        assertFalse(Double.isFinite(1 / Double.MIN_VALUE));
        assertThrows(IllegalArgumentException.class, () -> Section.normalized(1, 0, 0, Double.MIN_VALUE, 0, 0));
    }
}
