package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import java.nio.FloatBuffer;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Offsets, ranges, in-place work and empty blocks, for every form and sample format. */
class LiveCascadeContractTest {

    private static final int CHANNELS = 3;
    private static final int FRAMES = 300;
    private static final int MARGIN = 17;
    private static final int SAMPLES = FRAMES * CHANNELS;

    private final Cascade cascade = Designs.mixed(5, 5);

    @Test
    void printsItsShapeInOneLine() {
        assertEquals(
                "DIRECT_FORM_1 at 48000.0 Hz, channels: 1, sections at most: 5",
                LiveCascade.of(cascade, 1).toString());
        LiveCascade live = LiveCascade.builder(Designs.mixed(5, 1))
                .channels(CHANNELS)
                .form(Form.TRANSPOSED_DIRECT_FORM_2)
                .build();
        assertEquals("TRANSPOSED_DIRECT_FORM_2 at 48000.0 Hz, channels: 3, sections at most: 1", live.toString());
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void floatsInPlaceAtAnOffsetTouchNothingElse(Form form) {
        float[] source = floats(SAMPLES + 2 * MARGIN);
        float[] expected = new float[SAMPLES];
        Rig.live(cascade, CHANNELS, form).process(source, MARGIN, expected, 0, FRAMES);
        float[] apart = new float[SAMPLES + 2 * MARGIN];
        Arrays.fill(apart, Float.NaN);
        Rig.live(cascade, CHANNELS, form).process(source, MARGIN, apart, 5, FRAMES);
        float[] inPlace = source.clone();
        Rig.live(cascade, CHANNELS, form).process(inPlace, MARGIN, inPlace, MARGIN, FRAMES);
        for (int i = 0; i < apart.length; i++) {
            assertEquals(i >= 5 && i < 5 + SAMPLES ? expected[i - 5] : Float.NaN, apart[i], "sample " + i);
            boolean inside = i >= MARGIN && i < MARGIN + SAMPLES;
            assertEquals(inside ? expected[i - MARGIN] : source[i], inPlace[i], "sample " + i);
        }
        assertArrayEquals(floats(SAMPLES + 2 * MARGIN), source, "the source was written");
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void doublesInPlaceAtAnOffsetTouchNothingElse(Form form) {
        double[] source = doubles(SAMPLES + 2 * MARGIN);
        double[] expected = new double[SAMPLES];
        Rig.live(cascade, CHANNELS, form).process(source, MARGIN, expected, 0, FRAMES);
        double[] apart = new double[SAMPLES + 2 * MARGIN];
        Arrays.fill(apart, Double.NaN);
        Rig.live(cascade, CHANNELS, form).process(source, MARGIN, apart, 5, FRAMES);
        double[] inPlace = source.clone();
        Rig.live(cascade, CHANNELS, form).process(inPlace, MARGIN, inPlace, MARGIN, FRAMES);
        for (int i = 0; i < apart.length; i++) {
            assertEquals(i >= 5 && i < 5 + SAMPLES ? expected[i - 5] : Double.NaN, apart[i], "sample " + i);
            boolean inside = i >= MARGIN && i < MARGIN + SAMPLES;
            assertEquals(inside ? expected[i - MARGIN] : source[i], inPlace[i], "sample " + i);
        }
        assertArrayEquals(doubles(SAMPLES + 2 * MARGIN), source, "the source was written");
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void planesInPlaceAtAnOffsetTouchNothingElse(Form form) {
        float[][] source = planes();
        float[][] apart = new float[CHANNELS][FRAMES + 2 * MARGIN];
        for (float[] plane : apart) {
            Arrays.fill(plane, Float.NaN);
        }
        Rig.live(cascade, CHANNELS, form).process(source, apart, MARGIN, FRAMES);
        float[][] inPlace = planes();
        Rig.live(cascade, CHANNELS, form).process(inPlace, inPlace, MARGIN, FRAMES);
        float[] interleaved = new float[SAMPLES];
        for (int i = 0; i < SAMPLES; i++) {
            interleaved[i] = source[i % CHANNELS][MARGIN + i / CHANNELS];
        }
        Rig.live(cascade, CHANNELS, form).process(interleaved, 0, interleaved, 0, FRAMES);
        for (int c = 0; c < CHANNELS; c++) {
            assertArrayEquals(planes()[c], source[c], "the source was written");
            for (int i = 0; i < FRAMES + 2 * MARGIN; i++) {
                boolean inside = i >= MARGIN && i < MARGIN + FRAMES;
                float expected = inside ? interleaved[(i - MARGIN) * CHANNELS + c] : Float.NaN;
                assertEquals(expected, apart[c][i], "frame " + i);
                assertEquals(inside ? expected : source[c][i], inPlace[c][i], "frame " + i);
            }
        }
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void buffersAreReadFromTheirPositionsWhichStay(Form form) {
        float[] samples = floats(SAMPLES + 2 * MARGIN);
        float[] expected = new float[SAMPLES];
        Rig.live(cascade, CHANNELS, form).process(samples, MARGIN, expected, 0, FRAMES);
        FloatBuffer source = SampleFormat.direct(samples.length).put(samples).position(MARGIN);
        FloatBuffer apart = SampleFormat.direct(samples.length).position(5);
        Rig.live(cascade, CHANNELS, form).process(source.asReadOnlyBuffer(), apart, FRAMES);
        assertEquals(MARGIN, source.position());
        assertEquals(5, apart.position());
        assertEquals(samples.length, apart.limit());
        Rig.live(cascade, CHANNELS, form).process(source, source, FRAMES);
        for (int i = 0; i < samples.length; i++) {
            assertEquals(i >= 5 && i < 5 + SAMPLES ? expected[i - 5] : 0, apart.get(i), "sample " + i);
            boolean inside = i >= MARGIN && i < MARGIN + SAMPLES;
            assertEquals(inside ? expected[i - MARGIN] : samples[i], source.get(i), "sample " + i);
        }
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void rangesThatTouchInOneArrayAreAllowed(Form form) {
        float[] joined = floats(2 * SAMPLES);
        float[] expected = new float[SAMPLES];
        Rig.live(cascade, CHANNELS, form).process(joined, 0, expected, 0, FRAMES);
        Rig.live(cascade, CHANNELS, form).process(joined, 0, joined, SAMPLES, FRAMES);
        assertArrayEquals(expected, Arrays.copyOfRange(joined, SAMPLES, 2 * SAMPLES));
        assertArrayEquals(floats(SAMPLES), Arrays.copyOf(joined, SAMPLES));
    }

    @ParameterizedTest
    @EnumSource(SampleFormat.class)
    void noFramesDoNothing(SampleFormat format) {
        LiveCascade live = Rig.live(cascade, CHANNELS, Form.DIRECT_FORM_1);
        double[][] in = Signals.noise(1, CHANNELS, FRAMES);
        double[][] expected = Rig.run(Rig.live(cascade, CHANNELS, Form.DIRECT_FORM_1), format, in, FRAMES);
        assertArrayEquals(expected, Rig.run(live, format, in, 0, 100, 0, 0, 200, 0));
        assertTrue(live.isSettled());
    }

    /** The first output answers the first input: a pure gain comes out at once. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void hasNoLatency(Form form) {
        double[] out = Rig.runMono(Rig.live(cascade, 1, form), new double[] {1});
        assertEquals(cascade.gain(), out[0], 1e-15);
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void resetIsTheStartOfAStream(Form form) {
        double[] in = Signals.noise(4, 1, FRAMES)[0];
        LiveCascade live = Rig.live(cascade, 1, form);
        double[] first = Rig.runMono(live, in);
        live.reset();
        assertArrayEquals(first, Rig.runMono(live, in));
    }

    @Test
    void answersWhatItWasBuiltWith() {
        LiveCascade live = Rig.live(cascade, CHANNELS, Form.DIRECT_FORM_1, 9);
        assertEquals(CHANNELS, live.channels());
        assertEquals(9, live.mostSections());
        assertEquals(48_000, live.sampleRateHz());
        assertTrue(live.isSettled());
        LiveCascade plain = LiveCascade.of(cascade, 2);
        assertEquals(2, plain.channels());
        assertEquals(5, plain.mostSections());
        plain.retune(cascade);
        assertFalse(plain.isSettled());
    }

    private static float[] floats(int count) {
        float[] samples = new float[count];
        double[] noise = doubles(count);
        for (int i = 0; i < count; i++) {
            samples[i] = (float) noise[i];
        }
        return samples;
    }

    private static double[] doubles(int count) {
        return Arrays.copyOf(Signals.noise(6, 1, 2 * SAMPLES)[0], count);
    }

    private static float[][] planes() {
        double[][] noise = Signals.noise(8, CHANNELS, FRAMES + 2 * MARGIN);
        float[][] planes = new float[CHANNELS][FRAMES + 2 * MARGIN];
        for (int c = 0; c < CHANNELS; c++) {
            for (int i = 0; i < planes[c].length; i++) {
                planes[c][i] = (float) noise[c][i];
            }
        }
        return planes;
    }
}
