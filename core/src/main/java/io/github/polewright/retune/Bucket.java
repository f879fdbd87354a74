package io.github.polewright.retune;

import io.github.polewright.slab.Ranges;

/**
 * What recent changes together can have done to each section, and a limit on it. A single certified change bounds
 * itself; a chain of them does not, however small each one is.
 *
 * <p>For each section a level G: a change over the distance d adds d/2, and every frame takes away half of the decay
 * that the section would have if its coefficients stood still. A change is admitted only while G + d/2 stays within the
 * limit, or while G is 0. The gain of the state since any earlier moment is then at most e^G, with half of the frozen
 * decay left over for the input. Half of the decay is needed: with all of it spent on changes, a bounded input can
 * still drive the output without limit. Derived for this project.
 *
 * <p><b>Units</b> levels are natural logarithms of a factor. <b>Threads</b> one at a time, made for the audio thread.
 * <b>Allocation</b> none after construction. <b>Errors</b> an index outside the sections is refused.
 */
public final class Bucket {

    /** ln 2: recent changes together at most double the state of any section. */
    public static final double USUAL_LIMIT = 0.6931471805599453;

    private final double limit;
    private final double[] levels;
    private final double[] leaks;
    private long passed;

    /**
     * An empty bucket.
     *
     * @param sections how many sections it keeps, at least 1
     * @param limit the level up to which it admits changes, positive and finite
     * @throws IllegalArgumentException if {@code sections < 1}, or {@code limit} is not positive and finite
     */
    public Bucket(int sections, double limit) {
        if (sections < 1) {
            throw new IllegalArgumentException("sections is " + sections + "; it must be at least 1");
        }
        if (!(limit > 0 && limit < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("limit is " + limit + "; it must be positive and finite");
        }
        this.limit = limit;
        this.levels = new double[sections];
        this.leaks = new double[sections];
    }

    /**
     * The leak of a section while its coefficients lie on the straight ramp between two sets: half of the natural
     * logarithm of 1 over the largest sigma there, from below.
     *
     * @param a1 of one end
     * @param a2 of one end
     * @param c1 of the other end; the same numbers for coefficients that stand still
     * @param c2 of the other end
     * @return the loss in one frame
     */
    public static double leak(double a1, double a2, double c1, double c2) {
        return RampLength.leak(Poles.leastDecay(a1, a2, c1, c2));
    }

    /**
     * Lets time pass at the present leaks. Adds up whole frames, so that the way a stream is cut into blocks changes
     * nothing.
     *
     * @param frames how many, 0 or more
     */
    public void pass(long frames) {
        passed += frames;
    }

    /**
     * Sets what a section loses from here on.
     *
     * @param section its index
     * @param leakPerFrame from {@link #leak}
     */
    public void leakAt(int section, double leakPerFrame) {
        checkSection(section);
        settle();
        leaks[section] = leakPerFrame;
    }

    /**
     * Whether a change would be admitted now.
     *
     * @param section its index
     * @param distance d of the change, or an upper bound of it
     * @return true if {@link #charge} keeps the promise
     */
    public boolean admits(int section, double distance) {
        checkSection(section);
        settle();
        return levels[section] == 0 || levels[section] + 0.5 * distance <= limit;
    }

    /**
     * How long the section must stand still before the change is admitted, at its present leak.
     *
     * @param section its index
     * @param distance d of the change, or an upper bound of it
     * @return frames, 0 if it is admitted now, at most {@link Integer#MAX_VALUE}
     */
    public int framesUntil(int section, double distance) {
        if (admits(section, distance)) {
            return 0;
        }
        double excess = Math.min(levels[section], levels[section] + 0.5 * distance - limit);
        return (int) Math.max(1, Math.ceil(excess / leaks[section] * (1 + 1e-12)));
    }

    /**
     * Takes a change into account, once for a whole straight segment and before its first frame.
     *
     * @param section its index
     * @param distance d of the change, or an upper bound of it
     */
    public void charge(int section, double distance) {
        checkSection(section);
        settle();
        levels[section] += 0.5 * distance;
    }

    /**
     * The level of a section.
     *
     * @param section its index
     * @return G; the state has grown at most e^G-fold by changes
     */
    public double level(int section) {
        checkSection(section);
        // Not settled: when a level is asked for must not change how its sums are rounded.
        return Math.max(0, levels[section] - leaks[section] * passed);
    }

    /** Empties the bucket, as when the state it speaks of is cleared. */
    public void clear() {
        passed = 0;
        for (int i = 0; i < levels.length; i++) {
            levels[i] = 0;
        }
    }

    private void checkSection(int section) {
        // Not called where it holds: the JVM allocates as it compiles a busy method that takes a String.
        if (section < 0 || section >= levels.length) {
            Ranges.index("section", section, levels.length);
        }
    }

    private void settle() {
        if (passed == 0) {
            return;
        }
        double frames = passed;
        passed = 0;
        for (int i = 0; i < levels.length; i++) {
            levels[i] = Math.max(0, levels[i] - leaks[i] * frames);
        }
    }
}
