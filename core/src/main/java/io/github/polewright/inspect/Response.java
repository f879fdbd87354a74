package io.github.polewright.inspect;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.slab.Ranges;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.function.DoubleUnaryOperator;

/**
 * What a cascade does, as numbers: its response at any frequency, its poles and zeros, how long it rings, how much
 * round-off it makes and how loud it can get.
 *
 * <p>The response is that of the coefficients as stored, evaluated in half-angle forms and error-free sums, so that a
 * 5 Hz notch at 192 kHz is as accurate as one in the middle of the band.
 *
 * <p><b>Units</b> hertz, from 0 to half the sample rate; decibels of amplitude ({@code 20 log10}); radians; delays in
 * frames; times in seconds. <b>Threads</b> immutable. <b>Allocation</b> yes: not for the audio thread. <b>Errors</b> a
 * frequency that is NaN, negative or above half the sample rate is refused. <b>Numbers</b> an unstable cascade has a
 * response too, though nothing settles to it; its ring time, noise gain and worst output are infinite.
 */
public final class Response {

    private final Cascade cascade;
    private final List<Quadratic> numerators = new ArrayList<>();
    private final List<Quadratic> denominators = new ArrayList<>();

    private Response(Cascade cascade) {
        this.cascade = cascade;
        for (Section section : cascade.sections()) {
            numerators.add(new Quadratic(section.b0(), section.b1(), section.b2()));
            denominators.add(new Quadratic(1, section.a1(), section.a2()));
        }
    }

    /**
     * The response of a cascade.
     *
     * @param cascade what to inspect
     * @return its response
     */
    public static Response of(Cascade cascade) {
        return new Response(Objects.requireNonNull(cascade, "cascade"));
    }

    /**
     * The response of one section.
     *
     * @param sampleRateHz the sample rate its coefficients were made for, in hertz
     * @param section what to inspect
     * @return its response
     * @throws IllegalArgumentException if {@code sampleRateHz} is not positive and finite
     */
    public static Response of(double sampleRateHz, Section section) {
        return new Response(Cascade.of(sampleRateHz, Objects.requireNonNull(section, "section")));
    }

    /**
     * The complex response {@code H(e^{jw})}, {@code w = 2 pi frequencyHz / sampleRateHz}.
     *
     * @param frequencyHz from 0 to half the sample rate
     * @return gain and phase as a complex number
     * @throws IllegalArgumentException if {@code frequencyHz} is not in its range
     */
    public Complex at(double frequencyHz) {
        UnitPoint point = UnitPoint.of(cascade.sampleRateHz(), frequencyHz);
        Complex product = new Complex(1, 0);
        for (int i = 0; i < numerators.size(); i++) {
            product = product.times(
                    numerators.get(i).at(point).dividedBy(denominators.get(i).at(point)));
        }
        return product;
    }

    /**
     * The gain in decibels.
     *
     * @param frequencyHz from 0 to half the sample rate
     * @return {@code 20 log10 |H|}; minus infinity at a zero on the unit circle
     * @throws IllegalArgumentException if {@code frequencyHz} is not in its range
     */
    public double db(double frequencyHz) {
        return dbOfFirst(numerators.size(), frequencyHz);
    }

    /**
     * The gain in decibels on a grid.
     *
     * @param frequenciesHz each from 0 to half the sample rate
     * @return one gain a frequency
     * @throws IllegalArgumentException if a frequency is not in its range
     */
    public double[] db(double[] frequenciesHz) {
        return onGrid(frequenciesHz, this::db);
    }

    /** The gain from the input to the output of the section before {@code sections}. */
    double dbOfFirst(int sections, double frequencyHz) {
        UnitPoint point = UnitPoint.of(cascade.sampleRateHz(), frequencyHz);
        double db = 0;
        for (int i = 0; i < sections; i++) {
            double ratio = numerators.get(i).at(point).magnitude()
                    / denominators.get(i).at(point).magnitude();
            db += 20 * Math.log10(ratio);
        }
        return db;
    }

    /**
     * The phase, as a principal value.
     *
     * @param frequencyHz from 0 to half the sample rate
     * @return radians from -pi to pi; positive leads
     * @throws IllegalArgumentException if {@code frequencyHz} is not in its range
     */
    public double phaseRadians(double frequencyHz) {
        UnitPoint point = UnitPoint.of(cascade.sampleRateHz(), frequencyHz);
        double phase = 0;
        for (int i = 0; i < numerators.size(); i++) {
            phase += numerators.get(i).at(point).argument()
                    - denominators.get(i).at(point).argument();
        }
        return Math.IEEEremainder(phase, 2 * Math.PI);
    }

    /**
     * The phase on a grid, as principal values.
     *
     * @param frequenciesHz each from 0 to half the sample rate
     * @return one phase a frequency, in radians
     * @throws IllegalArgumentException if a frequency is not in its range
     */
    public double[] phaseRadians(double[] frequenciesHz) {
        return onGrid(frequenciesHz, this::phaseRadians);
    }

    /**
     * The group delay, minus the derivative of the phase, in closed form.
     *
     * @param frequencyHz from 0 to half the sample rate
     * @return frames; negative where the phase rises. At a zero on the unit circle the jump of the phase is left out
     * @throws IllegalArgumentException if {@code frequencyHz} is not in its range
     */
    public double groupDelayFrames(double frequencyHz) {
        UnitPoint point = UnitPoint.of(cascade.sampleRateHz(), frequencyHz);
        double delay = 0;
        for (int i = 0; i < numerators.size(); i++) {
            delay += denominators.get(i).phaseSlopeAt(point) - numerators.get(i).phaseSlopeAt(point);
        }
        return delay;
    }

    /**
     * The group delay on a grid.
     *
     * @param frequenciesHz each from 0 to half the sample rate
     * @return one delay a frequency, in frames
     * @throws IllegalArgumentException if a frequency is not in its range
     */
    public double[] groupDelayFrames(double[] frequenciesHz) {
        return onGrid(frequenciesHz, this::groupDelayFrames);
    }

    private static double[] onGrid(double[] frequenciesHz, DoubleUnaryOperator value) {
        double[] values = new double[Objects.requireNonNull(frequenciesHz, "frequenciesHz").length];
        for (int i = 0; i < values.length; i++) {
            values[i] = value.applyAsDouble(frequenciesHz[i]);
        }
        return values;
    }

    /**
     * The poles in the z plane, section by section, solved without cancellation.
     *
     * @return up to two a section; the upper of a conjugate pair first, the larger of a real pair first. A pole and a
     *     zero of one section that are both exactly at the origin are left out
     */
    public List<Complex> poles() {
        return roots(denominators);
    }

    /**
     * The zeros in the z plane, section by section, solved without cancellation.
     *
     * @return up to two a section, as for {@link #poles()}; zeros at infinity are left out
     */
    public List<Complex> zeros() {
        return roots(numerators);
    }

    private List<Complex> roots(List<Quadratic> polynomials) {
        List<Complex> roots = new ArrayList<>();
        for (int i = 0; i < polynomials.size(); i++) {
            roots.addAll(polynomials.get(i).roots(degree(i)));
        }
        return List.copyOf(roots);
    }

    private int degree(int section) {
        Quadratic b = numerators.get(section);
        Quadratic a = denominators.get(section);
        if (b.c2() != 0 || a.c2() != 0) {
            return 2;
        }
        return b.c1() != 0 || a.c1() != 0 ? 1 : 0;
    }

    /**
     * How long the slowest pole takes to fall by 60 dB, {@code ln(1000) / (-ln |p| * sampleRateHz)}. The envelope of
     * one pole pair: a pole that a zero covers counts as well, and several equally slow poles together take longer.
     *
     * @return seconds; 0 without poles off the origin, infinite if the cascade is not stable
     */
    public double ringTimeSeconds() {
        return Math.log(1000) / (slowestDecay() * cascade.sampleRateHz());
    }

    /** Minus the logarithm of the largest pole's size, a frame; 0 if the cascade is not stable. */
    double slowestDecay() {
        double slowest = cascade.isStable() ? Double.POSITIVE_INFINITY : 0;
        for (Quadratic denominator : denominators) {
            if (slowest > 0) {
                slowest = Math.min(slowest, denominator.slowestDecay());
            }
        }
        return slowest;
    }

    /**
     * The gain in power of the rounding noise that one section's recursion makes, from its adder to the output of the
     * cascade: the sum of the squared impulse response of {@code 1 / A} of that section through the following ones. For
     * the last section it is {@code (1 + a2) / ((1 - a2) ((1 + a2)^2 - a1^2))}. White rounding noise of variance
     * {@code v} at that adder makes a noise of variance {@code v * noiseGain} at the output, in direct form I and in
     * transposed direct form II.
     *
     * @param section the section's index
     * @return a factor in power; infinite if the cascade is not stable
     * @throws IndexOutOfBoundsException if {@code section < 0} or it is not below the section count
     */
    public double noiseGain(int section) {
        Ranges.index("section", section, cascade.sectionCount());
        return new NoiseGain(cascade).ofSection(section);
    }

    /**
     * The sum of {@link #noiseGain(int)} over all sections, as for independent rounding noises of one variance.
     *
     * @return a factor in power; infinite if the cascade is not stable
     */
    public double noiseGain() {
        NoiseGain gains = new NoiseGain(cascade);
        double sum = 0;
        for (int i = 0; i < cascade.sectionCount(); i++) {
            sum += gains.ofSection(i);
        }
        return sum;
    }

    /**
     * The largest gain from the input to the output of any section, over all frequencies: how much headroom a cascade
     * needs inside for a sine. Found by search around the poles and over a grid, so narrow peaks are not missed.
     *
     * @return decibels
     */
    public double peakInternalDb() {
        return new PeakSearch(this, cascade).largestDb();
    }

    /**
     * The largest sample that any input within -1 to 1 can bring out, the sum of the impulse response's sizes. Summed
     * frame by frame until the rest is below 1e-9 of it, which takes time in proportion to the ring time.
     *
     * @return a linear factor; infinite if the cascade is not stable
     * @throws IllegalStateException if the cascade rings for more than 100 million frames
     */
    public double worstOutput() {
        return WorstOutput.of(cascade, slowestDecay());
    }
}
