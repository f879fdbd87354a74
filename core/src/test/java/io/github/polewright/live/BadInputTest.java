package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.retune.Glide;
import io.github.polewright.retune.Pace;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.FloatBuffer;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Every bad call: the exception's type, that its message names the value and what is permitted, and that it changed
 * nothing: the next output equals that of a twin that was never asked.
 */
class BadInputTest {

    private static final Class<NullPointerException> NULL = NullPointerException.class;
    private static final Class<IllegalArgumentException> ILLEGAL = IllegalArgumentException.class;
    private static final Class<IndexOutOfBoundsException> BOUNDS = IndexOutOfBoundsException.class;
    private static final float[] FLOATS = new float[20];
    private static final double[] DOUBLES = new double[20];
    private static final float[][] PLANES = new float[2][10];
    private static final FloatBuffer DIRECT = SampleFormat.direct(20);
    private static final int HUGE = Integer.MAX_VALUE;

    static List<Arguments> calls() {
        List<Arguments> calls = new ArrayList<>();
        floats(calls);
        doubles(calls);
        planes(calls);
        buffers(calls);
        targets(calls);
        return calls;
    }

    private static void floats(List<Arguments> calls) {
        add(calls, "null source", NULL, live -> live.process((float[]) null, 0, FLOATS, 0, 1), "source");
        add(calls, "null destination", NULL, live -> live.process(FLOATS, 0, null, 0, 1), "destination");
        add(calls, "frames -1", ILLEGAL, live -> live.process(FLOATS, 0, FLOATS, 0, -1), "frames", "-1", "0");
        add(calls, "source short", BOUNDS, live -> live.process(FLOATS, 0, new float[99], 0, 11), "source", "20", "22");
        add(
                calls,
                "source offset",
                BOUNDS,
                live -> live.process(FLOATS, 1, new float[99], 0, 10),
                "source",
                "offset 1");
        add(calls, "source -1", BOUNDS, live -> live.process(FLOATS, -1, new float[99], 0, 1), "source", "-1");
        add(calls, "source past end", BOUNDS, live -> live.process(FLOATS, 21, FLOATS, 0, 0), "source", "21", "20");
        add(calls, "destination short", BOUNDS, live -> live.process(new float[99], 0, FLOATS, 0, 11), "destination");
        add(
                calls,
                "destination -1",
                BOUNDS,
                live -> live.process(new float[99], 0, FLOATS, -1, 1),
                "destination",
                "-1");
        add(
                calls,
                "product overflows",
                BOUNDS,
                live -> live.process(FLOATS, 0, FLOATS, 0, HUGE),
                "source",
                "4294967294");
        add(calls, "sum overflows", BOUNDS, live -> live.process(FLOATS, HUGE, FLOATS, 0, 1), "source", "" + HUGE);
        add(calls, "overlap up", ILLEGAL, live -> live.process(FLOATS, 0, FLOATS, 3, 2), "offset 3", "offset 0", "4");
        add(calls, "overlap down", ILLEGAL, live -> live.process(FLOATS, 3, FLOATS, 0, 2), "offset 3", "offset 0", "4");
    }

    private static void doubles(List<Arguments> calls) {
        add(calls, "null source", NULL, live -> live.process((double[]) null, 0, DOUBLES, 0, 1), "source");
        add(calls, "null destination", NULL, live -> live.process(DOUBLES, 0, null, 0, 1), "destination");
        add(calls, "frames -1", ILLEGAL, live -> live.process(DOUBLES, 0, DOUBLES, 0, -1), "frames", "-1", "0");
        add(
                calls,
                "source short",
                BOUNDS,
                live -> live.process(DOUBLES, 0, new double[99], 0, 11),
                "source",
                "20",
                "22");
        add(calls, "source -1", BOUNDS, live -> live.process(DOUBLES, -1, new double[99], 0, 1), "source", "-1");
        add(calls, "destination short", BOUNDS, live -> live.process(new double[99], 0, DOUBLES, 0, 11), "destination");
        add(calls, "destination -1", BOUNDS, live -> live.process(new double[99], 0, DOUBLES, -1, 1), "-1");
        add(calls, "product overflows", BOUNDS, live -> live.process(DOUBLES, 0, DOUBLES, 0, HUGE), "4294967294");
        add(calls, "overlap", ILLEGAL, live -> live.process(DOUBLES, 0, DOUBLES, 3, 2), "offset 3", "offset 0", "4");
    }

    private static void planes(List<Arguments> calls) {
        float[] shared = new float[10];
        float[][] twice = {shared, shared};
        float[][] crossed = {PLANES[1], PLANES[0]};
        float[][] uneven = {new float[10], new float[9]};
        float[][] holed = {new float[10], null};
        add(calls, "null planes", NULL, live -> live.process((float[][]) null, PLANES, 0, 1), "source");
        add(calls, "null destination planes", NULL, live -> live.process(PLANES, null, 0, 1), "destination");
        add(calls, "null plane", NULL, live -> live.process(PLANES, holed, 0, 1), "destination plane 1");
        add(calls, "null source plane", NULL, live -> live.process(holed, PLANES, 0, 1), "source plane 1");
        add(calls, "too few planes", ILLEGAL, live -> live.process(new float[1][10], PLANES, 0, 1), "source", "1", "2");
        add(calls, "too many", ILLEGAL, live -> live.process(PLANES, new float[3][10], 0, 1), "destination", "3", "2");
        add(calls, "frames -1", ILLEGAL, live -> live.process(PLANES, PLANES, 0, -1), "frames", "-1", "0");
        add(calls, "offset -1", BOUNDS, live -> live.process(PLANES, PLANES, -1, 1), "source", "-1", "10");
        add(
                calls,
                "short plane",
                BOUNDS,
                live -> live.process(PLANES, uneven, 0, 10),
                "destination plane 1",
                "9",
                "10");
        add(calls, "overflow", BOUNDS, live -> live.process(PLANES, PLANES, 5, HUGE), "source", "" + HUGE, "5");
        add(calls, "shared", ILLEGAL, live -> live.process(PLANES, twice, 0, 1), "plane 0", "plane 1");
        add(calls, "crossed", ILLEGAL, live -> live.process(PLANES, crossed, 0, 1), "plane 0", "plane 1");
    }

    private static void buffers(List<Arguments> calls) {
        FloatBuffer heap = FloatBuffer.allocate(20);
        FloatBuffer readOnly = SampleFormat.direct(20).asReadOnlyBuffer();
        FloatBuffer late = SampleFormat.direct(20).position(10);
        FloatBuffer cut = SampleFormat.direct(20).limit(10);
        ByteOrder other =
                ByteOrder.nativeOrder() == ByteOrder.BIG_ENDIAN ? ByteOrder.LITTLE_ENDIAN : ByteOrder.BIG_ENDIAN;
        FloatBuffer swapped = ByteBuffer.allocateDirect(80).order(other).asFloatBuffer();
        add(calls, "null buffer", NULL, live -> live.process((FloatBuffer) null, DIRECT, 1), "source");
        add(calls, "null destination buffer", NULL, live -> live.process(DIRECT, null, 1), "destination");
        add(calls, "heap source", ILLEGAL, live -> live.process(heap, DIRECT, 1), "source", "heap", "direct");
        add(calls, "heap destination", ILLEGAL, live -> live.process(DIRECT, heap, 1), "destination", "heap", "direct");
        add(calls, "read-only", ILLEGAL, live -> live.process(DIRECT, readOnly, 1), "destination", "read-only");
        add(calls, "order", ILLEGAL, live -> live.process(swapped, DIRECT, 1), "source", "" + other, "native");
        add(calls, "order out", ILLEGAL, live -> live.process(DIRECT, swapped, 1), "destination", "" + other);
        add(calls, "frames -1", ILLEGAL, live -> live.process(DIRECT, DIRECT, -1), "frames", "-1", "0");
        add(calls, "position", BOUNDS, live -> live.process(late, DIRECT, 6), "source", "10", "12");
        add(calls, "limit", BOUNDS, live -> live.process(DIRECT, cut, 6), "destination", "10", "12");
        add(calls, "overflow", BOUNDS, live -> live.process(DIRECT, DIRECT, HUGE), "source", "4294967294", "20");
    }

    private static void targets(List<Arguments> calls) {
        Cascade rate = Cascade.of(44_100, Section.PASS_THROUGH);
        Cascade unstable = Designs.cascade(Section.PASS_THROUGH, Section.of(1, 0, 0, -2.5, 1.5));
        Cascade edge = Designs.cascade(Section.of(1, 0, 0, 0, 1));
        add(calls, "null target", NULL, live -> live.retune((Cascade) null), "target");
        add(calls, "null target, own pace", NULL, live -> live.retune(null, Pace.SINGLE), "target");
        add(calls, "null pace", NULL, live -> live.retune(Designs.mixed(1, 3), null), "pace");
        add(calls, "null glide", NULL, live -> live.retune((Glide) null), "glide");
        add(calls, "other rate", ILLEGAL, live -> live.retune(rate), "44100", "48000");
        add(calls, "too long", ILLEGAL, live -> live.retune(Designs.mixed(1, 5)), "5 sections", "4");
        add(calls, "unstable", ILLEGAL, live -> live.retune(unstable), "section 1", "-2.5", "stable", "|a2| < 1");
        add(calls, "pole on the circle", ILLEGAL, live -> live.retune(edge), "section 0", "stable");
    }

    private static void add(
            List<Arguments> calls, String name, Class<?> type, Consumer<LiveCascade> call, String... words) {
        calls.add(Arguments.of(name, type, call, List.of(words)));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("calls")
    void isRefusedAndChangesNothing(
            String name, Class<? extends Throwable> type, Consumer<LiveCascade> call, List<String> words) {
        for (Form form : Form.values()) {
            LiveCascade live = busy(form);
            LiveCascade twin = busy(form);
            Throwable thrown = assertThrows(type, () -> call.accept(live));
            assertEquals(type, thrown.getClass());
            if (type == NULL) {
                assertEquals(words, List.of(thrown.getMessage()));
            }
            for (String word : words) {
                assertTrue(thrown.getMessage().contains(word), "\"" + word + "\" in: " + thrown.getMessage());
            }
            assertEquals(twin.isSettled(), live.isSettled());
            double[][] in = Signals.noise(2, 2, 8_000);
            assertArrayEquals(
                    Rig.run(twin, SampleFormat.DOUBLES, in, 8_000), Rig.run(live, SampleFormat.DOUBLES, in, 8_000));
            assertEquals(0, live.replacedInputSamples() + live.replacedOutputSamples() + live.channelRestarts());
        }
        assertArrayEquals(new float[20], FLOATS, "a refused block was written");
        assertArrayEquals(new double[20], DOUBLES, "a refused block was written");
        assertArrayEquals(new float[2][10], PLANES, "a refused block was written");
        assertEquals(SampleFormat.direct(20), DIRECT, "a refused block was written");
    }

    /** Sounding, in the middle of a glide, and with the next target waiting: as much state as there is. */
    private static LiveCascade busy(Form form) {
        LiveCascade live = Rig.live(Designs.mixed(1, 4), 2, form);
        live.retune(Designs.mixed(2, 4));
        Rig.run(live, SampleFormat.DOUBLES, Signals.noise(1, 2, 333), 333);
        live.retune(Designs.mixed(3, 3));
        return live;
    }
}
