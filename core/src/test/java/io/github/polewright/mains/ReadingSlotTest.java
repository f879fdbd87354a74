package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.concurrent.atomic.AtomicBoolean;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** The hand-over of readings alone: the writer puts the same number everywhere, so a torn copy shows. */
class ReadingSlotTest {

    private static final int CHANNELS = 64;

    private final Tracker tracker = new Tracker(Rates.of(48000), CHANNELS, Rates.MOST_LINES);
    private final ReadingSlot slot = new ReadingSlot(tracker, new LinePhasors(tracker));

    private void write(double value) {
        tracker.loop.start(value);
        java.util.Arrays.fill(tracker.bank.re, value);
        slot.publish();
    }

    private static double level(MainsReading reading, int harmonic, int channel) {
        return Math.pow(10, reading.levelDb(harmonic, channel) / 20);
    }

    /** 1280 levels take microseconds to write, so a reader that did not look again would meet many a write. */
    @Test
    void noReadingMixesTwoWrites() throws InterruptedException {
        tracker.proof.begin(50);
        java.util.Arrays.fill(tracker.presence.held, true);
        write(50);
        AtomicBoolean done = new AtomicBoolean();
        int[] torn = new int[2];
        Thread reader = new Thread(() -> {
            while (!done.get()) {
                MainsReading reading = slot.read();
                boolean same = true;
                for (int c = 0; c < CHANNELS; c += 9) {
                    same &= Math.abs(level(reading, 1 + c % 20, c) - reading.frequencyHz()) < 1e-9;
                }
                torn[0] += same ? 0 : 1;
                torn[1]++;
            }
        });
        reader.start();
        for (int round = 0; round < 100_000; round++) {
            write(50 + round % 7);
        }
        done.set(true);
        reader.join();
        assertTrue(torn[1] > 0, "nothing was read");
        assertEquals(0, torn[0], "torn of " + torn[1]);
    }

    /** Every state arrives as it was written, and a line that is not there has no level. */
    @ParameterizedTest
    @EnumSource(MainsState.class)
    void everyStateArrives(MainsState state) {
        LineBank bank = tracker.bank;
        for (int i = 0; i < 3; i++) {
            bank.re[i] = 0.1;
            tracker.presence.clear[i] = true;
            tracker.presence.open[i] = true;
            tracker.presence.held[i] = i < 2;
        }
        tracker.loop.start(50.3);
        if (state != MainsState.SEARCHING) {
            tracker.proof.begin(50.3);
        }
        if (tracker.proof.state() != state) {
            tracker.proof.match(true);
            for (int n = 0; n < 10; n++) {
                tracker.proof.tick(0.02, 50.3, false);
            }
        }
        if (tracker.proof.state() != state) {
            java.util.Arrays.fill(tracker.presence.open, false);
            tracker.proof.tick(0.02, 50.3, false);
        }
        slot.publish();
        MainsReading reading = slot.read();
        assertEquals(state, reading.state());
        boolean known = state != MainsState.SEARCHING;
        assertEquals(known ? 50.3 : Double.NaN, reading.frequencyHz());
        assertEquals(known ? -20 : Double.NEGATIVE_INFINITY, reading.levelDb(2, 0), 1e-9);
        assertEquals(Double.NEGATIVE_INFINITY, reading.levelDb(3, 0));
    }
}
