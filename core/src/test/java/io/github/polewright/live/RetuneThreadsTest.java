package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import java.util.Arrays;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Eight control threads retune while the audio thread runs. */
class RetuneThreadsTest {

    private static final int THREADS = 8;
    private static final int RETUNES = 400;
    private static final int SECTIONS = 5;

    @ParameterizedTest
    @EnumSource(Form.class)
    void endsExactlyOnALastTargetAndStaysFiniteMeanwhile(Form form) throws Exception {
        LiveCascade live = Rig.live(target(0), 2, form, SECTIONS);
        ExecutorService threads = Executors.newFixedThreadPool(THREADS);
        try {
            CountDownLatch ready = new CountDownLatch(THREADS);
            Future<?>[] control = IntStream.range(0, THREADS)
                    .mapToObj(thread -> threads.submit(() -> retuneOften(live, thread, ready)))
                    .toArray(Future[]::new);
            ready.await();
            double[] out = new double[128];
            double[] in = new double[128];
            for (int block = 0; block < 500 || !Arrays.stream(control).allMatch(Future::isDone); block++) {
                for (int i = 0; i < in.length; i++) {
                    in[i] = (i * 37 + block) % 128 / 64.0 - 1;
                }
                live.process(in, 0, out, 0, 1 + block % 64);
                for (double value : out) {
                    assertTrue(Math.abs(value) <= Double.MAX_VALUE);
                }
            }
            rethrow(control);
        } finally {
            threads.shutdownNow();
        }
        Rig.settle(live);
        double[] response = Rig.impulseResponse(live, 1, 2_000);
        assertTrue(
                IntStream.range(0, THREADS).anyMatch(thread -> Rig.heads(live, last(thread))),
                "settled on none of the threads' last targets");
        assertArrayEquals(Rig.impulseResponse(Rig.twin(live, form), 1, 2_000), response);

        live.retune(target(7));
        assertFalse(live.isSettled());
        Rig.settle(live);
        assertTrue(Rig.heads(live, target(7)));
        assertArrayEquals(Rig.impulseResponse(Rig.twin(live, form), 1, 2_000), Rig.impulseResponse(live, 1, 2_000));
    }

    private static void retuneOften(LiveCascade live, int thread, CountDownLatch ready) {
        ready.countDown();
        for (int i = 0; i < RETUNES; i++) {
            live.retune(target(thread * 31 + i % 13));
            live.isSettled();
        }
        live.retune(last(thread));
    }

    private static void rethrow(Future<?>[] control) throws InterruptedException, ExecutionException {
        for (Future<?> thread : control) {
            thread.get();
        }
    }

    private static Cascade last(int thread) {
        return target(1_000 + thread);
    }

    private static Cascade target(int seed) {
        return Designs.mixed(seed, 1 + seed % SECTIONS);
    }
}
