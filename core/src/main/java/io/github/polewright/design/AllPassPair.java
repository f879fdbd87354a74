package io.github.polewright.design;

import io.github.polewright.Section;

/**
 * The second-order all-pass {@code A(z) = (a2 + a1 z^-1 + z^-2) / (1 + a1 z^-1 + a2 z^-2)} and what is made of it:
 * the notch {@code (1 + A) / 2} and the resonator {@code (1 - A) / 2}, which add up to 1.
 *
 * <p>{@code t = tan(pi widthHz / sampleRateHz)}, {@code a2 = (1 - t) / (1 + t)},
 * {@code a1 = -(1 + a2) cos(2 pi centreHz / sampleRateHz)}. Written with {@code keep = 1 / (1 + t)} and
 * {@code cut = 1 - keep}, of which the larger is rounded once and the rest follows without rounding, so the gains at
 * DC, Nyquist and the peak hold for the coefficients as stored.
 */
record AllPassPair(double keep, double cut, double a1) {

    private static final String WIDER = "larger for this sample rate";

    static AllPassPair of(double sampleRateHz, double centreHz, double widthHz) {
        double t = HalfAngle.of(sampleRateHz, widthHz).tan();
        double keep = t <= 1 ? 1 / (1 + t) : 1 - t / (1 + t);
        double cut = t <= 1 ? 1 - keep : t / (1 + t);
        HalfAngle centre = HalfAngle.of(sampleRateHz, centreHz);
        // -2 keep cos w, rounded once where cos w is near 1 or -1 and a low or high centre depends on it.
        double a1;
        if (centre.sin() < 0.5) {
            a1 = Math.fma(4 * keep * centre.sin(), centre.sin(), -2 * keep);
        } else if (centre.cos() < 0.5) {
            a1 = Math.fma(-4 * keep * centre.cos(), centre.cos(), 2 * keep);
        } else {
            a1 = -2 * keep * centre.cosOfWhole();
        }
        return new AllPassPair(keep, cut, a1);
    }

    /** The notch with the gain {@code floor} left at its centre: {@code notch + floor * resonator}. */
    Section notch(double floor, String name, double value) {
        double b0 = keep + floor * cut;
        // b0 + b2 stays 2 keep without rounding: exactly 1 at DC and Nyquist.
        return Check.stable(Section.of(b0, a1, 2 * keep - b0, a1, keep - cut), name, value, WIDER);
    }

    Section resonator(String name, double value) {
        return Check.stable(Section.of(cut, 0, -cut, a1, keep - cut), name, value, WIDER);
    }
}
