package io.github.polewright.inspect;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.design.DcNotch;
import io.github.polewright.design.HumComb;
import io.github.polewright.design.HumNotch;
import io.github.polewright.design.LeakyIntegrator;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PolesAndZerosTest {

    private static List<Complex> poles(double a1, double a2) {
        return Response.of(48000, Section.of(1, 0, 0.5, a1, a2)).poles();
    }

    /** Solved in decimal arithmetic: {@code z = -a1/2 +- sqrt(a1^2/4 - a2)} at 60 digits. */
    @ParameterizedTest
    @CsvSource({
        "-1.9999998, 0.9999998000000099",
        "-1.5, 0.5624999999999999",
        "-0.9999999999, 1e-14",
        "0.5, -0.3",
        "1.9, 0.90249",
        "-1.99995, 0.99996",
        "-1.9997382509, 0.9997818421",
        "0, 0.25",
        "1.2, 0.37"
    })
    void rootsToTheLastDigits(double a1, double a2) {
        MathContext digits = new MathContext(60);
        BigDecimal half = new BigDecimal(a1).divide(BigDecimal.valueOf(2), digits);
        BigDecimal square = half.multiply(half, digits).subtract(new BigDecimal(a2));
        BigDecimal root = square.abs().sqrt(digits);
        Complex first;
        Complex second;
        if (square.signum() < 0) {
            first = new Complex(half.negate().doubleValue(), root.doubleValue());
            second = new Complex(first.real(), -first.imaginary());
        } else {
            BigDecimal left = half.negate().subtract(root);
            BigDecimal right = half.negate().add(root);
            boolean leftLarger = left.abs().compareTo(right.abs()) > 0;
            first = new Complex((leftLarger ? left : right).doubleValue(), 0);
            second = new Complex((leftLarger ? right : left).doubleValue(), 0);
        }
        List<Complex> poles = poles(a1, a2);
        assertEquals(2, poles.size());
        assertClose(first, poles.get(0));
        assertClose(second, poles.get(1));
    }

    private static void assertClose(Complex expected, Complex actual) {
        assertEquals(expected.real(), actual.real(), 4e-16 * Math.abs(expected.real()));
        assertEquals(expected.imaginary(), actual.imaginary(), 4e-16 * Math.abs(expected.imaginary()));
    }

    @Test
    void knownPlaces() {
        Response dcNotch = Response.of(48000, DcNotch.byCorner(48000, 5));
        assertEquals(List.of(new Complex(1, 0)), dcNotch.zeros());
        // R = (1 - tan x) / (1 + tan x), x = pi 5 / 48000: 0.9993457156212082 by SciPy's butter.
        assertEquals(0.9993457156212082, dcNotch.poles().get(0).real(), 1e-15);
        assertEquals(1, dcNotch.poles().size());
        Response integrator = Response.of(48000, LeakyIntegrator.byLambda(0.75));
        assertEquals(List.of(new Complex(0.75, 0)), integrator.poles());
        assertEquals(List.of(new Complex(0, 0)), integrator.zeros());
        Complex zero =
                Response.of(48000, HumNotch.byWidth(48000, 8000, 10)).zeros().get(0);
        assertEquals(0.5, zero.real(), 1e-15);
        assertEquals(Math.sqrt(0.75), zero.imaginary(), 1e-15);
    }

    @Test
    void degreesThatDrop() {
        assertEquals(List.of(), Response.of(1, Section.PASS_THROUGH).poles());
        assertEquals(List.of(), Response.of(1, Section.PASS_THROUGH).zeros());
        Response delay = Response.of(1, Section.of(0, 1, 0, 0, 0));
        assertEquals(List.of(new Complex(0, 0)), delay.poles());
        assertEquals(List.of(), delay.zeros());
        Response fir = Response.of(1, Section.of(1, 0, -4, 0, 0));
        assertEquals(List.of(new Complex(0, 0), new Complex(0, 0)), fir.poles());
        assertEquals(Set.of(new Complex(2, 0), new Complex(-2, 0)), Set.copyOf(fir.zeros()));
        Response twoPoles = Response.of(1, Section.of(0, 0, 1, 0, 0.25));
        assertEquals(List.of(), twoPoles.zeros());
        assertEquals(List.of(new Complex(0, 0.5), new Complex(0, -0.5)), twoPoles.poles());
        assertEquals(
                List.of(new Complex(-3, 0)),
                Response.of(1, Section.of(0, 1, 3, 0, 0.25)).zeros());
    }

    /** Worked from the definition: {@code -60 dB = 20 log10(r^n)}. */
    @Test
    void ringTimes() {
        assertEquals(3 / -Math.log10(0.75) / 48000, ring(LeakyIntegrator.byLambda(0.75)), 1e-15);
        assertEquals(
                3 / -Math.log10(0.5),
                Response.of(1, Section.of(1, 0, 0, 0, 0.25)).ringTimeSeconds(),
                1e-14);
        assertEquals(
                3 / -Math.log10(0.5),
                Response.of(1, Section.of(1, 0, 0, 0.6, 0.05)).ringTimeSeconds(),
                1e-14);
        assertEquals(
                3 / -Math.log10(0.5),
                Response.of(1, Section.of(1, 0, 0, -0.6, 0.05)).ringTimeSeconds(),
                1e-14);
        assertEquals(0, ring(Section.PASS_THROUGH));
        assertEquals(0, ring(Section.of(1, -2, 1, 0, 0)));
        assertEquals(Double.POSITIVE_INFINITY, ring(Section.of(1, 0, 0, -2, 1)));
    }

    /** Narrow notches: 2.199 / width, {@code ln(1000) / pi}. */
    @ParameterizedTest
    @CsvSource({"48000, 50, 1", "192000, 50, 0.5", "44100, 15000, 2"})
    void aNarrowNotchRingsForTwoWidths(double rate, double centreHz, double widthHz) {
        double ring =
                Response.of(rate, HumNotch.byWidth(rate, centreHz, widthHz)).ringTimeSeconds();
        assertEquals(2.1988 / widthHz, ring, 1e-4 / widthHz);
    }

    /** Two close real poles, the larger at 1 - 1e-7 by construction to 60 digits. */
    @Test
    void realPolesCloseToOne() {
        MathContext digits = new MathContext(60);
        double a1 = -1.9999997;
        double a2 = 0.99999970000002;
        BigDecimal half = new BigDecimal(-a1).divide(BigDecimal.valueOf(2), digits);
        BigDecimal root =
                half.multiply(half, digits).subtract(new BigDecimal(a2)).sqrt(digits);
        double distance = BigDecimal.ONE.subtract(half.add(root)).doubleValue();
        double expected = Math.log(1000) / -Math.log1p(-distance);
        assertEquals(expected, Response.of(1, Section.of(1, 0, 0, a1, a2)).ringTimeSeconds(), 1e-13 * expected);
        assertEquals(expected, Response.of(1, Section.of(1, 0, 0, -a1, a2)).ringTimeSeconds(), 1e-13 * expected);
    }

    @Test
    void theSlowestSectionCounts() {
        Cascade comb = HumComb.at(50).lines(3).widthHz(1).widthGrowing().design(48000);
        double narrowest = Response.of(48000, comb.section(0)).ringTimeSeconds();
        assertEquals(narrowest, Response.of(comb).ringTimeSeconds());
        assertEquals(
                narrowest,
                Response.of(Cascade.of(48000, comb.section(2), comb.section(0))).ringTimeSeconds());
        Cascade unstable = Cascade.of(48000, comb.section(0), Section.of(1, 0, 0, 0, 1.01));
        assertEquals(Double.POSITIVE_INFINITY, Response.of(unstable).ringTimeSeconds());
    }

    private static double ring(Section section) {
        return Response.of(48000, section).ringTimeSeconds();
    }

    @Test
    void listsCannotBeUsedToChangeAnything() {
        Response response = Response.of(48000, DcNotch.byCorner(48000, 5));
        List<Complex> poles = response.poles();
        assertThrows(UnsupportedOperationException.class, poles::clear);
    }
}
