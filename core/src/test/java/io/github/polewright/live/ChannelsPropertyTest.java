package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.design.Cookbook;
import java.util.Arrays;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/** Channels do not touch each other: each is the mono stream bit for bit. */
class ChannelsPropertyTest {

    private static final int FRAMES = 1_200;

    @ParameterizedTest
    @EnumSource(Form.class)
    void everyChannelIsTheMonoStream(Form form) {
        for (int channels : new int[] {2, 3, 4, 5, 8, 9, 17, 31, 32, 33}) {
            for (int sections : new int[] {1, 2, 3, 4, 7, 8}) {
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
    @CsvSource({"DIRECT_FORM_1, 9", "DIRECT_FORM_1, 33", "TRANSPOSED_DIRECT_FORM_2, 9", "TRANSPOSED_DIRECT_FORM_2, 33"})
    void everyChannelIsTheMonoStreamIntoAndOutOfAGlide(Form form, int channels) {
        int before = 100, frames = before + 6_000;
        double[][] in = Signals.noise(7, channels, frames);
        double[][] out = glided(Rig.live(Designs.mixed(1, 9), channels, form), in, before);
        for (int c = 0; c < channels; c++) {
            double[][] mono = glided(Rig.live(Designs.mixed(1, 9), 1, form), new double[][] {in[c]}, before);
            assertArrayEquals(mono[0], out[c], "channel " + c);
        }
    }

    private static double[][] glided(LiveCascade live, double[][] in, int before) {
        double[][] out = new double[in.length][in[0].length];
        for (int done = 0; done < out[0].length; ) {
            int frames = done == 0 ? before : 37;
            frames = Math.min(frames, out[0].length - done);
            double[] block = new double[frames * in.length];
            for (int i = 0; i < block.length; i++) {
                block[i] = in[i % in.length][done + i / in.length];
            }
            live.process(block, 0, block, 0, frames);
            for (int i = 0; i < block.length; i++) {
                out[i % in.length][done + i / in.length] = block[i];
            }
            done += frames;
            if (done == before) {
                live.retune(Designs.mixed(2, 9));
            }
        }
        assertTrue(live.isSettled(), "the glide has not ended");
        return out;
    }

    @ParameterizedTest
    @CsvSource({"DIRECT_FORM_1, 2", "DIRECT_FORM_1, 33", "TRANSPOSED_DIRECT_FORM_2, 33"})
    void everyTailEndsInSilenceWhereTheMonoStreamsDoes(Form form, int channels) {
        Section low = Cookbook.lowPass(48_000, 3_000, 2), high = Cookbook.highPass(48_000, 900, 3);
        Cascade cascade = Cascade.of(48_000, low, high, low, high, low, high, low, high);
        double[][] in = Signals.noise(5, channels, 6_000);
        for (int c = 0; c < channels; c++) {
            Arrays.fill(in[c], 10 + c, in[c].length, 0);
        }
        double[][] out = Rig.run(Rig.live(cascade, channels, form), SampleFormat.DOUBLES, in, Rig.cuts(9, 6_000));
        for (int c = 0; c < channels; c++) {
            assertEquals(0, out[c][5_999]);
            assertArrayEquals(Rig.runMono(Rig.live(cascade, 1, form), in[c]), out[c], "channel " + c);
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
