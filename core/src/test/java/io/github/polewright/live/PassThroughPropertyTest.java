package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Sections that pass through change no value; a cascade may be built with room to spare for nothing but time. */
class PassThroughPropertyTest {

    private static final int FRAMES = 2_000;

    @ParameterizedTest
    @EnumSource(Form.class)
    void appendedOrSpareSectionsChangeNothing(Form form) {
        for (int sections = 1; sections <= 5; sections++) {
            Cascade cascade = Designs.mixed(30 + sections, sections);
            double[] in = Signals.noise(sections, 1, FRAMES)[0];
            double[] expected = Rig.runMono(Rig.live(cascade, 1, form), in);
            Cascade longer = cascade;
            for (int more = 1; more <= 5; more++) {
                longer = longer.then(Designs.cascade(Section.PASS_THROUGH));
                assertSameValues(expected, Rig.runMono(Rig.live(longer, 1, form), in));
                assertSameValues(expected, Rig.runMono(Rig.live(cascade, 1, form, sections + more), in));
            }
        }
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void passThroughAloneIsTheInput(Form form) {
        double[] in = Signals.noise(1, 1, FRAMES)[0];
        assertSameValues(in, Rig.runMono(Rig.live(Designs.cascade(Section.PASS_THROUGH), 1, form, 7), in));
    }

    /** Equal values; the sign of a zero is free. */
    private static void assertSameValues(double[] expected, double[] actual) {
        for (int n = 0; n < expected.length; n++) {
            assertEquals(expected[n] + 0.0, actual[n] + 0.0, "frame " + n);
        }
    }
}
