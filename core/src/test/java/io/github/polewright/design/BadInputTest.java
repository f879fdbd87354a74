package io.github.polewright.design;

import static org.junit.jupiter.api.Assertions.assertDoesNotThrow;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Each parameter of each design with each kind of bad value: refused by name, with the value and the range. */
class BadInputTest {

    private static final double NAN = Double.NaN;
    private static final double INFINITE = Double.POSITIVE_INFINITY;
    private static final double[] NOT_POSITIVE = {NAN, INFINITE, -INFINITE, 0, -0.0, -1};
    private static final double[] NOT_IN_BAND = {NAN, INFINITE, -INFINITE, 0, -50, 24000, 24000.5, 1e9};
    private static final double[] NOT_FINITE = {NAN, INFINITE, -INFINITE};

    private interface Design {
        Object of(double... arguments);
    }

    private record Parameter(String name, double good, double[] bad) {}

    private static final Parameter RATE = new Parameter("sampleRateHz", 48000, NOT_POSITIVE);
    private static final Parameter CENTRE = new Parameter("centreHz", 50, NOT_IN_BAND);
    private static final Parameter CORNER = new Parameter("cornerHz", 50, NOT_IN_BAND);
    private static final Parameter WIDTH = new Parameter("widthHz", 1, NOT_IN_BAND);
    private static final Parameter Q = new Parameter("q", 2, NOT_POSITIVE);
    private static final Parameter NARROW_Q =
            new Parameter("q", 50, new double[] {NAN, INFINITE, 0, -1, 50.0 / 24000, 1e-300, 1e300});
    private static final Parameter DEPTH = new Parameter("depthDb", 40, NOT_POSITIVE);
    private static final Parameter GAIN =
            new Parameter("gainDb", 6, new double[] {NAN, INFINITE, -INFINITE, 1e6, -1e6});

    static Stream<Arguments> rows() {
        List<Arguments> rows = new ArrayList<>();
        add(rows, a -> LeakyIntegrator.byCorner(a[0], a[1]), RATE, CORNER);
        add(rows, a -> LeakyIntegrator.byLambda(a[0]), new Parameter("lambda", 0.5, new double[] {
            NAN, -0.1, 1, 2, INFINITE
        }));
        add(rows, a -> DcNotch.byCorner(a[0], a[1]), RATE, CORNER);
        add(rows, a -> Resonator.byWidth(a[0], a[1], a[2]), RATE, CENTRE, WIDTH);
        add(rows, a -> Resonator.byQ(a[0], a[1], a[2]), RATE, CENTRE, NARROW_Q);
        add(rows, a -> HumNotch.byWidth(a[0], a[1], a[2]), RATE, CENTRE, WIDTH);
        add(rows, a -> HumNotch.byWidth(a[0], a[1], a[2], a[3]), RATE, CENTRE, WIDTH, DEPTH);
        add(rows, a -> HumNotch.byQ(a[0], a[1], a[2]), RATE, CENTRE, NARROW_Q);
        add(rows, a -> HumNotch.byQ(a[0], a[1], a[2], a[3]), RATE, CENTRE, NARROW_Q, DEPTH);
        add(rows, a -> HumComb.at(a[0]), new Parameter("fundamentalHz", 50, NOT_POSITIVE));
        add(rows, a -> HumComb.at(50).widthHz(a[0]), new Parameter("widthHz", 1, new double[] {
            NAN, INFINITE, 0, -1, 50, 120
        }));
        add(rows, a -> HumComb.at(50).depthDb(a[0]), DEPTH);
        add(rows, a -> HumComb.at(50).lines((int) a[0]), new Parameter("lines", 3, new double[] {0, -1}));
        add(rows, a -> HumComb.at(50).design(a[0]), RATE);
        add(rows, a -> Cookbook.lowPass(a[0], a[1], a[2]), RATE, CORNER, Q);
        add(rows, a -> Cookbook.highPass(a[0], a[1], a[2]), RATE, CORNER, Q);
        add(rows, a -> Cookbook.bandPassSkirt(a[0], a[1], a[2]), RATE, CENTRE, Q);
        add(rows, a -> Cookbook.bandPassPeak(a[0], a[1], a[2]), RATE, CENTRE, Q);
        add(rows, a -> Cookbook.notch(a[0], a[1], a[2]), RATE, CENTRE, Q);
        add(rows, a -> Cookbook.allPass(a[0], a[1], a[2]), RATE, CENTRE, Q);
        add(rows, a -> Cookbook.peaking(a[0], a[1], a[2], a[3]), RATE, CENTRE, Q, GAIN);
        add(rows, a -> Cookbook.lowShelf(a[0], a[1], a[2], a[3]), RATE, CORNER, Q, GAIN);
        add(rows, a -> Cookbook.highShelf(a[0], a[1], a[2], a[3]), RATE, CORNER, Q, GAIN);
        Parameter octaves = new Parameter("octaves", 1, new double[] {NAN, INFINITE, 0, -1, 1e6});
        add(rows, a -> Cookbook.qOfOctaves(a[0], a[1], a[2]), RATE, CENTRE, octaves);
        // At 12 dB the steepest slope is (A^2 + 1) / (A - 1)^2 = 5.02.
        Parameter slope = new Parameter("slope", 1, new double[] {NAN, INFINITE, 0, -1, 5.1});
        Parameter shelfGain = new Parameter("gainDb", 12, NOT_FINITE);
        add(rows, a -> Cookbook.qOfSlope(a[0], a[1]), slope, shelfGain);
        return rows.stream();
    }

    private static void add(List<Arguments> rows, Design design, Parameter... parameters) {
        double[] good = Stream.of(parameters).mapToDouble(Parameter::good).toArray();
        assertDoesNotThrow(() -> design.of(good));
        for (int i = 0; i < parameters.length; i++) {
            for (double bad : parameters[i].bad()) {
                double[] arguments = good.clone();
                arguments[i] = bad;
                Consumer<double[]> call = design::of;
                rows.add(Arguments.of(rows.size(), parameters[i].name(), bad, arguments, call));
            }
        }
    }

    @ParameterizedTest(name = "{0}: {1} = {2}")
    @MethodSource("rows")
    void refusedByName(int row, String name, double bad, double[] arguments, Consumer<double[]> call) {
        String message = assertThrows(IllegalArgumentException.class, () -> call.accept(arguments))
                .getMessage();
        String value = name.equals("lines") ? String.valueOf((int) bad) : String.valueOf(bad);
        assertTrue(message.startsWith(name + " is " + value + "; it must be "), message);
    }

    @Test
    void wishesThatRoundToTheUnitCircle() {
        assertRefused("cornerHz", () -> LeakyIntegrator.byCorner(192000, 1e-13));
        assertRefused("cornerHz", () -> DcNotch.byCorner(192000, 1e-13));
        assertRefused("widthHz", () -> Resonator.byWidth(192000, 50, 1e-13));
        assertRefused("widthHz", () -> HumNotch.byWidth(192000, 50, 1e-13));
        assertRefused("q", () -> HumNotch.byQ(192000, 50, 1e17));
        assertRefused("q", () -> Cookbook.lowPass(48000, 1000, 1e18));
        assertRefused("q", () -> Cookbook.peaking(48000, 1000, 1e18, 6));
        assertRefused("q", () -> Cookbook.lowShelf(48000, 1000, 1e18, 6));
        assertRefused("gainDb", () -> Cookbook.peaking(48000, 1000, 1, 3000));
        assertRefused("gainDb", () -> Cookbook.lowShelf(48000, 1000, 1, 3000));
        assertRefused("gainDb", () -> Cookbook.highShelf(48000, 1000, 1, -3000));
    }

    private static void assertRefused(String name, org.junit.jupiter.api.function.Executable design) {
        String message = assertThrows(IllegalArgumentException.class, design).getMessage();
        assertTrue(message.startsWith(name + " is ") && message.contains("it must be "), message);
    }
}
