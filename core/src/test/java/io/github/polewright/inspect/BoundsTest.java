package io.github.polewright.inspect;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.Table;
import io.github.polewright.design.Cookbook;
import io.github.polewright.design.HumNotch;
import io.github.polewright.design.LeakyIntegrator;
import io.github.polewright.design.Resonator;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Round-off noise, internal peak and worst output. */
class BoundsTest {

    static List<Table.Row> noise() {
        return Table.rows(BoundsTest.class, "noise_gain.csv", ";");
    }

    private static Cascade cascade(Table.Row row) {
        List<Section> sections = Stream.of(row.text(2).split(" / "))
                .map(text -> new Table.Row(List.of(text.split(" "))).section(0))
                .toList();
        return Cascade.of(row.number(1), sections);
    }

    /** Residues at 60 digits. A pole's distance to the circle is what a double keeps least of, hence 1e-9. */
    @ParameterizedTest
    @MethodSource("noise")
    void noiseGainOfEachSection(Table.Row row) {
        Response response = Response.of(cascade(row));
        String[] expected = row.text(3).split(" ");
        double sum = 0;
        for (int i = 0; i < expected.length; i++) {
            double gain = Double.parseDouble(expected[i]);
            sum += gain;
            assertEquals(gain, response.noiseGain(i), 1e-9 * gain);
        }
        assertEquals(sum, response.noiseGain(), 1e-9 * sum);
    }

    /** {@code (1 + a2) / ((1 - a2)((1 + a2)^2 - a1^2))} evaluated by another program, in dB to the printed digits. */
    @ParameterizedTest
    @CsvSource({
        "48000, 50, 1, 79.50",
        "48000, 50, 5, 72.52",
        "48000, 1000, 50, 36.55",
        "8000, 697, 20, 20.77",
        "192000, 50, 1, 97.56"
    })
    void noiseGainOfNotches(double rate, double centreHz, double widthHz, double expectedDb) {
        double gain =
                Response.of(rate, HumNotch.byWidth(rate, centreHz, widthHz)).noiseGain();
        assertEquals(expectedDb, 10 * Math.log10(gain), 0.005);
    }

    @Test
    void noiseGainByHand() {
        // One pole: 1 / (1 - lambda^2). No pole: the impulse itself.
        assertEquals(
                1 / (1 - 0.5625), Response.of(1, LeakyIntegrator.byLambda(0.75)).noiseGain(), 1e-14);
        assertEquals(1, Response.of(1, Section.PASS_THROUGH).noiseGain(), 1e-15);
        // A double pole at 1/2: sum of ((n + 1) / 2^n)^2 = (1 + x) / (1 - x)^3 at x = 1/4.
        assertEquals(
                1.25 / 0.421875, Response.of(1, Section.of(1, 0, 0, -1, 0.25)).noiseGain(), 1e-14);
        // Through a following gain of 3 and a delay: 9 of it.
        Cascade scaled = Cascade.of(1, LeakyIntegrator.byLambda(0.75), Section.of(0, 3, 0, 0, 0));
        assertEquals(9 / (1 - 0.5625), Response.of(scaled).noiseGain(0), 1e-13);
        assertEquals(1, Response.of(scaled).noiseGain(1), 1e-15);
    }

    @Test
    void whatIsUnstableHasNoBound() {
        Response response = Response.of(1, Section.of(1, 0, 0, 0, 1));
        assertEquals(Double.POSITIVE_INFINITY, response.noiseGain());
        assertEquals(Double.POSITIVE_INFINITY, response.noiseGain(0));
        assertEquals(Double.POSITIVE_INFINITY, response.worstOutput());
        assertThrows(IndexOutOfBoundsException.class, () -> response.noiseGain(1));
        assertThrows(IndexOutOfBoundsException.class, () -> response.noiseGain(-1));
    }

    static List<Table.Row> worst() {
        return Table.rows(BoundsTest.class, "worst_output.csv", ";");
    }

    @ParameterizedTest
    @MethodSource("worst")
    void worstOutputAsFromSciPy(Table.Row row) {
        double expected = row.number(3);
        assertEquals(expected, Response.of(cascade(row)).worstOutput(), 2e-9 * expected);
    }

    @ParameterizedTest
    @MethodSource("worst")
    void peakInternalGainAsFromSciPy(Table.Row row) {
        assertEquals(row.number(4), Response.of(cascade(row)).peakInternalDb(), 1e-6);
    }

    @Test
    void boundsByHand() {
        // An integrator of unity DC gain never exceeds its input; two taps add up.
        assertEquals(1, Response.of(1, LeakyIntegrator.byLambda(0.999)).worstOutput(), 1e-9);
        assertEquals(3.5, Response.of(1, Section.of(1, -2, 0.5, 0, 0)).worstOutput(), 1e-15);
        assertEquals(2, Response.of(1, Section.of(0, 0, 2, 0, 0)).worstOutput(), 1e-15);
        assertEquals(0, Response.of(1, Section.of(0, 0, 0, -0.5, 0)).worstOutput());
        // A second-order low-pass of quality q peaks at q / sqrt(1 - 1 / (4 q^2)) of amplitude.
        double peak = 20 * Math.log10(5 / Math.sqrt(1 - 0.01));
        assertEquals(peak, Response.of(48000, Cookbook.lowPass(48000, 200, 5)).peakInternalDb(), 1e-9);
        assertEquals(0, Response.of(192000, Resonator.byWidth(192000, 50, 0.01)).peakInternalDb(), 1e-8);
    }

    /** The gain inside counts although a later section takes it away. */
    @Test
    void thePeakInsideCounts() {
        Cascade hidden = Cascade.of(48000, Cookbook.peaking(48000, 1000, 4, 18), Cookbook.peaking(48000, 1000, 4, -18));
        Response response = Response.of(hidden);
        assertEquals(18, response.peakInternalDb(), 1e-9);
        assertEquals(0, response.db(1000), 1e-9);
    }

    @Test
    void endlessSumsAreRefused() {
        Response response = Response.of(48000, LeakyIntegrator.byLambda(1 - 1e-9));
        assertThrows(IllegalStateException.class, response::worstOutput);
    }
}
