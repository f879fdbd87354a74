package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.sun.management.ThreadMXBean;
import java.io.File;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.net.MalformedURLException;
import java.net.URL;
import java.net.URLClassLoader;
import java.nio.FloatBuffer;
import java.util.Arrays;
import java.util.function.LongSupplier;
import org.junit.jupiter.api.Test;

/**
 * The first block of a program's life and its first glide: no class may be loaded or set up on the audio thread, which
 * would allocate, lock and read files there. A class loader of its own makes every run a first one.
 */
class FirstBlockAllocationTest {

    /** The JVM puts an object down to the thread when it throws compiled code away; a class is loaded in every one. */
    private static final int ATTEMPTS = 5;

    @Test
    void firstBlockAndFirstGlideAllocateNothing() throws IOException, ReflectiveOperationException {
        URL[] path = Arrays.stream(System.getProperty("java.class.path").split(File.pathSeparator))
                .map(FirstBlockAllocationTest::url)
                .toArray(URL[]::new);
        for (int form = 0; form < Form.values().length; form++) {
            long least = Long.MAX_VALUE;
            for (int attempt = 0; attempt < ATTEMPTS && least > 0; attempt++) {
                least = Math.min(least, bytes(path, form));
            }
            assertEquals(0, least, "bytes, with " + Form.values()[form]);
        }
    }

    private static long bytes(URL[] path, int form) throws IOException, ReflectiveOperationException {
        try (URLClassLoader fresh = new URLClassLoader(path, ClassLoader.getPlatformClassLoader())) {
            LongSupplier first = (LongSupplier) fresh.loadClass(First.class.getName())
                    .getDeclaredConstructor(int.class)
                    .newInstance(form);
            return first.getAsLong();
        }
    }

    private static URL url(String entry) {
        try {
            return new File(entry).toURI().toURL();
        } catch (MalformedURLException e) {
            throw new IllegalArgumentException(entry, e);
        }
    }

    /** Runs inside the fresh class loader. */
    public static final class First implements LongSupplier {

        private static final ThreadMXBean METER = (ThreadMXBean) ManagementFactory.getThreadMXBean();

        private final Form form;

        public First(int form) {
            this.form = Form.values()[form];
        }

        @Override
        public long getAsLong() {
            LiveCascade live = Rig.live(Designs.mixed(1, 5), 2, form);
            LiveCascade gliding = Rig.live(Designs.mixed(1, 5), 2, form);
            gliding.retune(Designs.mixed(2, 5));
            float[] floats = new float[128];
            double[] doubles = new double[128];
            doubles[0] = Double.NaN;
            doubles[1] = Double.MAX_VALUE;
            float[][] planes = new float[2][64];
            FloatBuffer buffer = SampleFormat.direct(128);
            METER.getCurrentThreadAllocatedBytes();
            long before = METER.getCurrentThreadAllocatedBytes();
            live.process(floats, 0, floats, 0, 64);
            live.process(doubles, 0, doubles, 0, 64);
            live.process(planes, planes, 0, 64);
            live.process(buffer, buffer, 64);
            for (int i = 0; i < 1_000; i++) {
                gliding.process(floats, 0, floats, 0, 64);
            }
            live.reset();
            return METER.getCurrentThreadAllocatedBytes() - before;
        }
    }
}
