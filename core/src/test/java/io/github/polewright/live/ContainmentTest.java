package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Values no filter can digest: replaced, counted, kept from the other channels, and recovered from. */
class ContainmentTest {

    private static final int FRAMES = 4_000;
    private static final int HIT = 1_013;

    private final Cascade cascade = Designs.mixed(17, 5);

    static List<Arguments> faults() {
        List<Arguments> faults = new ArrayList<>();
        for (Form form : Form.values()) {
            for (SampleFormat format : SampleFormat.values()) {
                for (double value : new double[] {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY}) {
                    faults.add(Arguments.of(form, format, value));
                }
            }
        }
        return faults;
    }

    @ParameterizedTest
    @MethodSource("faults")
    void aNonFiniteSampleIsSilenceAndCounted(Form form, SampleFormat format, double value) {
        double[][] clean = Signals.noise(1, 3, FRAMES);
        double[][] faulty = Signals.noise(1, 3, FRAMES);
        int[] hits = {0, HIT, HIT + 1, FRAMES - 1};
        for (int hit : hits) {
            clean[1][hit] = 0;
            faulty[1][hit] = value;
        }
        LiveCascade live = Rig.live(cascade, 3, form);
        double[][] out = Rig.run(live, format, faulty, Rig.cuts(1, FRAMES));
        assertArrayEquals(Rig.run(Rig.live(cascade, 3, form), format, clean, FRAMES), out);
        assertEquals(hits.length, live.replacedInputSamples());
        assertEquals(0, live.replacedOutputSamples());
        assertEquals(0, live.channelRestarts());
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void thatNaNOfAnyPayloadIsCaught(Form form) {
        double[] in = {Double.longBitsToDouble(0x7ff0000000000001L), Double.longBitsToDouble(-1L), 1, 0};
        LiveCascade live = Rig.live(cascade, 1, form);
        assertArrayEquals(Rig.runMono(Rig.live(cascade, 1, form), new double[] {0, 0, 1, 0}), Rig.runMono(live, in));
        assertEquals(2, live.replacedInputSamples());
    }

    /** Finite input that overflows the state: the channel restarts, the others never notice. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void anOverflowRestartsThatChannelOnly(Form form) {
        double[][] clean = Signals.noise(2, 3, FRAMES);
        double[][] faulty = Signals.noise(2, 3, FRAMES);
        for (int n = HIT; n < HIT + 10; n++) {
            faulty[1][n] = n % 2 == 0 ? Double.MAX_VALUE : -Double.MAX_VALUE;
        }
        LiveCascade live = Rig.live(boosting(), 3, form);
        double[][] expected = Rig.run(Rig.live(boosting(), 3, form), SampleFormat.DOUBLES, clean, FRAMES);
        double[][] out = Rig.run(live, SampleFormat.DOUBLES, faulty, FRAMES);
        assertArrayEquals(expected[0], out[0]);
        assertArrayEquals(expected[2], out[2]);
        for (int n = 0; n < HIT; n++) {
            assertEquals(expected[1][n], out[1][n], "frame " + n);
        }
        for (double value : out[1]) {
            assertTrue(Math.abs(value) <= Double.MAX_VALUE, "out came " + value);
        }
        assertEquals(1, live.channelRestarts());
        assertTrue(live.replacedOutputSamples() > 0);
        assertEquals(0, live.replacedInputSamples());
        for (int n = FRAMES - 500; n < FRAMES; n++) {
            assertEquals(expected[1][n], out[1][n], 1e-9, "not recovered in frame " + n);
        }
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void whereAChannelRestartsDoesNotDependOnTheCuts(Form form) {
        double[][] in = Signals.noise(2, 3, FRAMES);
        for (int n = HIT; n < FRAMES; n += 700) {
            in[n % 3][n] = Double.MAX_VALUE;
            in[n % 3][n + 1] = -Double.MAX_VALUE;
        }
        LiveCascade whole = Rig.live(boosting(), 3, form);
        double[][] expected = Rig.run(whole, SampleFormat.DOUBLES, in, FRAMES);
        assertTrue(whole.channelRestarts() >= 3);
        for (long seed = 0; seed < 5; seed++) {
            LiveCascade cut = Rig.live(boosting(), 3, form);
            assertArrayEquals(expected, Rig.run(cut, SampleFormat.DOUBLES, in, Rig.cuts(seed, FRAMES)));
            assertEquals(whole.channelRestarts(), cut.channelRestarts());
            assertEquals(whole.replacedOutputSamples(), cut.replacedOutputSamples());
        }
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void anOverflowInAGlideIsContainedAndTheTargetReached(Form form) {
        LiveCascade live = Rig.live(boosting(), 2, form);
        live.retune(cascade);
        double[][] in = Signals.noise(2, 2, FRAMES);
        for (int n = 100; n < 110; n++) {
            in[0][n] = n % 2 == 0 ? Double.MAX_VALUE : -Double.MAX_VALUE;
        }
        LiveCascade clean = Rig.live(boosting(), 2, form);
        clean.retune(cascade);
        double[][] out = Rig.run(live, SampleFormat.DOUBLES, in, Rig.cuts(4, FRAMES));
        in[0] = new double[FRAMES];
        assertArrayEquals(Rig.run(clean, SampleFormat.DOUBLES, in, FRAMES)[1], out[1]);
        assertTrue(live.channelRestarts() >= 1);
        Rig.settle(live);
        assertTrue(Rig.heads(live, cascade));
        assertArrayEquals(Rig.impulseResponse(Rig.twin(live, form), 0, 2_000), Rig.impulseResponse(live, 0, 2_000));
    }

    /** The largest float is a number like any other in double; only what will not fit on the way out is replaced. */
    @ParameterizedTest
    @EnumSource(value = SampleFormat.class, names = "DOUBLES", mode = EnumSource.Mode.EXCLUDE)
    void outputThatDoesNotFitInFloatIsReplacedAndCounted(SampleFormat format) {
        for (Form form : Form.values()) {
            LiveCascade live = Rig.live(Designs.cascade(Section.of(2, 0, 0, 0, 0)), 1, form);
            double most = Float.MAX_VALUE;
            double[][] in = {{1, most, -most, most / 2, 0.5}};
            assertArrayEquals(new double[][] {{2, 0, 0, most, 1}}, Rig.run(live, format, in, 5));
            assertEquals(2, live.replacedOutputSamples());
            assertEquals(0, live.channelRestarts());
        }
    }

    /** Six decibels more in every section, and poles: large values have nowhere to go. */
    private static Cascade boosting() {
        Cascade cascade = Designs.mixed(18, 4);
        return cascade.then(Designs.cascade(Designs.lowPass(3_000, 4).scaledBy(4)));
    }
}
