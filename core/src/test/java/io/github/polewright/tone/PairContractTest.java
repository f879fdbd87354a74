package io.github.polewright.tone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.sun.management.ThreadMXBean;
import java.lang.management.ManagementFactory;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicBoolean;
import org.junit.jupiter.api.Test;

/** What holds for any signal: cutting, layouts, the ring, allocation, unusable samples and arguments. */
final class PairContractTest {

    private static final String SENT = "159D0#*A4738B26C";

    private static PairSignal signal(double rate) {
        PairSignal signal = new PairSignal(rate, 3);
        signal.pause(0.1);
        for (char symbol : SENT.toCharArray()) {
            signal.pair(symbol, -12, 0.05).pause(0.05);
        }
        return signal.pause(0.05).noise(-12, 20);
    }

    private static List<PairReadings.Kept> drain(PairReader reader) {
        List<PairReadings.Kept> kept = new ArrayList<>();
        PairEvent event = new PairEvent();
        while (reader.poll(event)) {
            kept.add(PairReadings.Kept.of(event));
        }
        return kept;
    }

    @Test
    void anyCuttingGivesTheSameEvents() {
        for (double rate : new double[] {8000, 44100, 48000}) {
            float[] frames = signal(rate).frames();
            PairReader whole = PairReader.of(rate);
            whole.process(frames, 0, frames.length);
            List<PairReadings.Kept> expected = drain(whole);
            assertEquals(SENT, PairReadings.symbols(expected));
            SplittableRandom random = new SplittableRandom(5);
            for (int most : new int[] {1, 7, 64, 500}) {
                PairReader cut = PairReader.of(rate);
                for (int at = 0; at < frames.length; ) {
                    int count = Math.min(frames.length - at, random.nextInt(0, most + 1));
                    cut.process(frames, at, count);
                    at += count;
                }
                assertEquals(expected, drain(cut), "blocks of up to " + most);
            }
        }
    }

    @Test
    void everyLayoutAndChannelGivesTheSameEvents() {
        float[] frames = signal(48000).frames();
        PairReader mono = PairReader.of(48000);
        mono.process(frames, 0, frames.length);
        List<PairReadings.Kept> expected = drain(mono);
        float[] noise = new PairSignal(48000, 9).pause(1).noise(0, 0).frames();
        for (int channel = 0; channel < 3; channel++) {
            float[] floats = new float[3 * frames.length + 2];
            double[] doubles = new double[floats.length];
            float[][] planes = new float[3][frames.length + 1];
            for (int i = 0; i < frames.length; i++) {
                for (int c = 0; c < 3; c++) {
                    float sample = c == channel ? frames[i] : noise[i % noise.length];
                    floats[2 + 3 * i + c] = sample;
                    doubles[2 + 3 * i + c] = sample;
                    planes[c][1 + i] = sample;
                }
            }
            PairReader one = PairReader.builder(48000).channel(channel, 3).build();
            one.process(floats, 2, frames.length);
            assertEquals(expected, drain(one));
            one = PairReader.builder(48000).channel(channel, 3).build();
            one.process(doubles, 2, frames.length);
            assertEquals(expected, drain(one));
            one = PairReader.builder(48000).channel(channel, 3).build();
            one.process(planes, 1, frames.length);
            assertEquals(expected, drain(one));
        }
    }

    @Test
    void aFullRingDropsAndCounts() {
        float[] frames = signal(8000).frames();
        PairReader reader = PairReader.builder(8000).eventCapacity(5).build();
        reader.process(frames, 0, frames.length);
        assertEquals(2 * SENT.length() - 5, reader.droppedEvents());
        List<PairReadings.Kept> kept = drain(reader);
        assertEquals(5, kept.size());
        assertEquals("159", PairReadings.symbols(kept));
        reader.process(frames, 0, frames.length);
        assertEquals("159", PairReadings.symbols(drain(reader)), "the freed ring takes events again");
    }

    @Test
    void anotherThreadDrainsWholeEventsInOrder() throws InterruptedException {
        float[] frames = signal(8000).frames();
        PairReader quiet = PairReader.of(8000);
        int rounds = 200;
        List<PairReadings.Kept> expected = new ArrayList<>();
        for (int i = 0; i < rounds; i++) {
            quiet.process(frames, 0, frames.length);
            expected.addAll(drain(quiet));
        }
        PairReader reader =
                PairReader.builder(8000).eventCapacity(4 * SENT.length()).build();
        AtomicBoolean done = new AtomicBoolean();
        List<PairReadings.Kept> seen = new ArrayList<>();
        Thread control = new Thread(() -> {
            while (!done.get()) {
                seen.addAll(drain(reader));
                Thread.onSpinWait();
            }
            seen.addAll(drain(reader));
        });
        control.start();
        for (int i = 0; i < rounds; i++) {
            reader.process(frames, 0, frames.length);
        }
        done.set(true);
        control.join();
        assertEquals(expected.size(), seen.size() + reader.droppedEvents());
        int next = 0;
        for (PairReadings.Kept event : seen) {
            while (next < expected.size() && !expected.get(next).equals(event)) {
                next++;
            }
            assertTrue(next++ < expected.size(), "an event that was never written, or out of order: " + event);
        }
        assertTrue(seen.size() > SENT.length(), "the control thread saw almost nothing");
    }

    @Test
    void feedingAndDrainingAllocateNothing() {
        float[] frames = signal(48000).frames();
        float[][] planes = {frames};
        double[] doubles = signal(48000).samples();
        PairReader reader = PairReader.of(48000);
        PairEvent event = new PairEvent();
        Runnable work = () -> {
            reader.process(frames, 0, frames.length);
            reader.process(planes, 0, frames.length);
            reader.process(doubles, 0, frames.length);
            while (reader.poll(event)) {
                sum += event.startFrame();
            }
        };
        assertEquals(0, leastAllocation(work));
        assertTrue(leastAllocation(() -> planted = new byte[16]) >= 16, "the meter must see a planted allocation");
        assertTrue(sum > 0 && planted.length == 16);
    }

    private long sum;
    private byte[] planted = {};

    static long leastAllocation(Runnable work) {
        ThreadMXBean threads = (ThreadMXBean) ManagementFactory.getThreadMXBean();
        long least = Long.MAX_VALUE;
        for (int i = 0; i < 20; i++) {
            long before = threads.getCurrentThreadAllocatedBytes();
            work.run();
            least = Math.min(least, threads.getCurrentThreadAllocatedBytes() - before);
        }
        return least;
    }

    @Test
    void unusableSamplesAreSilenceAndCounted() {
        double[] samples = signal(8000).samples();
        double[] silenced = samples.clone();
        double[] bad = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, 1e16, -Double.MAX_VALUE};
        int count = 0;
        for (int i = 100; i < samples.length; i += 997) {
            samples[i] = bad[count++ % bad.length];
            silenced[i] = 0;
        }
        PairReader reader = PairReader.of(8000);
        reader.process(samples, 0, samples.length);
        PairReader expected = PairReader.of(8000);
        expected.process(silenced, 0, silenced.length);
        assertEquals(drain(expected), drain(reader));
        assertEquals(count, reader.replacedSamples());
        float[] floats = {Float.NaN, Float.MAX_VALUE, Float.NEGATIVE_INFINITY, 1};
        reader.process(floats, 0, 4);
        assertEquals(count + 3, reader.replacedSamples());
    }

    @Test
    void theLoudestUsableSamplesDoNoHarm() {
        double[] loud = new double[8000];
        for (int i = 0; i < loud.length; i++) {
            loud[i] = (i / 5 % 2 == 0 ? 1 : -1) * 1e15;
        }
        PairReader reader = PairReader.of(8000);
        reader.process(loud, 0, loud.length);
        reader.process(new double[24000], 0, 24000);
        drain(reader);
        float[] frames = signal(8000).frames();
        reader.process(frames, 0, frames.length);
        assertEquals(SENT, PairReadings.symbols(drain(reader)));
        assertEquals(0, reader.replacedSamples());
    }

    @Test
    void silenceLeavesExactZeros() {
        for (double rate : new double[] {8000, 48000, 192000}) {
            PairReader reader = PairReader.of(rate);
            float[] frames = signal(rate).frames();
            reader.process(frames, 0, frames.length);
            assertFalse(reader.isSilent());
            double[] subnormal = new double[(int) rate];
            Arrays.fill(subnormal, Double.MIN_NORMAL / 8);
            reader.process(subnormal, 0, subnormal.length);
            assertTrue(reader.isSilent(), "at " + rate + " Hz");
        }
    }

    @Test
    void resetStartsAnew() {
        float[] frames = signal(44100).frames();
        PairReader reader = PairReader.of(44100);
        reader.process(frames, 0, frames.length);
        List<PairReadings.Kept> expected = drain(reader);
        reader.process(frames, 0, 12345);
        drain(reader);
        reader.reset();
        reader.process(frames, 0, frames.length);
        assertEquals(expected, drain(reader));
    }

    @Test
    void badArgumentsAreRefusedByNameAndChangeNothing() {
        for (double rate : new double[] {Double.NaN, -1, 7999, 192001, Double.POSITIVE_INFINITY}) {
            refused("sampleRateHz", () -> PairReader.of(rate));
        }
        refused("channel", () -> PairReader.builder(8000).channel(2, 2).build());
        refused("channel", () -> PairReader.builder(8000).channel(-1, 2).build());
        refused("channels", () -> PairReader.builder(8000).channel(0, 0).build());
        refused("eventCapacity", () -> PairReader.builder(8000).eventCapacity(0).build());
        refused("hertz", () -> PairReader.builder(8000).dialTone(350, 600));
        refused("errorPercent", () -> PairLimits.RECOMMENDED.withError(2.5, 0));
        refused("errorHz", () -> PairLimits.RECOMMENDED.withError(1, Double.NaN));
        refused("1633", () -> PairLimits.RECOMMENDED.withError(0, 0));
        refused("lowestTwistDb", () -> PairLimits.RECOMMENDED.withTwist(1, 4));
        refused("highestTwistDb", () -> PairLimits.RECOMMENDED.withTwist(-8, 13));
        refused("floorDbfs", () -> PairLimits.RECOMMENDED.withFloor(1));
        refused("leastShare", () -> PairLimits.RECOMMENDED.withShare(0.96));
        refused("releaseSeconds", () -> PairLimits.RECOMMENDED.withRelease(0));
        PairReader stereo = PairReader.builder(8000).channel(1, 2).build();
        float[] ten = {9, 9, 9, 9, 9, 9, 9, 9, 9, 9};
        assertThrows(IllegalArgumentException.class, () -> stereo.process(ten, 0, -1));
        assertThrows(IndexOutOfBoundsException.class, () -> stereo.process(ten, -1, 2));
        assertThrows(IndexOutOfBoundsException.class, () -> stereo.process(ten, 1, 5));
        assertThrows(IndexOutOfBoundsException.class, () -> stereo.process(ten, 0, Integer.MAX_VALUE));
        assertThrows(IllegalArgumentException.class, () -> stereo.process(new float[][] {ten}, 0, 1));
        assertThrows(IndexOutOfBoundsException.class, () -> stereo.process(new float[][] {ten, ten}, 5, 6));
        assertTrue(stereo.isSilent());
    }

    @Test
    void limitsPrintInOneLine() {
        assertEquals(
                "error 1.5 % + 2.0 Hz, twist -8.0 to 4.0 dB, floor -36.0 dBFS, release 0.02 s, share 0.91",
                PairLimits.RECOMMENDED.toString());
        assertEquals(
                "error 1.0 % + 3.0 Hz, twist -5.0 to 6.0 dB, floor -40.0 dBFS, release 0.03 s, share 0.9",
                PairLimits.RECOMMENDED
                        .withError(1, 3)
                        .withTwist(-5, 6)
                        .withFloor(-40)
                        .withRelease(0.03)
                        .withShare(0.9)
                        .toString());
    }

    private static void refused(String name, Runnable work) {
        IllegalArgumentException thrown = assertThrows(IllegalArgumentException.class, work::run);
        assertTrue(thrown.getMessage().contains(name), thrown.getMessage());
    }
}
