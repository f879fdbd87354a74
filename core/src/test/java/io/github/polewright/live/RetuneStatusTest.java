package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.retune.Glide;
import io.github.polewright.retune.Pace;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** What anyone can read of a retune, bypass and output gain. */
class RetuneStatusTest {

    private static final Section LOW = Designs.notch(50, 1);
    private static final Section HIGH = Designs.notch(60, 1);

    private static void run(LiveCascade live, int frames) {
        double[] block = new double[frames * live.channels()];
        live.process(block, 0, block, 0, frames);
    }

    @Test
    void countsFramesDownAndOrdersUp() {
        LiveCascade live = Rig.live(Designs.cascade(LOW), 1, Form.DIRECT_FORM_1);
        assertEquals(new RetuneStatus(true, 0, 1, 0, 0, 0), live.retuneStatus());
        live.retune(Designs.cascade(Designs.notch(55, 1)));
        live.retune(Designs.cascade(Designs.notch(65, 1)));
        Glide glide = live.retune(Designs.cascade(HIGH));
        assertFalse(live.retuneStatus().settled());
        run(live, 100);
        RetuneStatus first = live.retuneStatus();
        assertEquals(glide.totalFrames() - 100, first.framesLeft());
        assertEquals(1, first.adopted());
        assertEquals(2, first.superseded());
        assertEquals(0, first.framesHeld());
        assertTrue(first.stateBound() > 1);
        run(live, (int) first.framesLeft() - 1);
        assertEquals(1, live.retuneStatus().framesLeft());
        assertFalse(live.isSettled());
        // The bucket loses half of the decay: the whole path costs less than all of it at once, e^(d/2).
        assertTrue(live.retuneStatus().stateBound() < glide.certificate(0).stateBound());
        run(live, 1);
        assertTrue(live.isSettled());
        assertEquals(Designs.cascade(HIGH), live.target());
    }

    @Test
    void tellsThatABurstIsHeldBack() {
        LiveCascade live = Rig.live(Designs.cascade(LOW), 1, Form.DIRECT_FORM_1);
        for (int i = 0; i < 400; i++) {
            live.retune(Designs.cascade(i % 2 == 0 ? HIGH : LOW), Pace.FOLLOWING);
            run(live, 1_500);
        }
        RetuneStatus status = live.retuneStatus();
        assertTrue(status.framesHeld() > 0, status.toString());
        assertTrue(status.stateBound() <= 2.000001, status.toString());
        assertEquals(400, status.adopted());
    }

    /** The input within 50 ms whatever rings, and then the sections as if they had never been away. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void bypassFadesOutAndIn(Form form) {
        Cascade cascade = Designs.cascade(Designs.notch(50, 0.5), Designs.lowPass(4_000, 0.7));
        LiveCascade live = Rig.live(cascade, 2, form);
        LiveCascade never = Rig.live(cascade, 2, form);
        double[][] noise = Signals.noise(1, 2, 3_000);
        assertArrayEquals(run(never, noise), run(live, noise));
        live.bypass(true);
        live.bypass(true);
        double[][] fading = run(live, noise), filtered = run(never, noise);
        assertEquals(1, live.retuneStatus().adopted());
        assertTrue(live.isSettled());
        for (int i = 0; i < 2_400; i++) {
            double u = (i + 1) / 2_400.0, share = 1 - u * u * (3 - 2 * u);
            double mixed = share * filtered[0][i] + (1 - share) * noise[0][i];
            assertEquals(mixed, fading[0][i], 1e-12, "frame " + i);
        }
        assertArrayEquals(noise, run(live, noise));
        run(never, noise);

        live.retune(Designs.cascade(Designs.notch(50.1, 0.5), Designs.lowPass(4_100, 0.7)));
        never.retune(Designs.cascade(Designs.notch(50.1, 0.5), Designs.lowPass(4_100, 0.7)));
        while (!never.isSettled()) {
            assertArrayEquals(noise, run(live, noise));
            run(never, noise);
        }
        live.bypass(false);
        assertFalse(live.isSettled());
        run(live, noise);
        run(never, noise);
        assertTrue(live.isSettled());
        assertArrayEquals(run(never, noise), run(live, noise));
    }

    private static double[][] run(LiveCascade live, double[][] in) {
        return Rig.run(live, SampleFormat.DOUBLES, in, in[0].length);
    }

    /** No step of a bypass is larger than the signal's own: nothing clicks. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void bypassIsNotHeardBesideATone(Form form) {
        LiveCascade live = Rig.live(Designs.cascade(Designs.notch(1_000, 100), Designs.lowPass(8_000, 0.7)), 1, form);
        double[] in = new double[2 * Clicks.WINDOW];
        for (int n = 0; n < in.length; n++) {
            in[n] = Math.sin(2 * Math.PI * 2_000 * n / 48_000);
        }
        double[] out = new double[in.length];
        live.process(in, 0, out, 0, Clicks.WINDOW);
        live.bypass(true);
        live.process(in, Clicks.WINDOW, out, Clicks.WINDOW, Clicks.WINDOW);
        double beside = Clicks.besideDb(out, Clicks.WINDOW + 1_200, 2_000, 48_000);
        assertTrue(beside < -75, beside + " dB");
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void outputGainGlidesAndLands(Form form) {
        LiveCascade live = Rig.live(Designs.cascade(Section.PASS_THROUGH), 2, form);
        live.outputGainDb(-20);
        double[] in = new double[2 * 4_000];
        Arrays.fill(in, 1);
        double[] out = new double[in.length];
        live.process(in, 0, out, 0, 1_000);
        assertFalse(live.isSettled());
        live.process(in, 2_000, out, 2_000, 3_000);
        assertTrue(live.isSettled());
        double before = 1;
        for (int n = 0; n < 4_000; n++) {
            assertEquals(out[2 * n], out[2 * n + 1]);
            assertTrue(before - out[2 * n] >= 0 && before - out[2 * n] < 0.0006, "step to " + out[2 * n]);
            before = out[2 * n];
        }
        // 3 u^2 - 2 u^3 at u = 1/2, after half of 50 ms.
        assertEquals(0.55, out[2 * 1_199], 1e-12);
        assertEquals(0.1, out[2 * 2_399], 1e-16);
        live.outputGainDb(Double.NEGATIVE_INFINITY);
        Rig.settle(live);
        live.process(in, 0, out, 0, 4_000);
        assertEquals(0, RoundingBound.peak(out));
        assertThrows(IllegalArgumentException.class, () -> live.outputGainDb(121));
        assertThrows(IllegalArgumentException.class, () -> live.outputGainDb(Double.NaN));
    }

    /** A gain in the middle of a glide leaves the glide alone. */
    @Test
    void outputGainDoesNotRestartAGlide() {
        LiveCascade live = Rig.live(Designs.cascade(LOW), 1, Form.DIRECT_FORM_1);
        live.retune(Designs.cascade(HIGH));
        run(live, 3_000);
        long left = live.retuneStatus().framesLeft();
        live.outputGainDb(3);
        run(live, 100);
        assertEquals(left - 100, live.retuneStatus().framesLeft());
        assertEquals(2, live.retuneStatus().adopted());
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void cutsAroundGainAndBypassChangeNothing(Form form) {
        double[][] in = Signals.noise(5, 2, 9_000);
        double[][] whole = busy(form, in, -1);
        for (long seed = 0; seed < 4; seed++) {
            assertArrayEquals(whole, busy(form, in, seed), "cut " + seed);
        }
    }

    private static double[][] busy(Form form, double[][] in, long seed) {
        LiveCascade live = Rig.live(Designs.mixed(3, 3), 2, form, 4);
        double[][] out = new double[2][in[0].length];
        int first = 0;
        for (int order = 0; order < 9; order++) {
            switch (order % 4) {
                case 0 -> live.outputGainDb(-3 * order);
                case 1 -> live.bypass(order % 8 == 1);
                case 2 -> live.retune(Designs.mixed(order, 2));
                default -> live.retune(Designs.mixed(order, 4), Pace.FOLLOWING);
            }
            for (int frames : seed < 0 ? Rig.whole(1_000) : Rig.cuts(seed + order, 1_000)) {
                SampleFormat.DOUBLES.process(live, in, out, first, frames);
                first += frames;
            }
        }
        return out;
    }
}
