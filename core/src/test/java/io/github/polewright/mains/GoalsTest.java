package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The goals of following and removal on speech-like programme; {@link Goals} prints the whole table. */
class GoalsTest {

    @ParameterizedTest
    @CsvSource({"50.02, 0.02, 0, 51", "60.0, 0.03, 6, 52", "50.8, 0.05, -6, 41"})
    void removalBeatsCombsOfKnownPhase(double meanHz, double sigmaHz, double levelDb, int seed) {
        Cases.assertKept(Goals.removal(Goals.speech(301, 14), meanHz, sigmaHz, levelDb, Hum.mixed(16, seed), seed));
    }

    @Test
    void wanderingGeneratorIsFollowed() {
        Cases.assertKept(Goals.removal(Goals.speech(302, 14), 60.7, 0.25, 0, Hum.flat(12), 42));
    }

    @Test
    void generatorNearATemperedNoteIsFollowedWithinFourSeconds() {
        Goals.Clean clean = Goals.speech(305, 8);
        double[] track = Hum.wander(16000, 8, 49.5, 0.05, 60, 3);
        Hum hum = Hum.of(16000, track, Hum.mixed(12, 3), 3).scaledTo(clean.samples(), 0);
        Trace trace = Trace.of(Measure.add(clean.samples(), hum.samples), 16000, Removal.SUBTRACTION);
        assertTrue(trace.followingAfter(0) < 4, "following at " + trace.followingAfter(0) + " s");
    }

    /** ENTSO-E asks plant to ride through 2.5 Hz/s; Great Britain's settings are 0.125 and 1 Hz/s. */
    @ParameterizedTest
    @CsvSource({"0.1, 5, 80", "1, 1.5, 350", "2.5, 1, 1000"})
    void rampsAreFollowed(double hertzPerSecond, double length, double mostLagMilliHz) {
        Cases.assertKept(Goals.ramp(Goals.speech(303, 18), hertzPerSecond, length, mostLagMilliHz, 46));
    }

    @Tag("slow")
    @ParameterizedTest
    @ValueSource(ints = {303, 304})
    void slowRampsAndTheEuropeanSplitAreFollowed(int seed) {
        Cases.assertKept(Goals.ramp(Goals.speech(seed, 26), 0.01, 15, 20, seed));
        Cases.assertKept(Goals.split(Goals.speech(seed, 26), seed));
    }

    @ParameterizedTest
    @EnumSource(Removal.class)
    void humThatStopsIsNotAdded(Removal way) {
        Cases.assertKept(Goals.step(Goals.speech(303, 18), 0, way, 46));
    }

    @ParameterizedTest
    @EnumSource(Removal.class)
    void humThatDoublesIsFollowed(Removal way) {
        Cases.assertKept(Goals.step(Goals.speech(304, 18), 2, way, 47));
    }

    @Test
    void silenceIsHeldThrough() {
        Cases.assertKept(Goals.silence(Goals.speech(303, 20), 46));
    }

    @ParameterizedTest
    @CsvSource({"50, 60", "60, 50"})
    void changeOfMainsIsFollowed(double fromHz, double toHz) {
        Cases.assertKept(Goals.change(Goals.speech(304, 18), fromHz, toHz, 47));
    }

    @Test
    void humThatBeginsLateIsProvenInTime() {
        Cases.assertKept(Goals.lateBegin(Goals.speech(303, 20), 46));
    }

    @ParameterizedTest
    @ValueSource(doubles = {-20, -30})
    void faintHumIsNeverMadeWorse(double levelDb) {
        Cases.assertKept(Goals.faint(Goals.speech(304, 20), levelDb, 47));
    }

    @Tag("slow")
    @ParameterizedTest
    @ValueSource(ints = {311, 312, 313, 314})
    void removalOnMoreSpeech(int seed) {
        Goals.Clean clean = Goals.speech(seed, 16);
        List<Goals.Figure> figures = Goals.removal(clean, 59.95, 0.02, 0, Hum.odd(20), seed);
        Cases.assertKept(figures);
        Cases.assertKept(Goals.removal(clean, 50.1, 0.03, 10, Hum.mixed(20, seed), seed));
    }
}
