package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The rules by which lines are taken for mains and let go, each alone, on lines that the test sets: the times are those
 * the users' documentation promises (derived for this project).
 */
class ProofTest {

    private static final double TICK = 0.02;
    /** 58 cents from any note: no music. */
    private static final double HUM_HZ = 50.4;
    /** G1 of equal temperament with A at 440 Hz (ISO 16), to a tenth of a cent. */
    private static final double NOTE_HZ = 48.999;

    private final LineBank bank = new LineBank(8, 1);
    private final Presence presence = new Presence(bank, new Amplitudes(bank, new Innovation(bank)));
    private final Proof proof = new Proof(presence);

    private void lines(int count, double amplitude) {
        for (int i = 0; i < bank.size(); i++) {
            boolean there = i < count;
            bank.re[i] = there ? amplitude : 0;
            presence.clear[i] = there;
            presence.open[i] = there;
            presence.held[i] = there;
            presence.remembered[i] = there ? amplitude * amplitude : 0;
        }
    }

    /** Ticks for so long, or until the state changes; returns the seconds that passed. */
    private double run(double seconds, double hz) {
        MainsState before = proof.state();
        int ticks = 0;
        while (proof.state() == before && ticks * TICK < seconds - 1e-9) {
            proof.tick(TICK, hz, false);
            ticks++;
        }
        return ticks * TICK;
    }

    /** Ticks until the mains are let go; returns the seconds that passed. */
    private double runWhileHeld() {
        int ticks = 0;
        while (proof.holds() && ticks < 1000) {
            proof.tick(TICK, HUM_HZ, false);
            ticks++;
        }
        return ticks * TICK;
    }

    private void prove() {
        lines(3, 1);
        proof.begin(HUM_HZ);
        proof.match(true);
        run(1, HUM_HZ);
        assertEquals(MainsState.FOLLOWING, proof.state());
    }

    private void loseAll() {
        for (int i = 0; i < bank.size(); i++) {
            presence.clear[i] = false;
            presence.open[i] = false;
            presence.held[i] = false;
        }
    }

    @Test
    void twoSteadyLinesAreProvenInTenSeconds() {
        lines(2, 1);
        proof.begin(HUM_HZ);
        assertFalse(proof.holds());
        assertEquals(10, run(20, HUM_HZ), 1.5 * TICK);
        assertEquals(MainsState.FOLLOWING, proof.state());
    }

    @Test
    void whatIsUnsteadyBeginsItsTenSecondsAgain() {
        lines(2, 1);
        proof.begin(HUM_HZ);
        run(6, HUM_HZ);
        lines(2, Math.sqrt(2));
        assertEquals(10, run(20, HUM_HZ), 1.5 * TICK, "after 3 dB more");

        lines(2, 1);
        proof.begin(HUM_HZ);
        run(6, HUM_HZ);
        proof.tick(TICK, HUM_HZ, true);
        assertEquals(10, run(20, HUM_HZ), 1.5 * TICK, "after a jump");

        lines(2, 1);
        proof.begin(HUM_HZ);
        run(6, HUM_HZ);
        lines(1, Math.sqrt(2));
        run(0.5, HUM_HZ);
        lines(2, 1);
        assertEquals(10, run(20, HUM_HZ), 2.5 * TICK, "after half a second of a single line of the same power");
    }

    @Test
    void threeLinesOfTheFirstSecondAreProvenAtOnce() {
        lines(3, 1);
        proof.begin(HUM_HZ);
        assertEquals(5, run(5, HUM_HZ), 1e-9, "not before the first second is known to match");
        proof.match(true);
        assertEquals(TICK, run(5, HUM_HZ), 1e-9);
        assertTrue(proof.holds());
    }

    @Test
    void twoLinesOfTheFirstSecondAreNoHum() {
        lines(2, 1);
        proof.begin(HUM_HZ);
        proof.match(true);
        assertEquals(9, run(9, HUM_HZ), 1e-9);
    }

    @Test
    void aTemperedNoteHasToWaitTenSeconds() {
        lines(4, 1);
        proof.begin(NOTE_HZ);
        proof.match(true);
        assertEquals(10, run(20, NOTE_HZ), 1.5 * TICK);
    }

    @Test
    void besideATemperedNoteTwoSecondsAreTaken() {
        lines(4, 1);
        // 7 cents, which a generator may hold and a tuned instrument seldom does.
        double hz = NOTE_HZ * Math.pow(2, 7 / 1200.0);
        proof.begin(hz);
        proof.match(true);
        assertEquals(2, run(20, hz), 2.5 * TICK);
    }

    @Test
    void whatJumpedOnTrialHasNoQuickProof() {
        lines(4, 1);
        proof.begin(HUM_HZ);
        proof.match(true);
        proof.tick(TICK, HUM_HZ, true);
        assertEquals(10, run(20, HUM_HZ), 1.5 * TICK);
    }

    @Test
    void provenMainsAreTakenBackSoonForAMinute() {
        prove();
        loseAll();
        assertEquals(0.5, runWhileHeld(), 1.5 * TICK, "let go");
        assertEquals(MainsState.SEARCHING, proof.state());
        proof.searchSeconds(50);
        lines(3, 1);
        proof.begin(HUM_HZ);
        double back = run(5, HUM_HZ);
        assertTrue(back > 0.3 && back < 0.6, "taken back after " + back + " s");
        loseAll();
        runWhileHeld();
        proof.searchSeconds(60);
        lines(3, 1);
        proof.begin(HUM_HZ);
        assertEquals(9, run(9, HUM_HZ), 1e-9, "a minute later");
    }

    @Test
    void aTrialWithoutALineFails() {
        lines(3, 1);
        proof.begin(HUM_HZ);
        run(1, HUM_HZ);
        loseAll();
        assertEquals(1.5, run(5, HUM_HZ), 1.5 * TICK);
        assertEquals(MainsState.SEARCHING, proof.state());
    }

    @Test
    void linesWithMostOfThePowerMustGoBeforeMainsAreLetGo() {
        prove();
        presence.held[0] = false;
        presence.clear[0] = false;
        assertEquals(5, run(5, HUM_HZ), 1e-9, "a third of the power is gone");
        loseAll();
        assertEquals(0.5, runWhileHeld(), 1.5 * TICK);
        assertEquals(MainsState.SEARCHING, proof.state());
    }

    @Test
    void linesUnderProgrammeAreHeld() {
        prove();
        java.util.Arrays.fill(presence.open, false);
        proof.tick(TICK, HUM_HZ, false);
        assertEquals(MainsState.HOLDING, proof.state());
        assertTrue(proof.holds());
        presence.open[1] = true;
        proof.tick(TICK, HUM_HZ, false);
        assertEquals(MainsState.FOLLOWING, proof.state());
    }

    @Test
    void silenceEndsATrialAndIsHeldThroughForAMinute() {
        lines(3, 1);
        proof.begin(HUM_HZ);
        proof.silence(TICK);
        assertEquals(MainsState.SEARCHING, proof.state());
        prove();
        for (int n = 1; n * TICK < 59.9; n++) {
            proof.silence(TICK);
            assertEquals(MainsState.HOLDING, proof.state());
        }
        for (int n = 0; n * TICK < 0.2; n++) {
            proof.silence(TICK);
        }
        assertEquals(MainsState.SEARCHING, proof.state());
    }

    @Test
    void oneJumpIsForgivenAndTwoAreNot() {
        prove();
        run(0.4, HUM_HZ);
        proof.tick(TICK, HUM_HZ, true);
        proof.tick(TICK, HUM_HZ, true);
        proof.tick(TICK, HUM_HZ, true);
        assertTrue(proof.holds(), "a jump may last some ticks");
        assertEquals(1, run(1, HUM_HZ), 1e-9);
        proof.tick(TICK, HUM_HZ, true);
        assertEquals(MainsState.PROVING, proof.state());
        proof.match(true);
        assertEquals(10, run(20, HUM_HZ), 1.5 * TICK, "what plays notes has no quick proof, remembered or matched");
    }

    /** Nor has the next trial, after this one has failed: what was taken for mains played notes. */
    @Test
    void twoJumpsAlsoEndTheMemoryOfTheProof() {
        prove();
        run(0.4, HUM_HZ);
        proof.tick(TICK, HUM_HZ, true);
        run(1, HUM_HZ);
        proof.tick(TICK, HUM_HZ, true);
        loseAll();
        run(5, HUM_HZ);
        assertEquals(MainsState.SEARCHING, proof.state());
        lines(3, 1);
        proof.begin(HUM_HZ);
        assertEquals(9, run(9, HUM_HZ), 1e-9);
    }

    /** In the first 0.3 s of following a jump is not counted yet: after a reset as with a new object. */
    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void aResetForgetsTheJumps(boolean used) {
        if (used) {
            prove();
            run(5, HUM_HZ);
            proof.reset();
            assertEquals(MainsState.SEARCHING, proof.state());
        }
        prove();
        run(0.1, HUM_HZ);
        proof.tick(TICK, HUM_HZ, true);
        run(1, HUM_HZ);
        proof.tick(TICK, HUM_HZ, true);
        assertTrue(proof.holds());
    }

    @Test
    void jumpsFarApartAreForgiven() {
        prove();
        for (int jump = 0; jump < 5; jump++) {
            run(15, HUM_HZ);
            proof.tick(TICK, HUM_HZ, true);
            assertTrue(proof.holds());
        }
    }

    @Test
    void lostPowerIsSeenAtOnceAndOnlyThen() {
        prove();
        run(1, HUM_HZ);
        assertFalse(proof.hasDropped());
        presence.clear[1] = false;
        presence.clear[2] = false;
        proof.tick(TICK, HUM_HZ, false);
        assertTrue(proof.hasDropped());
    }

    @Test
    void onlyATrialOlderThanASecondIsSlow() {
        lines(2, 1);
        proof.begin(HUM_HZ);
        run(0.9, HUM_HZ);
        assertFalse(proof.isSlow());
        run(0.2, HUM_HZ);
        assertTrue(proof.isSlow());
        prove();
        assertFalse(proof.isSlow());
    }

    @ParameterizedTest
    @ValueSource(doubles = {44.4, 65.6, Double.NaN})
    void noMainsTurnAtSuchAFrequency(double hz) {
        lines(3, 1);
        proof.begin(HUM_HZ);
        proof.tick(TICK, hz, false);
        assertEquals(MainsState.SEARCHING, proof.state());
        prove();
        proof.tick(TICK, hz, false);
        assertEquals(MainsState.SEARCHING, proof.state());
    }

    @ParameterizedTest
    @ValueSource(doubles = {44.6, 65.4})
    void mainsMayTurnAtSuchAFrequency(double hz) {
        prove();
        proof.tick(TICK, hz, false);
        assertNotEquals(MainsState.SEARCHING, proof.state());
    }

    /** Frequencies of the notes by ISO 16: G1 is 48.9994 Hz, A1 55 Hz, and 60 Hz lies 49.4 cents under B1. */
    @Test
    void notesAreThoseOfEqualTemperament() {
        assertEquals(0, TemperedNotes.centsAway(55), 1e-9);
        assertEquals(0, TemperedNotes.centsAway(48.9994), 0.01);
        assertEquals(35.0, TemperedNotes.centsAway(50), 0.05);
        assertEquals(49.4, TemperedNotes.centsAway(60), 0.05);
    }
}
