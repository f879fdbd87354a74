package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import java.util.function.LongSupplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The warm-up: leaves the live cascade alone, ends when it should, and tells what it saw. Clocks here are invented. */
class WarmUpTest {

    private static final Cascade CASCADE = Designs.mixed(3, 5);

    @ParameterizedTest
    @EnumSource(Form.class)
    void leavesStatesCoefficientsAndCountersAlone(Form form) {
        double[] in = Signals.noise(1, 1, 2_000)[0];
        LiveCascade warmed = Rig.live(CASCADE, 1, form);
        LiveCascade plain = Rig.live(CASCADE, 1, form);
        double[] first = new double[500];
        warmed.process(in, 0, first, 0, 500);
        plain.process(in, 0, first, 0, 500);
        warmed.retune(Designs.mixed(4, 5));
        plain.retune(Designs.mixed(4, 5));
        assertTrue(warmed.warmUp(0.05).blocks() > 0);
        double[] a = new double[1_500], b = new double[1_500];
        warmed.process(in, 500, a, 0, 1_500);
        plain.process(in, 500, b, 0, 1_500);
        assertArrayEquals(b, a);
        assertEquals(0, warmed.replacedInputSamples());
        assertEquals(0, warmed.replacedOutputSamples());
        assertEquals(0, warmed.channelRestarts());
    }

    @Test
    void reachesReplacedSamplesRestartsAndGlides() {
        LiveCascade twin = Rig.live(CASCADE, 2, Form.DIRECT_FORM_1).twin();
        new Warming(twin, new SlowClock(1_000)).run(1);
        assertTrue(twin.replacedInputSamples() > 0, "replaced input samples");
        assertTrue(twin.replacedOutputSamples() > 0, "replaced output samples");
        assertTrue(twin.channelRestarts() > 0, "restarts");
    }

    @Test
    void endsWhenTheTimeIsUp() {
        // 1 ms a reading: a round of 64 times four blocks takes 65 ms or more.
        WarmUp warmUp = new Warming(Rig.live(CASCADE, 1, Form.DIRECT_FORM_1).twin(), new SlowClock(1_000_000)).run(0.2);
        assertFalse(warmUp.levelled());
        assertTrue(warmUp.seconds() >= 0.2 && warmUp.seconds() < 0.5, warmUp.toString());
        assertTrue(warmUp.blocks() <= 1_024, warmUp.toString());
    }

    @Test
    void endsWhenTheCostNoLongerFalls() {
        // 10 us a reading from the start: nothing ever falls after the first round.
        WarmUp warmUp = new Warming(Rig.live(CASCADE, 1, Form.DIRECT_FORM_1).twin(), new SlowClock(10_000)).run(500);
        assertTrue(warmUp.levelled());
        assertTrue(warmUp.blocks() >= 4 * 6_000 - 4 * 64 && warmUp.seconds() >= 0.29, warmUp.toString());
        assertTrue(warmUp.seconds() < 5, warmUp.toString());
    }

    @Test
    void tellsHowTheCostFell() {
        long[] readings = {0};
        long[] now = {0};
        // 20 us a reading at first, 5 us from the 1,000th on.
        LongSupplier clock = () -> now[0] += readings[0]++ < 1_000 ? 20_000 : 5_000;
        WarmUp warmUp = new Warming(Rig.live(CASCADE, 1, Form.DIRECT_FORM_1).twin(), clock).run(500);
        assertTrue(warmUp.levelled());
        assertEquals(20, warmUp.firstBlockMicros());
        // One reading a four blocks between the clock's two readings.
        assertEquals(5 / 4.0, warmUp.lastBlockMicros(), 1e-9);
        assertEquals(16, warmUp.gain(), 1e-9);
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, -1, Double.NaN, 600.001, Double.POSITIVE_INFINITY})
    void refusesATimeOutOfRange(double seconds) {
        LiveCascade live = Rig.live(CASCADE, 1, Form.DIRECT_FORM_1);
        IllegalArgumentException refusal = assertThrows(IllegalArgumentException.class, () -> live.warmUp(seconds));
        assertTrue(refusal.getMessage().contains(Double.toString(seconds)), refusal.getMessage());
    }

    /** Moves by the same step at every reading. */
    private static final class SlowClock implements LongSupplier {
        private final long step;
        private long now;

        SlowClock(long step) {
            this.step = step;
        }

        @Override
        public long getAsLong() {
            return now += step;
        }
    }
}
