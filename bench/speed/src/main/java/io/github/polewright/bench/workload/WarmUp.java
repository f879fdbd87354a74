package io.github.polewright.bench.workload;

import java.time.Duration;

/** What a program does before its stream starts, so that the first callback meets compiled code. */
public final class WarmUp {

    private WarmUp() {}

    /**
     * Plays noise through a live cascade of the same shape, retuning it on the way, and leaves the one that will be
     * heard untouched.
     *
     * @param chain the shape
     * @param format of the samples
     * @param limit how long it may take
     * @return blocks played
     */
    public static int of(Chain chain, Samples format, Duration limit) {
        LiveRig twin = new LiveRig(chain, new Tape(chain, format, Signal.NOISE), Motion.STEADY);
        long end = System.nanoTime() + limit.toNanos();
        int blocks = 0;
        while (System.nanoTime() < end) {
            if ((blocks++ & 255) == 0) {
                twin.retune();
            }
            twin.block();
        }
        return blocks;
    }
}
