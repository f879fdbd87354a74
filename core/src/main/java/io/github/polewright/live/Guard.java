package io.github.polewright.live;

import io.github.polewright.slab.Slab;

/** Keeps states out of the subnormal range, where arithmetic is some forty times slower and never ends. */
final class Guard {

    /**
     * Frames between two guards. At 64 a pole near zero can turn its state subnormal between guards; at 32 none did.
     */
    static final int FRAMES = 32;

    private Guard() {}

    /** Whether both values of a state are so small that the state counts as silent. */
    static boolean tiny(double first, double second) {
        return Math.abs(first) < Slab.TINY && Math.abs(second) < Slab.TINY;
    }

    /** Frames from an absolute frame count to the next guard, 1 to {@link #FRAMES}. */
    static int framesUntil(long clock) {
        return FRAMES - (int) (clock & (FRAMES - 1));
    }
}
