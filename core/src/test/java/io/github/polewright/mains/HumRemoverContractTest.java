package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.lang.management.ManagementFactory;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What every remover promises, whatever it hears. */
class HumRemoverContractTest {

    private static float[] stereo(double rate, double seconds, double sideSign) {
        double[] programme = Programme.speech(rate, seconds, 21);
        Hum hum = Hum.of(rate, Hum.wander(rate, seconds, 50.1, 0.02, 60, 2), Hum.mixed(12, 2), 2)
                .scaledTo(programme, 3);
        float[] frames = new float[2 * programme.length];
        for (int n = 0; n < programme.length; n++) {
            frames[2 * n] = (float) (programme[n] + hum.samples[n]);
            frames[2 * n + 1] = (float) (programme[n] + sideSign * hum.samples[n]);
        }
        return frames;
    }

    private static HumRemover remover(double rate, Removal way) {
        return HumRemover.builder(rate, 2).by(way).build();
    }

    @ParameterizedTest
    @EnumSource(Removal.class)
    void anyCutGivesTheSameBits(Removal way) {
        float[] input = stereo(44100, 5, 1);
        float[] whole = new float[input.length];
        remover(44100, way).process(input, 0, whole, 0, input.length / 2);
        float[] cut = input.clone();
        HumRemover other = remover(44100, way);
        Random random = new Random(1);
        for (int at = 0; at < input.length / 2; ) {
            int frames = Math.min(random.nextInt(300), input.length / 2 - at);
            other.process(cut, 2 * at, cut, 2 * at, frames);
            at += frames;
        }
        assertArrayEquals(whole, cut);
        assertEquals(MainsState.FOLLOWING, other.reading().state());
    }

    @ParameterizedTest
    @EnumSource(Removal.class)
    void planarAndDoubleEqualInterleaved(Removal way) {
        float[] input = stereo(16000, 5, 1);
        int frames = input.length / 2;
        float[] whole = new float[input.length];
        remover(16000, way).process(input, 0, whole, 0, frames);
        float[][] planes = new float[2][frames];
        double[] wide = new double[input.length];
        for (int n = 0; n < input.length; n++) {
            planes[n % 2][n / 2] = input[n];
            wide[n] = input[n];
        }
        remover(16000, way).process(planes, planes, 0, frames);
        remover(16000, way).process(wide, 0, wide, 0, frames);
        for (int n = 0; n < input.length; n++) {
            assertEquals(whole[n], planes[n % 2][n / 2]);
            assertEquals(whole[n], (float) wide[n]);
        }
    }

    @Test
    void oppositePhaseIsFollowedAndRemoved() {
        float[] input = stereo(44100, 8, -1);
        float[] output = new float[input.length];
        HumRemover remover = remover(44100, Removal.SUBTRACTION);
        remover.process(input, 0, output, 0, input.length / 2);
        assertEquals(MainsState.FOLLOWING, remover.reading().state());
        // The sum of both channels is free of hum before and after; the difference is nothing but hum.
        double before = 0;
        double after = 0;
        for (int n = 3 * 44100; n < input.length / 2; n++) {
            before += Math.pow(input[2 * n] - input[2 * n + 1], 2);
            after += Math.pow(output[2 * n] - output[2 * n + 1], 2);
        }
        assertTrue(Measure.db(after / before) < -25, "left " + Measure.db(after / before) + " dB");
    }

    @ParameterizedTest
    @ValueSource(doubles = {8000, 11025, 22050, 48000, 96000, 192000})
    void everyRateFollowsAndTellsTheLevel(double rate) {
        double seconds = 4;
        double[] programme = Programme.noise(rate, seconds, 1e-3, 5);
        double[] amplitudes = {0.05, 0.1, 0.02, 0, 0.01};
        Hum hum = Hum.of(rate, Hum.wander(rate, seconds, 60.4, 0, 60, 3), amplitudes, 3);
        double[] input = Measure.add(programme, hum.samples);
        HumRemover remover = HumRemover.of(rate, 1);
        double[] output = new double[input.length];
        remover.process(input, 0, output, 0, input.length);
        MainsReading reading = remover.reading();
        assertEquals(MainsState.FOLLOWING, reading.state());
        assertEquals(60.4, reading.frequencyHz(), 0.003);
        for (int k = 0; k < amplitudes.length; k++) {
            if (amplitudes[k] > 0) {
                assertEquals(20 * Math.log10(amplitudes[k]), reading.levelDb(k + 1, 0), 0.1, "line " + (k + 1));
            }
        }
        int from = (int) (3 * rate);
        double left = Measure.differencePower(output, programme, from, output.length)
                / Measure.power(hum.samples, from, output.length);
        assertTrue(Measure.db(left) < -40, "left " + Measure.db(left) + " dB");
    }

    @ParameterizedTest
    @EnumSource(Removal.class)
    void offGlidesToTheInputItself(Removal way) {
        float[] input = stereo(16000, 5, 1);
        float[] output = new float[input.length];
        HumRemover remover = remover(16000, way);
        int at = 4 * 16000;
        remover.process(input, 0, output, 0, at);
        assertNotEquals(input[2 * at - 2], output[2 * at - 2]);
        remover.off();
        remover.process(input, 2 * at, output, 2 * at, input.length / 2 - at);
        double last = 0;
        for (int n = 2 * at; n < 2 * (at + 320); n += 2) {
            double now = input[n] - output[n];
            assertTrue(Math.abs(now - last) < 0.5 || n == 2 * at, "a jump of " + (now - last));
            last = now;
        }
        for (int n = 2 * (at + 500); n < input.length; n++) {
            assertEquals(input[n], output[n]);
        }
    }

    @Test
    void nonFiniteSamplesAreCountedAndContained() {
        float[] input = stereo(16000, 6, 1);
        for (int n = 3 * 32000; n < 3 * 32000 + 10; n++) {
            input[n] = n % 2 == 0 ? Float.NaN : Float.POSITIVE_INFINITY;
        }
        float[] output = new float[input.length];
        HumRemover remover = remover(16000, Removal.NOTCHES);
        remover.process(input, 0, output, 0, input.length / 2);
        assertEquals(10, remover.replacedSamples());
        for (float sample : output) {
            assertTrue(Float.isFinite(sample));
        }
        assertEquals(MainsState.FOLLOWING, remover.reading().state());
    }

    @ParameterizedTest
    @EnumSource(Removal.class)
    void hugeSamplesDoNotStick(Removal way) {
        double rate = 16000;
        double[] programme = Programme.speech(rate, 20, 22);
        Hum hum = Hum.of(rate, Hum.wander(rate, 20, 50.1, 0.02, 60, 2), Hum.mixed(12, 2), 2)
                .scaledTo(programme, 3);
        double[] input = Measure.add(programme, hum.samples);
        input[4 * 16000] = Double.MAX_VALUE;
        input[4 * 16000 + 1] = -Double.MAX_VALUE;
        double[] output = new double[input.length];
        HumRemover remover = HumRemover.builder(rate, 1).by(way).build();
        remover.process(input, 0, output, 0, input.length);
        for (double sample : output) {
            assertTrue(Double.isFinite(sample));
        }
        remover.reset();
        input = Measure.add(programme, hum.samples);
        remover.process(input, 0, output, 0, input.length);
        double[] fresh = new double[input.length];
        HumRemover.builder(rate, 1).by(way).build().process(input, 0, fresh, 0, input.length);
        assertArrayEquals(fresh, output);
    }

    @Test
    void badArgumentsAreNamed() {
        assertThrows(IllegalArgumentException.class, () -> HumRemover.of(7999, 1));
        assertThrows(IllegalArgumentException.class, () -> HumRemover.of(Double.NaN, 1));
        assertThrows(IllegalArgumentException.class, () -> HumRemover.of(48000, 0));
        assertThrows(
                IllegalArgumentException.class,
                () -> HumRemover.builder(48000, 1).lines(21));
        assertThrows(IllegalArgumentException.class, () -> MainsFollower.of(48000, 1, 1));
        HumRemover remover = HumRemover.of(48000, 2);
        float[] ten = new float[10];
        assertThrows(IndexOutOfBoundsException.class, () -> remover.process(ten, 0, ten, 0, 6));
        assertThrows(IndexOutOfBoundsException.class, () -> remover.process(ten, -1, ten, 0, 1));
        assertThrows(IllegalArgumentException.class, () -> remover.process(ten, 0, ten, 2, 3));
        assertThrows(IllegalArgumentException.class, () -> remover.process(ten, 0, ten, 0, -1));
        assertThrows(IllegalArgumentException.class, () -> remover.process(new float[1][9], new float[2][9], 0, 3));
        assertThrows(IndexOutOfBoundsException.class, () -> remover.reading().levelDb(0, 0));
        assertThrows(IndexOutOfBoundsException.class, () -> remover.reading().levelDb(1, 2));
    }

    @Test
    void processAllocatesNothing() {
        float[] input = stereo(48000, 6, 1);
        float[] output = new float[input.length];
        HumRemover remover = remover(48000, Removal.SUBTRACTION);
        remover.process(input, 0, output, 0, 48000);
        long least = Long.MAX_VALUE;
        // The JVM itself allocates now and then where it takes up a method for compiling; a block's own would always
        // show.
        for (int second = 1; second < 5; second++) {
            int from = second * 48000;
            least = Math.min(least, allocated(() -> {
                for (int at = from; at < from + 48000; at += 128) {
                    remover.process(input, 2 * at, output, 2 * at, 128);
                }
            }));
        }
        assertEquals(0, least, "bytes in the leanest second");
        assertTrue(allocated(() -> input.clone()) > 1_000_000, "the measure must see an allocation");
        assertEquals(MainsState.FOLLOWING, remover.reading().state());
    }

    private static long allocated(Runnable work) {
        com.sun.management.ThreadMXBean threads = (com.sun.management.ThreadMXBean) ManagementFactory.getThreadMXBean();
        long thread = Thread.currentThread().getId();
        long before = threads.getThreadAllocatedBytes(thread);
        work.run();
        return threads.getThreadAllocatedBytes(thread) - before;
    }
}
