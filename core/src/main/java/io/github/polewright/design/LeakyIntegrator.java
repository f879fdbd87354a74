package io.github.polewright.design;

import io.github.polewright.Section;

/**
 * The leaky integrator {@code y = lambda y + (1 - lambda) x}: one pole, gain exactly 1 at DC, falling towards Nyquist.
 *
 * <p>Use it to smooth a slow quantity. As a low-pass for audio prefer {@link Cookbook#lowPass}: this one has no zero
 * at Nyquist, where its gain is still {@code (1 - lambda) / (1 + lambda)}.
 *
 * <p><b>Units</b> hertz. <b>Threads</b> pure functions. <b>Errors</b> {@link IllegalArgumentException}. <b>Numbers</b>
 * the gain at DC is 1 without rounding for {@code lambda >= 0.5}.
 */
public final class LeakyIntegrator {

    private LeakyIntegrator() {}

    /**
     * By the corner: the gain is the square root of 1/2 (-3.0103 dB) at exactly {@code cornerHz}.
     *
     * <p>Solves {@code (1 - lambda)^2 / (1 - 2 lambda cos w + lambda^2) = 1/2} for the pole inside the unit circle:
     * with
     * {@code k = 1 - cos w = 2 sin^2(w/2)}, {@code 1 - lambda = 2k / (k + sqrt(k (k + 2)))} (derived for this project).
     * A solution exists for every corner below Nyquist; the common {@code lambda = exp(-w)} misses the corner the more
     * the higher it is.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param cornerHz the corner in hertz, above 0 and below half the sample rate
     * @return a first-order section
     * @throws IllegalArgumentException if {@code sampleRateHz} is not positive and finite, {@code cornerHz} is not
     *     above 0 and below half of it, or the corner is so low that the pole rounds to 1
     */
    public static Section byCorner(double sampleRateHz, double cornerHz) {
        Check.sampleRate(sampleRateHz);
        Check.belowNyquist("cornerHz", cornerHz, sampleRateHz);
        double sin = HalfAngle.of(sampleRateHz, cornerHz).sin();
        double k = 2 * sin * sin;
        double lambda = 1 - 2 * k / (k + sin * Math.sqrt(2 * (k + 2)));
        if (!(lambda < 1)) {
            throw Check.refused("cornerHz", cornerHz, "higher at this sample rate; the pole rounds to 1");
        }
        return of(lambda);
    }

    /**
     * By the share of the last output that is kept.
     *
     * @param lambda the pole, from 0 (passes through) to below 1; the time constant is {@code -1 / ln lambda} frames
     * @return a first-order section
     * @throws IllegalArgumentException if {@code lambda} is NaN, {@code lambda < 0} or {@code lambda >= 1}
     */
    public static Section byLambda(double lambda) {
        if (!(lambda >= 0 && lambda < 1)) {
            throw Check.refused("lambda", lambda, "at least 0 and below 1");
        }
        return of(lambda);
    }

    private static Section of(double lambda) {
        return Section.of(1 - lambda, 0, 0, -lambda, 0);
    }
}
