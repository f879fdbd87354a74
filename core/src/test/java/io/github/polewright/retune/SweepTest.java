package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.Random;
import java.util.function.DoubleFunction;
import org.junit.jupiter.api.Test;

/** Glides that are even in log frequency, log Q and decibels without knowing the design. */
class SweepTest {

    private static Cascade cascade(Section... sections) {
        return Cascade.of(Sections.RATE_HZ, sections);
    }

    /** The frequency half way on the logarithmic scale of the analogue filter, tan(pi f / fs). */
    private static double middleHz(double oneHz, double otherHz) {
        double product = Math.tan(Math.PI * oneHz / Sections.RATE_HZ) * Math.tan(Math.PI * otherHz / Sections.RATE_HZ);
        return Math.atan(Math.sqrt(product)) * Sections.RATE_HZ / Math.PI;
    }

    private static void assertMiddle(Section from, Section to, Section expected) {
        Glide glide = Glide.sweeping(cascade(from), cascade(to), Pace.SINGLE);
        int middle = glide.segmentCount() / 2;
        double[] wanted = {expected.b0(), expected.b1(), expected.b2(), expected.a1(), expected.a2()};
        for (int i = 0; i < 5; i++) {
            assertEquals(wanted[i], glide.coefficient(middle, 0, i), 1e-12);
        }
        assertEquals(to, glide.target().section(0));
    }

    /** Half way lies the cookbook section of the mean log frequency, log Q and decibels. */
    @Test
    void passesThroughTheSectionsOfTheirOwnKind() {
        double hz = middleHz(300, 9000);
        assertMiddle(Sections.lowPass(300, 0.7), Sections.lowPass(9000, 2.8), Sections.lowPass(hz, 1.4));
        double nearHz = middleHz(900, 1200);
        assertMiddle(Sections.peak(900, 2, -12), Sections.peak(1200, 2, 6), Sections.peak(nearHz, 2, -3));
        assertMiddle(Sections.peak(1000, 1, 0), Sections.peak(1000, 1, 12), Sections.peak(1000, 1, 6));
        assertMiddle(Sections.lowShelf(300, -12), Sections.lowShelf(300, 4), Sections.lowShelf(300, -4));
    }

    @Test
    void everyKnotIsStableWhateverTheEnds() {
        Random random = new Random(71);
        for (int i = 0; i < 500; i++) {
            Section from = Sections.random(random);
            Section to = Sections.random(random);
            Glide glide = Glide.sweeping(cascade(from), cascade(to), i % 2 == 0 ? Pace.SINGLE : Pace.TURNING);
            for (int knot = 0; knot <= glide.segmentCount(); knot++) {
                double a1 = glide.coefficient(knot, 0, 3);
                double a2 = glide.coefficient(knot, 0, 4);
                assertTrue(Math.abs(a2) < 1 && Math.abs(a1) < 1 + a2, "knot " + knot + " from " + from + " to " + to);
            }
            assertEquals(to, glide.target().section(0));
        }
    }

    /** A resonant low-pass that closes rings 29 dB up when its coefficients go straight, 15 dB in knots. */
    @Test
    void overshootsLessThanAStraightRamp() {
        Cascade from = cascade(Sections.lowPass(5000, 4));
        Cascade to = cascade(Sections.lowPass(200, 4));
        Pace pace = Pace.FOLLOWING.atLeastSeconds(0.1);
        assertEquals(29, worstDb(Glide.between(from, to, pace)), 1);
        assertEquals(15, worstDb(Glide.sweeping(from, to, pace)), 1);
    }

    private static double worstDb(Glide glide) {
        Walk walk = new Walk(glide.from(), Bucket.USUAL_LIMIT);
        var frames = new java.util.ArrayList<>(Runs.repeat(glide.from().section(0), 1500));
        walk.adopt(glide);
        frames.addAll(Runs.frames(walk, 0, (int) glide.totalFrames() + 3000, 64));
        double worst = 0;
        for (int n = 1500; n < frames.size(); n += 23) {
            worst = Math.max(worst, Runs.worstOutput(frames, n));
        }
        return 20 * Math.log10(worst);
    }

    /** A low-pass sweeps whatever the distance, even where a slot is free; a bell fades and another is born. */
    @Test
    void lowPassesSweepAndBellsAreExchanged() {
        DoubleFunction<Section> lowPass = hz -> Sections.lowPass(hz, 0.7);
        Cascade from = cascade(lowPass.apply(200), Section.PASS_THROUGH);
        Pairing pairing = Pairing.of(from, cascade(lowPass.apply(8000)));
        assertEquals(0, pairing.target(0));
        assertTrue(!pairing.isExchanged(0) && !pairing.isDying(0));

        Section low = Sections.notch(50, 5);
        Section high = Sections.notch(1000, 5);
        Glide glide = Glide.sweeping(cascade(low), cascade(high), Pace.SINGLE);
        assertEquals(Certificate.Rule.EXCHANGE, glide.certificate(0).rule());
        assertEquals(
                "Section 0: it fades, and once it rings no more another is born in its place, in " + glide.totalFrames()
                        + " frames; ringing grows at most 1.00-fold (0.0 dB).",
                glide.certificate(0).toString());
        assertEquals(0, glide.certificate(0).distance());
        boolean swapped = false;
        for (int knot = 0; knot <= glide.segmentCount(); knot++) {
            double a1 = glide.coefficient(knot, 0, 3);
            assertTrue(a1 == (swapped ? high.a1() : low.a1()) || glide.frames(knot - 1) == 0);
            swapped |= a1 == high.a1();
        }
        assertEquals(high, glide.target().section(0));
        double still = Glide.between(cascade(low), cascade(low), Pace.SINGLE)
                .certificate(0)
                .forcedBound();
        assertEquals(still, glide.certificate(0).forcedBound(), 0.1 * still);
    }

    /** What was bypassed comes back into the slots where it was. */
    @Test
    void birthsTakeTheSlotOfTheirOwnNumber() {
        Section notch = Sections.notch(100, 5);
        Cascade wish = cascade(Section.PASS_THROUGH, notch, Section.PASS_THROUGH);
        Cascade empty = cascade(Section.PASS_THROUGH, Section.PASS_THROUGH, Section.PASS_THROUGH);
        assertEquals(wish, Glide.between(empty, wish, Pace.SINGLE).target());
        assertEquals(wish, Glide.between(wish, wish, Pace.SINGLE).target());
    }
}
