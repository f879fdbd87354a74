package io.github.polewright.stress;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.live.LiveCascade;
import io.github.polewright.retune.Pace;

/** A live cascade of three equal gains, 2 at first. */
abstract class Gains {

    private static final Cascade TWO = gains(2);
    private static final Cascade THREE = gains(3);
    private static final Cascade FIVE = gains(5);

    private final LiveCascade live =
            LiveCascade.builder(TWO).pace(Pace.FOLLOWING).build();
    private final double[] sample = new double[1];

    private static Cascade gains(double gain) {
        Section section = Section.of(gain, 0, 0, 0, 0);
        return Cascade.of(48_000, section, section, section);
    }

    final void three() {
        live.retune(THREE);
    }

    final void five() {
        live.retune(FIVE);
    }

    final void bypass(boolean on) {
        live.bypass(on);
    }

    /** One block of one frame, as the audio thread runs it; what a 1 turns into. */
    final int block() {
        sample[0] = 1;
        live.process(sample, 0, sample, 0, 1);
        return (int) Math.round(sample[0]);
    }

    /** Runs until nothing moves; what a 1 turns into then. */
    final int settled() {
        while (!live.isSettled()) {
            block();
        }
        return block();
    }

    /** The cube of the gain that the latest retune asked for. */
    final int wished() {
        return (int) Math.round(Math.pow(live.target().section(0).b0(), 3));
    }
}
