package io.github.polewright.retune;

import java.util.ArrayList;
import java.util.List;

/** Sequences of coefficient sets, b0, b1, b2, a1, a2, one a frame, and what they do in direct form I. */
final class Runs {

    private Runs() {}

    /** The coefficients a walk uses, frame by frame, for one slot. */
    static List<double[]> frames(Walk walk, int slot, int count, int mostFrames) {
        List<double[]> frames = new ArrayList<>();
        while (frames.size() < count) {
            int stretch = walk.next(Math.min(mostFrames, count - frames.size()));
            for (int i = 0; i < stretch; i++) {
                double[] set = new double[5];
                for (int k = 0; k < 5; k++) {
                    int at = slot * 5 + k;
                    set[k] = Math.fma(walk.position() + 1 + i, walk.steps()[at], walk.bases()[at]);
                }
                frames.add(set);
            }
        }
        return frames;
    }

    /**
     * The largest |y| of the last frame over all inputs with |x| at most 1: the sum of the sizes of its row of the
     * impulse response, found backwards through the adjoint.
     */
    static double worstOutput(List<double[]> frames, int last) {
        double sum = 0;
        double nearer = 0;
        double here = 1;
        double[] first = frames.get(last);
        double ahead1 = 0;
        double[] next = null;
        double[] afterNext = null;
        double[] current = first;
        for (int k = last; k >= 0; k--) {
            current = frames.get(k);
            double taken = here * current[0]
                    + (next == null ? 0 : nearer * next[1])
                    + (afterNext == null ? 0 : ahead1 * afterNext[2]);
            sum += Math.abs(taken);
            double before = -current[3] * here - (next == null ? 0 : next[4] * nearer);
            ahead1 = nearer;
            nearer = here;
            here = before;
            afterNext = next;
            next = current;
        }
        return sum;
    }

    /** The product of the state matrices from frame {@code from} to before {@code to}. */
    static Plane product(List<double[]> frames, int from, int to) {
        Plane product = Plane.IDENTITY;
        for (int i = from; i < to; i++) {
            product = Plane.state(frames.get(i)[3], frames.get(i)[4]).times(product);
        }
        return product;
    }

    static List<double[]> repeat(io.github.polewright.Section section, int count) {
        double[] set = {section.b0(), section.b1(), section.b2(), section.a1(), section.a2()};
        List<double[]> frames = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            frames.add(set);
        }
        return frames;
    }
}
