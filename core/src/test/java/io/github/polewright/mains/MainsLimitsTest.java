package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

/** The ends of every range a user may ask for, just inside and just outside. */
class MainsLimitsTest {

    private static void assertNamed(Executable call, String name, String value, String least, String most) {
        String message = String.valueOf(
                assertThrows(IllegalArgumentException.class, call).getMessage());
        assertTrue(
                message.contains(name + " is " + value) && message.contains("from " + least + " to " + most), message);
    }

    @Test
    void channelsAreFromOneToSixtyFour() {
        assertEquals(1, HumRemover.of(8000, 1).reading().channels());
        assertEquals(64, HumRemover.of(8000, 64).reading().channels());
        assertEquals(64, MainsFollower.of(8000, 64).reading().channels());
        assertNamed(() -> HumRemover.builder(8000, 0), "channels", "0", "1", "64");
        assertNamed(() -> HumRemover.builder(8000, 65), "channels", "65", "1", "64");
        assertNamed(() -> MainsFollower.of(8000, 65), "channels", "65", "1", "64");
    }

    @Test
    void linesAreFromTwoToTwenty() {
        HumRemover.Builder builder = HumRemover.builder(8000, 1);
        assertEquals(2, builder.lines(2).build().reading().lines());
        assertEquals(20, builder.lines(20).build().reading().lines());
        assertEquals(2, MainsFollower.of(8000, 1, 2).reading().lines());
        assertEquals(20, MainsFollower.of(8000, 1, 20).reading().lines());
        assertNamed(() -> builder.lines(1), "lines", "1", "2", "20");
        assertNamed(() -> builder.lines(21), "lines", "21", "2", "20");
        assertNamed(() -> MainsFollower.of(8000, 1, 21), "lines", "21", "2", "20");
    }

    @Test
    void ratesAreFromEightToAHundredAndNinetyTwoThousandHertz() {
        assertEquals(MainsState.SEARCHING, HumRemover.of(8000, 1).reading().state());
        assertEquals(MainsState.SEARCHING, HumRemover.of(192_000, 1).reading().state());
        assertNamed(() -> HumRemover.of(7999.9, 1), "sampleRateHz", "7999.9", "8000.0", "192000.0");
        assertNamed(() -> HumRemover.of(192_000.1, 1), "sampleRateHz", "192000.1", "8000.0", "192000.0");
        assertNamed(() -> MainsFollower.of(Double.NaN, 1), "sampleRateHz", "NaN", "8000.0", "192000.0");
    }
}
