package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Against scipy.signal.sosfilt in long double (sosfilt.csv; version and call in its header). The table itself is right
 * to half a unit in the last place of its largest value, so the bound is {@link RoundingBound} and that much more.
 */
class ScipyReferenceTest {

    /** A design, its sections, and what SciPy makes of the input. */
    record Reference(String design, Cascade cascade, double[] expected) {
        @Override
        public String toString() {
            return design;
        }
    }

    static List<Arguments> references() throws IOException {
        List<Arguments> arguments = new ArrayList<>();
        for (Reference reference : read()) {
            for (Form form : Form.values()) {
                for (SampleFormat format : SampleFormat.values()) {
                    arguments.add(Arguments.of(reference, form, format));
                }
            }
        }
        return arguments;
    }

    @ParameterizedTest(name = "{0} {1} {2}")
    @MethodSource("references")
    void equalsScipyWithinTheRoundingBound(Reference reference, Form form, SampleFormat format) {
        double[][] in = {input(reference.expected.length)};
        double[][] out = Rig.run(Rig.live(reference.cascade, 1, form), format, in, Rig.cuts(1, in[0].length));
        double bound = RoundingBound.of(reference.cascade, form, Oracle.stages(reference.cascade, in[0]))
                + Math.ulp(RoundingBound.peak(reference.expected)) / 2;
        assertTrue(bound < 1e-9, "a bound that says nothing: " + bound);
        OracleReferenceTest.assertWithin(reference.expected, out[0], bound, format.narrow());
    }

    /** SciPy vouches for the oracle as well; long double is 2048 times finer than double. */
    @Test
    void oracleEqualsScipyInLongDouble() throws IOException {
        for (Reference reference : read()) {
            double[] in = input(reference.expected.length);
            double[] actual = Oracle.filter(reference.cascade, in);
            double[][] stages = Oracle.stages(reference.cascade, in);
            double bound = RoundingBound.of(reference.cascade, Form.TRANSPOSED_DIRECT_FORM_2, stages) / 2048;
            for (int n = 0; n < actual.length; n++) {
                assertEquals(reference.expected[n], actual[n], bound + Math.ulp(actual[n]), reference + " frame " + n);
            }
        }
    }

    private static double[] input(int frames) {
        double[] in = new double[frames];
        for (int i = 0; i < frames; i++) {
            in[i] = ((37 * i * i + 11 * i) % 257 - 128) / 128.0;
        }
        return in;
    }

    private static List<Reference> read() throws IOException {
        List<Reference> references = new ArrayList<>();
        List<Section> sections = new ArrayList<>();
        String design = "";
        try (BufferedReader lines = new BufferedReader(new InputStreamReader(
                Objects.requireNonNull(ScipyReferenceTest.class.getResourceAsStream("sosfilt.csv")),
                StandardCharsets.UTF_8))) {
            for (String line = lines.readLine(); line != null; line = lines.readLine()) {
                String[] cells = line.split(",", 2);
                switch (cells[0]) {
                    case "design" -> {
                        design = cells[1];
                        sections.clear();
                    }
                    case "sos" -> {
                        double[] c = numbers(cells[1]);
                        sections.add(Section.of(c[0], c[1], c[2], c[3], c[4]));
                    }
                    case "y" -> references.add(new Reference(design, Cascade.of(48_000, sections), numbers(cells[1])));
                    default -> assertTrue(line.startsWith("#"), line);
                }
            }
        }
        assertEquals(6, references.size());
        return references;
    }

    private static double[] numbers(String cells) {
        return Arrays.stream(cells.split(",")).mapToDouble(Double::parseDouble).toArray();
    }
}
