package io.github.polewright.bench.soak;

import io.github.polewright.bench.workload.LiveRig;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicLong;
import java.util.concurrent.locks.LockSupport;

/** What goes on beside the audio thread: threads that allocate hard, and one that retunes at random. */
final class Disturbance {

    private static final int KEPT = 4096;
    private static final int MOST_BYTES = 16_384;
    private static final long MEAN_PAUSE_NANOS = 5_000_000;

    private final AtomicBoolean ended = new AtomicBoolean();
    private final AtomicLong retunes = new AtomicLong();
    private final AtomicLong allocatedBytes = new AtomicLong();
    private final List<Thread> threads = new ArrayList<>();

    /** Starts it. */
    Disturbance(LiveRig rig, int allocators) {
        for (int i = 0; i < allocators; i++) {
            long seed = i;
            start("allocator", () -> allocate(new SplittableRandom(seed)));
        }
        start("retuner", () -> retune(rig, new SplittableRandom(allocators)));
    }

    private void start(String name, Runnable work) {
        Thread thread = new Thread(work, name);
        thread.setDaemon(true);
        threads.add(thread);
        thread.start();
    }

    /** Keeps some thousand arrays alive for a while, so that the collector must mark and move them. */
    private void allocate(SplittableRandom random) {
        byte[][] kept = new byte[KEPT][];
        while (!ended.get()) {
            for (int i = 0; i < KEPT; i++) {
                byte[] bytes = new byte[1 + random.nextInt(MOST_BYTES)];
                kept[random.nextInt(KEPT)] = bytes;
                allocatedBytes.addAndGet(bytes.length);
            }
            // Leaves the processor now and then, as programs do.
            LockSupport.parkNanos(1 + random.nextLong(MEAN_PAUSE_NANOS));
        }
    }

    private void retune(LiveRig rig, SplittableRandom random) {
        while (!ended.get()) {
            rig.retune();
            retunes.incrementAndGet();
            LockSupport.parkNanos(1 + random.nextLong(2 * MEAN_PAUSE_NANOS));
        }
    }

    /** Ends it and waits until it has. */
    void end() throws InterruptedException {
        ended.set(true);
        for (Thread thread : threads) {
            thread.join();
        }
    }

    long retunes() {
        return retunes.get();
    }

    long allocatedBytes() {
        return allocatedBytes.get();
    }
}
