package io.github.polewright.design;

import io.github.polewright.Section;

/**
 * The resonator, a band-pass of one pole pair: gain 1 at its centre, 0 at DC and at Nyquist, and -3.0103 dB at two
 * edges that lie exactly {@code widthHz} apart wherever the centre is.
 *
 * <p>It is {@code (1 - A) / 2} of the second-order all-pass {@code A} with
 * {@code a2 = (1 - t) / (1 + t)}, {@code t = tan(pi widthHz / sampleRateHz)} and
 * {@code a1 = -(1 + a2) cos(2 pi centreHz / sampleRateHz)} (the all-pass form of a peak and notch pair; P. A. Regalia,
 * S. K. Mitra, P. P. Vaidyanathan, "The digital all-pass filter", Proc. IEEE 76(1), 1988; citation from memory). A
 * resonator and a {@link HumNotch} of one centre and width add up to the input.
 *
 * <p><b>Units</b> hertz. <b>Threads</b> pure functions. <b>Errors</b> {@link IllegalArgumentException}. <b>Numbers</b>
 * a narrow resonator answers slowly: its time constant is about {@code 1 / (pi widthHz)} seconds.
 */
public final class Resonator {

    private Resonator() {}

    /**
     * By the width in hertz.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz the centre in hertz, above 0 and below half the sample rate
     * @param widthHz the distance of the -3.0103 dB edges in hertz, above 0 and below half the sample rate
     * @return a second-order section
     * @throws IllegalArgumentException if {@code sampleRateHz} is not positive and finite, {@code centreHz} or
     *     {@code widthHz} is not above 0 and below half of it, or the width is so small that the poles round to the
     *     unit circle
     */
    public static Section byWidth(double sampleRateHz, double centreHz, double widthHz) {
        Check.sampleRate(sampleRateHz);
        Check.belowNyquist("centreHz", centreHz, sampleRateHz);
        Check.belowNyquist("widthHz", widthHz, sampleRateHz);
        return AllPassPair.of(sampleRateHz, centreHz, widthHz).resonator("widthHz", widthHz);
    }

    /**
     * By the quality factor, which is the centre divided by the width.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz the centre in hertz, above 0 and below half the sample rate
     * @param q the quality factor, above {@code 2 centreHz / sampleRateHz}
     * @return a second-order section
     * @throws IllegalArgumentException if {@code sampleRateHz} is not positive and finite, {@code centreHz} is not
     *     above 0 and below half of it, {@code q} is not positive and finite, or the width {@code centreHz / q} is not
     *     one that {@link #byWidth} takes
     */
    public static Section byQ(double sampleRateHz, double centreHz, double q) {
        Check.sampleRate(sampleRateHz);
        Check.belowNyquist("centreHz", centreHz, sampleRateHz);
        Check.quality(q, centreHz, sampleRateHz);
        return AllPassPair.of(sampleRateHz, centreHz, centreHz / q).resonator("q", q);
    }
}
