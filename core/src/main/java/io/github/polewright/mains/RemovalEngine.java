package io.github.polewright.mains;

import io.github.polewright.slab.Slab;

/** One slab after the other: remove with what is known, then look at the slab, then plan the next one. */
final class RemovalEngine {

    private static final double RAMP_SECONDS = 0.02;

    final Slab slab;
    final ReadingSlot slot;
    volatile boolean on = true;
    volatile Removal way = Removal.SUBTRACTION;
    volatile long replacedInputs;
    volatile long replacedOutputs;
    volatile long restarted;

    private long restarts;
    private final SlabInput input;
    private final Tracker tracker;
    private final LinePhasors phasors;
    private final HumSubtraction subtraction;
    private final NotchBank notches;
    private final LinePlan plan;
    private final int channels;

    RemovalEngine(Rates rates, int channels, int lines) {
        this.channels = channels;
        slab = new Slab(channels);
        input = new SlabInput(rates, channels);
        tracker = new Tracker(rates, channels, lines);
        phasors = new LinePhasors(tracker);
        slot = new ReadingSlot(tracker, phasors);
        subtraction = new HumSubtraction(tracker, phasors, RAMP_SECONDS);
        notches = new NotchBank(tracker, phasors, RAMP_SECONDS);
        plan = new LinePlan(tracker, notches);
    }

    void reset() {
        input.reset();
        tracker.reset();
        subtraction.reset();
        notches.reset();
        plan.reset();
        slot.publish();
    }

    int room(int wanted) {
        return input.room(wanted);
    }

    /** Filters the frames just loaded. */
    void filter(int count) {
        int from = input.position();
        input.take(slab.samples(), count);
        for (int c = 0; c < channels; c++) {
            subtraction.run(c, slab.samples(), c * Slab.FRAMES, from, count);
            notches.run(c, slab.samples(), c * Slab.FRAMES, from, count);
        }
    }

    /** Moves on; at a slab's end the analysis looks at it. */
    void advance(int count) {
        if (input.advance(count)) {
            endSlab();
        }
    }

    private void endSlab() {
        guard();
        MainsState before = tracker.proof.state();
        tracker.slab(input.data);
        boolean news = tracker.ticked() || before != tracker.proof.state();
        if (news) {
            phasors.retune();
            notches.rotate(tracker.moved());
            plan.tick();
        }
        phasors.place();
        plan.choose(on, way);
        if (news && tracker.amplitudes.stepped()) {
            notches.adoptOpen();
        }
        subtraction.prepare(plan.subtracted);
        notches.prepare(plan.notched);
        if (news) {
            slot.publish();
        }
    }

    private void guard() {
        replacedInputs = slab.replacedInputs();
        replacedOutputs = slab.replacedOutputs();
        for (int c = 0; c < channels; c++) {
            if (!notches.isSound(c)) {
                restarts++;
            }
        }
        restarted = restarts;
    }
}
