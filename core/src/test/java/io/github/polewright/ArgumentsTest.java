package io.github.polewright;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.design.Cookbook;
import io.github.polewright.inspect.Response;
import io.github.polewright.pcm.PcmFormat;
import io.github.polewright.retune.Bucket;
import io.github.polewright.retune.Distance;
import io.github.polewright.retune.Glide;
import io.github.polewright.retune.Pace;
import io.github.polewright.retune.Pairing;
import io.github.polewright.retune.Setting;
import io.github.polewright.retune.Walk;
import io.github.polewright.tone.Cadence;
import io.github.polewright.tone.CadenceReader;
import io.github.polewright.tone.PairReader;
import io.github.polewright.tone.Tone;
import io.github.polewright.tone.ToneMeter;
import java.nio.ByteOrder;
import java.util.ArrayList;
import java.util.List;
import java.util.function.IntConsumer;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Missing arguments and indices out of range: refused by the parameter's name. The live cascade has its own test. */
class ArgumentsTest {

    private static final Section LOW = Cookbook.lowPass(48_000, 1000, 1);
    private static final Section HIGH = Cookbook.highPass(48_000, 100, 1);
    private static final Cascade TWO = Cascade.of(48_000, LOW, HIGH);
    private static final Setting AT = new Setting(1000, 1, 0);
    private static final double[] NO_DOUBLES = null;

    static List<Arguments> nulls() {
        List<Arguments> rows = new ArrayList<>();
        add(rows, "sections", () -> Cascade.of(48_000, (Section[]) null));
        add(rows, "sections", () -> Cascade.of(48_000, (List<Section>) null));
        add(rows, "sections[1]", () -> Cascade.of(48_000, LOW, null));
        add(rows, "next", () -> TWO.then(null));
        add(rows, "cascade", () -> Response.of(null));
        add(rows, "section", () -> Response.of(48_000, null));
        add(rows, "frequenciesHz", () -> Response.of(TWO).db(NO_DOUBLES));
        add(rows, "frequenciesHz", () -> Response.of(TWO).phaseRadians(NO_DOUBLES));
        add(rows, "frequenciesHz", () -> Response.of(TWO).groupDelayFrames(NO_DOUBLES));
        glides(rows);
        samples(rows);
        tones(rows);
        return rows;
    }

    private static void glides(List<Arguments> rows) {
        add(rows, "from", () -> Glide.between(null, TWO, Pace.SINGLE));
        add(rows, "to", () -> Glide.between(TWO, null, Pace.SINGLE));
        add(rows, "pace", () -> Glide.between(TWO, TWO, null));
        add(rows, "from", () -> Glide.sweeping(null, TWO, Pace.SINGLE));
        add(rows, "to", () -> Glide.sweeping(TWO, null, Pace.SINGLE));
        add(rows, "pace", () -> Glide.sweeping(TWO, TWO, null));
        add(rows, "design", () -> Glide.along(null, AT, AT, Pace.SINGLE));
        add(rows, "from", () -> Glide.along((hz, q, db) -> TWO, null, AT, Pace.SINGLE));
        add(rows, "to", () -> Glide.along((hz, q, db) -> TWO, AT, null, Pace.SINGLE));
        add(rows, "pace", () -> Glide.along((hz, q, db) -> TWO, AT, AT, null));
        add(rows, "design returned null at " + AT, () -> Glide.along((hz, q, db) -> null, AT, AT, Pace.SINGLE));
        add(rows, "running", () -> Glide.between(TWO, TWO, Pace.SINGLE).inSlotsOf(null));
        add(rows, "from", () -> Pairing.of(null, TWO));
        add(rows, "to", () -> Pairing.of(TWO, null));
        add(rows, "from", () -> Distance.between(null, LOW));
        add(rows, "to", () -> Distance.upperBound(LOW, null));
        add(rows, "second", () -> Distance.hopFraction(LOW, null));
        add(rows, "start", () -> new Walk(null, 1));
        add(rows, "next", () -> new Walk(TWO, 1).adopt(null));
    }

    private static void samples(List<Arguments> rows) {
        PcmFormat pcm = PcmFormat.integer(16, ByteOrder.LITTLE_ENDIAN);
        add(rows, "byteOrder", () -> PcmFormat.integer(16, null));
        add(rows, "byteOrder", () -> PcmFormat.floatingPoint(32, null));
        add(rows, "source", () -> pcm.decode(null, 0, new float[1], 0, 1));
        add(rows, "destination", () -> pcm.decode(new byte[2], 0, (float[]) null, 0, 1));
        add(rows, "source", () -> pcm.decode(null, 0, new double[1], 0, 1));
        add(rows, "destination", () -> pcm.decode(new byte[2], 0, NO_DOUBLES, 0, 1));
        add(rows, "source", () -> pcm.encode((float[]) null, 0, new byte[2], 0, 1));
        add(rows, "destination", () -> pcm.encode(new float[1], 0, null, 0, 1));
        add(rows, "source", () -> pcm.encode(NO_DOUBLES, 0, new byte[2], 0, 1));
        add(rows, "destination", () -> pcm.encode(new double[1], 0, null, 0, 1));
    }

    private static void tones(List<Arguments> rows) {
        PairReader reader = PairReader.builder(8000).channel(1, 2).build();
        add(rows, "source", () -> reader.process((float[]) null, 0, 1));
        add(rows, "source", () -> reader.process(NO_DOUBLES, 0, 1));
        add(rows, "source", () -> reader.process((float[][]) null, 0, 1));
        add(rows, "source[channel]", () -> reader.process(new float[2][], 0, 1));
        add(rows, "event", () -> reader.poll(null));
        add(rows, "limits", () -> PairReader.builder(8000).limits(null));
        add(rows, "hertz", () -> PairReader.builder(8000).dialTone(NO_DOUBLES));
        add(rows, "tone", () -> ToneMeter.builder(8000).tone(null));
        add(rows, "cadence", () -> CadenceReader.builder(8000).cadence(null));
        add(rows, "frequenciesHz", () -> Cadence.of(null, 1, 1));
        add(rows, "onOffSeconds", () -> Cadence.of(new double[] {425}, NO_DOUBLES));
        add(rows, "frequenciesHz", () -> Cadence.unbroken(null, 1));
    }

    private static void add(List<Arguments> rows, String name, Executable call) {
        rows.add(Arguments.of(rows.size(), name, call));
    }

    @ParameterizedTest(name = "{0}: {1}")
    @MethodSource("nulls")
    void aMissingArgumentIsNamed(int row, String name, Executable call) {
        assertEquals(name, assertThrows(NullPointerException.class, call).getMessage());
    }

    static List<Arguments> indices() {
        // Two sections, one segment, two knots.
        Glide glide = Glide.between(TWO, TWO, Pace.FOLLOWING);
        Pairing pairing = Pairing.of(TWO, TWO);
        Bucket bucket = new Bucket(2, 1);
        ToneMeter meter = ToneMeter.builder(8000)
                .tone(Tone.byWidth(1000, 20))
                .tone(Tone.byWidth(2000, 20))
                .build();
        List<Arguments> rows = new ArrayList<>();
        index(rows, "index", 2, TWO::section);
        index(rows, "section", 2, Response.of(TWO)::noiseGain);
        index(rows, "segment", 1, glide::frames);
        index(rows, "knot", 2, i -> glide.coefficient(i, 0, 0));
        index(rows, "section", 2, i -> glide.coefficient(0, i, 0));
        index(rows, "which", 5, i -> glide.coefficient(0, 0, i));
        index(rows, "segment", 1, i -> glide.distance(i, 0));
        index(rows, "section", 2, i -> glide.distance(0, i));
        index(rows, "segment", 1, i -> glide.leak(i, 0));
        index(rows, "section", 2, i -> glide.leak(0, i));
        index(rows, "section", 2, glide::certificate);
        index(rows, "slot", 2, pairing::target);
        index(rows, "slot", 2, pairing::isBorn);
        index(rows, "slot", 2, pairing::isDying);
        index(rows, "slot", 2, pairing::isExchanged);
        index(rows, "slot", 2, new Walk(TWO, 1)::level);
        index(rows, "section", 2, bucket::level);
        index(rows, "section", 2, i -> bucket.leakAt(i, 0));
        index(rows, "section", 2, i -> bucket.admits(i, 0));
        index(rows, "section", 2, i -> bucket.framesUntil(i, 0));
        index(rows, "section", 2, i -> bucket.charge(i, 0));
        index(rows, "tone", 2, meter::levelDbfs);
        return rows;
    }

    private static void index(List<Arguments> rows, String name, int count, IntConsumer call) {
        rows.add(Arguments.of(rows.size(), name, count, call));
    }

    @ParameterizedTest(name = "{0}: {1}")
    @MethodSource("indices")
    void anIndexOutOfRangeIsNamedWithItsRange(int row, String name, int count, IntConsumer call) {
        for (int index = 0; index < count; index++) {
            call.accept(index);
        }
        for (int bad : new int[] {-1, count, 99}) {
            String message = assertThrows(IndexOutOfBoundsException.class, () -> call.accept(bad))
                    .getMessage();
            assertEquals(name + " is " + bad + "; it must be 0 to " + (count - 1), message);
        }
    }

    @Test
    void aRefusedWishNamesTheParameter() {
        refused("thresholdDbfs is 1.0", () -> ToneMeter.builder(8000).threshold(1));
        refused("thresholdDbfs is 1.0", () -> CadenceReader.builder(8000).threshold(1));
        refused("cycles is 0", () -> CadenceReader.builder(8000).cycles(0));
        refused("tolerance is 1.0", () -> Cadence.of(new double[] {425}, 1, 1).withTolerance(1));
    }

    private static void refused(String start, Executable call) {
        String message = assertThrows(IllegalArgumentException.class, call).getMessage();
        assertTrue(message.startsWith(start + "; it must be "), message);
    }
}
