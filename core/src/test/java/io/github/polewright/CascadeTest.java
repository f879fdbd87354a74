package io.github.polewright;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class CascadeTest {

    private static final Section FIRST = Section.of(2, 1, 0, -0.5, 0);
    private static final Section SECOND = Section.of(3, 0, 1, 0, 0.5);
    private static final Cascade CASCADE = Cascade.of(48000, FIRST, SECOND);

    @Test
    void keepsRateAndOrder() {
        assertEquals(48000, CASCADE.sampleRateHz());
        assertEquals(2, CASCADE.sectionCount());
        assertEquals(FIRST, CASCADE.section(0));
        assertEquals(SECOND, CASCADE.section(1));
        assertEquals(List.of(FIRST, SECOND), CASCADE.sections());
        assertThrows(IndexOutOfBoundsException.class, () -> CASCADE.section(2));
        assertThrows(IndexOutOfBoundsException.class, () -> CASCADE.section(-1));
    }

    @Test
    void equalityIsOfRateSectionsAndOrder() {
        Cascade same = Cascade.of(48000, List.of(FIRST, SECOND));
        assertEquals(CASCADE, same);
        assertEquals(CASCADE.hashCode(), same.hashCode());
        assertNotEquals(CASCADE, Cascade.of(44100, FIRST, SECOND));
        assertNotEquals(CASCADE, Cascade.of(48000, SECOND, FIRST));
        assertNotEquals(CASCADE, Cascade.of(48000, FIRST));
        assertNotEquals(CASCADE, CASCADE.sections());
    }

    @Test
    void textHasALineForEachSection() {
        String end = System.lineSeparator();
        assertEquals(
                "2 sections at 48000.0 Hz" + end + "0: b 2.0 1.0 0.0 / a 1 -0.5 0.0" + end
                        + "1: b 3.0 0.0 1.0 / a 1 0.0 0.5",
                CASCADE.toString());
        assertTrue(Cascade.of(8000, FIRST).toString().startsWith("1 section at 8000.0 Hz"));
    }

    @Test
    void doesNotFollowTheListItWasMadeFrom() {
        List<Section> sections = new ArrayList<>(List.of(FIRST));
        Cascade cascade = Cascade.of(48000, sections);
        sections.set(0, SECOND);
        assertEquals(FIRST, cascade.section(0));
        assertThrows(
                UnsupportedOperationException.class, () -> cascade.sections().add(SECOND));
    }

    @Test
    void joinsAtOneRateOnly() {
        Cascade joined = CASCADE.then(Cascade.of(48000, SECOND));
        assertEquals(Cascade.of(48000, FIRST, SECOND, SECOND), joined);
        Cascade other = Cascade.of(44100, FIRST);
        String message = assertThrows(IllegalArgumentException.class, () -> CASCADE.then(other))
                .getMessage();
        assertEquals("next's sampleRateHz is 44100.0; it must be 48000.0, as in the cascade it follows", message);
    }

    @Test
    void gainIsTheFirstSampleOfTheImpulseResponse() {
        assertEquals(6, CASCADE.gain());
        Cascade scaled = CASCADE.scaledBy(-0.5);
        assertEquals(-3, scaled.gain());
        assertEquals(SECOND, scaled.section(1));
        assertEquals(CASCADE.section(0).scaledBy(-0.5), scaled.section(0));
    }

    @Test
    void stableOnlyIfEverySectionIs() {
        assertTrue(CASCADE.isStable());
        assertFalse(Cascade.of(48000, FIRST, Section.of(1, 0, 0, -2, 1)).isStable());
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, -1, Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
    void refusesASampleRate(double bad) {
        String message = assertThrows(IllegalArgumentException.class, () -> Cascade.of(bad, FIRST))
                .getMessage();
        assertEquals("sampleRateHz is " + bad + "; it must be positive and finite", message);
    }

    @Test
    void refusesNothingToRun() {
        assertThrows(IllegalArgumentException.class, () -> Cascade.of(48000));
        assertThrows(IllegalArgumentException.class, () -> Cascade.of(48000, List.of()));
        assertThrows(NullPointerException.class, () -> Cascade.of(48000, FIRST, null));
    }
}
