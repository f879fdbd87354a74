package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Section;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** The ramp bound against products of state matrices. */
class RampBoundTest {

    @Test
    void complexPolesStayWithinTheBoundAndAttainItInOneStep() {
        Random random = new Random(11);
        double tightest = 0;
        for (int i = 0; i < 3000; i++) {
            Section from = Sections.randomComplex(random);
            Section to = Sections.randomComplex(random);
            int frames = i % 3 == 0 ? 1 : 1 + random.nextInt(60);
            double[] shares = shares(frames, random);
            double bound = Math.exp(Distance.between(from, to) / 2);
            Plane product = Plane.IDENTITY;
            for (double share : shares) {
                Section here = at(from, to, share);
                product = Plane.state(here).times(product);
                bound *= Math.sqrt(here.a2());
            }
            double reached = product.norm(Plane.basisOf(from), Plane.basisOf(to));
            assertTrue(reached <= bound * (1 + 1e-6), reached + " > " + bound);
            if (frames == 1) {
                tightest = Math.max(tightest, reached / bound);
                assertEquals(1, reached / bound, 1e-5);
            }
        }
        assertTrue(tightest > 0.99999);
    }

    @Test
    void realPolesStayWithinTheBoundOfTheirHomes() {
        Random random = new Random(12);
        for (int i = 0; i < 2000; i++) {
            Section from = Sections.random(random);
            Section to = Sections.random(random);
            int frames = 1 + random.nextInt(80);
            double bound = Math.exp(Distance.between(from, to) / 2);
            Plane product = Plane.IDENTITY;
            for (double share : shares(frames, random)) {
                Section here = at(from, to, share);
                product = Plane.state(here).times(product);
                Plane home = Plane.basisOf(here);
                double sigma = Plane.state(here).norm(home, home);
                assertEquals(1 - sigma, Poles.decay(here.a1(), here.a2()), 1e-9 + 1e-6 * (1 - sigma));
                assertTrue(Poles.leastDecay(from.a1(), from.a2(), to.a1(), to.a2()) <= (1 - sigma) * (1 + 1e-6) + 1e-9);
                bound *= sigma;
            }
            double reached = product.norm(Plane.basisOf(from), Plane.basisOf(to));
            assertTrue(reached <= bound * (1 + 1e-6), reached + " > " + bound + " from " + from + " to " + to);
        }
    }

    /** Each frame an adversary moves on to wherever the state grows most, never back. */
    @Test
    void adversaryThatOnlyMovesOnNeverBreaksTheBound() {
        Random random = new Random(13);
        for (int i = 0; i < 400; i++) {
            Section from = Sections.randomComplex(random);
            Section to = Sections.randomComplex(random);
            double[] state = {random.nextGaussian(), random.nextGaussian()};
            double start = size(from, state);
            double share = 0;
            double decay = 1;
            for (int n = 0; n < 50; n++) {
                double bestShare = share;
                double[] best = step(at(from, to, share), state);
                for (int k = 1; k <= 20; k++) {
                    double candidate = share + (1 - share) * Math.pow(k / 20.0, 3);
                    double[] next = step(at(from, to, candidate), state);
                    if (size(at(from, to, candidate), next) > size(at(from, to, bestShare), best)) {
                        best = next;
                        bestShare = candidate;
                    }
                }
                share = bestShare;
                state = best;
                Section here = at(from, to, share);
                decay *= Math.sqrt(here.a2());
                double bound = Math.exp(Distance.between(from, here) / 2) * decay * start;
                assertTrue(size(here, state) <= bound * (1 + 1e-6));
            }
        }
    }

    @Test
    void ringingOfANarrowSectionGrowsByTheSineRatio() {
        assertEquals(1.2, ringing(Sections.notch(60, 1), Sections.notch(50, 1)), 1e-4);
        double high = Math.cos(Math.PI * 10000 / 48000) / Math.cos(Math.PI * 15000 / 48000);
        assertEquals(1.43, high, 0.005);
        assertEquals(high, ringing(Sections.notch(10000, 1), Sections.notch(15000, 1)), 1e-3);
    }

    @Test
    void ringingOfALowPassThatClosesCanGrowTwentyFiveFold() {
        for (double q : new double[] {0.7, 4}) {
            double factor = ringing(Sections.lowPass(5000, q), Sections.lowPass(200, q));
            assertTrue(factor > 23 && factor < 30, "factor " + factor);
        }
    }

    private static double ringing(Section from, Section to) {
        var glide = Glide.between(
                io.github.polewright.Cascade.of(Sections.RATE_HZ, from),
                io.github.polewright.Cascade.of(Sections.RATE_HZ, to),
                Pace.FOLLOWING);
        return glide.certificate(0).ringingBound();
    }

    private static double size(Section section, double[] state) {
        Plane basis = Plane.basisOf(section);
        return Math.hypot(basis.a() * state[0] + basis.b() * state[1], basis.d() * state[1]);
    }

    private static double[] step(Section here, double[] state) {
        return new double[] {-here.a1() * state[0] - here.a2() * state[1], state[0]};
    }

    private static Section at(Section from, Section to, double share) {
        return Section.of(
                1, 0, 0, from.a1() + share * (to.a1() - from.a1()), from.a2() + share * (to.a2() - from.a2()));
    }

    private static double[] shares(int frames, Random random) {
        double[] shares = random.doubles(frames).toArray();
        if (random.nextInt(3) == 0) {
            Arrays.setAll(shares, i -> (i + 1.0) / frames);
        }
        Arrays.sort(shares);
        shares[frames - 1] = 1;
        return shares;
    }
}
