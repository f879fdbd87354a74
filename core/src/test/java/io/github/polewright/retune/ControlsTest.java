package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * Sequences of stable sets that diverge all the same: first shown to diverge when nobody holds them back, then refused
 * as a jump and held back by the walk. The growth figures are of state matrices multiplied here.
 */
class ControlsTest {

    private static Cascade cascade(Section section) {
        return Cascade.of(Sections.RATE_HZ, section);
    }

    private static Section poles(double a1, double a2) {
        return Section.of(1, 0, 0, a1, a2);
    }

    private static double growth(Section first, int firstFrames, Section second, int secondFrames) {
        return Plane.state(second)
                .power(secondFrames)
                .times(Plane.state(first).power(firstFrames))
                .spectralRadius();
    }

    /** Asks the walk for one target after another and returns the coefficients it really used. */
    private static List<double[]> held(List<Section> targets, int[] frames, int total) {
        Walk walk = new Walk(cascade(targets.get(targets.size() - 1)), Bucket.USUAL_LIMIT);
        Section before = targets.get(targets.size() - 1);
        List<double[]> used = new ArrayList<>();
        double allowed = allowed(targets);
        for (int i = 0; used.size() < total; i++) {
            Section target = targets.get(i % targets.size());
            walk.adopt(Glide.between(cascade(before), cascade(target), Pace.FOLLOWING));
            used.addAll(Runs.frames(walk, 0, frames[i % frames.length], 64));
            assertTrue(walk.level(0) <= allowed);
            before = target;
        }
        return used;
    }

    /** The limit, or what one change that an empty bucket admits can cost; 1.2 for real poles, known from above only. */
    private static double allowed(List<Section> targets) {
        double farthest = 0;
        int stride = Math.max(1, targets.size() / 40);
        for (int i = 0; i < targets.size(); i += stride) {
            for (int j = 0; j < i; j += stride) {
                farthest = Math.max(farthest, Distance.between(targets.get(i), targets.get(j)));
            }
        }
        return Math.max(Bucket.USUAL_LIMIT, 1.2 * 0.5 * farthest);
    }

    /** The largest state gain between any of the given moments, in the norms of the sections at both. */
    private static double largestGain(List<double[]> used, int stride) {
        double largest = 0;
        int moments = used.size() / stride;
        for (int start = 1; start < moments; start += Math.max(1, moments / 12)) {
            Plane product = Plane.IDENTITY;
            Plane from = basis(used.get(start * stride - 1));
            for (int i = start * stride; i < used.size(); i++) {
                product = Plane.state(used.get(i)[3], used.get(i)[4]).times(product);
                if ((i + 1) % stride == 0) {
                    largest = Math.max(largest, product.norm(from, basis(used.get(i))));
                }
            }
        }
        return largest;
    }

    private static Plane basis(double[] set) {
        return Plane.basisOf(poles(set[3], set[4]));
    }

    private static void assertHeld(List<Section> targets, int[] frames, int total, int stride) {
        double largest = largestGain(held(targets, frames, total), stride);
        assertTrue(largest <= Math.exp(allowed(targets)) * (1 + 1e-6), "state gain " + largest);
    }

    @Test
    void alternatingNotchesTenWidthsApart() {
        Section first = Sections.notch(50, 1);
        Section second = Sections.notch(60, 1);
        assertEquals(1.16586770, growth(first, 234, second, 205), 5e-9);
        assertTrue(Distance.hopFraction(first, second) > 1);
        Certificate certificate =
                Glide.between(cascade(first), cascade(second), Pace.FOLLOWING).certificate(0);
        assertEquals(Certificate.Rule.RAMP, certificate.rule());
        assertEquals(2787, certificate.shortestFrames(), 1);
        assertHeld(List.of(first, second), new int[] {234, 205}, 60_000, 97);
    }

    @Test
    void alternatingNotchesTwoWidthsApart() {
        Section first = Sections.notch(50, 1);
        Section second = Sections.notch(52, 1);
        assertEquals(1.00840733, growth(first, 240, second, 231), 5e-9);
        assertTrue(Distance.hopFraction(first, second) > 1);
        assertTrue(Glide.between(cascade(first), cascade(second), Pace.FOLLOWING)
                        .certificate(0)
                        .shortestFrames()
                > 240);
        assertHeld(List.of(first, second), new int[] {240, 231}, 60_000, 97);
    }

    @Test
    void resonantLowPassModulatedAtTwoKilohertz() {
        List<Section> period = new ArrayList<>();
        Plane product = Plane.IDENTITY;
        for (int n = 0; n < 24; n++) {
            period.add(Sections.lowPass(1000 * Math.pow(2, Math.sin(2 * Math.PI * n / 24)), 10));
            product = Plane.state(period.get(n)).times(product);
        }
        assertEquals(2.0408, product.spectralRadius(), 5e-5);
        assertTrue(Distance.hopFraction(period.get(6), period.get(18)) > 1);
        assertHeld(period, new int[] {1}, 4800, 1);
    }

    @Test
    void lowPassAtRandomEverySample() {
        Random random = new Random(31);
        List<Section> targets = new ArrayList<>();
        double logarithm = 0;
        double[] state = {1, 0};
        for (int n = 0; n < 48000; n++) {
            Section section = Sections.lowPass(100 * Math.pow(100, random.nextDouble()), 2);
            targets.add(section);
            state = new double[] {-section.a1() * state[0] - section.a2() * state[1], state[0]};
            double size = Math.hypot(state[0], state[1]);
            state = new double[] {state[0] / size, state[1] / size};
            logarithm += Math.log10(size);
        }
        assertTrue(logarithm > 200, "decades " + logarithm);
        assertHeld(targets.subList(0, 400), new int[] {1}, 3000, 1);
    }

    @Test
    void hopsThatAreCertifiedOneByOne() {
        List<Section> hops = new ArrayList<>();
        for (int i = 0; i < 40; i++) {
            hops.add(Sections.notch(i < 20 ? 50 + 0.5 * i : 70 - 0.5 * i, 1));
        }
        Plane product = Plane.IDENTITY;
        for (int i = 0; i < 40; i++) {
            assertTrue(Distance.hopFraction(hops.get(i), hops.get((i + 1) % 40)) < GlidePlan.HOP_FRACTION);
            product = Plane.state(hops.get(i)).power(11).times(product);
        }
        assertEquals(1.0877, product.spectralRadius(), 5e-5);
        assertHeld(hops, new int[] {11}, 60_000, 97);
    }

    @Test
    void threeSetsOfWhichEveryPairIsCertified() {
        List<Section> sets =
                List.of(poles(.3044786, -.6559843), poles(-.1288723, -.8126109), poles(-1.6475480, .6893586));
        for (int i = 0; i < 3; i++) {
            assertTrue(Distance.hopFraction(sets.get(i), sets.get((i + 1) % 3)) < 1);
        }
        List<Section> word = new ArrayList<>();
        Plane product = Plane.IDENTITY;
        for (int i : new int[] {0, 1, 2, 0, 1, 2, 2}) {
            word.add(sets.get(i));
            product = Plane.state(sets.get(i)).times(product);
        }
        assertEquals(1.092, Math.pow(product.spectralRadius(), 1.0 / 7), 5e-4);
        assertHeld(word, new int[] {1}, 4000, 1);
    }

    /** With the whole decay spent on changes the free state is bounded and the forced output is not. */
    @Test
    void hopsThatLeaveAFreeStateBoundedDriveTheOutput() {
        Section first = Sections.notch(50, 0.9562481);
        Section second = Sections.notch(51.502146, 0.9562481);
        double radius = growth(first, 240, second, 233);
        assertTrue(radius < 1 && radius > 0.999999, "radius " + radius);
        double charged = Distance.between(first, second) / 2;
        double wholeDecay = -0.5 * Math.log(first.a2()) * 236.5;
        assertTrue(charged - wholeDecay < Math.log(1.015));
        List<double[]> free = new ArrayList<>();
        List<Section> pair = List.of(first, second);
        for (int i = 0; i <= 2030; i++) {
            free.addAll(Runs.repeat(pair.get(i % 2), i % 2 == 0 ? 240 : 233));
        }
        double afterOne = Runs.worstOutput(free, 48_000);
        double afterTen = Runs.worstOutput(free, free.size() - 1);
        assertEquals(4.8, afterOne, 1.5);
        assertEquals(39, afterTen, 3);
        List<double[]> used = held(pair, new int[] {240, 233}, 480_000);
        double worst = 0;
        for (int n = 200_000; n < used.size(); n += 9_973) {
            worst = Math.max(worst, Runs.worstOutput(used, n));
        }
        assertTrue(worst < 8, "worst output " + worst);
    }

    @Test
    void triangleRampsThatAreTooShort() {
        assertEquals(5.6, triangle(217)[0], 0.05);
        double[] shortest = triangle(1393);
        assertEquals(0.026, shortest[0], 5e-4);
        assertEquals(0.92, shortest[1], 5e-3);
        Section first = Sections.notch(50, 1);
        Section second = Sections.notch(60, 1);
        assertTrue(
                Glide.between(cascade(first), cascade(second), Pace.FOLLOWING).totalFrames() >= 2 * 1392);
        assertHeld(List.of(first, second), new int[] {217}, 40 * 217, 31);
    }

    /** The gain after 40 ramps and the largest at the end of any of them. */
    private static double[] triangle(int frames) {
        Section from = Sections.notch(50, 1);
        Section to = Sections.notch(60, 1);
        Plane start = Plane.basisOf(from);
        Plane product = Plane.IDENTITY;
        double largest = 0;
        for (int ramp = 0; ramp < 40; ramp++) {
            for (int i = 1; i <= frames; i++) {
                double share = (double) i / frames;
                product = Plane.state(
                                from.a1() + share * (to.a1() - from.a1()), from.a2() + share * (to.a2() - from.a2()))
                        .times(product);
            }
            Section turned = from;
            from = to;
            to = turned;
            largest = Math.max(largest, product.norm(start, Plane.basisOf(from)));
        }
        return new double[] {product.norm(start, Plane.basisOf(from)), largest};
    }
}
