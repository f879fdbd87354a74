package io.github.polewright.tone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Levels against the amplitudes that were sent, instants against where they were sent. */
final class ToneMeterTest {

    private static List<String> drain(ToneMeter meter) {
        List<String> kept = new ArrayList<>();
        ToneEvent event = new ToneEvent();
        while (meter.poll(event)) {
            kept.add(event.toString());
        }
        return kept;
    }

    @ParameterizedTest
    @CsvSource({"8000,1000,20", "8000,3600,50", "44100,60,5", "48000,440,10", "48000,15000,100", "192000,1000,20"})
    void tellsLevelAndInstants(double rate, double hertz, double widthHz) {
        Tone tone = Tone.byWidth(hertz, widthHz);
        ToneMeter meter = ToneMeter.builder(rate).tone(tone).build();
        double response = tone.responseSeconds();
        double seconds = 6 * response + 0.1;
        PairSignal signal =
                new PairSignal(rate, 1).pause(0.1).tone(hertz, -20, seconds).pause(5 * response + 0.1);
        float[] frames = signal.frames();
        int middle = (int) ((0.1 + seconds * 0.9) * rate);
        meter.process(frames, 0, middle);
        assertEquals(-20, meter.levelDbfs(0), 0.02);
        meter.process(frames, middle, frames.length - middle);
        ToneEvent event = new ToneEvent();
        double slack = 0.002 + 0.1 * response;
        assertTrue(meter.poll(event) && !event.isEnd());
        assertEquals(0.1, event.startFrame() / rate, slack);
        assertTrue(meter.poll(event) && event.isEnd());
        assertEquals(0.1, event.startFrame() / rate, slack);
        assertEquals(0.1 + seconds, event.endFrame() / rate, slack);
        assertEquals(-20, event.levelDbfs(), 0.2);
        assertTrue(!meter.poll(event));
    }

    @Test
    void isThreeDecibelsDownAtTheEdgesAndInTheResponseTimeNine() {
        // cos and tan of the band edges: a peak 40 Hz wide around 1000 Hz at 8 kHz, from its two -3 dB frequencies.
        double lower = 8000 / Math.PI * Math.atan(edge(-1));
        ToneMeter meter = ToneMeter.builder(8000).tone(Tone.byWidth(1000, 40)).build();
        meter.process(new PairSignal(8000, 1).tone(lower, -10, 1).frames(), 0, 8000);
        // Off its centre the two quadratures differ a little, so the reading breathes.
        assertEquals(-13.01, meter.levelDbfs(0), 0.2);
        meter = ToneMeter.builder(8000).tone(Tone.byResponse(1000, 0.05)).build();
        meter.process(new PairSignal(8000, 1).tone(1000, -10, 1).frames(), 0, 400);
        assertEquals(-10 + 20 * Math.log10(0.9), meter.levelDbfs(0), 0.1);
    }

    /** tan(w/2) at an edge: the edges' tangents have the product tan^2(w0/2) and their w differ by the width. */
    private static double edge(int side) {
        double product = Math.pow(Math.tan(Math.PI * 1000 / 8000), 2);
        double difference = Math.tan(Math.PI * 40 / 8000) * (1 + product);
        return (side * difference + Math.sqrt(difference * difference + 4 * product)) / 2;
    }

    @Test
    void anyCuttingGivesTheSameEventsAndSilenceIsZero() {
        PairSignal signal = new PairSignal(48000, 1).pause(0.1);
        for (int i = 0; i < 5; i++) {
            signal.tone(1000, -20, 0.2).pause(0.2).tone(2000, -25, 0.2).pause(0.1);
        }
        float[] frames = signal.noise(-20, 20).frames();
        List<String> expected = null;
        for (int most : new int[] {frames.length, 1, 77, 512}) {
            ToneMeter meter = meter();
            for (int at = 0; at < frames.length; at += most) {
                meter.process(frames, at, Math.min(most, frames.length - at));
            }
            List<String> events = drain(meter);
            assertEquals(20, events.size());
            expected = expected == null ? events : expected;
            assertEquals(expected, events);
            meter.process(new float[4 * 48000], 0, 4 * 48000);
            assertTrue(meter.isSilent());
            assertEquals(Double.NEGATIVE_INFINITY, meter.levelDbfs(0));
        }
    }

    private static ToneMeter meter() {
        return ToneMeter.builder(48000)
                .tone(Tone.byWidth(1000, 30))
                .tone(Tone.byWidth(2000, 30))
                .build();
    }

    @Test
    void allocatesNothing() {
        float[] frames =
                new PairSignal(48000, 1).tone(1000, -20, 0.2).pause(0.2).frames();
        ToneMeter meter = meter();
        CadenceReader reader = CadenceReader.builder(48000)
                .cadence(Cadence.of(new double[] {1000}, 0.2, 0.2))
                .build();
        ToneEvent event = new ToneEvent();
        CadenceEvent found = new CadenceEvent();
        assertEquals(0, PairContractTest.leastAllocation(() -> {
            for (int i = 0; i < 5; i++) {
                meter.process(frames, 0, frames.length);
                reader.process(frames, 0, frames.length);
            }
            assertTrue(meter.poll(event));
            reader.poll(found);
        }));
    }

    @ParameterizedTest
    @ValueSource(doubles = {8000, 44100, 48000, 192000})
    void findsCadences(double rate) {
        CadenceReader reader = CadenceReader.builder(rate)
                .cadence(Cadence.of(new double[] {480, 620}, 0.5, 0.5))
                .cadence(Cadence.unbroken(new double[] {350, 440}, 1))
                .cadence(Cadence.of(new double[] {425}, 0.1, 0.1, 0.1, 0.7))
                .build();
        PairSignal signal = new PairSignal(rate, 1)
                .pause(0.3)
                .pair('1', 350, 440, -20, -20, 2)
                .pause(1);
        for (int i = 0; i < 4; i++) {
            signal.pair('1', 480, 620, -24, -22, 0.52).pause(0.48);
        }
        signal.pause(1);
        for (int i = 0; i < 3; i++) {
            signal.tone(425, -20, 0.1).pause(0.1).tone(425, -20, 0.1).pause(0.7);
        }
        signal.pause(1);
        float[] frames = signal.noise(-22, 20).frames();
        reader.process(frames, 0, frames.length);
        double[][] expected = {{1, 0.3, 2.3}, {0, 3.3, 6.82}, {2, 8.3, 10.6}};
        CadenceEvent event = new CadenceEvent();
        for (double[] one : expected) {
            assertTrue(reader.poll(event) && !event.isEnd(), event.toString());
            assertEquals(one[0], event.cadence());
            assertEquals(one[1], event.startFrame() / rate, 0.015);
            assertTrue(reader.poll(event) && event.isEnd(), event.toString());
            assertEquals(one[0], event.cadence());
            assertEquals(one[2], event.endFrame() / rate, 0.015);
        }
        assertTrue(!reader.poll(event), event.toString());
    }

    @Test
    void refusesOtherCadences() {
        CadenceReader reader = CadenceReader.builder(8000)
                .cadence(Cadence.of(new double[] {480, 620}, 0.5, 0.5))
                .build();
        PairSignal signal = new PairSignal(8000, 1).pause(0.3);
        for (int i = 0; i < 5; i++) {
            signal.pair('1', 480, 620, -20, -20, 0.25).pause(0.25);
            signal.pair('1', 480, 620, -20, -20, 0.7).pause(0.3);
            signal.tone(480, -20, 0.5).pause(0.5);
            signal.pair('1', 440, 620, -20, -20, 0.5).pause(0.5);
        }
        float[] frames = signal.frames();
        reader.process(frames, 0, frames.length);
        assertTrue(!reader.poll(new CadenceEvent()));
    }

    @Test
    void countsACadenceFromItsFirstWholeTone() {
        CadenceReader reader = CadenceReader.builder(8000)
                .cadence(Cadence.of(new double[] {480, 620}, 0.5, 0.5))
                .build();
        PairSignal signal = new PairSignal(8000, 1).pause(0.3);
        for (double seconds : new double[] {1, 0.5, 1}) {
            signal.pair('1', 480, 620, -20, -20, seconds).pause(0.5);
        }
        float[] once = signal.pause(1).frames();
        reader.process(once, 0, once.length);
        CadenceEvent event = new CadenceEvent();
        assertTrue(!reader.poll(event), "one tone of the right length between two that are too long: " + event);
        signal = new PairSignal(8000, 1).pause(0.3);
        for (double seconds : new double[] {1, 0.5, 0.5}) {
            signal.pair('1', 480, 620, -20, -20, seconds).pause(0.5);
        }
        float[] twice = signal.pause(1).frames();
        reader.reset();
        reader.process(twice, 0, twice.length);
        assertTrue(reader.poll(event) && !event.isEnd(), event.toString());
        assertEquals(1.8, event.startFrame() / 8000.0, 0.015);
        assertTrue(reader.poll(event) && event.isEnd(), event.toString());
        assertEquals(3.3, event.endFrame() / 8000.0, 0.015);
    }

    @Test
    void badWishesAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> Tone.byWidth(10, 20));
        assertThrows(IllegalArgumentException.class, () -> Tone.byWidth(1000, 0));
        assertThrows(IllegalArgumentException.class, () -> Tone.byResponse(1000, Double.NaN));
        assertThrows(
                IllegalArgumentException.class,
                () -> ToneMeter.builder(8000).tone(Tone.byWidth(3990, 30)).build());
        assertThrows(
                IllegalArgumentException.class, () -> ToneMeter.builder(8000).build());
        assertThrows(IllegalArgumentException.class, () -> ToneMeter.builder(7000));
        assertThrows(
                IllegalArgumentException.class, () -> ToneMeter.builder(8000).threshold(1));
        assertThrows(IllegalArgumentException.class, () -> Cadence.of(new double[] {425}, 0.5));
        assertThrows(IllegalArgumentException.class, () -> Cadence.of(new double[] {425}, 0.5, 0.01));
        assertThrows(IllegalArgumentException.class, () -> Cadence.of(new double[] {}, 0.5, 0.5));
        assertThrows(IllegalArgumentException.class, () -> Cadence.unbroken(new double[] {50}, 0.5));
        assertThrows(
                IllegalArgumentException.class,
                () -> Cadence.of(new double[] {425}, 1, 1).withTolerance(1));
        assertThrows(
                IllegalArgumentException.class,
                () -> CadenceReader.builder(8000).cycles(0));
        assertThrows(
                IllegalArgumentException.class,
                () -> CadenceReader.builder(8000).build());
    }
}
