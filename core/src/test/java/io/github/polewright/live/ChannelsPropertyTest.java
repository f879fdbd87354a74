package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import io.github.polewright.Cascade;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/** Channels do not touch each other: each is the mono stream bit for bit. */
class ChannelsPropertyTest {

    private static final int FRAMES = 1_200;

    @ParameterizedTest
    @EnumSource(Form.class)
    void everyChannelIsTheMonoStream(Form form) {
        for (int channels : new int[] {2, 3, 4, 5, 6, 7, 8, 9, 16, 17, 32}) {
            for (int sections : new int[] {1, 2, 3, 4, 7}) {
                Cascade cascade = Designs.mixed(sections, sections);
                double[][] in = Signals.noise(channels, channels, FRAMES);
                double[][] out =
                        Rig.run(Rig.live(cascade, channels, form), SampleFormat.DOUBLES, in, Rig.cuts(9, FRAMES));
                for (int c = 0; c < channels; c++) {
                    assertArrayEquals(
                            Rig.runMono(Rig.live(cascade, 1, form), in[c]),
                            out[c],
                            channels + " channels, " + sections + " sections, channel " + c);
                }
            }
        }
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void everyChannelIsTheMonoStreamWhileGliding(Form form) {
        int channels = 9;
        double[][] in = Signals.noise(7, channels, FRAMES);
        LiveCascade live = Rig.live(Designs.mixed(1, 5), channels, form);
        live.retune(Designs.mixed(2, 5));
        double[][] out = Rig.run(live, SampleFormat.DOUBLES, in, Rig.cuts(3, FRAMES));
        for (int c = 0; c < channels; c++) {
            LiveCascade mono = Rig.live(Designs.mixed(1, 5), 1, form);
            mono.retune(Designs.mixed(2, 5));
            assertArrayEquals(Rig.runMono(mono, in[c]), out[c], "channel " + c);
        }
    }

    @ParameterizedTest
    @CsvSource({"DIRECT_FORM_1, 2", "DIRECT_FORM_1, 8", "TRANSPOSED_DIRECT_FORM_2, 2", "TRANSPOSED_DIRECT_FORM_2, 8"})
    void aSilentChannelStaysSilentBesideLoudOnes(Form form, int channels) {
        for (int silent = 0; silent < channels; silent++) {
            double[][] in = Signals.noise(2, channels, FRAMES);
            in[silent] = new double[FRAMES];
            double[][] out = Rig.run(
                    Rig.live(Designs.mixed(3, 5), channels, form), SampleFormat.FLOATS, in, Rig.cuts(1, FRAMES));
            assertArrayEquals(new double[FRAMES], magnitudes(out[silent]));
        }
    }

    private static double[] magnitudes(double[] values) {
        double[] magnitudes = new double[values.length];
        for (int n = 0; n < values.length; n++) {
            magnitudes[n] = Math.abs(values[n]);
        }
        return magnitudes;
    }
}
