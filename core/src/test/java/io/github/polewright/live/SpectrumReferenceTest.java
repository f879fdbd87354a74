package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;
import org.jtransforms.fft.DoubleFFT_1D;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The spectrum of the measured impulse response (JTransforms) against H on the unit circle, at every bin from DC to
 * Nyquist, within 1e-9 of full scale.
 */
class SpectrumReferenceTest {

    private static final double BOUND = 1e-9;

    static List<Arguments> cascades() {
        List<Arguments> cascades = new ArrayList<>();
        for (Form form : Form.values()) {
            for (int sections : new int[] {1, 2, 3, 4, 5, 8, 16}) {
                cascades.add(Arguments.of(form, Designs.mixed(200 + sections, sections), 1 << 15));
            }
            // Both ring for 22 seconds until nothing is left.
            cascades.add(Arguments.of(form, Designs.cascade(Designs.notch(50, 1)), 1 << 20));
            cascades.add(Arguments.of(form, Designs.cascade(Designs.resonator(50, 1)), 1 << 20));
        }
        return cascades;
    }

    @ParameterizedTest
    @MethodSource("cascades")
    void measuredResponseIsTheComputedOne(Form form, Cascade cascade, int frames) {
        assertResponse(cascade, Rig.impulseResponse(Rig.live(cascade, 1, form), 0, frames));
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void measuredResponseIsTheTargetsAfterARetune(Form form) {
        LiveCascade live = Rig.live(Designs.mixed(300, 4), 1, form);
        Rig.runMono(live, Signals.noise(1, 1, 100)[0]);
        live.retune(Designs.mixed(301, 3));
        Rig.settle(live);
        assertResponse(Designs.mixed(301, 3), Rig.impulseResponse(live, 0, 1 << 15));
    }

    private static void assertResponse(Cascade cascade, double[] impulseResponse) {
        int frames = impulseResponse.length;
        new DoubleFFT_1D(frames).realForward(impulseResponse);
        for (int bin = 0; bin <= frames / 2; bin++) {
            double[] expected = response(cascade, 2 * Math.PI * bin / frames);
            // The transform packs the real value at Nyquist into the place of the imaginary part at DC.
            double real = bin == frames / 2 ? impulseResponse[1] : impulseResponse[2 * bin];
            double imaginary = bin == 0 || bin == frames / 2 ? 0 : impulseResponse[2 * bin + 1];
            assertEquals(0, Math.hypot(real - expected[0], imaginary - expected[1]), BOUND, "bin " + bin);
        }
    }

    private static double[] response(Cascade cascade, double w) {
        double real = 1, imaginary = 0;
        for (Section s : cascade.sections()) {
            double[] b = polynomial(s.b0(), s.b1(), s.b2(), w);
            double[] a = polynomial(1, s.a1(), s.a2(), w);
            double power = a[0] * a[0] + a[1] * a[1];
            double quotient = (b[0] * a[0] + b[1] * a[1]) / power;
            double rest = (b[1] * a[0] - b[0] * a[1]) / power;
            double nextReal = real * quotient - imaginary * rest;
            imaginary = real * rest + imaginary * quotient;
            real = nextReal;
        }
        return new double[] {real, imaginary};
    }

    /**
     * {@code e^jw (p + q e^-jw + r e^-2jw)}, written so that nothing cancels at low frequencies: real part
     * {@code (p + q + r) - 2 (p + r) sin^2(w/2)}, imaginary part {@code (p - r) sin w}. Derived for this project.
     */
    private static double[] polynomial(double p, double q, double r, double w) {
        double half = Math.sin(w / 2);
        return new double[] {(p + r + q) - 2 * (p + r) * half * half, (p - r) * Math.sin(w)};
    }
}
