package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** A reset forgets everything: what follows is, bit for bit, what a new object would make of it. */
class HumRemoverResetTest {

    private static final double RATE = 16000;

    private static double[] heard(double hz, double seconds, double[] amplitudes, double programmeGain, int seed) {
        double[] programme = Programme.speech(RATE, seconds, seed);
        for (int n = 0; n < programme.length; n++) {
            programme[n] *= programmeGain;
        }
        return Measure.add(
                programme, Hum.of(RATE, Hum.wander(RATE, seconds, hz, 0.02, 60, seed), amplitudes, 3).samples);
    }

    /** Cut within a slab, while following, and at several times of the search. */
    @ParameterizedTest
    @CsvSource({
        "NOTCHES, 96007",
        "SUBTRACTION, 96013",
        "SUBTRACTION, 9001",
        "NOTCHES, 19001",
        "SUBTRACTION, 20003",
        "SUBTRACTION, 20801",
        "SUBTRACTION, 21001",
        "SUBTRACTION, 22003"
    })
    void removerBeginsAnew(Removal way, int frames) {
        double[] before = heard(57.2, 7, Hum.flat(20), 1, 1);
        double[] after = heard(50.3, 5, Hum.mixed(12, 2), 1, 2);
        HumRemover used = HumRemover.builder(RATE, 1).by(way).build();
        used.process(before, 0, new double[before.length], 0, frames);
        used.reset();
        assertEquals(MainsState.SEARCHING, used.reading().state());
        assertTrue(Double.isNaN(used.reading().frequencyHz()));
        assertEquals(Double.NEGATIVE_INFINITY, used.reading().levelDb(1, 0));
        HumRemover fresh = HumRemover.builder(RATE, 1).by(way).build();
        double[] expected = new double[after.length];
        double[] output = new double[after.length];
        fresh.process(after, 0, expected, 0, after.length);
        used.process(after, 0, output, 0, after.length);
        assertEquals(MainsState.FOLLOWING, fresh.reading().state());
        assertArrayEquals(expected, output);
        assertEquals(fresh.reading().toString(), used.reading().toString());
    }

    @ParameterizedTest
    @ValueSource(ints = {80011, 20003})
    void followerBeginsAnew(int frames) {
        double[] before = heard(57.2, 6, Hum.flat(20), 1, 1);
        double[] after = heard(50.3, 4, Hum.mixed(12, 2), 1, 2);
        MainsFollower used = MainsFollower.of(RATE, 1);
        used.follow(before, 0, frames);
        used.reset();
        assertEquals(MainsState.SEARCHING, used.reading().state());
        used.follow(after, 0, after.length);
        MainsFollower fresh = MainsFollower.of(RATE, 1);
        fresh.follow(after, 0, after.length);
        assertEquals(fresh.reading().toString(), used.reading().toString());
        assertEquals(fresh.reading().levelDb(2, 0), used.reading().levelDb(2, 0));
    }
}
