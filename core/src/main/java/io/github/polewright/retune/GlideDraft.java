package io.github.polewright.retune;

import io.github.polewright.Cascade;
import java.util.ArrayList;
import java.util.List;

/** A glide while it is put together, segment by segment; certifies each as it is added. */
final class GlideDraft {

    private static final int WIDTH = Knots.WIDTH;

    private final int sections;
    private final List<double[]> knots = new ArrayList<>();
    private final List<Integer> frames = new ArrayList<>();
    private final List<double[]> distances = new ArrayList<>();
    private final List<double[]> leaks = new ArrayList<>();
    private final long[] shortest;
    private long movingFrames;

    GlideDraft(double[] first) {
        sections = first.length / WIDTH;
        shortest = new long[sections];
        knots.add(first);
    }

    /** The least frames of each section so far. */
    long[] shortest() {
        return shortest.clone();
    }

    /** A jump that changes nothing that can be heard. */
    void swap(double[] knot) {
        double[] leak = new double[sections];
        for (int i = 0; i < sections; i++) {
            leak[i] = Bucket.leak(a1(knot, i), a2(knot, i), a1(knot, i), a2(knot, i));
        }
        add(knot, 0, new double[sections], leak);
    }

    /** Coefficients stand still. */
    void hold(int wish) {
        double[] here = here();
        swap(here);
        frames.set(frames.size() - 1, wish);
    }

    /** A straight segment of the wished number of frames, or as many as its certificate asks for. */
    void move(double[] knot, double wish, boolean mayJump, boolean last) {
        double[] here = here();
        double[] distance = new double[sections];
        double[] leak = new double[sections];
        int least = GlidePlan.wholeFrames(-1, Math.max(1, wish));
        for (int i = 0; i < sections; i++) {
            double a1 = a1(here, i);
            double a2 = a2(here, i);
            double c1 = a1(knot, i);
            double c2 = a2(knot, i);
            distance[i] = Distance.between(a1, a2, c1, c2);
            leak[i] = Bucket.leak(a1, a2, c1, c2);
            int needed = 0;
            if (distance[i] > 0 && mayJump && GlidePlan.mayJump(a1, a2, c1, c2)) {
                needed = 1;
            } else if (distance[i] > 0) {
                needed = GlidePlan.wholeFrames(i, RampLength.frames(distance[i], a1, a2, c1, c2)) + (last ? 1 : 0);
            }
            shortest[i] += needed;
            least = Math.max(least, needed);
        }
        add(knot, least, distance, leak);
        movingFrames = frames.stream().mapToLong(Integer::longValue).sum();
    }

    Glide finish(Cascade from, Cascade target, long[] certified, boolean straight) {
        return finish(from, target, certified, straight, new boolean[sections]);
    }

    /** Exchanged sections are other ones after the hold than before. */
    Glide finish(Cascade from, Cascade target, long[] certified, boolean straight, boolean[] exchanged) {
        int[] lengths = frames.stream().mapToInt(Integer::intValue).toArray();
        Knots path = new Knots(lengths, knots.toArray(new double[0][]));
        Certificate[] certificates = new Certificate[sections];
        for (int i = 0; i < sections; i++) {
            certificates[i] = exchanged[i]
                    ? new Certificate(i, Certificate.Rule.EXCHANGE, 0, 1, 0, path)
                    : certificate(i, path, certified[i], straight);
        }
        return new Glide(
                from,
                target,
                path,
                distances.toArray(new double[0][]),
                leaks.toArray(new double[0][]),
                movingFrames,
                certificates);
    }

    private Certificate certificate(int section, Knots path, long certified, boolean straight) {
        double distance = 0;
        int firstMove = -1;
        int lastMove = -1;
        for (int i = 0; i < distances.size(); i++) {
            if (distances.get(i)[section] > 0) {
                distance += distances.get(i)[section];
                firstMove = firstMove < 0 ? i : firstMove;
                lastMove = i + 1;
            }
        }
        if (firstMove < 0) {
            return new Certificate(section, Certificate.Rule.STILL, 0, 1, 0, path);
        }
        double[] start = path.at(firstMove);
        double[] end = path.at(lastMove);
        double before = Poles.height(a1(start, section), a2(start, section));
        double after = Poles.height(a1(end, section), a2(end, section));
        double ringing = Math.max(1, Math.exp(0.5 * distance) * Math.sqrt(before / after));
        Certificate.Rule rule = straight && certified == 1 ? Certificate.Rule.PAIR : Certificate.Rule.RAMP;
        return new Certificate(section, rule, distance, ringing, certified, path);
    }

    private void add(double[] knot, int length, double[] distance, double[] leak) {
        knots.add(knot);
        frames.add(length);
        distances.add(distance);
        leaks.add(leak);
    }

    private double[] here() {
        return knots.get(knots.size() - 1);
    }

    private static double a1(double[] knot, int section) {
        return knot[section * WIDTH + 3];
    }

    private static double a2(double[] knot, int section) {
        return knot[section * WIDTH + 4];
    }
}
