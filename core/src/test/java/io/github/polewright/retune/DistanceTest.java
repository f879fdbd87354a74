package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Section;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class DistanceTest {

    /** The table was computed with NumPy from widths and centres; its header says what each column is. */
    private static List<double[]> table() throws IOException {
        try (BufferedReader reader = new BufferedReader(new InputStreamReader(
                DistanceTest.class.getResourceAsStream("certificate.csv"), StandardCharsets.US_ASCII))) {
            return reader.lines()
                    .filter(line -> !line.startsWith("#"))
                    .map(line -> java.util.Arrays.stream(line.split(","))
                            .mapToDouble(Double::parseDouble)
                            .toArray())
                    .toList();
        }
    }

    @Test
    void distanceAndPairConditionAgreeWithTheTable() throws IOException {
        List<double[]> rows = table();
        assertEquals(14, rows.size());
        for (double[] row : rows) {
            Section from = Section.of(1, 0, 0, row[4], row[5]);
            Section to = Section.of(1, 0, 0, row[6], row[7]);
            assertEquals(row[10], Distance.between(from, to), 5e-8 * row[10]);
            assertEquals(row[11], Math.exp(Distance.between(from, to) / 2), 1e-8);
            double frames = Distance.between(from, to) / -Math.log(Math.max(row[5], row[7]));
            assertEquals(row[12], Math.ceil(frames));
            boolean sitsOnTheLimit = row[0] == 50 && row[2] == 51;
            if (!sitsOnTheLimit) {
                assertEquals(row[9] == 1, Distance.hopFraction(from, to) < 1);
            }
            double product = (1 - row[5]) / (1 + row[5]) * ((1 - row[7]) / (1 + row[7]));
            double mu = Distance.hopFraction(from, to);
            assertEquals(row[8], product * (1 - mu * mu), 1e-7 * product);
        }
    }

    @Test
    void distanceOfNamedPairsIsAsPrinted() {
        assertEquals(0.01981, Distance.between(Sections.notch(50, 1), Sections.notch(51, 1)), 6e-6);
        assertEquals(0.18234, Distance.between(Sections.notch(50, 1), Sections.notch(60, 1)), 5e-6);
        assertEquals(0.18271, Distance.between(Sections.notch(50, 5), Sections.notch(60, 5)), 5e-6);
        assertEquals(0.18234, Distance.between(Sections.notch(100, 2), Sections.notch(120, 2)), 5e-6);
        assertEquals(0.30078, Distance.between(Sections.notch(697, 20), Sections.notch(941, 20)), 5e-6);
    }

    /** The disc form of the distance: d = 2 artanh |(p - q)/(p - conj q)|. */
    @Test
    void distanceIsHyperbolicForComplexPoles() {
        Random random = new Random(1);
        for (int i = 0; i < 2000; i++) {
            Section from = Sections.randomComplex(random);
            Section to = Sections.randomComplex(random);
            double across = (to.a1() - from.a1()) / 2;
            double first = Math.sqrt(from.a2() - from.a1() * from.a1() / 4);
            double second = Math.sqrt(to.a2() - to.a1() * to.a1() / 4);
            double ratio = Math.hypot(across, first - second) / Math.hypot(across, first + second);
            double expected = Math.log((1 + ratio) / (1 - ratio));
            assertEquals(expected, Distance.between(from, to), 1e-6 * expected + 1e-9);
            assertEquals(Distance.between(from, to), Distance.between(to, from), 1e-12);
        }
    }

    @Test
    void straightRampIsGeodesicForComplexPoles() {
        Random random = new Random(2);
        for (int i = 0; i < 500; i++) {
            Section from = Sections.randomComplex(random);
            Section to = Sections.randomComplex(random);
            double whole = Distance.between(from, to);
            assertEquals(whole, lengthInSteps(from, to, 1 + random.nextInt(40), random), 1e-7 * whole + 1e-10);
        }
    }

    @Test
    void lengthCoversEveryWayToWalkARampThroughRealPoles() {
        Random random = new Random(3);
        for (int i = 0; i < 1500; i++) {
            Section from = Sections.random(random);
            Section to = Sections.random(random);
            double whole = Distance.between(from, to);
            double walked = lengthInSteps(from, to, 4000, random);
            assertTrue(walked <= whole * (1 + 1e-9), () -> walked + " > " + whole + " from " + from + " to " + to);
            // Uniform steps cut corners near an end, so only the cruder half is asked of them.
            assertTrue(whole <= 1.03 * walked || walked > 0.3 * whole);
        }
    }

    private static double lengthInSteps(Section from, Section to, int steps, Random random) {
        double[] shares = random.doubles(steps - 1)
                .map(x -> random.nextInt(2) == 0 ? x : x * x * x)
                .sorted()
                .toArray();
        double sum = 0;
        double a1 = from.a1();
        double a2 = from.a2();
        for (int i = 0; i < steps; i++) {
            double share = i == steps - 1 ? 1 : shares[i];
            double c1 = from.a1() + share * (to.a1() - from.a1());
            double c2 = from.a2() + share * (to.a2() - from.a2());
            Plane change = Plane.IDENTITY;
            Section here = Section.of(1, 0, 0, a1, a2);
            Section there = Section.of(1, 0, 0, c1, c2);
            sum += 2 * Math.log(change.norm(Plane.basisOf(here), Plane.basisOf(there)));
            a1 = c1;
            a2 = c2;
        }
        return sum;
    }

    @Test
    void boundWithoutLogarithmIsNeverBelow() {
        Random random = new Random(4);
        for (int i = 0; i < 3000; i++) {
            Section from = Sections.random(random);
            Section to = Sections.random(random);
            if (i % 3 == 0) {
                double share = Math.pow(10, -6 * random.nextDouble());
                to = Section.of(
                        1, 0, 0, from.a1() + share * (to.a1() - from.a1()), from.a2() + share * (to.a2() - from.a2()));
            }
            double exact = Distance.between(from, to);
            double bound = Distance.upperBound(from, to);
            assertTrue(bound >= exact, bound + " < " + exact);
            assertTrue(bound <= 1.3 * exact, bound + " far above " + exact);
        }
    }

    @Test
    void arcSineBoundIsNeverBelowAndTight() {
        for (double x = 1e-9; x < 1e6; x *= 1.01) {
            double exact = Math.log(x + Math.hypot(1, x));
            assertTrue(Distance.asinhBound(x) >= Distance.asinh(x));
            assertEquals(exact, Distance.asinh(x), 1e-15 + 1e-13 * exact + (x < 1e-3 ? 1e-12 : 0));
            assertTrue(x > 16 || Distance.asinhBound(x) <= 1.035 * Distance.asinh(x), "x " + x);
        }
    }

    @Test
    void hopOfOneWidthIsTheLimitAtEveryCentre() {
        for (double centreHz : new double[] {40, 1000, 12000, 20000}) {
            Section first = Sections.notch(centreHz, 20);
            assertEquals(1, Distance.hopFraction(first, Sections.notch(centreHz + 20, 20)), 1e-6);
            assertTrue(Distance.hopFraction(first, Sections.notch(centreHz + 19, 20)) < 1);
            assertTrue(Distance.hopFraction(first, Sections.notch(centreHz + 21, 20)) > 1);
        }
    }

    @Test
    void unstableSectionIsRefusedByName() {
        Section stable = Sections.notch(50, 1);
        Section unstable = Section.of(1, 0, 0, 0, 1);
        for (String name : List.of("from", "to")) {
            IllegalArgumentException refused = assertThrows(
                    IllegalArgumentException.class,
                    () -> Distance.between(
                            name.equals("from") ? unstable : stable, name.equals("to") ? unstable : stable));
            assertTrue(refused.getMessage().startsWith(name + " is "));
        }
    }
}
