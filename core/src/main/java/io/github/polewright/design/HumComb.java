package io.github.polewright.design;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;

/**
 * A wish for a comb: one {@link HumNotch} on each of the lines {@code k * fundamentalHz}. The comb finds nothing by
 * itself: it is told the fundamental, and removes whatever lies on those lines, music too.
 *
 * <p>Unless told otherwise: the first 10 lines, even and odd, each 0.5 Hz wide, without a depth limit. Each method
 * returns a changed copy; the order of calls does not matter. Full-wave rectified hum has only even lines, magnetic
 * pick-up mostly odd ones.
 *
 * <p>A line is left out where it does not fit: its centre plus half its width must lie below half the sample rate.
 * Notches as wide as the fundamental would leave nothing between the lines, and are refused.
 *
 * <p><b>Units</b> hertz, decibels. <b>Threads</b> immutable. <b>Errors</b> {@link IllegalArgumentException}.
 * <b>Numbers</b> a notch rings for about {@code 2.2 / widthHz} seconds down to -60 dB. A drift of the fundamental by
 * {@code d} moves line {@code k} by {@code k d}: steady widths suit a steady fundamental, growing ones a drifting one.
 */
public final class HumComb {

    private static final int DEFAULT_COUNT = 10;
    private static final double DEFAULT_WIDTH_HZ = 0.5;

    private final double fundamentalHz;
    private final int firstLine;
    private final int lineStep;
    private final int count;
    private final double widthHz;
    private final boolean growing;
    private final double depthDb;

    private HumComb(
            double fundamentalHz,
            int firstLine,
            int lineStep,
            int count,
            double widthHz,
            boolean growing,
            double depthDb) {
        this.fundamentalHz = fundamentalHz;
        this.firstLine = firstLine;
        this.lineStep = lineStep;
        this.count = count;
        this.widthHz = widthHz;
        this.growing = growing;
        this.depthDb = depthDb;
    }

    /**
     * The wish for a comb at the given fundamental.
     *
     * @param fundamentalHz the frequency of line 1 in hertz, such as 50 or 60
     * @return the wish with the defaults named above
     * @throws IllegalArgumentException if {@code fundamentalHz} is not positive and finite
     */
    public static HumComb at(double fundamentalHz) {
        Check.positive("fundamentalHz", fundamentalHz);
        return new HumComb(fundamentalHz, 1, 1, DEFAULT_COUNT, DEFAULT_WIDTH_HZ, false, Double.POSITIVE_INFINITY);
    }

    /**
     * At most so many notches, counted from the lowest line wished for.
     *
     * @param lines at least 1; lines that do not fit below Nyquist are left out
     * @return the changed wish
     * @throws IllegalArgumentException if {@code lines < 1}
     */
    public HumComb lines(int lines) {
        if (lines < 1) {
            throw new IllegalArgumentException("lines is " + lines + "; it must be at least 1");
        }
        return new HumComb(fundamentalHz, firstLine, lineStep, lines, widthHz, growing, depthDb);
    }

    /**
     * As many notches as fit below Nyquist.
     *
     * @return the changed wish
     */
    public HumComb linesToNyquist() {
        return lines(Integer.MAX_VALUE);
    }

    /**
     * Even and odd lines: 1, 2, 3 and so on.
     *
     * @return the changed wish
     */
    public HumComb allLines() {
        return new HumComb(fundamentalHz, 1, 1, count, widthHz, growing, depthDb);
    }

    /**
     * Even lines only: 2, 4, 6 and so on.
     *
     * @return the changed wish
     */
    public HumComb evenLines() {
        return new HumComb(fundamentalHz, 2, 2, count, widthHz, growing, depthDb);
    }

    /**
     * Odd lines only: 1, 3, 5 and so on.
     *
     * @return the changed wish
     */
    public HumComb oddLines() {
        return new HumComb(fundamentalHz, 1, 2, count, widthHz, growing, depthDb);
    }

    /**
     * The width of each notch, or of line 1 where widths grow.
     *
     * @param widthHz in hertz, above 0 and below the fundamental, see {@link HumNotch}
     * @return the changed wish
     * @throws IllegalArgumentException if {@code widthHz} is not in its range
     */
    public HumComb widthHz(double widthHz) {
        checkWidth(fundamentalHz, widthHz);
        return new HumComb(fundamentalHz, firstLine, lineStep, count, widthHz, growing, depthDb);
    }

    /**
     * Widths that grow with the line: line {@code k} is {@code k * widthHz} wide, so all notches have one quality
     * factor.
     *
     * @return the changed wish
     */
    public HumComb widthGrowing() {
        return new HumComb(fundamentalHz, firstLine, lineStep, count, widthHz, true, depthDb);
    }

    /**
     * A depth limit for each notch.
     *
     * @param depthDb how far a line's centre is turned down, in decibels: 40 leaves -40 dB
     * @return the changed wish
     * @throws IllegalArgumentException if {@code depthDb} is not positive and finite
     */
    public HumComb depthDb(double depthDb) {
        Check.positive("depthDb", depthDb);
        return new HumComb(fundamentalHz, firstLine, lineStep, count, widthHz, growing, depthDb);
    }

    /**
     * The comb at a sample rate: a section a line, lowest line first.
     *
     * @param sampleRateHz the sample rate in hertz
     * @return the cascade
     * @throws IllegalArgumentException if {@code sampleRateHz} is not positive and finite, no line fits below half of
     *     it, the width is not below the fundamental, or so small that the poles round to the unit circle
     */
    public Cascade design(double sampleRateHz) {
        Check.sampleRate(sampleRateHz);
        checkWidth(fundamentalHz, widthHz);
        double floor = HumNotch.floor(depthDb);
        List<Section> notches = new ArrayList<>();
        for (long line = firstLine; notches.size() < count; line += lineStep) {
            double centreHz = line * fundamentalHz;
            double lineWidthHz = growing ? line * widthHz : widthHz;
            if (!(centreHz + lineWidthHz / 2 < sampleRateHz / 2)) {
                break;
            }
            notches.add(HumNotch.ofWidth(sampleRateHz, centreHz, lineWidthHz, floor));
        }
        if (notches.isEmpty()) {
            throw new IllegalArgumentException("fundamentalHz is " + fundamentalHz + " with a width of " + widthHz
                    + " Hz; line " + firstLine + " must fit between 0 and " + sampleRateHz / 2
                    + ", half the sample rate");
        }
        return Cascade.of(sampleRateHz, notches);
    }

    private static void checkWidth(double fundamentalHz, double widthHz) {
        if (!(widthHz > 0 && widthHz < fundamentalHz)) {
            throw Check.refused("widthHz", widthHz, "above 0 and below " + fundamentalHz + ", the fundamental");
        }
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof HumComb that
                && fundamentalHz == that.fundamentalHz
                && firstLine == that.firstLine
                && lineStep == that.lineStep
                && count == that.count
                && widthHz == that.widthHz
                && growing == that.growing
                && depthDb == that.depthDb;
    }

    @Override
    public int hashCode() {
        return Objects.hash(fundamentalHz, firstLine, lineStep, count, widthHz, growing, depthDb);
    }

    /** The wish in one line. */
    @Override
    public String toString() {
        String which = lineStep == 1 ? "all" : firstLine == 1 ? "odd" : "even";
        return "comb at " + fundamentalHz + " Hz, " + which + " lines"
                + (count == Integer.MAX_VALUE ? " to Nyquist" : ", at most " + count)
                + ", width " + widthHz + " Hz" + (growing ? " times the line" : "")
                + (depthDb == Double.POSITIVE_INFINITY ? "" : ", depth " + depthDb + " dB");
    }
}
