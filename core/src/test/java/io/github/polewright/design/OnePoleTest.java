package io.github.polewright.design;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.ExactGain;
import io.github.polewright.Section;
import io.github.polewright.Table;
import java.math.BigDecimal;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The DC notch and the leaky integrator. */
class OnePoleTest {

    private static final double HALF_POWER_DB = 10 * Math.log10(0.5);

    static List<Table.Row> scipy() {
        return Table.rows(OnePoleTest.class, "butter1.csv", ",");
    }

    /** A first-order Butterworth high-pass from SciPy is the same filter. */
    @ParameterizedTest
    @MethodSource("scipy")
    void dcNotchIsTheFirstOrderHighPass(Table.Row row) {
        Section notch = DcNotch.byCorner(row.number(0), row.number(1));
        assertEquals(row.number(2), notch.b0(), 2e-15);
        assertEquals(row.number(3), notch.b1(), 2e-15);
        assertEquals(row.number(4), notch.a1(), 2e-15);
        assertEquals(0, notch.b2());
        assertEquals(0, notch.a2());
    }

    @ParameterizedTest
    @CsvSource({"48000, 5", "44100, 20", "192000, 5", "192000, 0.5", "8000, 3990", "48000, 12000", "384000, 1"})
    void dcNotchIsHalfPowerAtItsCorner(double rate, double cornerHz) {
        Section notch = DcNotch.byCorner(rate, cornerHz);
        assertEquals(HALF_POWER_DB, ExactGain.db(rate, cornerHz, notch), 1e-9);
        assertEquals(0, ExactGain.power(rate, 0, notch));
        assertEquals(1, ExactGain.power(rate, rate / 2, notch), 1e-15);
    }

    /** {@code x / sqrt(1 + x^2)}, {@code x = tan(pi f / rate) / tan(pi corner / rate)}: the bilinear transform. */
    @ParameterizedTest
    @ValueSource(doubles = {0.01, 0.5, 4.99, 5, 5.01, 20, 1000, 50000})
    void dcNotchFollowsTheAnalogueCurve(double hertz) {
        double x = Math.tan(Math.PI * hertz / 192000) / Math.tan(Math.PI * 5 / 192000);
        double expected = x * x / (1 + x * x);
        assertEquals(expected, ExactGain.power(192000, hertz, DcNotch.byCorner(192000, 5)), 1.5e-12 * expected);
    }

    @ParameterizedTest
    @CsvSource({"48000, 5", "44100, 20", "192000, 0.5", "8000, 3990", "48000, 12000", "384000, 1", "8000, 3999.9"})
    void integratorIsHalfPowerAtItsCorner(double rate, double cornerHz) {
        Section section = LeakyIntegrator.byCorner(rate, cornerHz);
        assertEquals(HALF_POWER_DB, ExactGain.db(rate, cornerHz, section), 1e-9);
        assertTrue(section.isStable());
        assertTrue(section.a1() < 0, "lambda stays above 0 below Nyquist");
    }

    @ParameterizedTest
    @CsvSource({"48000, 0.5", "192000, 5", "44100, 1000"})
    void integratorPassesDcExactly(double rate, double cornerHz) {
        Section section = LeakyIntegrator.byCorner(rate, cornerHz);
        BigDecimal denominator = BigDecimal.ONE.add(new BigDecimal(section.a1()));
        assertEquals(0, new BigDecimal(section.b0()).compareTo(denominator));
    }

    @Test
    void integratorByItsPole() {
        assertEquals(Section.of(0.25, 0, 0, -0.75, 0), LeakyIntegrator.byLambda(0.75));
        assertEquals(Section.PASS_THROUGH, LeakyIntegrator.byLambda(0));
        // Gain at Nyquist by hand: (1 - lambda) / (1 + lambda).
        assertEquals(1.0 / 49, ExactGain.power(48000, 24000, LeakyIntegrator.byLambda(0.75)), 1e-15);
    }
}
