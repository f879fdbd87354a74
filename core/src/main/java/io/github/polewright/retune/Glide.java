package io.github.polewright.retune;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.slab.Ranges;
import java.util.Objects;

/**
 * A path from one cascade to another: coefficient knots, and how many frames lie between them. Between two knots every
 * coefficient moves in equal steps. A segment of no frames is a swap that changes nothing that can be heard: a slot that
 * passes through becomes a section with b = a, or the reverse.
 *
 * <p>{@link #between} goes straight from set to set, which is right for small moves and for following a drift. Wide
 * moves belong to {@link #along}: a straight ramp of a resonant low-pass over several octaves overshoots by more than a
 * factor of five, whatever its length.
 *
 * <p><b>Units</b> frames at the cascades' sample rate. <b>Threads</b> immutable; made on a control thread, read by any.
 * <b>Allocation</b> none in the accessors. <b>Errors</b> what cannot be certified is refused when the glide is made.
 */
public final class Glide {

    private final Cascade from;
    private final Cascade target;
    private final Knots knots;
    private final double[][] distances;
    private final double[][] leaks;
    private final long movingFrames;
    private final Certificate[] certificates;
    private final boolean still;
    private final int sectionCount;
    private final double sampleRateHz;

    Glide(
            Cascade from,
            Cascade target,
            Knots knots,
            double[][] distances,
            double[][] leaks,
            long movingFrames,
            Certificate[] certificates) {
        this.from = from;
        this.target = target;
        this.knots = knots;
        this.distances = distances;
        this.leaks = leaks;
        this.movingFrames = movingFrames;
        this.certificates = certificates;
        this.still = from.equals(target);
        this.sectionCount = from.sectionCount();
        this.sampleRateHz = from.sampleRateHz();
    }

    /**
     * A glide that is linear in the coefficients, between cascades whose sections are paired as {@link Pairing} says.
     *
     * @param from the running cascade, one section a slot, free slots being {@link Section#PASS_THROUGH}
     * @param to where to go, with at most as many sections
     * @param pace how long and how evenly
     * @return the glide
     * @throws RefusedGlideException if the sample rates differ, {@code to} has too many sections, or a section is not
     *     stable or so near to it that its ramp would be endless
     */
    public static Glide between(Cascade from, Cascade to, Pace pace) {
        requireEnds(from, to, pace);
        return GlidePlan.straight(from, to, pace);
    }

    /**
     * A glide that is even in log frequency, log Q and decibels whatever the sections are, between cascades whose
     * sections are paired as {@link Pairing} says: the right default for wide moves.
     *
     * <p>It is geometric in the coefficients of the analogue sections that the bilinear transform would turn into the two
     * ends: for a low-pass, high-pass, band-pass, notch, peak or shelf of the second order that is the same as moving
     * its frequency, Q and gain. A coefficient that is 0 at one end or changes its sign goes in a straight line. Every
     * knot is stable. Knots as in {@link #along}. Derived for this project.
     *
     * @param from the running cascade, one section a slot, free slots being {@link Section#PASS_THROUGH}
     * @param to where to go, with at most as many sections
     * @param pace how long and how evenly
     * @return the glide
     * @throws RefusedGlideException as {@link #between}
     */
    public static Glide sweeping(Cascade from, Cascade to, Pace pace) {
        requireEnds(from, to, pace);
        return GlidePlan.sweeping(from, to, pace);
    }

    /**
     * A glide through a design, even in log frequency, log Q and decibels: half an octave a knot and at most 16 knots at
     * an even pace, 64 knots at a gentle one.
     *
     * @param design asked for each knot; the same number of sections for every setting
     * @param from the setting at the start
     * @param to the setting at the end
     * @param pace how long and how evenly
     * @return the glide
     * @throws RefusedGlideException if two knots differ in sample rate or number of sections, or a section is not stable
     *     or so near to it that its ramp would be endless
     */
    public static Glide along(CascadeDesign design, Setting from, Setting to, Pace pace) {
        Objects.requireNonNull(design, "design");
        requireEnds(from, to, pace);
        return GlidePlan.along(design, from, to, pace);
    }

    private static void requireEnds(Object from, Object to, Pace pace) {
        Objects.requireNonNull(from, "from");
        Objects.requireNonNull(to, "to");
        Objects.requireNonNull(pace, "pace");
    }

    /**
     * The cascade at the first knot.
     *
     * @return what the running cascade is taken to be
     */
    public Cascade from() {
        return from;
    }

    /**
     * The cascade at the last knot, its sections in the order of the slots; free slots pass through.
     *
     * @return what to start the next glide from
     */
    public Cascade target() {
        return target;
    }

    /**
     * How many slots it speaks of.
     *
     * @return the number of sections at every knot
     */
    public int sectionCount() {
        return sectionCount;
    }

    /**
     * The sample rate of all its knots.
     *
     * @return hertz
     */
    public double sampleRateHz() {
        return sampleRateHz;
    }

    /**
     * How many segments lie between the first and the last knot.
     *
     * @return at least 1
     */
    public int segmentCount() {
        return knots.segmentCount();
    }

    /**
     * The length of a segment.
     *
     * @param segment 0 is the first
     * @return frames; 0 for a swap
     * @throws IndexOutOfBoundsException if there is no such segment
     */
    public int frames(int segment) {
        Ranges.index("segment", segment, segmentCount());
        return knots.frames(segment);
    }

    /**
     * The length of the whole glide.
     *
     * @return frames
     */
    public long totalFrames() {
        return knots.totalFrames();
    }

    /**
     * One coefficient at one knot.
     *
     * @param knot 0 to {@link #segmentCount()}
     * @param section its slot
     * @param which 0 to 4 for b0, b1, b2, a1, a2
     * @return the coefficient
     * @throws IndexOutOfBoundsException if an index is out of range
     */
    public double coefficient(int knot, int section, int which) {
        Ranges.index("knot", knot, segmentCount() + 1);
        Ranges.index("section", section, sectionCount);
        Ranges.index("which", which, Knots.WIDTH);
        return knots.at(knot)[section * Knots.WIDTH + which];
    }

    /**
     * The distance a section's poles move in one segment.
     *
     * @param segment 0 is the first
     * @param section its slot
     * @return d, 0 for a swap
     * @throws IndexOutOfBoundsException if an index is out of range
     */
    public double distance(int segment, int section) {
        checkPlace(segment, section);
        return distances[segment][section];
    }

    /**
     * What the bucket of a section loses in each frame of a segment.
     *
     * @param segment 0 is the first
     * @param section its slot
     * @return the loss in one frame
     * @throws IndexOutOfBoundsException if an index is out of range
     */
    public double leak(int segment, int section) {
        checkPlace(segment, section);
        return leaks[segment][section];
    }

    private void checkPlace(int segment, int section) {
        Ranges.index("segment", segment, segmentCount());
        Ranges.index("section", section, sectionCount);
    }

    /**
     * What the glide can do to one section.
     *
     * @param section its slot
     * @return the certificate
     * @throws IndexOutOfBoundsException if there is no such slot
     */
    public Certificate certificate(int section) {
        Ranges.index("section", section, sectionCount);
        return certificates[section];
    }

    /**
     * The same glide with its sections in the slots where a running cascade has them, and the other slots free. The
     * sections at the first knot are paired with the running ones as {@link Pairing} says.
     *
     * @param running the running cascade, one section a slot, free slots being {@link Section#PASS_THROUGH}
     * @return the glide for that cascade
     * @throws RefusedGlideException if the sample rates differ or there are not enough slots
     */
    public Glide inSlotsOf(Cascade running) {
        if (Objects.requireNonNull(running, "running").equals(from)) {
            return this;
        }
        return SlotOrder.arrange(this, running);
    }

    /** Whether both ends are the same. */
    boolean isStill() {
        return still;
    }

    /** Whether a slot's section fades out and another is born in its place. */
    boolean isExchanged(int section) {
        return certificates[section].rule() == Certificate.Rule.EXCHANGE;
    }

    /** How many frames pass until the last coefficient has stopped. */
    long movingFrames() {
        return movingFrames;
    }

    double[][] distances() {
        return distances;
    }

    double[][] leaks() {
        return leaks;
    }

    Knots knots() {
        return knots;
    }

    /** Knot coefficients in the order b0, b1, b2, a1, a2 a section; not a copy. */
    double[] knot(int index) {
        return knots.at(index);
    }

    /** One line for the length, then a sentence a section. */
    @Override
    public String toString() {
        StringBuilder text = new StringBuilder();
        text.append(totalFrames()).append(" frames in ").append(segmentCount()).append(" segments");
        for (Certificate certificate : certificates) {
            text.append(System.lineSeparator()).append(certificate);
        }
        return text.toString();
    }
}
