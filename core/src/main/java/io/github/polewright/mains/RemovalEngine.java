package io.github.polewright.mains;

/** One slab after the other: remove with what is known, then look at the slab, then plan the next one. */
final class RemovalEngine {

    private static final double RAMP_SECONDS = 0.02;

    final Slab slab;
    final ReadingSlot slot;
    volatile boolean on = true;
    volatile Removal way = Removal.SUBTRACTION;
    volatile long replaced;
    volatile long restarted;

    private final Tracker tracker;
    private final LinePhasors phasors;
    private final HumSubtraction subtraction;
    private final NotchBank notches;
    private final LinePlan plan;
    private final double[][] output;
    private final int channels;

    RemovalEngine(Rates rates, int channels, int lines) {
        this.channels = channels;
        slab = new Slab(rates, channels);
        tracker = new Tracker(rates, channels, lines);
        phasors = new LinePhasors(tracker);
        slot = new ReadingSlot(tracker, phasors);
        subtraction = new HumSubtraction(tracker, phasors, RAMP_SECONDS);
        notches = new NotchBank(tracker, phasors, RAMP_SECONDS);
        plan = new LinePlan(tracker, notches);
        output = new double[channels][rates.slabFrames];
    }

    void reset() {
        slab.reset();
        tracker.reset();
        subtraction.reset();
        notches.reset();
        plan.reset();
        slot.publish();
    }

    /** Filters the frames just loaded. */
    void filter(int count) {
        int from = slab.position();
        int to = from + count;
        for (int c = 0; c < channels; c++) {
            System.arraycopy(slab.data[c], from, output[c], from, count);
            subtraction.run(c, output[c], from, to);
            notches.run(c, output[c], from, to);
        }
    }

    void store(float[] destination, int offset, int count) {
        int from = slab.position();
        for (int c = 0; c < channels; c++) {
            for (int n = 0, i = offset + c; n < count; n++, i += channels) {
                destination[i] = (float) output[c][from + n];
            }
        }
    }

    void store(double[] destination, int offset, int count) {
        int from = slab.position();
        for (int c = 0; c < channels; c++) {
            for (int n = 0, i = offset + c; n < count; n++, i += channels) {
                destination[i] = output[c][from + n];
            }
        }
    }

    void store(float[][] destination, int offset, int count) {
        int from = slab.position();
        for (int c = 0; c < channels; c++) {
            for (int n = 0; n < count; n++) {
                destination[c][offset + n] = (float) output[c][from + n];
            }
        }
    }

    /** Moves on; at a slab's end the analysis looks at it. */
    void advance(int count) {
        if (slab.advance(count)) {
            endSlab();
        }
    }

    private void endSlab() {
        guard();
        MainsState before = tracker.proof.state();
        tracker.slab(slab.data);
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
        if (slab.replaced() != replaced) {
            replaced = slab.replaced();
        }
        for (int c = 0; c < channels; c++) {
            if (!notches.isSound(c)) {
                restarted = restarted + 1;
            }
        }
    }
}
