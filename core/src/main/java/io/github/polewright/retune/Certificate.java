package io.github.polewright.retune;

import java.util.Locale;

/**
 * What a glide can do to one section, known before the first sample. Bounds are stated for each section: each section
 * bounded makes the cascade bounded, but the product of the sections' bounds says nothing useful about its level.
 *
 * <p><b>Units</b> linear factors unless named Db. <b>Threads</b> immutable, any thread; {@link #forcedBound()} is work
 * for a control thread. Where the output can reach a loudspeaker or an ear, a bound on a section is no protection:
 * keep a limiter.
 */
public final class Certificate {

    /** By which rule a section's change was certified. */
    public enum Rule {
        /** Its poles do not move. */
        STILL,
        /** One quadratic norm serves the whole segment, at most 0.7 of the pair limit is used: any walk, even a jump. */
        PAIR,
        /** The section fades until it passes its input through; its poles are replaced when they ring no more. */
        EXCHANGE,
        /** The ramp takes at least as many frames as its hyperbolic length needs. */
        RAMP
    }

    private final int section;
    private final Rule rule;
    private final double distance;
    private final double ringingBound;
    private final long shortestFrames;
    private final Knots knots;
    private volatile double forcedBound = Double.NaN;

    Certificate(int section, Rule rule, double distance, double ringingBound, long shortestFrames, Knots knots) {
        this.section = section;
        this.rule = rule;
        this.distance = distance;
        this.ringingBound = ringingBound;
        this.shortestFrames = shortestFrames;
        this.knots = knots;
    }

    /**
     * The section it speaks of.
     *
     * @return its index in the glide
     */
    public int section() {
        return section;
    }

    /**
     * The rule that decided.
     *
     * @return the rule
     */
    public Rule rule() {
        return rule;
    }

    /**
     * The hyperbolic length d of the path of the poles.
     *
     * @return 0 or more
     * @see Distance#between
     */
    public double distance() {
        return distance;
    }

    /**
     * By how much a state without input can grow, in the norm that belongs to the section: e^(d/2).
     *
     * @return a factor, at least 1
     */
    public double stateBound() {
        return Math.exp(0.5 * distance);
    }

    /**
     * By how much the amplitude of a ringing section can grow: e^(d/2) sqrt(Im p / Im q) from pole p to pole q. For a
     * narrow section that is the larger of the ratios of sin(omega/2) and cos(omega/2). Derived for this project.
     *
     * @return a factor, at least 1
     */
    public double ringingBound() {
        return ringingBound;
    }

    /**
     * The bound of the section's output, for every input with |x| at most 1 from long before the glide until long
     * after it, in direct form I arithmetic. The first call follows the glide frame by frame. Derived for this project.
     *
     * @return the bound, a linear factor
     */
    public double forcedBound() {
        double bound = forcedBound;
        if (Double.isNaN(bound)) {
            bound = knots.forcedBound(section);
            forcedBound = bound;
        }
        return bound;
    }

    /**
     * The certified length: the least number of frames this section's poles may take.
     *
     * @return 0 where they do not move, 1 where they may jump
     */
    public long shortestFrames() {
        return shortestFrames;
    }

    /** The same certificate for a section that sits in another slot. */
    Certificate inSlot(int slot, Knots moved) {
        return new Certificate(slot, rule, distance, ringingBound, shortestFrames, moved);
    }

    /** One sentence for a log. */
    @Override
    public String toString() {
        String what =
                switch (rule) {
                    case STILL -> "the poles stay";
                    case EXCHANGE ->
                        "it fades, and once it rings no more another is born in its place, in " + knots.totalFrames()
                                + " frames";
                    case PAIR ->
                        decimals("the poles move by d = %.3g and may jump, one norm contracts all the way", distance);
                    case RAMP ->
                        decimals("the poles move by d = %.3g", distance)
                                + " along a ramp of at least "
                                + shortestFrames
                                + " frames";
                };
        return "Section " + section + ": " + what
                + decimals("; ringing grows at most %.3g-fold (%.1f dB).", ringingBound, 20 * Math.log10(ringingBound));
    }

    private static String decimals(String format, Object... values) {
        return String.format(Locale.ROOT, format, values);
    }
}
