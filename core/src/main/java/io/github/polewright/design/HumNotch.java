package io.github.polewright.design;

import io.github.polewright.Section;

/**
 * The hum notch: takes out one frequency, gain exactly 1 at DC and at Nyquist, and -3.0103 dB at two edges that lie
 * exactly {@code widthHz} apart wherever the centre is.
 *
 * <p>It is {@code (1 + A) / 2} of the all-pass described at {@link Resonator}. A line {@code d} hertz off the centre of
 * a notch keeps about {@code 2 d / widthHz} of its amplitude, so a narrow notch needs a steady or a followed line.
 *
 * <p><b>Depth limit</b> With {@code depthDb} the centre keeps {@code floor = 10^(-depthDb / 20)} of the amplitude:
 * {@code notch + floor * resonator}. The gain at DC and Nyquist stays 1 and the poles, hence the ringing, stay the
 * same. The width then means the distance of the two edges where the power is the mean of 1 and the floor's power,
 * {@code (1 + floor^2) / 2}, which is -3.0103 dB without a limit.
 *
 * <p><b>Units</b> hertz, decibels. <b>Threads</b> pure functions. <b>Errors</b> {@link IllegalArgumentException}. A
 * notch treats the symptom; hum may come from faulty wiring, which a qualified person should look at.
 */
public final class HumNotch {

    private HumNotch() {}

    /**
     * By the width in hertz, with a true zero at the centre.
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
        return ofWidth(sampleRateHz, centreHz, widthHz, 0);
    }

    /**
     * By the width in hertz, with a limited depth.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz the centre in hertz, above 0 and below half the sample rate
     * @param widthHz the distance of the edges in hertz (see the class), above 0 and below half the sample rate
     * @param depthDb how far the centre is turned down, positive and finite: 40 leaves -40 dB
     * @return a second-order section
     * @throws IllegalArgumentException as without a depth, or if {@code depthDb} is not positive and finite
     */
    public static Section byWidth(double sampleRateHz, double centreHz, double widthHz, double depthDb) {
        Check.positive("depthDb", depthDb);
        return ofWidth(sampleRateHz, centreHz, widthHz, floor(depthDb));
    }

    /**
     * By the quality factor, which is the centre divided by the width, with a true zero at the centre.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz the centre in hertz, above 0 and below half the sample rate
     * @param q the quality factor, above {@code 2 centreHz / sampleRateHz}
     * @return a second-order section
     * @throws IllegalArgumentException if {@code sampleRateHz} is not positive and finite, {@code centreHz} is not
     *     above 0 and below half of it, {@code q} is not positive and finite, or the width {@code centreHz / q} is not
     *     one that {@link #byWidth(double, double, double)} takes
     */
    public static Section byQ(double sampleRateHz, double centreHz, double q) {
        return ofQ(sampleRateHz, centreHz, q, 0);
    }

    /**
     * By the quality factor, which is the centre divided by the width, with a limited depth.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz the centre in hertz, above 0 and below half the sample rate
     * @param q the quality factor, above {@code 2 centreHz / sampleRateHz}
     * @param depthDb how far the centre is turned down, positive and finite: 40 leaves -40 dB
     * @return a second-order section
     * @throws IllegalArgumentException as without a depth, or if {@code depthDb} is not positive and finite
     */
    public static Section byQ(double sampleRateHz, double centreHz, double q, double depthDb) {
        Check.positive("depthDb", depthDb);
        return ofQ(sampleRateHz, centreHz, q, floor(depthDb));
    }

    static double floor(double depthDb) {
        return Math.pow(10, -depthDb / 20);
    }

    static Section ofWidth(double sampleRateHz, double centreHz, double widthHz, double floor) {
        Check.sampleRate(sampleRateHz);
        Check.belowNyquist("centreHz", centreHz, sampleRateHz);
        Check.belowNyquist("widthHz", widthHz, sampleRateHz);
        return AllPassPair.of(sampleRateHz, centreHz, widthHz).notch(floor, "widthHz", widthHz);
    }

    private static Section ofQ(double sampleRateHz, double centreHz, double q, double floor) {
        Check.sampleRate(sampleRateHz);
        Check.belowNyquist("centreHz", centreHz, sampleRateHz);
        Check.quality(q, centreHz, sampleRateHz);
        return AllPassPair.of(sampleRateHz, centreHz, centreHz / q).notch(floor, "q", q);
    }
}
