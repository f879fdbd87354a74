package io.github.polewright.retune;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.slab.Ranges;
import java.util.Arrays;
import java.util.Objects;

/**
 * Which section of a target each section of a running cascade turns into. The order of the target is changed, never the
 * running slots; sections in series commute.
 *
 * <p>Only close sections are paired, those less than d = 0.7 apart. Any other section of the target is <em>born</em>: a
 * slot that passes through becomes b = a with the target's poles, which changes nothing, and then only b moves. Any
 * other section of the running cascade <em>dies</em>: its b moves to a, and once what still rings is gone the slot
 * passes through. A birth or a death costs as much as a pair at d = 0.35. The cost of a pair is d and a small share for
 * the movement of its zeros. Combs, whose notches each have zeros and poles at one angle, are aligned in the order of
 * frequency by dynamic programming, so that no notch of a comb that gains or loses some is dragged past another; other
 * cascades by the Hungarian method. Common practice but for the costs, which were chosen for this project.
 *
 * <p>Sections that hold back an end of the band, such as a low-pass or a shelf, are paired at any distance, since one
 * that faded would let through what it is there to hold back. Where a birth finds no slot, the closest leftovers are
 * paired too; if both are notches or bells, the one fades and the other is then born in its slot.
 *
 * <p><b>Threads</b> immutable. <b>Errors</b> see {@link #of}.
 */
public final class Pairing {

    static final double END_COST = 0.35;
    static final double FARTHEST = 2 * END_COST;
    private static final double ZERO_SHARE = 0.05;

    private final int[] targets;
    private final boolean[] born;
    private final boolean[] dying;
    private final boolean[] exchanged;

    private Pairing(int[] targets, boolean[] born, boolean[] dying, boolean[] exchanged) {
        this.targets = targets;
        this.born = born;
        this.dying = dying;
        this.exchanged = exchanged;
    }

    /**
     * Pairs the sections of two cascades.
     *
     * @param from the running cascade, one section a slot, free slots being {@link Section#PASS_THROUGH}
     * @param to the wish; its sections that pass through are left out
     * @return the pairing
     * @throws RefusedGlideException if {@code to} has more sections than {@code from} has slots, or a section is not
     *     stable
     */
    public static Pairing of(Cascade from, Cascade to) {
        int[] olds = present(Objects.requireNonNull(from, "from"));
        int[] news = present(Objects.requireNonNull(to, "to"));
        if (news.length > from.sectionCount()) {
            throw new RefusedGlideException(
                    -1,
                    "the target has " + news.length + " sections; the running cascade has room for "
                            + from.sectionCount());
        }
        requireStable(from);
        requireStable(to);
        double[][] costs = costs(from, olds, to, news);
        int[] matches = isComb(from, olds) && isComb(to, news)
                ? alignByAngle(from, olds, to, news, costs)
                : Assignment.solve(costs, END_COST);
        fillUp(matches, costs, from.sectionCount() - olds.length);
        return place(from, olds, to, news, matches);
    }

    /**
     * What becomes of a slot.
     *
     * @param slot its index in the running cascade
     * @return the index of the target's section, or -1 if the slot will pass through
     * @throws IndexOutOfBoundsException if there is no such slot
     */
    public int target(int slot) {
        return targets[checked(slot)];
    }

    /**
     * Whether a slot that passes through becomes a section.
     *
     * @param slot its index in the running cascade
     * @return true for a birth
     * @throws IndexOutOfBoundsException if there is no such slot
     */
    public boolean isBorn(int slot) {
        return born[checked(slot)];
    }

    /**
     * Whether a slot will pass through.
     *
     * @param slot its index in the running cascade
     * @return true for a death
     * @throws IndexOutOfBoundsException if there is no such slot
     */
    public boolean isDying(int slot) {
        return dying[checked(slot)];
    }

    /**
     * Whether a slot's section fades out and its target is then born in the same slot.
     *
     * @param slot its index in the running cascade
     * @return true for a notch or bell that is too far from its target
     * @throws IndexOutOfBoundsException if there is no such slot
     */
    public boolean isExchanged(int slot) {
        return exchanged[checked(slot)];
    }

    private int checked(int slot) {
        Ranges.index("slot", slot, targets.length);
        return slot;
    }

    private static int[] present(Cascade cascade) {
        int[] found = new int[cascade.sectionCount()];
        int count = 0;
        for (int i = 0; i < found.length; i++) {
            if (!cascade.section(i).equals(Section.PASS_THROUGH)) {
                found[count++] = i;
            }
        }
        return Arrays.copyOf(found, count);
    }

    private static void requireStable(Cascade cascade) {
        for (int i = 0; i < cascade.sectionCount(); i++) {
            if (!cascade.section(i).isStable()) {
                throw new RefusedGlideException(i, "not stable: " + cascade.section(i));
            }
        }
    }

    private static double[][] costs(Cascade from, int[] olds, Cascade to, int[] news) {
        double[][] costs = new double[olds.length][news.length];
        for (int i = 0; i < olds.length; i++) {
            for (int j = 0; j < news.length; j++) {
                Section a = from.section(olds[i]);
                Section b = to.section(news[j]);
                double distance = Distance.between(a, b);
                double cost = distance + ZERO_SHARE * zeroMovement(a, b);
                if (opensBothEnds(a) || opensBothEnds(b)) {
                    costs[i][j] = distance < FARTHEST ? cost : cost + Assignment.FAR;
                } else {
                    // A low-pass that fades lets through what it is there to hold back: it sweeps, however far.
                    costs[i][j] = FARTHEST * cost / (1 + cost);
                }
            }
        }
        return costs;
    }

    private static boolean opensBothEnds(Section section) {
        return Transparency.opensBothEnds(
                new double[] {section.b0(), section.b1(), section.b2(), section.a1(), section.a2()}, 0);
    }

    private static double zeroMovement(Section from, Section to) {
        double fromSize = size(from);
        double toSize = size(to);
        if (fromSize == 0 || toSize == 0) {
            return 1;
        }
        double b0 = from.b0() / fromSize - to.b0() / toSize;
        double b1 = from.b1() / fromSize - to.b1() / toSize;
        double b2 = from.b2() / fromSize - to.b2() / toSize;
        return Math.sqrt(b0 * b0 + b1 * b1 + b2 * b2);
    }

    private static double size(Section section) {
        return Math.sqrt(section.b0() * section.b0() + section.b1() * section.b1() + section.b2() * section.b2());
    }

    /** Whether every section has zeros and complex poles at one angle: notches and peaks. */
    private static boolean isComb(Cascade cascade, int[] present) {
        for (int index : present) {
            Section s = cascade.section(index);
            double skew = s.b1() * (1 + s.a2()) - s.a1() * (s.b0() + s.b2());
            if (!Poles.areComplex(s.a1(), s.a2()) || Math.abs(skew) > 1e-9 * (Math.abs(s.b0()) + Math.abs(s.b2()))) {
                return false;
            }
        }
        return true;
    }

    private static int[] alignByAngle(Cascade from, int[] olds, Cascade to, int[] news, double[][] costs) {
        int[] oldOrder = byAngle(from, olds);
        int[] newOrder = byAngle(to, news);
        double[][] sorted = new double[olds.length][news.length];
        for (int i = 0; i < olds.length; i++) {
            for (int j = 0; j < news.length; j++) {
                sorted[i][j] = costs[oldOrder[i]][newOrder[j]];
            }
        }
        int[] aligned = Alignment.solve(sorted, news.length, END_COST);
        int[] matches = new int[olds.length];
        for (int i = 0; i < olds.length; i++) {
            matches[oldOrder[i]] = aligned[i] < 0 ? -1 : newOrder[aligned[i]];
        }
        return matches;
    }

    private static int[] byAngle(Cascade cascade, int[] present) {
        Integer[] order = new Integer[present.length];
        Arrays.setAll(order, i -> i);
        Arrays.sort(order, (i, j) -> Double.compare(angle(cascade, present[i]), angle(cascade, present[j])));
        return Arrays.stream(order).mapToInt(Integer::intValue).toArray();
    }

    private static double angle(Cascade cascade, int index) {
        return Poles.angle(cascade.section(index).a1(), cascade.section(index).a2());
    }

    /** Pairs the closest leftovers while there are more births than free slots. */
    private static void fillUp(int[] matches, double[][] costs, int freeSlots) {
        int newCount = matches.length == 0 ? 0 : costs[0].length;
        boolean[] taken = new boolean[newCount];
        int births = newCount;
        for (int match : matches) {
            if (match >= 0) {
                taken[match] = true;
                births--;
            }
        }
        for (; births > freeSlots; births--) {
            int bestOld = -1;
            int bestNew = -1;
            for (int i = 0; i < matches.length; i++) {
                for (int j = 0; matches[i] < 0 && j < newCount; j++) {
                    if (!taken[j] && (bestOld < 0 || costs[i][j] < costs[bestOld][bestNew])) {
                        bestOld = i;
                        bestNew = j;
                    }
                }
            }
            matches[bestOld] = bestNew;
            taken[bestNew] = true;
        }
    }

    private static Pairing place(Cascade from, int[] olds, Cascade to, int[] news, int[] matches) {
        int slots = from.sectionCount();
        int[] targets = new int[slots];
        boolean[] born = new boolean[slots];
        boolean[] dying = new boolean[slots];
        boolean[] occupied = new boolean[slots];
        boolean[] placed = new boolean[news.length];
        Arrays.fill(targets, -1);
        for (int i = 0; i < olds.length; i++) {
            occupied[olds[i]] = true;
            dying[olds[i]] = matches[i] < 0;
            if (matches[i] >= 0) {
                targets[olds[i]] = news[matches[i]];
                placed[matches[i]] = true;
            }
        }
        // A birth takes the slot of its own number if that is free: what was bypassed comes back where it was.
        for (int pass = 0; pass < 2; pass++) {
            for (int j = 0; j < news.length; j++) {
                int slot = pass == 0 ? Math.min(news[j], slots - 1) : firstFree(occupied);
                if (!placed[j] && slot < slots && !occupied[slot]) {
                    placed[j] = true;
                    occupied[slot] = true;
                    born[slot] = true;
                    targets[slot] = news[j];
                }
            }
        }
        return new Pairing(targets, born, dying, exchanges(from, to, targets, born));
    }

    private static int firstFree(boolean[] occupied) {
        int slot = 0;
        while (slot < occupied.length && occupied[slot]) {
            slot++;
        }
        return slot;
    }

    private static boolean[] exchanges(Cascade from, Cascade to, int[] targets, boolean[] born) {
        boolean[] exchanged = new boolean[targets.length];
        for (int slot = 0; slot < targets.length; slot++) {
            if (targets[slot] >= 0 && !born[slot]) {
                Section old = from.section(slot);
                Section target = to.section(targets[slot]);
                exchanged[slot] =
                        opensBothEnds(old) && opensBothEnds(target) && Distance.between(old, target) >= FARTHEST;
            }
        }
        return exchanged;
    }
}
