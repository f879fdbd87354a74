package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.sun.management.ThreadMXBean;
import io.github.polewright.Cascade;
import java.lang.management.ManagementFactory;
import java.nio.FloatBuffer;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.stream.IntStream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Bytes the audio thread allocates: none, in a million blocks, while another thread retunes. */
class AllocationTest {

    private static final int CHANNELS = 2;
    private static final int BLOCKS = 1_000_000;
    private static final int WARM_UP = 20_000;
    private static final int ATTEMPTS = 8;
    private static final ThreadMXBean METER = (ThreadMXBean) ManagementFactory.getThreadMXBean();

    /** Keeps a planted object from being optimized away. */
    static volatile Object planted;

    private final float[] floats = new float[16];
    private final double[] doubles = new double[16];
    private final float[][] planes = new float[CHANNELS][8];
    private final FloatBuffer buffer = SampleFormat.direct(16);

    @BeforeEach
    void meterWorks() {
        assumeTrue(METER.isThreadAllocatedMemorySupported() && METER.isThreadAllocatedMemoryEnabled());
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void aMillionBlocksAllocateNothing(Form form) throws InterruptedException {
        LiveCascade live = Rig.live(Designs.mixed(1, 5), CHANNELS, form);
        retunedMeanwhile(live, () -> {
            assertEquals(0, leastBytes(() -> blocks(live, BLOCKS)));
        });
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void faultsAndResetsAllocateNothing(Form form) {
        LiveCascade live = Rig.live(Designs.mixed(1, 5), CHANNELS, form);
        Runnable faults = () -> {
            for (int i = 0; i < WARM_UP; i++) {
                doubles[0] = i % 3 == 0 ? Double.NaN : i % 3 == 1 ? Double.MAX_VALUE : Double.MIN_VALUE;
                doubles[1] = -doubles[0];
                live.process(doubles, 0, doubles, 0, 8);
                live.reset();
            }
        };
        assertEquals(0, leastBytes(faults));
        assertTrue(live.replacedInputSamples() > 0);
    }

    /** The control: the meter sees a single object in as many blocks. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void theMeterSeesOnePlantedAllocation(Form form) {
        LiveCascade live = Rig.live(Designs.mixed(1, 5), CHANNELS, form);
        long bytes = leastBytes(() -> {
            blocks(live, BLOCKS / 20);
            planted = new Object();
            blocks(live, BLOCKS / 20);
        });
        assertTrue(bytes >= 8 && bytes <= 32, bytes + " bytes");
    }

    private void blocks(LiveCascade live, int count) {
        for (int i = 0; i < count; i++) {
            switch (i & 3) {
                case 0 -> live.process(floats, 0, floats, 0, 1 + (i & 7));
                case 1 -> live.process(doubles, 0, doubles, 0, 1 + (i & 7));
                case 2 -> live.process(planes, planes, 0, 1 + (i & 7));
                default -> live.process(buffer, buffer, 1 + (i & 7));
            }
            if ((i & 1023) == 0) {
                floats[0] = planes[0][0] = 1;
                doubles[1] = 1;
            }
        }
    }

    /**
     * The JVM itself puts a few single objects down to a thread when it loads a class or throws compiled code away; so
     * the first runs may show some bytes. What the code under test allocates shows in every run.
     */
    private static long leastBytes(Runnable work) {
        long least = Long.MAX_VALUE;
        for (int run = 0; run < ATTEMPTS && least > 0; run++) {
            least = Math.min(least, bytes(work));
        }
        return least;
    }

    private static long bytes(Runnable work) {
        long before = METER.getCurrentThreadAllocatedBytes();
        long own = METER.getCurrentThreadAllocatedBytes() - before;
        before = METER.getCurrentThreadAllocatedBytes();
        work.run();
        return METER.getCurrentThreadAllocatedBytes() - before - own;
    }

    private static void retunedMeanwhile(LiveCascade live, Runnable work) throws InterruptedException {
        Cascade[] targets = IntStream.range(0, 16)
                .mapToObj(i -> Designs.mixed(i, 1 + i % 5))
                .toArray(Cascade[]::new);
        AtomicBoolean done = new AtomicBoolean();
        Thread control = new Thread(() -> {
            for (int i = 0; !done.get(); i++) {
                live.retune(targets[i % targets.length]);
                Thread.onSpinWait();
            }
        });
        control.start();
        try {
            work.run();
        } finally {
            done.set(true);
            control.join();
        }
    }
}
