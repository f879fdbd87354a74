package io.github.polewright.pcm;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.Arrays;
import java.util.Random;
import java.util.stream.Stream;
import javax.sound.sampled.AudioFormat;
import javax.sound.sampled.AudioInputStream;
import javax.sound.sampled.AudioSystem;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

final class PcmFormatTest {

    private static final ByteOrder LITTLE = ByteOrder.LITTLE_ENDIAN;
    private static final ByteOrder BIG = ByteOrder.BIG_ENDIAN;

    static Stream<PcmFormat> integers() {
        return Stream.of(LITTLE, BIG)
                .flatMap(order -> Stream.of(8, 16, 24, 32).map(bits -> PcmFormat.integer(bits, order)));
    }

    static Stream<PcmFormat> all() {
        return Stream.concat(
                integers(),
                Stream.of(LITTLE, BIG)
                        .flatMap(order -> Stream.of(32, 64).map(bits -> PcmFormat.floatingPoint(bits, order))));
    }

    /** All values of 8 and 16 bits; the edges, powers of two and random values of 24 and 32. */
    private static long[] values(int bits) {
        long half = 1L << (bits - 1);
        if (bits <= 16) {
            long[] every = new long[1 << bits];
            Arrays.setAll(every, i -> i - half);
            return every;
        }
        Random random = new Random(bits);
        long[] some = new long[20_000];
        Arrays.setAll(some, i -> Math.floorMod(random.nextLong(), 2 * half) - half);
        long[] edges = {-half, -half + 1, -1, 0, 1, half - 2, half - 1};
        System.arraycopy(edges, 0, some, 0, edges.length);
        for (int i = 0; i < bits - 1; i++) {
            some[10 + 2 * i] = 1L << i;
            some[11 + 2 * i] = -(1L << i);
        }
        return some;
    }

    /** The bytes as java.nio lays them, so that the layout is not judged by the code under test. */
    private static byte[] bytes(PcmFormat format, long[] values) {
        int width = format.bytesPerSample();
        ByteBuffer out = ByteBuffer.allocate(values.length * width);
        for (long value : values) {
            long word = format.bits() == 8 ? value + 128 : value;
            byte[] big = ByteBuffer.allocate(8).putLong(word).array();
            for (int i = 0; i < width; i++) {
                out.put(format.byteOrder() == BIG ? big[8 - width + i] : big[7 - i]);
            }
        }
        return out.array();
    }

    @ParameterizedTest
    @MethodSource("integers")
    void integersSurviveTheWayThroughDouble(PcmFormat format) {
        long[] values = values(format.bits());
        byte[] source = bytes(format, values);
        double[] samples = new double[values.length];
        format.decode(source, 0, samples, 0, samples.length);
        for (int i = 0; i < values.length; i++) {
            assertEquals(values[i] * Math.pow(2, 1 - format.bits()), samples[i]);
        }
        byte[] back = new byte[source.length];
        assertEquals(0, format.encode(samples, 0, back, 0, samples.length));
        assertArrayEquals(source, back);
    }

    @ParameterizedTest
    @MethodSource("integers")
    void integersUpTo24BitsSurviveTheWayThroughFloat(PcmFormat format) {
        long[] values = values(format.bits());
        byte[] source = bytes(format, values);
        float[] samples = new float[values.length];
        format.decode(source, 0, samples, 0, samples.length);
        for (int i = 0; i < values.length; i++) {
            assertEquals((float) values[i] * (float) Math.pow(2, 1 - format.bits()), samples[i]);
        }
        byte[] back = new byte[source.length];
        int clipped = format.encode(samples, 0, back, 0, samples.length);
        if (format.bits() <= 24) {
            assertEquals(0, clipped);
            assertArrayEquals(source, back);
        }
    }

    @ParameterizedTest
    @MethodSource("integers")
    void encodingRoundsHalvesToEvenAndSaturates(PcmFormat format) {
        Random random = new Random(7);
        long half = 1L << (format.bits() - 1);
        double[] samples = new double[4000];
        for (int i = 0; i < samples.length; i++) {
            double wide = (random.nextDouble() * 2.2 - 1.1) * half;
            samples[i] = (i % 2 == 0 ? wide : Math.floor(wide) + 0.5) / half;
        }
        long[] expected = new long[samples.length];
        int outside = 0;
        for (int i = 0; i < samples.length; i++) {
            long exact = new BigDecimal(samples[i])
                    .multiply(BigDecimal.valueOf(half))
                    .setScale(0, RoundingMode.HALF_EVEN)
                    .longValueExact();
            expected[i] = Math.max(-half, Math.min(half - 1, exact));
            outside += expected[i] == exact ? 0 : 1;
        }
        byte[] out = new byte[samples.length * format.bytesPerSample()];
        assertEquals(outside, format.encode(samples, 0, out, 0, samples.length));
        assertTrue(outside > 100);
        assertArrayEquals(bytes(format, expected), out);
    }

    @ParameterizedTest
    @MethodSource("integers")
    void whatAnIntegerCannotHoldIsCounted(PcmFormat format) {
        float[] samples = {
            Float.NaN, Float.POSITIVE_INFINITY, Float.NEGATIVE_INFINITY, 1, -1, 0, -0f, Float.MIN_VALUE, Float.MAX_VALUE
        };
        long half = 1L << (format.bits() - 1);
        byte[] out = new byte[samples.length * format.bytesPerSample()];
        assertEquals(5, format.encode(samples, 0, out, 0, samples.length));
        long[] expected = {0, half - 1, -half, half - 1, -half, 0, 0, 0, half - 1};
        assertArrayEquals(bytes(format, expected), out);
    }

    @ParameterizedTest
    @ValueSource(booleans = {true, false})
    void floatingPointKeepsEveryBit(boolean big) {
        ByteOrder order = big ? BIG : LITTLE;
        Random random = new Random(3);
        ByteBuffer floats = ByteBuffer.allocate(40_000).order(order);
        ByteBuffer doubles = ByteBuffer.allocate(80_000).order(order);
        for (int i = 0; i < 10_000; i++) {
            float value = Float.intBitsToFloat(random.nextInt());
            floats.putFloat(Float.isNaN(value) ? Float.NEGATIVE_INFINITY : value);
            double wide = Double.longBitsToDouble(random.nextLong());
            doubles.putDouble(Double.isNaN(wide) ? Double.MIN_VALUE : wide);
        }
        float[] narrow = new float[10_000];
        double[] wide = new double[10_000];
        PcmFormat format32 = PcmFormat.floatingPoint(32, order);
        PcmFormat format64 = PcmFormat.floatingPoint(64, order);
        format32.decode(floats.array(), 0, narrow, 0, 10_000);
        format64.decode(doubles.array(), 0, wide, 0, 10_000);
        for (int i = 0; i < 10_000; i++) {
            assertEquals(floats.getFloat(4 * i), narrow[i]);
            assertEquals(doubles.getDouble(8 * i), wide[i]);
        }
        byte[] back = new byte[80_000];
        assertEquals(0, format32.encode(narrow, 0, back, 0, 10_000));
        assertArrayEquals(floats.array(), Arrays.copyOf(back, 40_000));
        assertEquals(0, format64.encode(wide, 0, back, 0, 10_000));
        assertArrayEquals(doubles.array(), back);
    }

    @Test
    void floatingPointTakesNonFiniteValuesAndClipsWhatIsTooLarge() {
        PcmFormat format = PcmFormat.floatingPoint(32, LITTLE);
        byte[] out = new byte[16];
        double[] samples = {Double.NaN, Double.POSITIVE_INFINITY, 1e300, -1e300};
        assertEquals(2, format.encode(samples, 0, out, 0, 4));
        double[] back = new double[4];
        format.decode(out, 0, back, 0, 4);
        assertArrayEquals(new double[] {Double.NaN, Double.POSITIVE_INFINITY, Float.MAX_VALUE, -Float.MAX_VALUE}, back);
    }

    /** The JDK's own converter, javax.sound.sampled.AudioSystem, turns 32-bit float into integers and back. */
    @ParameterizedTest
    @MethodSource("integers")
    void theJdkDecodesTheSameValues(PcmFormat format) throws Exception {
        long[] values = values(format.bits());
        byte[] source = bytes(format, values);
        AudioFormat.Encoding encoding =
                format.bits() == 8 ? AudioFormat.Encoding.PCM_UNSIGNED : AudioFormat.Encoding.PCM_SIGNED;
        int width = format.bytesPerSample();
        boolean big = format.byteOrder() == BIG;
        AudioFormat from = new AudioFormat(encoding, 8000, format.bits(), 1, width, 8000, big);
        AudioFormat to = new AudioFormat(AudioFormat.Encoding.PCM_FLOAT, 8000, 32, 1, 4, 8000, true);
        AudioInputStream stream = new AudioInputStream(new ByteArrayInputStream(source), from, values.length);
        byte[] theirs = AudioSystem.getAudioInputStream(to, stream).readAllBytes();
        float[] ours = new float[values.length];
        format.decode(source, 0, ours, 0, ours.length);
        // The JDK divides n-bit integers by 2^(n-1) - 1 or 2^(n-1), depending on n: one step of n bits apart at most.
        double step = Math.pow(2, 1 - format.bits()) + 1.2e-7;
        for (int i = 0; i < ours.length; i++) {
            assertEquals(ByteBuffer.wrap(theirs).getFloat(4 * i), ours[i], step);
        }
    }

    @ParameterizedTest
    @MethodSource("all")
    void nothingOutsideTheRangeIsTouched(PcmFormat format) {
        int width = format.bytesPerSample();
        byte[] out = new byte[10 * width];
        Arrays.fill(out, (byte) 0x55);
        double[] samples = {9, 9, 0.25, -0.5, 9};
        assertEquals(0, format.encode(samples, 2, out, 3 * width, 2));
        for (int i = 0; i < out.length; i++) {
            if (i < 3 * width || i >= 5 * width) {
                assertEquals(0x55, out[i]);
            }
        }
        float[] back = {7, 7, 7, 7};
        format.decode(out, 3 * width, back, 1, 2);
        assertArrayEquals(new float[] {7, 0.25f, -0.5f, 7}, back);
    }

    @ParameterizedTest
    @MethodSource("all")
    void badRangesAreRefusedBeforeAnythingIsWritten(PcmFormat format) {
        int width = format.bytesPerSample();
        byte[] bytes = new byte[4 * width];
        float[] floats = new float[4];
        double[] doubles = new double[4];
        int[][] bad = {{0, 0, 5}, {-1, 0, 1}, {0, -1, 1}, {0, 0, -1}, {1, 0, 4}, {0, 1, 4}, {0, 0, Integer.MAX_VALUE}};
        Arrays.fill(bytes, (byte) 0x55);
        byte[] before = bytes.clone();
        for (int[] row : bad) {
            Class<IndexOutOfBoundsException> expected = IndexOutOfBoundsException.class;
            assertThrows(expected, () -> format.decode(bytes, row[0], floats, row[1], row[2]));
            assertThrows(expected, () -> format.decode(bytes, row[0], doubles, row[1], row[2]));
            assertThrows(expected, () -> format.encode(floats, row[0], bytes, row[1], row[2]));
            assertThrows(expected, () -> format.encode(doubles, row[0], bytes, row[1], row[2]));
        }
        assertArrayEquals(before, bytes);
        assertArrayEquals(new float[4], floats);
        assertArrayEquals(new double[4], doubles);
        format.decode(bytes, bytes.length, floats, 4, 0);
    }

    @Test
    void formatsAreValues() {
        assertEquals(PcmFormat.integer(16, BIG), PcmFormat.integer(16, BIG));
        assertEquals(
                PcmFormat.integer(16, BIG).hashCode(),
                PcmFormat.integer(16, BIG).hashCode());
        assertNotEquals(PcmFormat.integer(16, BIG), PcmFormat.integer(16, LITTLE));
        assertNotEquals(PcmFormat.integer(32, BIG), PcmFormat.floatingPoint(32, BIG));
        assertEquals(
                "24-bit integer, LITTLE_ENDIAN", PcmFormat.integer(24, LITTLE).toString());
        assertEquals(3, PcmFormat.integer(24, LITTLE).bytesPerSample());
        assertFalse(PcmFormat.integer(24, LITTLE).isFloatingPoint());
        assertThrows(IllegalArgumentException.class, () -> PcmFormat.integer(12, LITTLE));
        assertThrows(IllegalArgumentException.class, () -> PcmFormat.floatingPoint(16, LITTLE));
    }
}
