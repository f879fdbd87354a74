package io.github.polewright.bench.measure;

import java.util.concurrent.locks.LockSupport;

/** Waits for a moment of the wall clock as a callback does: sleeps most of the way, then spins. Allocates nothing. */
public final class Pace {

    private static final long SPIN_NANOS = 200_000;

    private Pace() {}

    /**
     * Waits.
     *
     * @param dueNanos on the scale of {@link System#nanoTime()}
     * @return the first reading of the clock that is not before it
     */
    public static long until(long dueNanos) {
        for (; ; ) {
            long now = System.nanoTime();
            long left = dueNanos - now;
            if (left <= 0) {
                return now;
            }
            if (left > SPIN_NANOS) {
                LockSupport.parkNanos(left - SPIN_NANOS);
            } else {
                Thread.onSpinWait();
            }
        }
    }
}
