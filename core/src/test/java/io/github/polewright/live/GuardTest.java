package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Subnormal numbers: gradual underflow cannot be switched off in Java, and an undriven section may stay in it for ever
 * (seen here: a pole pair at radius 0.9999 sticks at 2501 units of 4.9e-324). Every tail must end at exactly zero.
 */
class GuardTest {

    private static final int BLOCK = 512;
    private static final int MINUTE = 60 * 48_000;
    private static final int FRESH = 4_096;

    static List<Arguments> tails() {
        List<Arguments> tails = new ArrayList<>();
        Section narrow = Designs.resonator(50, 1);
        for (Form form : Form.values()) {
            tails.add(Arguments.of(form, "narrow resonator", Designs.cascade(narrow)));
            tails.add(Arguments.of(form, "limit cycle", Designs.cascade(polePair(0.9999, 0.01))));
            tails.add(Arguments.of(form, "pole near 1", Designs.cascade(Designs.onePole(1 - 5e-5))));
            tails.add(Arguments.of(form, "pole near 0", Designs.cascade(Designs.onePole(1e-9))));
            tails.add(Arguments.of(form, "pole below 0", Designs.cascade(Designs.onePole(-0.99))));
            tails.add(Arguments.of(form, "8 narrow", Cascade.of(48_000, Collections.nCopies(8, narrow))));
            tails.add(Arguments.of(form, "8 mixed", Designs.mixed(8, 8)));
        }
        return tails;
    }

    private static Section polePair(double radius, double angle) {
        return Section.of(1, 0, 0, -2 * radius * Math.cos(angle), radius * radius);
    }

    @ParameterizedTest(name = "{0} {1}")
    @MethodSource("tails")
    void tenMinutesOfSilenceEndAtExactlyZero(Form form, String name, Cascade cascade) {
        endsAtZero(form, SampleFormat.DOUBLES, cascade, 10 * MINUTE);
    }

    @ParameterizedTest(name = "{0} {1}")
    @MethodSource("tails")
    void aMinuteOfFloatSilenceEndsAtExactlyZero(Form form, String name, Cascade cascade) {
        endsAtZero(form, SampleFormat.FLOATS, cascade, MINUTE);
    }

    private static void endsAtZero(Form form, SampleFormat format, Cascade cascade, int frames) {
        LiveCascade live = Rig.live(cascade, 1, form);
        double[] fresh = Rig.runMono(Rig.live(cascade, 1, form), Signals.impulse(FRESH));
        double[] in = Signals.impulse(BLOCK);
        double[] out = new double[BLOCK];
        float[] narrow = new float[BLOCK];
        narrow[0] = 1;
        int lastSounding = -1;
        for (int first = 0; first < frames; first += BLOCK) {
            if (format.narrow()) {
                live.process(narrow, 0, narrow, 0, BLOCK);
                lastSounding = sounds(narrow) ? first : lastSounding;
                Arrays.fill(narrow, 0);
            } else {
                live.process(in, 0, out, 0, BLOCK);
                in[0] = 0;
                lastSounding = sounds(out) ? first : lastSounding;
            }
        }
        assertTrue(lastSounding < MINUTE * 3 / 4, "still sounding in block " + lastSounding);
        assertArrayEquals(fresh, Rig.runMono(live, Signals.impulse(FRESH)), "some state was left");
        assertEquals(0, live.channelRestarts());
    }

    private static boolean sounds(float[] block) {
        boolean sounds = false;
        for (float value : block) {
            sounds |= value != 0;
        }
        return sounds;
    }

    /** Whether a block is other than zero; a subnormal in it fails. */
    private static boolean sounds(double[] block) {
        boolean sounds = false;
        boolean subnormal = false;
        for (double value : block) {
            sounds |= value != 0;
            subnormal |= value != 0 && Math.abs(value) < Double.MIN_NORMAL;
        }
        assertFalse(subnormal, "a subnormal came out");
        return sounds;
    }

    /**
     * A single pole below 1e-10 falls through the whole subnormal range between two guards. It cannot be caught there,
     * and need not be: the range is 16 decades wide, so that happens in two samples of a tail at most.
     */
    @ParameterizedTest
    @EnumSource(Form.class)
    void aPoleAlmostAtZeroIsSubnormalForTwoSamplesAtMost(Form form) {
        for (int exponent = -1; exponent >= -300; exponent--) {
            double[] out = Rig.runMono(
                    Rig.live(Designs.cascade(Designs.onePole(Math.pow(10, exponent))), 1, form), Signals.impulse(256));
            int subnormals = 0;
            for (double value : out) {
                subnormals += value != 0 && Math.abs(value) < Double.MIN_NORMAL ? 1 : 0;
            }
            assertTrue(subnormals <= (exponent >= -9 ? 0 : 2), subnormals + " at a pole of 1e" + exponent);
            assertEquals(0, out[255]);
        }
    }

    /** Whatever the frame at which the sound stops, relative to the guard's own beat, and whatever the format. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void everyPhaseOfTheGuardEndsAtZero(Form form) {
        Section wide = Designs.lowPass(4_000, 0.7);
        Cascade cascade = Designs.cascade(
                wide, Designs.notch(9_000, 3_000), wide, Designs.onePole(0.9), Designs.lowPass(9_000, 1));
        for (SampleFormat format : SampleFormat.values()) {
            for (int phase = 0; phase < 70; phase++) {
                LiveCascade live = Rig.live(cascade, 2, form);
                double[][] in = Signals.noise(phase, 2, 4_000);
                for (double[] channel : in) {
                    Arrays.fill(channel, 100 + phase, 4_000, 0);
                }
                double[][] out = Rig.run(live, format, in, Rig.cuts(phase, 4_000));
                for (double[] channel : out) {
                    assertEquals(0, RoundingBound.peak(Arrays.copyOfRange(channel, 3_000, 4_000)));
                }
            }
        }
    }

    /** A tail that decays while the coefficients move ends at zero too, and lands there without subnormals. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void aTailThatDecaysWhileGlidingEndsAtZero(Form form) {
        LiveCascade live = Rig.live(Designs.mixed(31, 5), 1, form);
        double[] in = Signals.impulse(64);
        double[] out = new double[64];
        for (int first = 0; first < 48_000; first += 64) {
            if (first % 1_024 == 0) {
                live.retune(Designs.mixed(31 + first / 1_024 % 2, 5));
            }
            live.process(in, 0, out, 0, 64);
            in[0] = 0;
            for (double value : out) {
                assertTrue(value == 0 || Math.abs(value) >= Double.MIN_NORMAL, value + " near frame " + first);
            }
        }
        assertEquals(0, RoundingBound.peak(out));
        Rig.settle(live);
        live.retune(Designs.mixed(32, 5));
        Rig.settle(live);
        assertTrue(Rig.heads(live, Designs.mixed(32, 5)));
        double[] expected = Rig.impulseResponse(Rig.twin(live, form), 0, FRESH);
        assertArrayEquals(expected, Rig.impulseResponse(live, 0, FRESH));
    }

    /** Subnormal input counts as silence, from the first sample on. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void subnormalInputIsSilence(Form form) {
        double[][] in = new double[2][5_000];
        for (int n = 0; n < 5_000; n++) {
            in[0][n] = n % 2 == 0 ? Double.MIN_VALUE : -Double.MIN_NORMAL / 3;
            in[1][n] = n % 3 == 0 ? 9e-31 : -1e-300;
        }
        LiveCascade live = Rig.live(Designs.mixed(6, 5), 2, form);
        double[][] out = Rig.run(live, SampleFormat.DOUBLES, in, Rig.cuts(1, 5_000));
        assertEquals(0, RoundingBound.peak(out[0]));
        assertEquals(0, RoundingBound.peak(out[1]));
        assertEquals(0, live.replacedInputSamples(), "silence is not a fault");
    }

    /** Subnormal float input is an ordinary double; whatever comes out of it is no subnormal double. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void subnormalFloatInputIsNoSubnormalDouble(Form form) {
        float[] in = new float[4_096];
        for (int n = 0; n < 2_000; n++) {
            in[n] = n % 2 == 0 ? Float.MIN_VALUE : Float.MIN_NORMAL / 3;
        }
        float[] out = new float[in.length];
        Rig.live(Designs.mixed(6, 5), 1, form).process(in, 0, out, 0, in.length);
        for (int n = 3_000; n < out.length; n++) {
            assertEquals(0, out[n], "frame " + n);
        }
    }
}
