package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The running cascade against the plain difference equation in twice the precision. The bound is {@link RoundingBound};
 * {@code float} output may err by half a unit in its own last place more.
 */
class OracleReferenceTest {

    private static final int FRAMES = 1_500;

    static List<Arguments> shapes() {
        List<Arguments> shapes = new ArrayList<>();
        for (Form form : Form.values()) {
            for (SampleFormat format : SampleFormat.values()) {
                for (int sections : new int[] {1, 2, 3, 4, 5, 7, 8, 9, 16}) {
                    shapes.add(Arguments.of(form, format, sections, 1 + sections % 8));
                }
                for (int channels : new int[] {1, 2, 3, 4, 5, 6, 7, 8, 32}) {
                    shapes.add(Arguments.of(form, format, 3, channels));
                }
            }
        }
        return shapes;
    }

    @ParameterizedTest
    @MethodSource("shapes")
    void staysWithinTheRoundingBound(Form form, SampleFormat format, int sections, int channels) {
        Cascade cascade = Designs.mixed(sections, sections);
        double[][] in = Signals.noise(sections + 100L * channels, channels, FRAMES);
        double[][] out =
                Rig.run(Rig.live(cascade, channels, form), format, in, Rig.cuts(sections * 7L + channels, FRAMES));
        for (int c = 0; c < channels; c++) {
            double[][] stages = Oracle.stages(cascade, in[c]);
            double bound = RoundingBound.of(cascade, form, stages);
            assertTrue(bound < 1e-9, "a bound that says nothing: " + bound);
            assertWithin(stages[sections], out[c], bound, format.narrow());
        }
    }

    /** The hard case: poles 6.5e-5 inside the unit circle, close to its real point. */
    @ParameterizedTest
    @EnumSource(Form.class)
    void staysWithinTheRoundingBoundOfNarrowSections(Form form) {
        Cascade cascade = Designs.cascade(Designs.notch(50, 1), Designs.resonator(50, 1), Designs.notch(100, 2));
        double[] in = Signals.noise(5, 1, 20_000)[0];
        double[][] stages = Oracle.stages(cascade, in);
        double bound = RoundingBound.of(cascade, form, stages);
        assertTrue(bound < 1e-6, "a bound that says nothing: " + bound);
        assertWithin(stages[3], Rig.runMono(Rig.live(cascade, 1, form), in), bound, false);
    }

    static void assertWithin(double[] expected, double[] actual, double bound, boolean narrow) {
        for (int n = 0; n < expected.length; n++) {
            double more = narrow ? Math.ulp((float) expected[n]) / 2 : 0;
            assertEquals(expected[n], actual[n], bound + more, "frame " + n);
        }
    }
}
