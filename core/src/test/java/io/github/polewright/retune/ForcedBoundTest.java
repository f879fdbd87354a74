package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** The bound of the output against the worst input, which the adjoint of the time-varying recursion finds exactly. */
class ForcedBoundTest {

    private static List<double[]> ramp(Section from, Section to, int before, int frames, int after) {
        List<double[]> sets = new ArrayList<>(Runs.repeat(from, before));
        double[] start = Runs.repeat(from, 1).get(0);
        double[] end = Runs.repeat(to, 1).get(0);
        for (int i = 1; i <= frames; i++) {
            double[] set = new double[5];
            for (int k = 0; k < 5; k++) {
                set[k] = i == frames ? end[k] : start[k] + (end[k] - start[k]) * i / frames;
            }
            sets.add(set);
        }
        sets.addAll(Runs.repeat(to, after));
        return sets;
    }

    private static double bound(Section from, Section to, int frames) {
        double[] start = Runs.repeat(from, 1).get(0);
        double[] end = Runs.repeat(to, 1).get(0);
        return new Knots(new int[] {frames}, new double[][] {start, end}).forcedBound(0);
    }

    private static double reached(List<double[]> sets, int first, int stride) {
        double reached = 0;
        for (int n = first; n < sets.size(); n += stride) {
            reached = Math.max(reached, Runs.worstOutput(sets, n));
        }
        return reached;
    }

    private static double db(double factor) {
        return 20 * Math.log10(factor);
    }

    @Test
    void noInputExceedsTheBoundOnRandomRamps() {
        Random random = new Random(21);
        for (int i = 0; i < 1000; i++) {
            Section from = Sections.random(random);
            Section to = Sections.random(random);
            int frames = 1 + random.nextInt(i % 2 == 0 ? 12 : 150);
            List<double[]> sets = ramp(from, to, 400, frames, 60);
            double bound = bound(from, to, frames);
            double reached = reached(sets, 395, 7);
            assertTrue(reached <= bound * (1 + 1e-9), reached + " > " + bound + " from " + from + " to " + to);
        }
    }

    @Test
    void noInputExceedsTheBoundOnDesignsWithNumeratorsOfTheirOwn() {
        Random random = new Random(22);
        List<Double> slack = new ArrayList<>();
        for (int i = 0; i < 300; i++) {
            Section from = design(random);
            Section to = design(random);
            int frames = 1 + random.nextInt(300);
            double bound = bound(from, to, frames);
            double reached = reached(ramp(from, to, 1500, frames, 100), 1490, 13);
            assertTrue(reached <= bound * (1 + 1e-9), reached + " > " + bound);
            slack.add(db(bound / reached));
        }
        double median = slack.stream().sorted().toList().get(150);
        assertTrue(median < 6, "median slack " + median + " dB");
    }

    private static Section design(Random random) {
        double frequencyHz = 200 * Math.pow(50, random.nextDouble());
        double q = 0.4 * Math.pow(10, random.nextDouble());
        double gainDb = 24 * random.nextDouble() - 12;
        return switch (random.nextInt(3)) {
            case 0 -> Sections.lowPass(frequencyHz, q);
            case 1 -> Sections.peak(frequencyHz, q, gainDb);
            default -> Sections.lowShelf(frequencyHz, gainDb);
        };
    }

    /** Worst case reached and bound, in dB, as published with the formula; notch of 1 Hz and peak of Q 1. */
    @Test
    void slackOnNamedCasesIsAsPrinted() {
        Section at50 = Sections.notch(50, 1);
        Section at60 = Sections.notch(60, 1);
        assertEquals(9.5, db(bound(at50, at60, 1393)), 0.06);
        List<double[]> notch = ramp(at50, at60, 130_000, 1393, 20_000);
        double reachedNotch = db(reached(notch, 130_000, 997));
        assertEquals(7.1, reachedNotch, 0.15);

        Section flat = Sections.peak(1000, 1, 0);
        Section raised = Sections.peak(1000, 1, 12);
        int shortest = shortest(flat, raised);
        assertEquals(17.1, db(bound(flat, raised, shortest)), 0.06);
        assertEquals(13.5, db(reached(ramp(flat, raised, 1000, shortest, 2000), 1000, 11)), 0.2);

        Section low = Sections.lowPass(200, 0.7);
        Section high = Sections.lowPass(5000, 0.7);
        int frames = shortest(low, high);
        // The printed pair leaves the ramp's length open, which moves both by some tenths.
        assertEquals(9.5, db(bound(low, high, frames)), 0.25);
        assertEquals(4.5, db(reached(ramp(low, high, 3000, frames, 200), 2990, 1)), 0.25);
    }

    /** The length at which a free state has lost what the ramp can add. */
    private static int shortest(Section from, Section to) {
        return (int) Math.ceil(Distance.between(from, to) / -Math.log(Math.max(from.a2(), to.a2())));
    }

    @Test
    void boundOfARestingSectionCoversItsImpulseResponse() {
        for (Section section : Arrays.asList(
                Sections.notch(1000, 50), Sections.lowPass(500, 3), Sections.peak(2000, 2, 9), Section.PASS_THROUGH)) {
            double worst = Runs.worstOutput(Runs.repeat(section, 5000), 4999);
            double bound = bound(section, section, 1);
            assertTrue(worst <= bound * (1 + 1e-12) && bound < 2 * worst, worst + " and " + bound);
        }
    }
}
