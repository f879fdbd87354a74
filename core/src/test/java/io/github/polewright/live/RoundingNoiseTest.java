package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * The noise that rounding adds, against the classic model: white noise injected at the adder of the recursion, which
 * reaches the output through 1/A with the power gain (1 + a2) / ((1 - a2) ((1 + a2)^2 - a1^2)) (L. Jackson, On the
 * interaction of roundoff noise and dynamic range in digital filters, Bell Syst. Tech. J. 49, 1970; the closed form
 * from memory, checked here against the sum of squares).
 */
class RoundingNoiseTest {

    @ParameterizedTest
    @CsvSource({"50, 5", "1000, 50", "5000, 1000"})
    void directFormRoundsNoMoreThanTheModel(double centreHz, double widthHz) {
        Section s = Designs.notch(centreHz, widthHz);
        Cascade cascade = Designs.cascade(s);
        double[] in = Signals.noise(9, 1, 200_000)[0];
        double[] exact = Oracle.filter(cascade, in);
        double[] actual = Rig.runMono(Rig.live(cascade, 1, Form.DIRECT_FORM_1), in);
        double error = 0;
        for (int n = 0; n < in.length; n++) {
            error += (actual[n] - exact[n]) * (actual[n] - exact[n]);
        }
        // Nine roundings of numbers below 4, each spread evenly over a unit in the last place, 2^-51 there.
        double injected = 9 * Math.pow(0x1p-51, 2) / 12;
        double model = Math.sqrt(injected * gain(s));
        assertTrue(Math.sqrt(error / in.length) < model, "rms error " + Math.sqrt(error / in.length) + " of " + model);
    }

    @ParameterizedTest
    @CsvSource({"50, 5", "1000, 50", "5000, 1000"})
    void closedFormIsTheSumOfSquares(double centreHz, double widthHz) {
        Section s = Designs.notch(centreHz, widthHz);
        double sum = 0;
        for (double value :
                Oracle.filter(Designs.cascade(Section.of(1, 0, 0, s.a1(), s.a2())), Signals.impulse(200_000))) {
            sum += value * value;
        }
        assertEquals(1, sum / gain(s), 1e-8);
    }

    private static double gain(Section s) {
        double a = 1 + s.a2();
        return a / ((1 - s.a2()) * (a * a - s.a1() * s.a1()));
    }
}
