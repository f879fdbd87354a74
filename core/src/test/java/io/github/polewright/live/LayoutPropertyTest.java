package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import io.github.polewright.Cascade;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** The sample format changes nothing but the rounding of the output. */
class LayoutPropertyTest {

    private static final int FRAMES = 3_000;

    @ParameterizedTest
    @EnumSource(Form.class)
    void interleavedPlanarAndBufferAgreeBitForBit(Form form) {
        for (int channels : new int[] {1, 2, 3, 8}) {
            Cascade cascade = Designs.mixed(channels, 6);
            double[][] in = Signals.noise(channels, channels, FRAMES);
            double[][] floats = Rig.run(Rig.live(cascade, channels, form), SampleFormat.FLOATS, in, FRAMES);
            assertArrayEquals(
                    floats, Rig.run(Rig.live(cascade, channels, form), SampleFormat.PLANES, in, Rig.cuts(1, FRAMES)));
            assertArrayEquals(
                    floats, Rig.run(Rig.live(cascade, channels, form), SampleFormat.BUFFERS, in, Rig.cuts(2, FRAMES)));
        }
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void floatOutputIsDoubleOutputRounded(Form form) {
        Cascade cascade = Designs.mixed(11, 5);
        double[][] in = Signals.noise(12, 2, FRAMES);
        double[][] doubles = Rig.run(Rig.live(cascade, 2, form), SampleFormat.DOUBLES, in, FRAMES);
        double[][] floats = Rig.run(Rig.live(cascade, 2, form), SampleFormat.FLOATS, in, FRAMES);
        for (int c = 0; c < 2; c++) {
            for (int n = 0; n < FRAMES; n++) {
                assertEquals((float) doubles[c][n], floats[c][n], "channel " + c + " frame " + n);
            }
        }
    }

    /** One stream may change its format from block to block. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void formatsMixWithinAStream(Form form) {
        Cascade cascade = Designs.mixed(13, 5);
        double[][] in = Signals.noise(14, 3, FRAMES);
        double[][] expected = Rig.run(Rig.live(cascade, 3, form), SampleFormat.FLOATS, in, FRAMES);
        LiveCascade live = Rig.live(cascade, 3, form);
        double[][] out = new double[3][FRAMES];
        for (int first = 0, i = 0; first < FRAMES; i++) {
            int frames = Math.min(FRAMES - first, 1 + 37 * (i % 5));
            SampleFormat.values()[i % SampleFormat.values().length].process(live, in, out, first, frames);
            first += frames;
        }
        for (int c = 0; c < 3; c++) {
            for (int n = 0; n < FRAMES; n++) {
                assertEquals((float) expected[c][n], (float) out[c][n], "channel " + c + " frame " + n);
            }
        }
    }
}
