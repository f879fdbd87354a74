package io.github.polewright.retune;

import io.github.polewright.Cascade;
import io.github.polewright.Section;

/** Where every slot stands at the turns of a glide between two cascades: births, moves, deaths, exchanges. */
final class Changes {

    /** The amplitude left of what a dying section still rings when it is swapped out: -120 dB. */
    private static final double DECAYED = 1e-6;

    private static final int WIDTH = Knots.WIDTH;

    private final double[] first;
    private final double[] start;
    private final double[] end;
    private final double[] swapped;
    private final double[] last;
    private final boolean[] exchanged;
    private boolean births;
    private boolean exchanges;
    private int holdFrames;

    private Changes(Cascade from) {
        first = GlidePlan.flat(from);
        start = first.clone();
        end = first.clone();
        swapped = first.clone();
        last = first.clone();
        exchanged = new boolean[from.sectionCount()];
    }

    static Changes between(Cascade from, Cascade to) {
        if (from.sampleRateHz() != to.sampleRateHz()) {
            throw new RefusedGlideException(
                    -1, "the target's sampleRateHz is " + to.sampleRateHz() + "; it must be " + from.sampleRateHz());
        }
        Pairing pairing = Pairing.of(from, to);
        Changes changes = new Changes(from);
        for (int slot = 0; slot < from.sectionCount(); slot++) {
            int target = pairing.target(slot);
            if (target < 0) {
                if (pairing.isDying(slot)) {
                    changes.dies(slot, from.section(slot), Section.PASS_THROUGH);
                }
            } else if (pairing.isExchanged(slot)) {
                changes.exchanges(slot, from.section(slot), to.section(target));
            } else {
                changes.becomes(slot, to.section(target), pairing.isBorn(slot));
            }
        }
        return changes;
    }

    private void becomes(int slot, Section target, boolean isBorn) {
        if (isBorn) {
            Transparency.set(start, slot * WIDTH, target.a1(), target.a2());
            births = true;
        }
        GlidePlan.put(end, slot, target);
        GlidePlan.put(swapped, slot, target);
        GlidePlan.put(last, slot, target);
    }

    private void dies(int slot, Section old, Section heir) {
        Transparency.set(end, slot * WIDTH, old.a1(), old.a2());
        GlidePlan.put(swapped, slot, heir);
        GlidePlan.put(last, slot, heir);
        double decay = Poles.decay(old.a1(), old.a2());
        holdFrames = Math.max(holdFrames, 1 + GlidePlan.wholeFrames(slot, Math.log(DECAYED) / Math.log1p(-decay)));
    }

    private void exchanges(int slot, Section old, Section heir) {
        dies(slot, old, heir);
        Transparency.set(swapped, slot * WIDTH, heir.a1(), heir.a2());
        exchanged[slot] = true;
        exchanges = true;
    }

    /** The running cascade. */
    double[] first() {
        return first;
    }

    /** After the births. */
    double[] start() {
        return start;
    }

    /** After the moves; what dies or is exchanged passes its input through. */
    double[] end() {
        return end;
    }

    /** When nothing that has faded rings any more. */
    double[] swapped() {
        return swapped;
    }

    /** The target, in slots. */
    double[] last() {
        return last;
    }

    boolean hasBirths() {
        return births;
    }

    boolean hasExchanges() {
        return exchanges;
    }

    boolean[] exchanged() {
        return exchanged;
    }

    /** How long what has faded rings, 0 if nothing has. */
    int holdFrames() {
        return holdFrames;
    }
}
