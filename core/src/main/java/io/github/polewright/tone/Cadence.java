package io.github.polewright.tone;

import java.util.Arrays;
import java.util.Objects;

/**
 * A call-progress signal by its numbers: the frequencies that sound together, and for how long they are on and off in
 * turn. National plans are given by the caller, for example from the list of tones that ITU-T publishes as a supplement to
 * E.180.
 *
 * <p><b>Units</b> hertz, seconds. <b>Threads</b> immutable.
 */
public final class Cadence {

    private final double[] frequenciesHz;
    private final double[] intervalsSeconds;
    private final double tolerance;

    private Cadence(double[] frequenciesHz, double[] intervalsSeconds, double tolerance) {
        this.frequenciesHz = frequenciesHz;
        this.intervalsSeconds = intervalsSeconds;
        this.tolerance = tolerance;
    }

    /**
     * Tones that go on and off.
     *
     * @param frequenciesHz 1 to 4 frequencies that sound together, each 100 to 3000 Hz
     * @param onOffSeconds on, off, on, off and so on, an even number of intervals of 0.08 to 20 s each
     * @return the cadence, with a tolerance of 15 %
     * @throws IllegalArgumentException if a count or a value is outside its range
     */
    public static Cadence of(double[] frequenciesHz, double... onOffSeconds) {
        Objects.requireNonNull(frequenciesHz, "frequenciesHz");
        Objects.requireNonNull(onOffSeconds, "onOffSeconds");
        if (onOffSeconds.length < 2 || onOffSeconds.length > 16 || onOffSeconds.length % 2 != 0) {
            throw new IllegalArgumentException(
                    "onOffSeconds has " + onOffSeconds.length + " intervals; it must have an even number, 2 to 16");
        }
        for (double seconds : onOffSeconds) {
            Tone.check("onOffSeconds", seconds, 0.08, 20);
        }
        return new Cadence(checked(frequenciesHz), onOffSeconds.clone(), 0.15);
    }

    /**
     * Tones without a break.
     *
     * @param frequenciesHz 1 to 4 frequencies that sound together, each 100 to 3000 Hz
     * @param leastSeconds how long they must last to be told, 0.1 to 20 s
     * @return the cadence
     * @throws IllegalArgumentException if a count or a value is outside its range
     */
    public static Cadence unbroken(double[] frequenciesHz, double leastSeconds) {
        Tone.check("leastSeconds", leastSeconds, 0.1, 20);
        return new Cadence(checked(frequenciesHz), new double[] {leastSeconds}, 0);
    }

    private static double[] checked(double[] frequenciesHz) {
        Objects.requireNonNull(frequenciesHz, "frequenciesHz");
        if (frequenciesHz.length < 1 || frequenciesHz.length > 4) {
            throw new IllegalArgumentException(
                    "frequenciesHz has " + frequenciesHz.length + " frequencies; it must have 1 to 4");
        }
        for (double hertz : frequenciesHz) {
            Tone.check("frequenciesHz", hertz, 100, 3000);
        }
        return frequenciesHz.clone();
    }

    /**
     * The same cadence with another tolerance: an interval may differ by this share, and by 10 ms besides.
     *
     * @param tolerance 0 to 0.5, a share of the interval
     * @return the changed copy
     * @throws IllegalArgumentException if the value is outside its range
     */
    public Cadence withTolerance(double tolerance) {
        Tone.check("tolerance", tolerance, 0, 0.5);
        return new Cadence(frequenciesHz, intervalsSeconds, tolerance);
    }

    /**
     * The frequencies that sound together.
     *
     * @return hertz, a copy
     */
    public double[] frequenciesHz() {
        return frequenciesHz.clone();
    }

    /**
     * On and off in turn; one interval, the least, if unbroken.
     *
     * @return seconds, a copy
     */
    public double[] intervalsSeconds() {
        return intervalsSeconds.clone();
    }

    /**
     * Whether the tones sound without a break.
     *
     * @return true if there is no pattern
     */
    public boolean isUnbroken() {
        return intervalsSeconds.length == 1;
    }

    /**
     * By how much an interval may differ.
     *
     * @return a share of the interval
     */
    public double tolerance() {
        return tolerance;
    }

    @Override
    public String toString() {
        return Arrays.toString(frequenciesHz) + " Hz, " + Arrays.toString(intervalsSeconds) + " s";
    }
}
