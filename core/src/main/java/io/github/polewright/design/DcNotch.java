package io.github.polewright.design;

import io.github.polewright.Section;

/**
 * The notch at 0 Hz: a zero at {@code z = 1} and a pole beside it. Removes a constant offset and what is slower than
 * the corner; the gain is 0 at DC, the square root of 1/2 (-3.0103 dB) at the corner and 1 at Nyquist.
 *
 * <p>{@code H(z) = g (1 - z^-1) / (1 - R z^-1)} with {@code t = tan(pi cornerHz / sampleRateHz)},
 * {@code R = (1 - t) / (1 + t)} and {@code g = (1 + R) / 2}: the bilinear transform of {@code s / (s + 1)}, the
 * first-order Butterworth high-pass. The common {@code R = 1 - 2 pi cornerHz / sampleRateHz} only approaches it.
 *
 * <p><b>Units</b> hertz. <b>Threads</b> pure functions. <b>Errors</b> {@link IllegalArgumentException}. <b>Numbers</b>
 * the zero is exactly at 1, and the gain at Nyquist is 1 but for one rounding.
 */
public final class DcNotch {

    private DcNotch() {}

    /**
     * By the corner.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param cornerHz where the gain is -3.0103 dB, in hertz, above 0 and below half the sample rate
     * @return a first-order section
     * @throws IllegalArgumentException if {@code sampleRateHz} is not positive and finite, {@code cornerHz} is not
     *     above 0 and below half of it, or the pole rounds to the unit circle
     */
    public static Section byCorner(double sampleRateHz, double cornerHz) {
        Check.sampleRate(sampleRateHz);
        Check.belowNyquist("cornerHz", cornerHz, sampleRateHz);
        double t = HalfAngle.of(sampleRateHz, cornerHz).tan();
        double pole = (1 - t) / (1 + t);
        double gain = (1 + pole) / 2;
        return Check.stable(
                Section.of(gain, -gain, 0, -pole, 0), "cornerHz", cornerHz, "farther from 0 and from Nyquist");
    }
}
