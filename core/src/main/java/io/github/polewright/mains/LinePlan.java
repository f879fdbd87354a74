package io.github.polewright.mains;

import java.util.Arrays;

/** Which lines are removed, and how wide their notches are. Decides at ticks. */
final class LinePlan {

    /**
     * A share of the width that balances a notch's loss of programme against the residue of a constant frequency error
     * as large as the uncertainty. The notches turn with the follower's phase, so that error is mostly taken out: a
     * thousandth was found best, a tenth cost 1.5 dB (derived for this project).
     */
    private static final double SHARE = 0.001;

    private static final double WIDTH_PACE = 0.3;
    private static final double DROP = 0.8;
    private static final double TAKE = 2;

    final boolean[] notched;
    final boolean[] subtracted;
    private final Tracker tracker;
    private final NotchBank notches;
    private final boolean[] worth;
    private final double[] openSeconds;

    LinePlan(Tracker tracker, NotchBank notches) {
        this.tracker = tracker;
        this.notches = notches;
        int size = tracker.bank.size();
        notched = new boolean[size];
        subtracted = new boolean[size];
        worth = new boolean[size];
        openSeconds = new double[size];
    }

    void reset() {
        Arrays.fill(notched, false);
        Arrays.fill(subtracted, false);
        Arrays.fill(worth, false);
        Arrays.fill(openSeconds, 0);
    }

    /** After a tick. */
    void tick() {
        double uncertaintyHz = tracker.loop.uncertaintyHz();
        int lines = tracker.bank.lines;
        for (int i = 0; i < notched.length; i++) {
            width(i, i % lines + 1, uncertaintyHz);
        }
    }

    private void width(int i, int order, double uncertaintyHz) {
        double perHz = tracker.presence.spread[i] * tracker.tickSeconds() / 2;
        double power = tracker.presence.power(i);
        double line = tracker.bank.power(i) / 2;
        if (!notches.isOpen(i)) {
            openSeconds[i] = 0;
            double cost = perHz * NotchBank.NARROWEST_HZ * Math.PI / 2;
            worth[i] = line > (worth[i] ? DROP : TAKE) * cost;
        }
        openSeconds[i] += tracker.tickSeconds();
        double off = order * uncertaintyHz;
        double law = perHz > 0 ? Math.cbrt(SHARE * 8 * off * off * power / (Math.PI * perHz)) : NotchBank.WIDEST_HZ;
        double hz = Math.max(law, startWidth(openSeconds[i]));
        hz = Math.max(NotchBank.NARROWEST_HZ, Math.min(NotchBank.WIDEST_HZ, hz));
        double now = notches.widthHz(i);
        notches.width(i, notches.isOpen(i) ? now + WIDTH_PACE * (hz - now) : hz);
        if (notches.isOpen(i) && line < DROP * perHz * notches.widthHz(i) * Math.PI / 2) {
            worth[i] = false;
        }
    }

    private static double startWidth(double seconds) {
        return 1 / (Math.PI * seconds + 1);
    }

    /** At every slab: what is wanted now. */
    void choose(boolean on, Removal way) {
        boolean may = on && tracker.proof.holds() && !tracker.isSilent();
        for (int i = 0; i < notched.length; i++) {
            boolean there = may && tracker.presence.held[i];
            notched[i] = there && way == Removal.NOTCHES && worth[i];
            subtracted[i] = there && way == Removal.SUBTRACTION;
        }
    }
}
