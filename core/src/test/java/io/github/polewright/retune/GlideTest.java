package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import org.junit.jupiter.api.Test;

class GlideTest {

    private static final CascadeDesign LOW_PASS = (frequencyHz, q, gainDb) -> cascade(Sections.lowPass(frequencyHz, q));

    private static final CascadeDesign PEAK =
            (frequencyHz, q, gainDb) -> cascade(Sections.peak(frequencyHz, q, gainDb));

    private static Cascade cascade(Section... sections) {
        return Cascade.of(Sections.RATE_HZ, sections);
    }

    private static void assertKnot(Section expected, Glide glide, int knot, int section) {
        Section found = Section.of(
                glide.coefficient(knot, section, 0),
                glide.coefficient(knot, section, 1),
                glide.coefficient(knot, section, 2),
                glide.coefficient(knot, section, 3),
                glide.coefficient(knot, section, 4));
        assertEquals(expected, found);
    }

    @Test
    void followerTakesTheCertifiedLengthInOneSegment() {
        Section from = Sections.notch(50, 1);
        Section to = Sections.notch(60, 1);
        Glide glide = Glide.between(cascade(from), cascade(to), Pace.FOLLOWING);
        // d = 0.18234 and ln(1/a2) = 1.309e-4 give 2 * 1393.0 frames at half of the decay.
        assertEquals(1, glide.segmentCount());
        assertEquals(2787, glide.totalFrames(), 1);
        assertEquals(glide.totalFrames(), glide.certificate(0).shortestFrames());
        assertEquals(0.18234, glide.distance(0, 0), 5e-6);
        assertKnot(from, glide, 0, 0);
        assertKnot(to, glide, 1, 0);
    }

    @Test
    void hopInsideSevenTenthsOfAWidthMayJump() {
        Glide glide = Glide.between(cascade(Sections.notch(50, 1)), cascade(Sections.notch(50.69, 1)), Pace.FOLLOWING);
        assertEquals(Certificate.Rule.PAIR, glide.certificate(0).rule());
        assertEquals(1, glide.totalFrames());
        Glide farther =
                Glide.between(cascade(Sections.notch(50, 1)), cascade(Sections.notch(50.71, 1)), Pace.FOLLOWING);
        assertEquals(Certificate.Rule.RAMP, farther.certificate(0).rule());
        assertTrue(farther.totalFrames() > 200);
    }

    @Test
    void paceSetsTheLengthAndNeverUndercutsTheCertificate() {
        Cascade from = cascade(Sections.notch(50, 1));
        Cascade to = cascade(Sections.notch(60, 1));
        assertEquals(2 * 2787, Glide.between(from, to, Pace.SINGLE).totalFrames(), 35);
        assertEquals(2787, Glide.between(from, to, Pace.TURNING).totalFrames(), 1);
        assertEquals(
                48_000,
                Glide.between(from, to, Pace.FOLLOWING.atLeastSeconds(1)).totalFrames());
        Cascade wide = cascade(Sections.lowPass(1000, 0.7));
        Cascade wider = cascade(Sections.lowPass(1060, 0.7));
        assertEquals(2400, Glide.between(wide, wider, Pace.TURNING).totalFrames());
        assertEquals(2880, Glide.between(wide, wider, Pace.SINGLE).totalFrames());
        Glide sweep = Glide.along(LOW_PASS, new Setting(200, 4, 0), new Setting(12800, 4, 0), Pace.SINGLE);
        assertEquals(0.025 * 6 * 48_000, sweep.totalFrames(), 1);
    }

    @Test
    void evenSweepHasAKnotEveryHalfOctaveAndSixteenAtMost() {
        Setting low = new Setting(200, 0.7, 0);
        Glide sweep = Glide.along(LOW_PASS, low, new Setting(1600, 2.8, 0), Pace.TURNING);
        assertEquals(6, sweep.segmentCount());
        assertKnot(Sections.lowPass(200 * Math.pow(2, 1.5), 1.4), sweep, 3, 0, 1e-12);
        assertEquals(400, sweep.frames(2), 1);
        assertEquals(2400, sweep.totalFrames());
        assertEquals(
                16,
                Glide.along(LOW_PASS, new Setting(20, 1, 0), new Setting(20000, 1, 0), Pace.TURNING)
                        .segmentCount());
        Glide raise = Glide.along(PEAK, new Setting(1000, 1, 0), new Setting(1000, 1, 12), Pace.SINGLE);
        assertKnot(Sections.peak(1000, 1, 6), raise, raise.segmentCount() / 2, 0, 1e-12);
    }

    private static void assertKnot(Section expected, Glide glide, int knot, int section, double tolerance) {
        double[] wanted = {expected.b0(), expected.b1(), expected.b2(), expected.a1(), expected.a2()};
        for (int i = 0; i < 5; i++) {
            assertEquals(wanted[i], glide.coefficient(knot, section, i), tolerance);
        }
    }

    /** Between knots the place lags the smoothstep by at most its largest curvature, 6, times h squared over 8. */
    @Test
    void gentlePaceFollowsTheSmoothstep() {
        Glide raise = Glide.along(PEAK, new Setting(1000, 1, 0), new Setting(1000, 1, 12), Pace.SINGLE);
        assertEquals(64, raise.segmentCount());
        int elapsed = 0;
        for (int i = 0; i <= 64; i++) {
            double u = i / 64.0;
            double gainDb = 12 * (u * u * (3 - 2 * u));
            assertKnot(Sections.peak(1000, 1, gainDb), raise, i, 0, 1e-12);
            assertEquals(2880 * u, elapsed, 0.5);
            elapsed += i < 64 ? raise.frames(i) : 0;
        }
        assertEquals(Sections.peak(1000, 1, 12), raise.target().section(0));
    }

    /** The path through log frequency is longer than the geodesic, by at most 18 % at half an octave a knot. */
    @Test
    void knotsLengthenThePathALittle() {
        for (double q : new double[] {0.7, 4}) {
            Glide sweep = Glide.along(LOW_PASS, new Setting(5000, q, 0), new Setting(200, q, 0), Pace.TURNING);
            double straight = Distance.between(Sections.lowPass(5000, q), Sections.lowPass(200, q));
            double ratio = sweep.certificate(0).distance() / straight;
            assertTrue(ratio >= 1 && ratio < 1.18, "ratio " + ratio);
        }
    }

    @Test
    void birthSwapsInThePolesAndThenMovesOnlyTheNumerator() {
        Section kept = Sections.notch(50, 1);
        Section born = Sections.notch(100, 1);
        Glide glide = Glide.between(cascade(kept, Section.PASS_THROUGH), cascade(kept, born), Pace.TURNING);
        assertEquals(2, glide.segmentCount());
        assertEquals(0, glide.frames(0));
        assertKnot(Section.PASS_THROUGH, glide, 0, 1);
        assertKnot(Section.of(1, born.a1(), born.a2(), born.a1(), born.a2()), glide, 1, 1);
        assertKnot(born, glide, 2, 1);
        assertEquals(2400, glide.totalFrames());
        assertEquals(Certificate.Rule.STILL, glide.certificate(1).rule());
        assertEquals(0, glide.distance(0, 1) + glide.distance(1, 1));
    }

    @Test
    void deathMovesTheNumeratorWaitsAndThenSwapsOut() {
        Section kept = Sections.notch(50, 1);
        Section dying = Sections.notch(100, 10);
        Glide glide = Glide.between(cascade(dying, kept), cascade(kept), Pace.TURNING);
        assertEquals(3, glide.segmentCount());
        Section transparent = Section.of(1, dying.a1(), dying.a2(), dying.a1(), dying.a2());
        assertKnot(transparent, glide, 1, 0);
        assertKnot(transparent, glide, 2, 0);
        assertKnot(Section.PASS_THROUGH, glide, 3, 0);
        // A pole radius sqrt(a2) to the power of the wait leaves a millionth.
        assertEquals(1e-6, Math.pow(dying.a2(), glide.frames(1) / 2.0), 1e-8);
        assertEquals(0, glide.frames(2));
        assertEquals(Section.PASS_THROUGH, glide.target().section(0));
        assertEquals(kept, glide.target().section(1));
    }

    @Test
    void sectionsMoveToTheSlotsOfTheRunningCascade() {
        Glide sweep = Glide.along(
                (f, q, gainDb) -> cascade(Sections.peak(f, q, 6), Sections.lowPass(4 * f, q)),
                new Setting(500, 1, 0),
                new Setting(700, 1, 0),
                Pace.TURNING);
        Cascade running = cascade(Section.PASS_THROUGH, Sections.lowPass(2000, 1), Sections.peak(500, 1, 6));
        Glide moved = sweep.inSlotsOf(running);
        assertEquals(running, moved.from());
        assertKnot(Sections.lowPass(2800, 1), moved, moved.segmentCount(), 1);
        assertKnot(Sections.peak(700, 1, 6), moved, moved.segmentCount(), 2);
        assertKnot(Section.PASS_THROUGH, moved, moved.segmentCount(), 0);
        assertEquals(sweep.certificate(0).distance(), moved.certificate(2).distance());
        assertEquals(2, moved.certificate(2).section());
        assertThrows(RefusedGlideException.class, () -> sweep.inSlotsOf(cascade(Section.PASS_THROUGH)));
        assertThrows(RefusedGlideException.class, () -> sweep.inSlotsOf(Cascade.of(44_100, running.sections())));
    }

    @Test
    void certificateSaysWhatItGrants() {
        Certificate certificate = Glide.between(
                        cascade(Sections.notch(60, 1)), cascade(Sections.notch(50, 1)), Pace.FOLLOWING)
                .certificate(0);
        assertEquals(1.2, certificate.ringingBound(), 1e-4);
        assertEquals(1.09545, certificate.stateBound(), 1e-5);
        Certificate upwards = Glide.between(
                        cascade(Sections.notch(50, 1)), cascade(Sections.notch(60, 1)), Pace.FOLLOWING)
                .certificate(0);
        assertEquals(9.5, 20 * Math.log10(upwards.forcedBound()), 0.06);
        assertEquals(upwards.forcedBound(), upwards.forcedBound());
        assertEquals(
                "Section 0: the poles move by d = 0.182 along a ramp of at least " + certificate.shortestFrames()
                        + " frames; ringing grows at most 1.20-fold (1.6 dB).",
                certificate.toString());
    }

    @Test
    void aPacePrintsInOneLine() {
        assertEquals(
                "gentle, 2.0 times the certified length, at least 0.06 s and 0.025 s an octave",
                Pace.SINGLE.toString());
        assertEquals(
                "even, 1.0 times the certified length, at least 3.0 s and 0.0 s an octave",
                Pace.TURNING.atLeastSeconds(3).toString());
    }

    @Test
    void whatCannotBeCertifiedIsRefused() {
        Cascade notch = cascade(Sections.notch(50, 1));
        assertThrows(
                RefusedGlideException.class,
                () -> Glide.between(notch, Cascade.of(44_100, Sections.notch(50, 1)), Pace.SINGLE));
        assertThrows(
                RefusedGlideException.class,
                () -> Glide.between(notch, cascade(Section.of(1, 0, 0, 0, 1)), Pace.SINGLE));
        assertThrows(
                RefusedGlideException.class,
                () -> Glide.between(notch, cascade(Sections.notch(50, 1), Sections.notch(60, 1)), Pace.SINGLE));
        RefusedGlideException endless = assertThrows(
                RefusedGlideException.class,
                () -> Glide.between(notch, cascade(Section.of(1, 0, 0, -1, 1 - 1e-13)), Pace.SINGLE));
        assertEquals(0, endless.section());
        assertTrue(endless.getMessage().contains("too close to instability"));
        CascadeDesign burst = (f, q, gainDb) -> cascade(Section.of(1, 0, 0, 0, f / 1000));
        assertThrows(
                RefusedGlideException.class,
                () -> Glide.along(burst, new Setting(100, 1, 0), new Setting(1100, 1, 0), Pace.SINGLE));
        CascadeDesign grows = (f, q, gainDb) ->
                f > 150 ? cascade(Sections.notch(f, 1), Sections.notch(f, 1)) : cascade(Sections.notch(f, 1));
        assertThrows(
                RefusedGlideException.class,
                () -> Glide.along(grows, new Setting(100, 1, 0), new Setting(200, 1, 0), Pace.SINGLE));
        assertThrows(IllegalArgumentException.class, () -> new Setting(0, 1, 0));
        assertThrows(IllegalArgumentException.class, () -> new Setting(1, Double.NaN, 0));
        assertThrows(IllegalArgumentException.class, () -> new Setting(1, 1, Double.POSITIVE_INFINITY));
        assertThrows(IllegalArgumentException.class, () -> Pace.SINGLE.atLeastSeconds(-1));
    }
}
