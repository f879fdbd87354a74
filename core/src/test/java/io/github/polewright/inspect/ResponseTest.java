package io.github.polewright.inspect;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.Table;
import io.github.polewright.design.DcNotch;
import io.github.polewright.design.HumComb;
import io.github.polewright.design.HumNotch;
import java.math.BigDecimal;
import java.util.List;
import org.jtransforms.fft.DoubleFFT_1D;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class ResponseTest {

    static List<Table.Row> precise() {
        return Table.rows(ResponseTest.class, "precise_response.csv", ",");
    }

    /**
     * The same coefficients at 60 digits. Whatever is computed in doubles cannot tell a frequency from one 1e-16 of it
     * away, so what the response changes over 4e-16 of the frequency (last column) is allowed.
     */
    @ParameterizedTest
    @MethodSource("precise")
    void responseToTwelveDigits(Table.Row row) {
        Response response = Response.of(row.number(1), row.section(2));
        Complex expected = new Complex(row.number(8), row.number(9));
        Complex actual = response.at(row.number(7));
        double difference = Math.hypot(actual.real() - expected.real(), actual.imaginary() - expected.imaginary());
        double tolerance = 1e-12 * expected.magnitude() + 4e-16 * row.number(11);
        assertEquals(0, difference, tolerance);
    }

    @ParameterizedTest
    @MethodSource("precise")
    void groupDelayToElevenDigits(Table.Row row) {
        Response response = Response.of(row.number(1), row.section(2));
        double expected = row.number(10);
        assertEquals(expected, response.groupDelayFrames(row.number(7)), 1e-11 * Math.max(1, Math.abs(expected)));
    }

    static List<Table.Row> scipy() {
        return Table.rows(ResponseTest.class, "group_delay.csv", ";");
    }

    /** No narrow notch here: SciPy's delay loses digits beside one; those rows are in the table of 60 digits. */
    @ParameterizedTest
    @MethodSource("scipy")
    void delayGainAndPhaseAsFromSciPy(Table.Row row) {
        Response response = Response.of(row.number(1), row.section(2));
        double hertz = row.number(7);
        double delay = row.number(8);
        assertEquals(delay, response.groupDelayFrames(hertz), 1e-6 * Math.max(1, Math.abs(delay)));
        double gain = row.number(9);
        assertEquals(gain, Math.pow(10, response.db(hertz) / 20), 1e-8);
        assertEquals(row.number(10), response.phaseRadians(hertz), 1e-7);
    }

    /** The defining property of each design, at the frequencies in its call. */
    @Test
    void knownPointsOfClassicalDesigns() {
        double half = 10 * Math.log10(0.5);
        assertDb(half, "butter(8,1000,fs=48000)", 48000, 1000);
        assertDb(half, "butter(5,100,'highpass',fs=44100)", 44100, 100);
        assertDb(half, "butter(4,[300,3400],'bandpass',fs=8000)", 8000, 300);
        assertDb(half, "butter(4,[300,3400],'bandpass',fs=8000)", 8000, 3400);
        assertDb(half, "butter(2,[49,51],'bandstop',fs=48000)", 48000, 49);
        assertDb(half, "butter(2,[49,51],'bandstop',fs=48000)", 48000, 51);
        assertDb(-1, "cheby1(6,1,2000,fs=48000)", 48000, 2000);
        assertDb(-1, "cheby1(6,1,2000,fs=48000)", 48000, 0);
        assertDb(-60, "cheby2(6,60,2000,fs=48000)", 48000, 2000);
        assertDb(-0.5, "ellip(5,0.5,60,2000,fs=48000)", 48000, 2000);
        assertDb(-1, "ellip(4,1,50,[600,1000],'bandpass',fs=8000)", 8000, 600);
        assertDb(-1, "ellip(4,1,50,[600,1000],'bandpass',fs=8000)", 8000, 1000);
        assertDb(0, "bessel(4,1000,fs=48000,norm='phase')", 48000, 0);
        assertDb(half, "bessel(6,1000,fs=48000,norm='mag')", 48000, 1000);
    }

    private static void assertDb(double expected, String design, double rate, double hertz) {
        assertEquals(expected, Response.of(scipyCascade(design, rate)).db(hertz), 1e-6, design);
    }

    private static Cascade scipyCascade(String design, double rate) {
        List<Section> sections = Table.rows(ResponseTest.class, "sos_reference.csv", "\"").stream()
                .filter(row -> row.text(1).equals(design))
                .map(row -> row.text(2).split(","))
                .map(c -> Section.normalized(
                        Double.parseDouble(c[2]),
                        Double.parseDouble(c[3]),
                        Double.parseDouble(c[4]),
                        Double.parseDouble(c[5]),
                        Double.parseDouble(c[6]),
                        Double.parseDouble(c[7])))
                .toList();
        return Cascade.of(rate, sections);
    }

    /**
     * ITU-R BS.1770 tables at 48 kHz: the filters' curve, and +0.691 dB at 997 Hz, which the standard's offset undoes.
     */
    @Test
    void weightingOfBs1770() {
        List<Section> stages = Table.rows(ResponseTest.class, "kweighting.csv", ",").stream()
                .filter(row -> row.number(0) == 48000)
                .map(row -> row.section(2))
                .toList();
        Response response = Response.of(Cascade.of(48000, stages));
        for (Table.Row row : Table.rows(ResponseTest.class, "kweighting_response48k.csv", ",")) {
            assertEquals(row.number(1), response.db(row.number(0)), 1e-9);
        }
        assertEquals(0.691, response.db(997), 5e-5);
    }

    /** The spectrum of the impulse response by an FFT of another library. */
    @Test
    void spectrumOfTheImpulseResponse() {
        Cascade cascade = scipyCascade("butter(4,[300,3400],'bandpass',fs=8000)", 8000);
        int length = 4096;
        double[] spectrum = impulseResponse(cascade, length);
        new DoubleFFT_1D(length).realForward(spectrum);
        Response response = Response.of(cascade);
        for (int bin = 1; bin < length / 2; bin++) {
            Complex value = response.at(bin * 8000.0 / length);
            assertEquals(spectrum[2 * bin], value.real(), 1e-10);
            assertEquals(spectrum[2 * bin + 1], value.imaginary(), 1e-10);
            assertEquals(value.argument(), response.phaseRadians(bin * 8000.0 / length), 1e-9);
            assertEquals(20 * Math.log10(value.magnitude()), response.db(bin * 8000.0 / length), 1e-9);
        }
    }

    /** Straight from the difference equation, direct form I. */
    private static double[] impulseResponse(Cascade cascade, int length) {
        double[] signal = new double[length];
        signal[0] = 1;
        for (Section s : cascade.sections()) {
            double[] output = new double[length];
            for (int n = 0; n < length; n++) {
                output[n] = s.b0() * signal[n];
                if (n >= 1) {
                    output[n] += s.b1() * signal[n - 1] - s.a1() * output[n - 1];
                }
                if (n >= 2) {
                    output[n] += s.b2() * signal[n - 2] - s.a2() * output[n - 2];
                }
            }
            signal = output;
        }
        return signal;
    }

    /** Delays that follow by hand: a delay of k frames, a zero at 1, a symmetric numerator. */
    @Test
    void delaysByHand() {
        for (double hertz : new double[] {0, 1e-9, 1, 12000, 20000, 24000}) {
            assertEquals(0, delay(Section.PASS_THROUGH, hertz));
            assertEquals(1, delay(Section.of(0, 1, 0, 0, 0), hertz), 1e-15);
            assertEquals(2, delay(Section.of(0, 0, 1, 0, 0), hertz), 1e-15);
            assertEquals(0.5, delay(Section.of(1, -1, 0, 0, 0), hertz), 1e-12);
            assertEquals(0.5, delay(Section.of(1, 1, 0, 0, 0), hertz), 1e-12);
            assertEquals(1, delay(Section.of(1, -1.7, 1, 0, 0), hertz), 1e-12);
        }
        // One pole at DC: lambda / (1 - lambda).
        assertEquals(9, delay(Section.of(0.1, 0, 0, -0.9, 0), 0), 1e-13);
        assertEquals(-0.9 / 1.9, delay(Section.of(0.1, 0, 0, -0.9, 0), 24000), 1e-14);
    }

    private static double delay(Section section, double hertz) {
        return Response.of(48000, section).groupDelayFrames(hertz);
    }

    @Test
    void aCascadeIsTheProductOfItsSections() {
        Cascade comb = HumComb.at(50).lines(3).design(48000);
        Response whole = Response.of(comb);
        for (double hertz : new double[] {3, 49.9, 75, 101, 149, 5000}) {
            double db = 0;
            double delay = 0;
            for (Section section : comb.sections()) {
                Response one = Response.of(48000, section);
                db += one.db(hertz);
                delay += one.groupDelayFrames(hertz);
            }
            assertEquals(db, whole.db(hertz), 1e-12);
            assertEquals(delay, whole.groupDelayFrames(hertz), 1e-8);
        }
    }

    @Test
    void endsOfTheBand() {
        Response dcNotch = Response.of(48000, DcNotch.byCorner(48000, 5));
        assertEquals(new Complex(0, 0), dcNotch.at(0));
        assertEquals(Double.NEGATIVE_INFINITY, dcNotch.db(0));
        assertEquals(0, dcNotch.db(24000), 1e-14);
        Response notch = Response.of(192000, HumNotch.byWidth(192000, 50, 0.5, 40));
        assertEquals(new Complex(1, 0), notch.at(0));
        assertEquals(1, notch.at(96000).real(), 1e-15);
    }

    /** Taps that nearly cancel, added as decimals: a plain sum of doubles keeps only nine digits of them. */
    @Test
    void gainAtTheEndsOfNearlyCancellingTaps() {
        Section taps = Section.of(0.1, -1.1, 1.00000003, 0, 0);
        BigDecimal sum = new BigDecimal(0.1).add(new BigDecimal(-1.1)).add(new BigDecimal(1.00000003));
        double expected = sum.doubleValue();
        assertEquals(expected, Response.of(48000, taps).at(0).real(), 1e-15 * expected);
        Section mirrored = Section.of(0.1, 1.1, 1.00000003, 0, 0);
        assertEquals(-expected, -Response.of(48000, mirrored).at(24000).real(), 1e-15 * expected);
    }

    @Test
    void gridsAreTheSinglePoints() {
        Response response = Response.of(HumComb.at(50).lines(2).design(48000));
        double[] grid = FrequencyGrid.logarithmic(10, 24000, 7);
        double[] db = response.db(grid);
        double[] phase = response.phaseRadians(grid);
        double[] delay = response.groupDelayFrames(grid);
        for (int i = 0; i < grid.length; i++) {
            assertEquals(response.db(grid[i]), db[i]);
            assertEquals(response.phaseRadians(grid[i]), phase[i]);
            assertEquals(response.groupDelayFrames(grid[i]), delay[i]);
        }
        assertEquals(24000, grid[6]);
        assertEquals(10 * Math.pow(2400, 0.5), grid[3], 1e-10);
        assertArrayEquals(new double[] {0, 5, 10}, FrequencyGrid.linear(0, 10, 3));
    }

    @ParameterizedTest
    @ValueSource(doubles = {-1, 24000.001, Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
    void refusesAFrequencyOutsideTheBand(double bad) {
        Response response = Response.of(48000, Section.PASS_THROUGH);
        List<org.junit.jupiter.api.function.Executable> calls = List.of(
                () -> response.at(bad),
                () -> response.db(bad),
                () -> response.db(new double[] {1, bad}),
                () -> response.phaseRadians(bad),
                () -> response.groupDelayFrames(bad));
        for (org.junit.jupiter.api.function.Executable call : calls) {
            String message = assertThrows(IllegalArgumentException.class, call).getMessage();
            assertEquals("frequencyHz is " + bad + "; it must be from 0 to 24000.0, half the sample rate", message);
        }
    }

    @Test
    void refusesABadGrid() {
        double nan = Double.NaN;
        double infinite = Double.POSITIVE_INFINITY;
        assertThrows(IllegalArgumentException.class, () -> FrequencyGrid.linear(-1, 10, 3));
        assertThrows(IllegalArgumentException.class, () -> FrequencyGrid.linear(nan, 10, 3));
        assertThrows(IllegalArgumentException.class, () -> FrequencyGrid.linear(0, nan, 3));
        assertThrows(IllegalArgumentException.class, () -> FrequencyGrid.linear(0, infinite, 3));
        assertThrows(IllegalArgumentException.class, () -> FrequencyGrid.linear(10, 10, 3));
        assertThrows(IllegalArgumentException.class, () -> FrequencyGrid.linear(0, 10, 1));
        assertThrows(IllegalArgumentException.class, () -> FrequencyGrid.logarithmic(0, 10, 3));
        assertThrows(IllegalArgumentException.class, () -> FrequencyGrid.logarithmic(1, 1, 3));
        assertThrows(IllegalArgumentException.class, () -> FrequencyGrid.logarithmic(1, 10, 1));
    }
}
