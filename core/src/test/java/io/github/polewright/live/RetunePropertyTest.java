package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** What must hold of any retune, however it glides. */
class RetunePropertyTest {

    private static final int FRAMES = 6_000;

    @Test
    void retuneToTheSameCascadeChangesNoBitInDirectForm1() {
        for (int sections = 1; sections <= 6; sections++) {
            Cascade cascade = Designs.mixed(sections, sections);
            double[][] in = Signals.noise(1, 2, FRAMES);
            LiveCascade undisturbed = Rig.live(cascade, 2, Form.DIRECT_FORM_1);
            LiveCascade retuned = Rig.live(cascade, 2, Form.DIRECT_FORM_1);
            double[][] expected = new double[2][FRAMES];
            double[][] actual = new double[2][FRAMES];
            for (int first = 0; first < FRAMES; first += 100) {
                if (first % 700 == 0) {
                    retuned.retune(cascade);
                }
                SampleFormat.DOUBLES.process(undisturbed, in, expected, first, 100);
                SampleFormat.DOUBLES.process(retuned, in, actual, first, 100);
            }
            assertArrayEquals(expected, actual, sections + " sections");
        }
    }

    /** The glide itself runs another form, so all that may differ is rounding. */
    @Test
    void retuneToTheSameCascadeStaysWithinTheRoundingBoundInTransposedForm() {
        Cascade cascade = Designs.mixed(8, 5);
        double[] in = Signals.noise(1, 1, FRAMES)[0];
        LiveCascade live = Rig.live(cascade, 1, Form.TRANSPOSED_DIRECT_FORM_2);
        double[][] out = new double[1][FRAMES];
        for (int first = 0; first < FRAMES; first += 100) {
            if (first == 500 || first == 4_500) {
                live.retune(cascade);
            }
            SampleFormat.DOUBLES.process(live, new double[][] {in}, out, first, 100);
        }
        double[][] stages = Oracle.stages(cascade, in);
        // The glide errs as direct form I does, and turning signals into states errs no more than a step does.
        double bound = RoundingBound.of(cascade, Form.TRANSPOSED_DIRECT_FORM_2, stages)
                + RoundingBound.of(cascade, Form.DIRECT_FORM_1, stages);
        OracleReferenceTest.assertWithin(stages[5], out[0], bound, false);
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void landsExactlyOnTheTarget(Form form) {
        for (int sections = 1; sections <= 6; sections++) {
            Cascade target = Designs.mixed(90 + sections, sections);
            LiveCascade live = Rig.live(Designs.mixed(80 + sections, 6), 2, form);
            Rig.run(live, SampleFormat.FLOATS, Signals.noise(1, 2, 500), Rig.cuts(1, 500));
            live.retune(target);
            assertFalse(live.isSettled());
            Rig.settle(live);
            assertTrue(Rig.heads(live, target));
            LiveCascade fresh = Rig.twin(live, form);
            for (int channel = 0; channel < 2; channel++) {
                assertArrayEquals(
                        Rig.impulseResponse(fresh, channel, 2_000),
                        Rig.impulseResponse(live, channel, 2_000),
                        sections + " sections, channel " + channel);
            }
        }
    }

    /** From the settled frame on, the signal itself is what the target would make of the whole past: no lost state. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void keepsTheStateOfEveryStageOverAGlide(Form form) {
        Cascade target = Designs.cascade(Designs.lowPass(2_000, 1), Designs.notch(500, 100));
        LiveCascade live = Rig.live(Designs.cascade(Designs.lowPass(4_000, 1), Designs.notch(400, 100)), 1, form);
        live.retune(target);
        int frames = 60_000;
        double[] in = new double[frames];
        for (int n = 0; n < frames; n++) {
            in[n] = (float) (0.5 + 0.25 * Math.sin(0.05 * n));
        }
        double[] out = Rig.runMono(live, in);
        assertTrue(live.isSettled());
        double[] expected = Oracle.filter(target, in);
        for (int n = frames - 5_000; n < frames; n++) {
            assertEquals(expected[n], out[n], 1e-12, "frame " + n);
        }
    }

    /** A constant passes a glide between sections of unit gain at DC: nothing is heard of it. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void passesDirectCurrentUnchanged(Form form) {
        LiveCascade live = Rig.live(Designs.cascade(Designs.notch(1_000, 100)), 1, form);
        double[] in = new double[40_000];
        java.util.Arrays.fill(in, 0.5);
        Rig.runMono(live, in);
        live.retune(Designs.cascade(Designs.notch(3_000, 400)));
        for (double value : Rig.runMono(live, in)) {
            assertEquals(0.5, value, 1e-12);
        }
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void theLatestOfSeveralRetunesBetweenTwoBlocksWins(Form form) {
        double[][] in = Signals.noise(3, 1, FRAMES);
        LiveCascade once = Rig.live(Designs.mixed(1, 3), 1, form);
        LiveCascade often = Rig.live(Designs.mixed(1, 3), 1, form);
        Rig.run(once, SampleFormat.DOUBLES, in, 1_000, 5_000);
        Rig.run(often, SampleFormat.DOUBLES, in, 1_000, 5_000);
        for (int i = 0; i < 5; i++) {
            often.retune(Designs.mixed(70 + i, 1 + i % 3));
        }
        often.retune(Designs.mixed(2, 2));
        once.retune(Designs.mixed(2, 2));
        assertArrayEquals(
                Rig.run(once, SampleFormat.DOUBLES, in, FRAMES), Rig.run(often, SampleFormat.DOUBLES, in, FRAMES));
    }

    /** A retune takes effect with the block that follows, never within one, and not before. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void isAdoptedByTheNextBlock(Form form) {
        double[][] in = Signals.noise(3, 1, 1_000);
        LiveCascade live = Rig.live(Designs.cascade(Section.PASS_THROUGH), 1, form);
        assertTrue(live.isSettled());
        live.retune(Designs.cascade(Section.of(0.25, 0, 0, 0, 0)));
        assertFalse(live.isSettled());
        double[][] out = Rig.run(live, SampleFormat.DOUBLES, in, 1, 999);
        assertFalse(java.util.Arrays.equals(in[0], out[0]));
        Rig.settle(live);
        assertArrayEquals(new double[] {0.25}, Rig.runMono(live, new double[] {1}));
    }
}
