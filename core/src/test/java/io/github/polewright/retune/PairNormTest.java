package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Section;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** The pair condition against a search over all quadratic norms, each of which is a point (m, h) of the half plane. */
class PairNormTest {

    /** The least of the larger contraction of two state matrices over all norms, and the norm that attains it. */
    private static double[] search(Plane first, Plane second, double[] start) {
        double centre = start[0];
        double height = start[1];
        double best = worse(first, second, centre, height);
        double step = 1;
        double offset = 0;
        while (step > 1e-9) {
            boolean better = false;
            offset += 0.618;
            for (int i = 0; i < 24 && !better; i++) {
                double turn = 2 * Math.PI * (i + offset) / 24;
                double nextCentre = centre + height * Math.sinh(step) * Math.cos(turn);
                double nextHeight = height * Math.exp(step * Math.sin(turn));
                double value = worse(first, second, nextCentre, nextHeight);
                if (value < best) {
                    best = value;
                    centre = nextCentre;
                    height = nextHeight;
                    better = true;
                }
            }
            step *= better ? 1.5 : 0.9;
        }
        return new double[] {best, centre, height};
    }

    private static double worse(Plane first, Plane second, double centre, double height) {
        Plane basis = Plane.basis(centre, height);
        return Math.max(first.norm(basis, basis), second.norm(basis, basis));
    }

    static double[] bestNorm(Section first, Section second) {
        double[] best = {Double.POSITIVE_INFINITY, 0, 1};
        for (double share : new double[] {0, 0.5, 1}) {
            double a1 = first.a1() + share * (second.a1() - first.a1());
            double a2 = first.a2() + share * (second.a2() - first.a2());
            double height = Math.sqrt(Math.max(1e-6, Math.abs(a2 - a1 * a1 / 4)));
            double[] found = search(Plane.state(first), Plane.state(second), new double[] {-a1 / 2, height});
            best = found[0] < best[0] ? found : best;
        }
        return best;
    }

    @Test
    void pairConditionAgreesWithASearchOverQuadraticNorms() {
        Random random = new Random(5);
        int held = 0;
        int close = 0;
        for (int i = 0; i < 600; i++) {
            Section first = wide(random);
            Section second = wide(random);
            if (i % 2 == 0) {
                second = nearTheLimit(first, second, random);
            }
            double mu = Distance.hopFraction(first, second);
            if (Math.abs(mu - 1) < 1e-3) {
                continue;
            }
            close += Math.abs(mu - 1) < 0.02 ? 1 : 0;
            held += mu < 1 ? 1 : 0;
            double best = bestNorm(first, second)[0];
            Section other = second;
            assertEquals(mu < 1, best < 1 - 1e-9, () -> "mu " + mu + " best " + best + " for " + first + other);
        }
        assertTrue(held > 100 && held < 500 && close > 30, held + " held, " + close + " close to the limit");
    }

    private static Section wide(Random random) {
        if (random.nextInt(3) == 0) {
            return Sections.realPoles(1.9 * random.nextDouble() - 0.95, 1.9 * random.nextDouble() - 0.95);
        }
        return Sections.fromWidthAndAngle(
                Math.pow(10, -2 * random.nextDouble()), Math.PI * (0.02 + 0.96 * random.nextDouble()));
    }

    /** Moves the second set along the straight line until the pair condition nearly decides the other way. */
    private static Section nearTheLimit(Section first, Section second, Random random) {
        double low = 0;
        double high = 1;
        double wish = 1 + 0.02 * random.nextGaussian();
        for (int i = 0; i < 40; i++) {
            double middle = (low + high) / 2;
            if (Distance.hopFraction(first, between(first, second, middle)) < wish) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return between(first, second, low);
    }

    private static Section between(Section first, Section second, double share) {
        return Section.of(
                1,
                0,
                0,
                first.a1() + share * (second.a1() - first.a1()),
                first.a2() + share * (second.a2() - first.a2()));
    }

    /** Each frame an adversary picks the place on the segment that hurts most, in the norm that should contract. */
    @Test
    void adversaryInsideACertifiedSegmentNeverRaisesTheCommonNorm() {
        Random random = new Random(6);
        int pairs = 0;
        while (pairs < 60) {
            Section first = wide(random);
            Section second = nearTheLimit(first, wide(random), random);
            second = between(first, second, 0.68);
            if (Distance.hopFraction(first, second) > GlidePlan.HOP_FRACTION) {
                continue;
            }
            pairs++;
            double[] norm = bestNorm(first, second);
            Plane basis = Plane.basis(norm[1], norm[2]);
            double[] state = {random.nextGaussian(), random.nextGaussian()};
            for (int n = 0; n < 300; n++) {
                double before = size(basis, state);
                double[] worst = worstStep(first, second, basis, state);
                assertTrue(size(basis, worst) < before);
                state = worst;
            }
        }
    }

    private static double[] worstStep(Section first, Section second, Plane basis, double[] state) {
        double[] worst = null;
        for (int i = 0; i <= 16; i++) {
            Section here = between(first, second, i / 16.0);
            double[] next = {-here.a1() * state[0] - here.a2() * state[1], state[0]};
            worst = worst == null || size(basis, next) > size(basis, worst) ? next : worst;
        }
        return worst;
    }

    private static double size(Plane basis, double[] state) {
        return Math.hypot(basis.a() * state[0] + basis.b() * state[1], basis.c() * state[0] + basis.d() * state[1]);
    }

    /** The same adversary does break two notches that are 1.7 widths apart: the condition is not idle. */
    @Test
    void adversaryBreaksAHopOfMoreThanOneAndAHalfWidths() {
        Section first = Sections.notch(1000, 20);
        Section second = Sections.notch(1034, 20);
        assertTrue(Distance.hopFraction(first, second) > 1.6);
        double[] norm = bestNorm(first, second);
        Plane basis = Plane.basis(norm[1], norm[2]);
        double[] state = {1, 0};
        double largest = 0;
        for (int n = 0; n < 400_000; n++) {
            state = worstStep(first, second, basis, state);
            largest = Math.max(largest, size(basis, state));
        }
        assertTrue(largest > 1e6 * size(basis, new double[] {1, 0}), "reached " + largest);
    }
}
