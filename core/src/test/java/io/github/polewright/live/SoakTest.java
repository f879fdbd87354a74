package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.sun.management.ThreadMXBean;
import io.github.polewright.Cascade;
import io.github.polewright.retune.Pace;
import java.lang.management.ManagementFactory;
import java.util.SplittableRandom;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicLong;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Blocks without end while eight threads retune, bypass and turn the gain: bounded, finite, free of allocation. */
class SoakTest {

    private static final int CONTROL_THREADS = 8;
    private static final int FRAMES = 64;
    private static final int SECTIONS = 4;

    /** Far above what these sections do to noise of full scale, 10 dB of gain included. */
    private static final double MOST = 1_000;

    private static final ThreadMXBean METER = (ThreadMXBean) ManagementFactory.getThreadMXBean();

    @ParameterizedTest
    @EnumSource(Form.class)
    void aHundredThousandBlocks(Form form) throws Exception {
        soak(form, 100_000);
    }

    @Tag("slow")
    @ParameterizedTest
    @EnumSource(Form.class)
    void fiveMillionBlocksInEachForm(Form form) throws Exception {
        soak(form, 5_000_000);
    }

    private static void soak(Form form, int blocks) throws Exception {
        LiveCascade live = Rig.live(Designs.mixed(1, SECTIONS), 1, form);
        AtomicBoolean done = new AtomicBoolean();
        AtomicLong orders = new AtomicLong();
        ExecutorService threads = Executors.newFixedThreadPool(CONTROL_THREADS);
        try {
            Future<?>[] control = IntStream.range(0, CONTROL_THREADS)
                    .mapToObj(seed -> threads.submit(() -> disturb(live, seed, done, orders)))
                    .toArray(Future[]::new);
            long bytes = run(live, blocks);
            done.set(true);
            for (Future<?> thread : control) {
                thread.get();
            }
            // While it compiles a method anew the JVM puts a few objects of its own down to the thread, 1.7 kB in all.
            assertTrue(bytes < 2_000, bytes + " bytes");
        } finally {
            done.set(true);
            threads.shutdownNow();
        }
        assertTrue(orders.get() > CONTROL_THREADS);
        assertEquals(0, live.channelRestarts());
        assertEquals(0, live.replacedOutputSamples());
        endsOnTheLastTarget(live, form);
    }

    private static void endsOnTheLastTarget(LiveCascade live, Form form) {
        Cascade last = Designs.mixed(99, SECTIONS);
        live.outputGainDb(0);
        live.bypass(false);
        live.retune(last);
        Rig.settle(live);
        assertTrue(Rig.heads(live, last));
        assertArrayEquals(Rig.impulseResponse(Rig.twin(live, form), 0, 2_000), Rig.impulseResponse(live, 0, 2_000));
    }

    private static long run(LiveCascade live, int blocks) {
        double[] noise = Signals.noise(1, 1, 1 << 16)[0];
        double[] block = new double[FRAMES];
        double most = 0;
        long before = 0;
        for (int i = 0; i < blocks; i++) {
            if (i == blocks / 10) {
                before = METER.getCurrentThreadAllocatedBytes();
            }
            int frames = 1 + i % FRAMES;
            System.arraycopy(noise, i * 31 & 0x7fff, block, 0, frames);
            live.process(block, 0, block, 0, frames);
            for (int n = 0; n < frames; n++) {
                most = Math.max(most, Math.abs(block[n]));
            }
        }
        long bytes = METER.getCurrentThreadAllocatedBytes() - before;
        assertTrue(most < MOST, "peak " + most);
        return bytes;
    }

    private static void disturb(LiveCascade live, int seed, AtomicBoolean done, AtomicLong orders) {
        SplittableRandom random = new SplittableRandom(seed);
        while (!done.get()) {
            int count = 1 + random.nextInt(SECTIONS);
            live.retune(Designs.mixed(random.nextInt(40), count), random.nextBoolean() ? Pace.TURNING : Pace.FOLLOWING);
            if (random.nextInt(50) == 0) {
                live.bypass(random.nextBoolean());
            }
            if (random.nextInt(50) == 0) {
                live.outputGainDb(10 * random.nextDouble() - 10);
            }
            live.retuneStatus();
            orders.incrementAndGet();
        }
    }
}
