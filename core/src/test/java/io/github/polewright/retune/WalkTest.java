package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class WalkTest {

    private static final double LIMIT = Bucket.USUAL_LIMIT;

    private static Cascade cascade(Section... sections) {
        return Cascade.of(Sections.RATE_HZ, sections);
    }

    private static void assertAt(Section expected, Walk walk, int slot) {
        double[] wanted = {expected.b0(), expected.b1(), expected.b2(), expected.a1(), expected.a2()};
        double[] found = new double[5];
        System.arraycopy(walk.bases(), slot * 5, found, 0, 5);
        assertArrayEquals(wanted, found);
    }

    private static void runToEnd(Walk walk) {
        for (int i = 0; i < 1_000_000 && !walk.isSettled(); i++) {
            walk.next(512);
        }
        assertTrue(walk.isSettled());
    }

    @Test
    void walksInEqualStepsAndLandsExactly() {
        Cascade from = cascade(Sections.notch(50, 1), Sections.peak(500, 1, 3));
        Cascade to = cascade(Sections.notch(51, 1), Sections.peak(600, 1, 9));
        Walk walk = new Walk(from, LIMIT);
        assertTrue(walk.isSettled());
        Glide glide = Glide.between(from, to, Pace.TURNING);
        walk.adopt(glide);
        assertFalse(walk.isSettled());
        List<double[]> frames = Runs.frames(walk, 1, 2400, 64);
        assertFalse(walk.isSettled());
        assertEquals(64, walk.next(64));
        assertTrue(walk.isSettled());
        for (double step : walk.steps()) {
            assertEquals(0, step);
        }
        assertAt(to.section(0), walk, 0);
        assertAt(to.section(1), walk, 1);
        for (int i = 0; i < 2400; i++) {
            double share = (i + 1) / 2400.0;
            double a1 = from.section(1).a1()
                    + share * (to.section(1).a1() - from.section(1).a1());
            assertEquals(a1, frames.get(i)[3], 1e-15);
        }
    }

    @Test
    void cuttingTheStreamChangesNothing() {
        Random random = new Random(61);
        List<Cascade> targets = new ArrayList<>();
        for (int i = 0; i < 12; i++) {
            targets.add(cascade(
                    Sections.notch(45 + 20 * random.nextDouble(), 1),
                    Sections.lowPass(300 + 3000 * random.nextDouble(), 0.6 + random.nextDouble())));
        }
        List<double[]> whole = frames(targets, 4096, random);
        List<double[]> cut = frames(targets, 1, random);
        List<double[]> odd = frames(targets, 37, random);
        for (int i = 0; i < whole.size(); i++) {
            assertArrayEquals(whole.get(i), cut.get(i));
            assertArrayEquals(whole.get(i), odd.get(i));
        }
    }

    private static List<double[]> frames(List<Cascade> targets, int mostFrames, Random random) {
        Walk walk = new Walk(targets.get(0), LIMIT);
        List<double[]> frames = new ArrayList<>();
        for (int i = 1; i < targets.size(); i++) {
            walk.adopt(Glide.between(targets.get(i - 1), targets.get(i), i % 2 == 0 ? Pace.SINGLE : Pace.TURNING));
            frames.addAll(Runs.frames(walk, i % 2, 700 + 211 * i, mostFrames));
        }
        return frames;
    }

    @Test
    void adoptionStartsWhereTheCoefficientsAreNow() {
        Cascade first = cascade(Sections.lowPass(500, 0.7));
        Cascade second = cascade(Sections.lowPass(700, 0.7));
        Cascade third = cascade(Sections.lowPass(600, 0.9));
        for (Pace pace : List.of(Pace.TURNING, Pace.SINGLE)) {
            Walk walk = new Walk(first, LIMIT);
            walk.adopt(Glide.between(first, second, pace));
            List<double[]> frames = Runs.frames(walk, 0, 1000, 64);
            walk.adopt(Glide.between(second, third, pace));
            frames.addAll(Runs.frames(walk, 0, 2600, 64));
            double largest = 0;
            for (int i = 1; i < frames.size(); i++) {
                largest = Math.max(largest, Math.abs(frames.get(i)[3] - frames.get(i - 1)[3]));
            }
            double whole = Math.abs(second.section(0).a1() - first.section(0).a1());
            assertTrue(largest < whole / 400, "jump of " + largest + " in " + whole);
            runToEnd(walk);
            assertAt(third.section(0), walk, 0);
        }
    }

    @Test
    void repeatedTargetStillArrivesFromTheMiddle() {
        Cascade first = cascade(Sections.lowPass(500, 0.7));
        Cascade second = cascade(Sections.lowPass(700, 0.7));
        Walk walk = new Walk(first, LIMIT);
        walk.adopt(Glide.between(first, second, Pace.SINGLE));
        walk.next(100);
        walk.adopt(Glide.between(second, second, Pace.SINGLE));
        assertFalse(walk.isSettled());
        runToEnd(walk);
        assertAt(second.section(0), walk, 0);
        walk.adopt(Glide.between(second, second, Pace.SINGLE));
        assertTrue(walk.isSettled());
    }

    /** While a birth, a death or a fade is interrupted at any moment, poles never move towards 0. */
    @Test
    void interruptedBirthsAndDeathsKeepTheirPoles() {
        Cascade empty = cascade(Section.PASS_THROUGH, Section.PASS_THROUGH);
        Cascade one = cascade(Sections.notch(100, 20), Section.PASS_THROUGH);
        Cascade two = cascade(Sections.notch(100, 20), Sections.notch(200, 20));
        Random random = new Random(62);
        for (int round = 0; round < 60; round++) {
            Walk walk = new Walk(empty, LIMIT);
            Cascade submitted = empty;
            List<Cascade> targets = List.of(empty, one, two);
            for (int i = 0; i < 6; i++) {
                Cascade target = i == 5 ? two : targets.get(random.nextInt(3));
                Glide glide = Glide.between(submitted, target, random.nextBoolean() ? Pace.TURNING : Pace.SINGLE);
                submitted = glide.target();
                if (i < 5 && random.nextInt(4) == 0) {
                    continue; // overtaken before it was adopted
                }
                walk.adopt(glide);
                for (int left = random.nextInt(20_000); left > 0; left -= 64) {
                    walk.next(64);
                    for (int slot = 0; slot < 2; slot++) {
                        assertPolesAreWhole(walk, slot);
                    }
                }
            }
            runToEnd(walk);
            assertEquals(
                    2, submitted.sections().stream().filter(s -> s.a2() != 0).count());
            for (int slot = 0; slot < 2; slot++) {
                assertAt(submitted.section(slot), walk, slot);
            }
        }
    }

    private static void assertPolesAreWhole(Walk walk, int slot) {
        double a2 = walk.bases()[slot * 5 + 4];
        boolean passes = a2 == 0 && walk.bases()[slot * 5] == 1 && walk.bases()[slot * 5 + 1] == 0;
        assertTrue(passes || a2 > 0.99, "a2 " + a2);
    }

    @Test
    void fullBucketHoldsTheCoefficientsAndLetsGoInTime() {
        Cascade first = cascade(Sections.notch(50, 1));
        Cascade second = cascade(Sections.notch(60, 1));
        Walk walk = new Walk(first, 0.08);
        walk.adopt(Glide.between(first, second, Pace.FOLLOWING));
        assertEquals(2000, walk.next(2000));
        // Empty, it admits any one change: half of 0.18234, less what the walk has lost on its way.
        double leak = -0.25 * Math.log(first.section(0).a2());
        assertEquals(0.09117 - 2000 * leak, walk.level(0), 1e-4);
        double level = walk.level(0);
        Section now =
                Section.of(1, 0, 0, walk.bases()[3] + 2000 * walk.steps()[3], walk.bases()[4] + 2000 * walk.steps()[4]);
        double back = Distance.between(now, first.section(0)) / 2;
        walk.adopt(Glide.between(second, first, Pace.FOLLOWING));
        int held = 0;
        while (walk.next(1) == 1 && walk.steps()[3] == 0) {
            held++;
            assertEquals(now.a1(), walk.bases()[3]);
            assertFalse(walk.isSettled());
        }
        assertEquals((level + back - 0.08) / leak, held, 20);
        assertTrue(walk.level(0) <= 0.0801);
        runToEnd(walk);
        assertAt(first.section(0), walk, 0);
    }

    /** Random targets at random moments: the level tells the truth about the state's gain since any earlier moment. */
    @Test
    void levelBoundsTheStateGainOfRandomRetunes() {
        Random random = new Random(63);
        for (int round = 0; round < 20; round++) {
            Cascade before = cascade(Sections.random(random));
            Walk walk = new Walk(before, LIMIT);
            List<double[]> used = new ArrayList<>();
            double highest = LIMIT;
            for (int i = 0; i < 30; i++) {
                Cascade target = cascade(Sections.random(random));
                Glide glide = Glide.between(before, target, i % 3 == 0 ? Pace.FOLLOWING : Pace.TURNING);
                before = glide.target();
                walk.adopt(glide);
                used.addAll(Runs.frames(walk, 0, 1 + random.nextInt(400), 64));
                highest = Math.max(highest, walk.level(0));
                highest = Math.max(highest, 0.5 * glide.distance(0, 0));
            }
            for (int start = 0; start < used.size(); start += 97) {
                Plane product = Plane.IDENTITY;
                double[] at = used.get(start);
                Plane from = Plane.basisOf(Section.of(1, 0, 0, at[3], at[4]));
                for (int i = start + 1; i < used.size(); i++) {
                    double[] set = used.get(i);
                    product = Plane.state(set[3], set[4]).times(product);
                    double gain = product.norm(from, Plane.basisOf(Section.of(1, 0, 0, set[3], set[4])));
                    assertTrue(gain <= Math.exp(highest) * (1 + 1e-6), gain + " > e^" + highest);
                }
            }
        }
    }

    @Test
    void resetArrivesAtOnce() {
        Cascade first = cascade(Sections.notch(50, 1));
        Cascade second = cascade(Sections.notch(60, 1));
        Walk walk = new Walk(first, LIMIT);
        walk.adopt(Glide.between(first, second, Pace.SINGLE));
        walk.next(500);
        walk.reset();
        assertTrue(walk.isSettled());
        assertEquals(0, walk.level(0));
        assertAt(second.section(0), walk, 0);
    }

    @Test
    void foreignGlideIsRefusedBeforeAnythingChanges() {
        Cascade first = cascade(Sections.notch(50, 1));
        Walk walk = new Walk(first, LIMIT);
        Cascade wide = cascade(Sections.notch(50, 1), Section.PASS_THROUGH);
        assertFalse(walk.adopt(Glide.between(wide, wide, Pace.SINGLE)));
        Cascade other = Cascade.of(44_100, first.section(0));
        assertFalse(walk.adopt(Glide.between(other, other, Pace.SINGLE)));
        assertTrue(walk.isSettled());
        assertThrows(IllegalArgumentException.class, () -> new Walk(cascade(Section.of(1, 0, 0, 0, 2)), LIMIT));
    }

    /** A notch caught on its way to a far one is not dragged: it fades where it is, and the other is born. */
    @Test
    void farNotchIsExchangedAlsoInTheMiddleOfAGlide() {
        Section low = Sections.notch(50, 20);
        Section near = Sections.notch(60, 20);
        Section far = Sections.notch(5000, 20);
        Walk walk = new Walk(cascade(low), LIMIT);
        walk.adopt(Glide.between(cascade(low), cascade(near), Pace.TURNING));
        walk.next(1000);
        double caught = walk.bases()[3] + 1000 * walk.steps()[3];
        walk.adopt(Glide.between(cascade(near), cascade(far), Pace.TURNING));
        long planned = walk.framesLeft();
        long frames = 0;
        while (!walk.isSettled()) {
            int stretch = walk.next(64);
            double a1 = walk.bases()[3];
            assertTrue(a1 == far.a1() || Math.abs(a1 - caught) < 1e-15, "a1 " + a1);
            assertEquals(0, walk.steps()[3]);
            frames += stretch;
            walk.arrive();
        }
        assertEquals(planned, frames);
        assertAt(far, walk, 0);
        assertEquals(0, walk.framesHeld());
    }

    /** A glide that was to hop may not hop from elsewhere: it takes the frames that the distance from here needs. */
    @Test
    void hopFromElsewhereTakesTheCertifiedFrames() {
        Section low = Sections.notch(50, 1);
        Section high = Sections.notch(60, 1);
        Glide hop = Glide.between(cascade(Sections.notch(59.5, 1)), cascade(high), Pace.FOLLOWING);
        assertEquals(1, hop.totalFrames());
        Walk walk = new Walk(cascade(low), LIMIT);
        walk.adopt(hop);
        long needed = Glide.between(cascade(low), cascade(high), Pace.FOLLOWING).totalFrames();
        assertEquals(needed, walk.framesLeft(), 0.04 * needed);
        runToEnd(walk);
        assertAt(high, walk, 0);
    }

    @Test
    void askingForTheLevelChangesNoBit() {
        Cascade first = cascade(Sections.notch(50, 1));
        Cascade second = cascade(Sections.notch(60, 1));
        Walk asked = new Walk(first, LIMIT);
        Walk silent = new Walk(first, LIMIT);
        for (int i = 0; i < 300; i++) {
            Glide glide = Glide.between(i % 2 == 0 ? first : second, i % 2 == 0 ? second : first, Pace.FOLLOWING);
            asked.adopt(glide);
            silent.adopt(glide);
            for (int left = 1_111; left > 0; ) {
                int frames = asked.next(Math.min(left, 37));
                asked.level(0);
                assertEquals(frames, silent.next(Math.min(left, 37)));
                left -= frames;
            }
            assertEquals(silent.level(0), asked.level(0));
        }
        assertTrue(asked.framesHeld() > 0);
        assertTrue(asked.highestLevel() <= LIMIT);
    }
}
