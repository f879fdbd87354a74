package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What is removed, on lines that the test sets: held ones alone, while switched on, proven, and heard. */
class LinePlanTest {

    private static final double TICK = 0.02;

    private final Tracker tracker = new Tracker(Rates.of(16000), 1, 4);
    private final NotchBank notches = new NotchBank(tracker, new LinePhasors(tracker), 0.02);
    private final LinePlan plan = new LinePlan(tracker, notches);

    @ParameterizedTest
    @CsvSource({
        "true, true, true, true, true",
        "false, true, true, true, false",
        "true, false, true, true, false",
        "true, true, false, true, false",
        "true, true, true, false, false"
    })
    void everyConditionCounts(boolean on, boolean proven, boolean held, boolean heard, boolean removed) {
        lines(1);
        tracker.presence.held[1] = held;
        if (proven) {
            prove();
        }
        if (!heard) {
            // Four slabs of exact zeros are silence.
            double[][] silence = new double[1][tracker.rates.slabFrames];
            for (int slab = 0; slab < 4; slab++) {
                tracker.slab(silence);
            }
        }
        plan.tick();
        for (Removal way : Removal.values()) {
            plan.choose(on, way);
            assertEquals(removed && way == Removal.SUBTRACTION, plan.subtracted[1]);
            assertEquals(removed && way == Removal.NOTCHES, plan.notched[1]);
        }
    }

    /**
     * A notch 0.25 Hz wide takes pi / 2 * 0.25 Hz of the programme beside the line: 0.39 times its density. A line below
     * that is left alone by notches, one well above is not; a subtraction costs no programme.
     */
    @ParameterizedTest
    @CsvSource({"0.5, false", "4, true"})
    void aNotchMustTakeMoreHumThanProgramme(double lineOverLoss, boolean removed) {
        double perHz = 1e-4;
        double loss = perHz * 0.25 * Math.PI / 2;
        lines(Math.sqrt(2 * lineOverLoss * loss));
        // A tick's spread is the power in a band of two over its length.
        java.util.Arrays.fill(tracker.presence.spread, perHz * 2 / tracker.tickSeconds());
        prove();
        plan.tick();
        plan.choose(true, Removal.NOTCHES);
        assertEquals(removed, plan.notched[1]);
        plan.choose(true, Removal.SUBTRACTION);
        assertEquals(true, plan.subtracted[1]);
    }

    private void lines(double amplitude) {
        for (int i = 0; i < 4; i++) {
            tracker.bank.re[i] = amplitude;
            tracker.presence.clear[i] = true;
            tracker.presence.open[i] = true;
            tracker.presence.held[i] = true;
        }
        tracker.loop.start(50.3);
        tracker.proof.begin(50.3);
    }

    private void prove() {
        tracker.proof.match(true);
        for (int n = 0; n < 10; n++) {
            tracker.proof.tick(TICK, 50.3, false);
        }
        assertEquals(MainsState.FOLLOWING, tracker.proof.state());
    }
}
