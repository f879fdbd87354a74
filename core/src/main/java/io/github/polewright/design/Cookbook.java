package io.github.polewright.design;

import io.github.polewright.Section;

/**
 * The nine shapes of the W3C Working Group Note "Audio EQ Cookbook" (8 June 2021, after R. Bristow-Johnson): bilinear
 * transforms of second-order analogue prototypes.
 *
 * <p>With {@code w0 = 2 pi f0 / sampleRateHz}, {@code alpha = sin w0 / (2 q)} and {@code A = 10^(gainDb / 40)} as in
 * the
 * note. {@code 1 - cos w0} and {@code 1 + cos w0} are taken as {@code 2 sin^2(w0/2)} and {@code 2 cos^2(w0/2)}, so low
 * corners lose no digits. A bandwidth in octaves or a shelf slope becomes a quality factor by {@link #qOfOctaves} or
 * {@link #qOfSlope}.
 *
 * <p>For a notch or a resonator whose width in hertz is exact see {@link HumNotch} and {@link Resonator}.
 *
 * <p><b>Units</b> hertz, decibels. <b>Threads</b> pure functions. <b>Errors</b> {@link IllegalArgumentException} in
 * every method if {@code sampleRateHz} is not positive and finite, a frequency is not above 0 and below half of it,
 * {@code q} is not positive and finite, {@code gainDb} is not finite, or the result is not stable and finite. A gain is
 * heard: start low, and mind ears and loudspeakers.
 */
public final class Cookbook {

    private Cookbook() {}

    /**
     * Low-pass: gain 1 at DC, {@code q} at the corner, 0 at Nyquist.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param cornerHz the corner in hertz, above 0 and below half the sample rate
     * @param q the quality factor; the square root of 1/2 is the flattest (Butterworth)
     * @return a second-order section
     * @throws IllegalArgumentException as told for the class
     */
    public static Section lowPass(double sampleRateHz, double cornerHz, double q) {
        Shape shape = Shape.of(sampleRateHz, "cornerHz", cornerHz, q);
        double s = shape.half().sin();
        return shape.section(s * s, 2 * s * s, s * s);
    }

    /**
     * High-pass: gain 0 at DC, {@code q} at the corner, 1 at Nyquist.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param cornerHz the corner in hertz, above 0 and below half the sample rate
     * @param q the quality factor; the square root of 1/2 is the flattest (Butterworth)
     * @return a second-order section
     * @throws IllegalArgumentException as told for the class
     */
    public static Section highPass(double sampleRateHz, double cornerHz, double q) {
        Shape shape = Shape.of(sampleRateHz, "cornerHz", cornerHz, q);
        double k = shape.half().cos();
        return shape.section(k * k, -2 * k * k, k * k);
    }

    /**
     * Band-pass of constant skirts: the gain at the centre is {@code q}.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz the centre in hertz, above 0 and below half the sample rate
     * @param q the quality factor
     * @return a second-order section
     * @throws IllegalArgumentException as told for the class
     */
    public static Section bandPassSkirt(double sampleRateHz, double centreHz, double q) {
        Shape shape = Shape.of(sampleRateHz, "centreHz", centreHz, q);
        double b = shape.half().sinOfWhole() / 2;
        return shape.section(b, 0, -b);
    }

    /**
     * Band-pass of constant peak: the gain at the centre is 1.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz the centre in hertz, above 0 and below half the sample rate
     * @param q the quality factor
     * @return a second-order section
     * @throws IllegalArgumentException as told for the class
     */
    public static Section bandPassPeak(double sampleRateHz, double centreHz, double q) {
        Shape shape = Shape.of(sampleRateHz, "centreHz", centreHz, q);
        return shape.section(shape.alpha(), 0, -shape.alpha());
    }

    /**
     * Notch: gain 1 at DC and at Nyquist, 0 at the centre. Its width is bent by the bilinear transform, unlike that of
     * {@link HumNotch#byQ(double, double, double)}.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz the centre in hertz, above 0 and below half the sample rate
     * @param q the quality factor
     * @return a second-order section
     * @throws IllegalArgumentException as told for the class
     */
    public static Section notch(double sampleRateHz, double centreHz, double q) {
        Shape shape = Shape.of(sampleRateHz, "centreHz", centreHz, q);
        return shape.section(1, -2 * shape.half().cosOfWhole(), 1);
    }

    /**
     * All-pass: gain 1 everywhere, the phase turns by a full circle about the centre.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz where the phase is half a turn, in hertz, above 0 and below half the sample rate
     * @param q the quality factor
     * @return a second-order section
     * @throws IllegalArgumentException as told for the class
     */
    public static Section allPass(double sampleRateHz, double centreHz, double q) {
        Shape shape = Shape.of(sampleRateHz, "centreHz", centreHz, q);
        return shape.section(1 - shape.alpha(), -2 * shape.half().cosOfWhole(), 1 + shape.alpha());
    }

    /**
     * Peaking: gain 1 at DC and at Nyquist, {@code gainDb} at the centre. The same gain with the opposite sign
     * undoes it exactly.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz the centre in hertz, above 0 and below half the sample rate
     * @param q the quality factor of the note, which is {@code A} times less than that of the prototype's poles
     * @param gainDb the gain at the centre in decibels
     * @return a second-order section
     * @throws IllegalArgumentException as told for the class
     */
    public static Section peaking(double sampleRateHz, double centreHz, double q, double gainDb) {
        Shape shape = Shape.of(sampleRateHz, "centreHz", centreHz, q);
        double a = amplitude(gainDb);
        double up = shape.alpha() * a;
        double down = shape.alpha() / a;
        double middle = -2 * shape.half().cosOfWhole();
        return checked(shape, gainDb, 1 + up, middle, 1 - up, 1 + down, middle, 1 - down);
    }

    /**
     * Low shelf: {@code gainDb} at DC, half of it at the corner, 0 dB at Nyquist.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param cornerHz the middle of the slope in hertz, above 0 and below half the sample rate
     * @param q the quality factor; see {@link #qOfSlope}
     * @param gainDb the gain at DC in decibels
     * @return a second-order section
     * @throws IllegalArgumentException as told for the class
     */
    public static Section lowShelf(double sampleRateHz, double cornerHz, double q, double gainDb) {
        Shape shape = Shape.of(sampleRateHz, "cornerHz", cornerHz, q);
        double a = amplitude(gainDb);
        double low = shape.half().sin() * shape.half().sin();
        double high = shape.half().cos() * shape.half().cos();
        double bend = Math.sqrt(a) * shape.alpha();
        // (A+1) - (A-1) cos w0 = 2 (A sin^2 + cos^2), and so on: halves of the note's terms.
        double top = a * low + high;
        double bottom = a * high + low;
        return checked(
                shape,
                gainDb,
                a * (top + bend),
                2 * a * (a * low - high),
                a * (top - bend),
                bottom + bend,
                -2 * (a * high - low),
                bottom - bend);
    }

    /**
     * High shelf: 0 dB at DC, half of {@code gainDb} at the corner, {@code gainDb} at Nyquist.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param cornerHz the middle of the slope in hertz, above 0 and below half the sample rate
     * @param q the quality factor; see {@link #qOfSlope}
     * @param gainDb the gain at Nyquist in decibels
     * @return a second-order section
     * @throws IllegalArgumentException as told for the class
     */
    public static Section highShelf(double sampleRateHz, double cornerHz, double q, double gainDb) {
        Shape shape = Shape.of(sampleRateHz, "cornerHz", cornerHz, q);
        double a = amplitude(gainDb);
        double low = shape.half().sin() * shape.half().sin();
        double high = shape.half().cos() * shape.half().cos();
        double bend = Math.sqrt(a) * shape.alpha();
        double top = a * high + low;
        double bottom = a * low + high;
        return checked(
                shape,
                gainDb,
                a * (top + bend),
                -2 * a * (a * high - low),
                a * (top - bend),
                bottom + bend,
                2 * (a * low - high),
                bottom - bend);
    }

    /**
     * The quality factor of a bandwidth in octaves: {@code 1/Q = 2 sinh(ln 2 / 2 * octaves * w0 / sin w0)}, the note's
     * digital form. The bandwidth lies between the -3 dB edges of a band-pass or notch, or between the edges at half
     * the
     * decibels of a peaking shape. After the bilinear transform it is close, not exact: 1 octave about 3 kHz at 48 kHz
     * measures 0.998.
     *
     * @param sampleRateHz the sample rate in hertz
     * @param centreHz the centre in hertz, above 0 and below half the sample rate
     * @param octaves the bandwidth in octaves
     * @return the quality factor
     * @throws IllegalArgumentException if {@code sampleRateHz} is not positive and finite, {@code centreHz} is not
     *     above 0 and below half of it, or {@code octaves} is not positive and finite or so large that {@code Q} is 0
     */
    public static double qOfOctaves(double sampleRateHz, double centreHz, double octaves) {
        Check.sampleRate(sampleRateHz);
        Check.belowNyquist("centreHz", centreHz, sampleRateHz);
        Check.positive("octaves", octaves);
        double w0 = 2 * Math.PI * (centreHz / sampleRateHz);
        double sin = HalfAngle.of(sampleRateHz, centreHz).sinOfWhole();
        double q = 1 / (2 * Math.sinh(Math.log(2) / 2 * octaves * (w0 / sin)));
        if (!(q > 0 && q < Double.POSITIVE_INFINITY)) {
            throw Check.refused("octaves", octaves, "such that Q is positive and finite; it is " + q);
        }
        return q;
    }

    /**
     * The quality factor of a shelf slope: {@code 1/Q = sqrt((A + 1/A) (1/slope - 1) + 2)}. A slope of 1 is the
     * steepest that stays monotonic.
     *
     * @param slope the note's {@code S}, above 0 and below {@code (A^2 + 1) / (A - 1)^2}
     * @param gainDb the gain of the shelf in decibels
     * @return the quality factor
     * @throws IllegalArgumentException if {@code slope} is not in its range or {@code gainDb} is not finite
     */
    public static double qOfSlope(double slope, double gainDb) {
        double a = amplitude(gainDb);
        Check.positive("slope", slope);
        double q = 1 / Math.sqrt((a + 1 / a) * (1 / slope - 1) + 2);
        if (!(q > 0 && q < Double.POSITIVE_INFINITY)) {
            double steepest = (a * a + 1) / ((a - 1) * (a - 1));
            throw Check.refused("slope", slope, "above 0 and below " + steepest + " at " + gainDb + " dB");
        }
        return q;
    }

    private static double amplitude(double gainDb) {
        Check.finite("gainDb", gainDb);
        double a = Math.pow(10, gainDb / 40);
        if (!(a > 0 && a < Double.POSITIVE_INFINITY)) {
            throw Check.refused("gainDb", gainDb, "so that 10^(gainDb / 40) is a finite number above 0");
        }
        return a;
    }

    private static Section checked(
            Shape shape, double gainDb, double b0, double b1, double b2, double a0, double a1, double a2) {
        if (!Double.isFinite(b0 / a0 + b1 / a0 + b2 / a0 + a1 / a0 + a2 / a0)) {
            throw Check.refused("gainDb", gainDb, "nearer to 0; a coefficient is not finite");
        }
        Section section = Section.normalized(b0, b1, b2, a0, a1, a2);
        if (!section.isStable()) {
            // Throws if q is to blame: at 0 dB the denominator is that of the other six.
            shape.section(1, 0, 0);
        }
        return Check.stable(section, "gainDb", gainDb, "nearer to 0 with a q of " + shape.q());
    }

    /** What six of the nine shapes share: {@code a = 1 + alpha, -2 cos w0, 1 - alpha}. */
    private record Shape(HalfAngle half, double alpha, double q) {

        static Shape of(double sampleRateHz, String name, double hertz, double q) {
            Check.sampleRate(sampleRateHz);
            Check.belowNyquist(name, hertz, sampleRateHz);
            Check.positive("q", q);
            HalfAngle half = HalfAngle.of(sampleRateHz, hertz);
            double alpha = half.sinOfWhole() / (2 * q);
            if (!(alpha > 0 && alpha < Double.POSITIVE_INFINITY)) {
                throw Check.refused("q", q, "less extreme; sin w0 / (2 q) is " + alpha);
            }
            return new Shape(half, alpha, q);
        }

        Section section(double b0, double b1, double b2) {
            Section section = Section.normalized(b0, b1, b2, 1 + alpha, -2 * half.cosOfWhole(), 1 - alpha);
            return Check.stable(section, "q", q, "less extreme");
        }
    }
}
