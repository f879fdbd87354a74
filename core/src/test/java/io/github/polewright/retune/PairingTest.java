package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;

class PairingTest {

    private static final int FREE = -1;

    private static Cascade comb(int slots, double... centresHz) {
        List<Section> sections = new ArrayList<>(
                DoubleStream.of(centresHz).mapToObj(f -> Sections.notch(f, 1)).toList());
        while (sections.size() < slots) {
            sections.add(Section.PASS_THROUGH);
        }
        return Cascade.of(Sections.RATE_HZ, sections);
    }

    private static void assertTargets(Pairing pairing, int... expected) {
        for (int slot = 0; slot < expected.length; slot++) {
            assertEquals(expected[slot], pairing.target(slot), "slot " + slot);
        }
    }

    @Test
    void combThatFollowsKeepsItsOrder() {
        assertTargets(Pairing.of(comb(3, 50, 100, 150), comb(3, 51, 102, 153)), 0, 1, 2);
    }

    @Test
    void reorderedCombIsPairedByFrequency() {
        assertTargets(Pairing.of(comb(4, 50, 100, 150, 200), comb(4, 204, 51, 153, 102)), 1, 3, 2, 0);
        assertTargets(Pairing.of(comb(4, 200, 50, 150, 100), comb(4, 51, 102, 153, 204)), 3, 0, 2, 1);
    }

    @Test
    void combThatGainsANotchBearsItInAFreeSlot() {
        Pairing pairing = Pairing.of(comb(5, 50, 150, 200), comb(4, 50, 100, 150, 200));
        assertTargets(pairing, 0, 2, 3, 1, FREE);
        assertTrue(pairing.isBorn(3));
        assertFalse(pairing.isBorn(0) || pairing.isBorn(4));
    }

    @Test
    void combThatLosesANotchLetsItDieInPlace() {
        Pairing pairing = Pairing.of(comb(4, 50, 100, 150, 200), comb(3, 50, 150, 200));
        assertTargets(pairing, 0, FREE, 1, 2);
        assertTrue(pairing.isDying(1));
        assertFalse(pairing.isDying(0) || pairing.isDying(2) || pairing.isDying(3));
    }

    /** 60, 120, 180, ... is nearer to 50, 150, 200, ... crosswise than in order: order must win. */
    @Test
    void noNotchOfACombIsDraggedPastAnother() {
        Random random = new Random(51);
        for (int i = 0; i < 200; i++) {
            int count = 1 + random.nextInt(10);
            int next = 1 + random.nextInt(10);
            double base = 45 + 20 * random.nextDouble();
            double other = 45 + 20 * random.nextDouble();
            double[] from = random.ints(1, 20)
                    .distinct()
                    .limit(count)
                    .mapToDouble(k -> k * base)
                    .toArray();
            double[] to = random.ints(1, 20)
                    .distinct()
                    .limit(next)
                    .mapToDouble(k -> k * other)
                    .toArray();
            Pairing pairing = Pairing.of(comb(count + next, from), comb(next, to));
            for (int a = 0; a < count; a++) {
                for (int b = 0; b < count; b++) {
                    if (pairing.target(a) >= 0 && pairing.target(b) >= 0 && from[a] < from[b]) {
                        assertTrue(to[pairing.target(a)] < to[pairing.target(b)]);
                    }
                }
                if (pairing.target(a) >= 0) {
                    double ratio = from[a] / to[pairing.target(a)];
                    assertTrue(Math.abs(Math.log(ratio)) < 0.7, "dragged by a factor of " + ratio);
                }
            }
        }
    }

    @Test
    void everySectionOfTheTargetHasOneSlot() {
        Random random = new Random(52);
        for (int i = 0; i < 100; i++) {
            int count = 1 + random.nextInt(8);
            int next = 1 + random.nextInt(8);
            int slots = Math.max(count, next) + random.nextInt(3);
            List<Section> from = new ArrayList<>();
            List<Section> to = new ArrayList<>();
            for (int k = 0; k < slots; k++) {
                from.add(k < count ? Sections.random(random) : Section.PASS_THROUGH);
            }
            for (int k = 0; k < next; k++) {
                to.add(Sections.random(random));
            }
            Collections.shuffle(from, random);
            Pairing pairing = Pairing.of(Cascade.of(Sections.RATE_HZ, from), Cascade.of(Sections.RATE_HZ, to));
            boolean[] seen = new boolean[next];
            for (int slot = 0; slot < slots; slot++) {
                int target = pairing.target(slot);
                if (target >= 0) {
                    assertFalse(seen[target]);
                    seen[target] = true;
                }
                assertEquals(pairing.isBorn(slot), target >= 0 && from.get(slot).equals(Section.PASS_THROUGH));
                assertEquals(
                        pairing.isDying(slot), target < 0 && !from.get(slot).equals(Section.PASS_THROUGH));
            }
            for (boolean found : seen) {
                assertTrue(found);
            }
        }
    }

    /** The cost of the Hungarian method against trying every way to pair. */
    @Test
    void assignmentIsTheCheapest() {
        Random random = new Random(53);
        for (int i = 0; i < 400; i++) {
            int rows = random.nextInt(6);
            int columns = 1 + random.nextInt(5);
            double[][] costs = new double[rows][columns];
            for (double[] row : costs) {
                for (int j = 0; j < columns; j++) {
                    row[j] = 1.2 * random.nextDouble() + (random.nextInt(5) == 0 ? Assignment.FAR : 0);
                }
            }
            int[] matches = Assignment.solve(costs, 0.35);
            double total = (rows == 0 ? 0 : columns) * 0.35;
            for (int row = 0; row < rows; row++) {
                total += matches[row] < 0 ? 0.35 : costs[row][matches[row]] - 0.35;
            }
            double least = cheapest(costs, 0, new boolean[columns], rows == 0 ? 0 : columns);
            assertEquals(least, total, 1e-9);
        }
    }

    private static double cheapest(double[][] costs, int row, boolean[] taken, int left) {
        if (row == costs.length) {
            return left * 0.35;
        }
        double least = 0.35 + cheapest(costs, row + 1, taken, left);
        for (int j = 0; j < taken.length; j++) {
            if (!taken[j]) {
                taken[j] = true;
                least = Math.min(least, costs[row][j] + cheapest(costs, row + 1, taken, left - 1));
                taken[j] = false;
            }
        }
        return least;
    }

    @Test
    void equalizerKeepsNeighboursTogetherWhateverTheOrder() {
        Section low = Sections.peak(200, 2, 6);
        Section high = Sections.lowPass(8000, 0.8);
        Section lowMoved = Sections.peak(220, 2, 3);
        Section highMoved = Sections.lowPass(8500, 0.8);
        Cascade from = Cascade.of(Sections.RATE_HZ, low, high, Section.PASS_THROUGH);
        assertTargets(Pairing.of(from, Cascade.of(Sections.RATE_HZ, highMoved, lowMoved)), 1, 0, FREE);
    }

    @Test
    void withoutAFreeSlotTheClosestLeftoversArePaired() {
        Pairing pairing = Pairing.of(comb(2, 50, 400), comb(2, 50, 1000));
        assertTargets(pairing, 0, 1);
        assertFalse(pairing.isBorn(1) || pairing.isDying(1));
    }

    @Test
    void refusalsNameTheSection() {
        assertEquals(
                -1,
                assertThrows(RefusedGlideException.class, () -> Pairing.of(comb(1, 50), comb(2, 50, 100)))
                        .section());
        Cascade unstable = Cascade.of(Sections.RATE_HZ, Section.PASS_THROUGH, Section.of(1, 0, 0, 0, 1.1));
        RefusedGlideException refused =
                assertThrows(RefusedGlideException.class, () -> Pairing.of(comb(2, 50), unstable));
        assertEquals(1, refused.section());
        assertTrue(refused.getMessage().startsWith("section 1: not stable"));
    }
}
