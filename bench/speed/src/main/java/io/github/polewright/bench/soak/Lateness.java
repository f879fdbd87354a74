package io.github.polewright.bench.soak;

import io.github.polewright.bench.measure.Times;

/**
 * Where the time of the callbacks went. A block is due one period after its callback was; what makes it late is either
 * <i>ours</i>, the time inside {@code process}, or <i>the machine's</i>, the time the callback was late to start.
 * Time inside {@code process} in which the thread was off the processor is told apart, since a scheduler or a collector
 * took it. Recording allocates nothing.
 */
final class Lateness {

    private final long periodNanos;
    private final Times ours = new Times();
    private final Times machine = new Times();
    private final Times offProcessor = new Times();
    private long missedByOurs;
    private long missedByMachine;
    private long skipped;
    private long worstNanos;
    private long worstOursNanos;
    private long worstMachineNanos;
    private long worstOffProcessorNanos;

    Lateness(long periodNanos) {
        this.periodNanos = periodNanos;
    }

    /**
     * One callback.
     *
     * @param lateNanos from when it was due to when it started
     * @param insideNanos from the start of {@code process} to its end
     * @param onProcessorNanos of those, spent running; as {@code insideNanos} where it cannot be told
     */
    void record(long lateNanos, long insideNanos, long onProcessorNanos) {
        long off = Math.max(0, insideNanos - onProcessorNanos);
        ours.record(insideNanos);
        machine.record(lateNanos);
        offProcessor.record(off);
        long over = lateNanos + insideNanos - periodNanos;
        if (over <= 0) {
            return;
        }
        if (insideNanos - off > periodNanos) {
            missedByOurs++;
        } else {
            missedByMachine++;
        }
        if (over > worstNanos) {
            worstNanos = over;
            worstOursNanos = insideNanos;
            worstMachineNanos = lateNanos;
            worstOffProcessorNanos = off;
        }
    }

    /** Callbacks that never came, since the thread slept through their whole period. */
    void skip(long callbacks) {
        skipped += callbacks;
    }

    Times ours() {
        return ours;
    }

    Times machine() {
        return machine;
    }

    Times offProcessor() {
        return offProcessor;
    }

    /** Misses that the filter's own work explains alone. */
    long missedByOurs() {
        return missedByOurs;
    }

    /** All other misses, skipped callbacks among them. */
    long missedByMachine() {
        return missedByMachine + skipped;
    }

    long skipped() {
        return skipped;
    }

    long worstNanos() {
        return worstNanos;
    }

    long worstOursNanos() {
        return worstOursNanos;
    }

    long worstMachineNanos() {
        return worstMachineNanos;
    }

    long worstOffProcessorNanos() {
        return worstOffProcessorNanos;
    }
}
