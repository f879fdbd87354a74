package io.github.polewright.bench.measure;

import com.sun.management.ThreadMXBean;
import io.github.polewright.bench.workload.Rig;
import java.lang.management.ManagementFactory;

/** Bytes that a thread allocates. */
public final class Allocation {

    private static final ThreadMXBean THREADS = (ThreadMXBean) ManagementFactory.getThreadMXBean();
    private static final int ROUNDS = 20;

    private Allocation() {}

    /**
     * What the current thread has allocated so far. Allocates nothing itself.
     *
     * @return bytes
     */
    public static long bytesSoFar() {
        return THREADS.getCurrentThreadAllocatedBytes();
    }

    /**
     * What a rig's block allocates. The least of some rounds counts, since a compiler that drops an allocation late
     * must not be blamed for its first rounds.
     *
     * @param rig what runs
     * @param blocks a round
     * @return bytes a block
     */
    public static double bytesPerBlock(Rig rig, int blocks) {
        long least = Long.MAX_VALUE;
        for (int round = 0; round < ROUNDS; round++) {
            long bytes = 0;
            for (int i = 0; i < blocks; i++) {
                rig.betweenBlocks();
                long before = bytesSoFar();
                rig.block();
                bytes += bytesSoFar() - before;
            }
            least = Math.min(least, bytes);
        }
        return (double) least / blocks;
    }
}
