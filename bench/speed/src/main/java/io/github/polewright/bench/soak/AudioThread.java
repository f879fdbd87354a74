package io.github.polewright.bench.soak;

import io.github.polewright.bench.measure.Allocation;
import io.github.polewright.bench.measure.Pace;
import io.github.polewright.bench.workload.Rig;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;

/** A callback at wall-clock pace. Its loop allocates nothing unless the rig does. */
final class AudioThread extends Thread {

    /** More than the calls after which the JVM's last compiler takes up a method. */
    private static final int REHEARSED_BLOCKS = 12_000;

    private final Rig rig;
    private final long endNanos;
    private final long periodNanos;
    private final Rig rehearsed;
    private final Lateness lateness;
    private final ThreadMXBean threads = ManagementFactory.getThreadMXBean();
    private long blocks;
    private long allocatedBytes;

    /** As sound systems do, asks for the highest priority; a JVM may ignore it, and nothing here relies on it. */
    @SuppressWarnings("ThreadPriorityCheck")
    AudioThread(Rig rig, Rig rehearsed, long endNanos) {
        super("audio");
        this.rig = rig;
        this.rehearsed = rehearsed;
        this.endNanos = endNanos;
        this.periodNanos = Math.max(1, Math.round(rig.chain().periodNanos()));
        this.lateness = new Lateness(periodNanos);
        setDaemon(true);
        setPriority(MAX_PRIORITY);
    }

    @Override
    public void run() {
        boolean timed = threads.isCurrentThreadCpuTimeSupported() && threads.isThreadCpuTimeEnabled();
        rehearse(timed);
        long before = Allocation.bytesSoFar();
        long due = System.nanoTime() + periodNanos;
        while (due < endNanos) {
            long woken = Pace.until(due);
            long onBefore = onProcessor(timed);
            long begun = System.nanoTime();
            rig.block();
            long ended = System.nanoTime();
            long inside = ended - begun;
            lateness.record(woken - due, inside, timed ? Math.min(inside, onProcessor(true) - onBefore) : inside);
            blocks++;
            due += periodNanos;
            long behind = (System.nanoTime() - due) / periodNanos;
            if (behind > 0) {
                lateness.skip(behind);
                due += behind * periodNanos;
            }
        }
        allocatedBytes = Allocation.bytesSoFar() - before;
    }

    /** What the JVM allocates when it loads, links and compiles this loop itself is not the library's. */
    private void rehearse(boolean timed) {
        Lateness scratch = new Lateness(periodNanos);
        for (int i = 0; i < REHEARSED_BLOCKS; i++) {
            long now = Pace.until(System.nanoTime());
            long on = onProcessor(timed);
            rehearsed.block();
            scratch.record(0, System.nanoTime() - now, Math.min(now, onProcessor(timed) - on));
        }
        Allocation.bytesSoFar();
    }

    private long onProcessor(boolean timed) {
        return timed ? threads.getCurrentThreadCpuTime() : 0;
    }

    /** Blocks played; to be read after the thread has ended, like all that follows. */
    long blocks() {
        return blocks;
    }

    long allocatedBytes() {
        return allocatedBytes;
    }

    Lateness lateness() {
        return lateness;
    }
}
