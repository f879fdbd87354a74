package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import io.github.polewright.Cascade;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Any way of cutting a stream into blocks gives the same output bit for bit. */
class CutsPropertyTest {

    private static final int FRAMES = 9_000;

    static List<Arguments> shapes() {
        List<Arguments> shapes = new ArrayList<>();
        for (Form form : Form.values()) {
            for (SampleFormat format : SampleFormat.values()) {
                for (int sections : new int[] {1, 2, 4, 5, 8, 11}) {
                    shapes.add(Arguments.of(form, format, sections));
                }
            }
        }
        return shapes;
    }

    @ParameterizedTest
    @MethodSource("shapes")
    void cutsChangeNothing(Form form, SampleFormat format, int sections) {
        Cascade cascade = Designs.mixed(40 + sections, sections);
        double[][] in = withSilence(Signals.noise(3, 2, FRAMES));
        double[][] whole = Rig.run(Rig.live(cascade, 2, form), format, in, FRAMES);
        for (long seed = 0; seed < 4; seed++) {
            int[] cuts = Rig.cuts(seed, FRAMES);
            assertArrayEquals(whole, Rig.run(Rig.live(cascade, 2, form), format, in, cuts), "cut " + seed);
        }
        int[] frames = new int[FRAMES];
        Arrays.fill(frames, 1);
        assertArrayEquals(whole, Rig.run(Rig.live(cascade, 2, form), format, in, frames), "single frames");
    }

    /** A retune at the same absolute frame gives the same output, wherever the blocks around it are cut. */
    @ParameterizedTest
    @MethodSource("shapes")
    void cutsAroundARetuneChangeNothing(Form form, SampleFormat format, int sections) {
        double[][] in = withSilence(Signals.noise(4, 2, FRAMES));
        double[][] whole = retuned(form, format, sections, in, -1);
        for (long seed = 0; seed < 4; seed++) {
            assertArrayEquals(whole, retuned(form, format, sections, in, seed), "cut " + seed);
        }
    }

    private static double[][] retuned(Form form, SampleFormat format, int sections, double[][] in, long seed) {
        LiveCascade live = Rig.live(Designs.mixed(50 + sections, sections), 2, form);
        double[][] out = new double[2][FRAMES];
        int[] retunes = {0, 1, 777, 1_000, 4_321, 4_322, FRAMES};
        for (int r = 0; r + 1 < retunes.length; r++) {
            live.retune(Designs.mixed(60 + r, 1 + (sections + r) % sections));
            int first = retunes[r];
            int length = retunes[r + 1] - first;
            for (int frames : seed < 0 ? Rig.whole(length) : Rig.cuts(seed + r, length)) {
                format.process(live, in, out, first, frames);
                first += frames;
            }
        }
        return out;
    }

    /** Long stretches of silence, so that the guard has to act as well. */
    private static double[][] withSilence(double[][] in) {
        for (double[] channel : in) {
            Arrays.fill(channel, 2_000, 4_000, 0);
            Arrays.fill(channel, 5_003, 8_500, 0);
        }
        return in;
    }
}
