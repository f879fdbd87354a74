package io.github.polewright;

import io.github.polewright.slab.Ranges;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;

/**
 * An ordered list of second-order sections in series, made for one sample rate.
 *
 * <p>A cascade is a value: what a design makes, what an inspection reads and what a live cascade is told to become. It
 * filters nothing itself and has no state.
 *
 * <p><b>Units</b> sample rate in hertz. <b>Threads</b> immutable. <b>Errors</b> a sample rate that is not positive and
 * finite, or no section at all, is refused; an empty wish is {@link Section#PASS_THROUGH}.
 */
public final class Cascade {

    private final double sampleRateHz;
    private final List<Section> sections;

    private Cascade(double sampleRateHz, List<Section> sections) {
        if (!(sampleRateHz > 0 && sampleRateHz < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("sampleRateHz is " + sampleRateHz + "; it must be positive and finite");
        }
        for (int i = 0; i < sections.size(); i++) {
            if (sections.get(i) == null) {
                throw new NullPointerException("sections[" + i + "]");
            }
        }
        this.sections = List.copyOf(sections);
        if (this.sections.isEmpty()) {
            throw new IllegalArgumentException("a cascade of 0 sections; it must have at least 1");
        }
        this.sampleRateHz = sampleRateHz;
    }

    /**
     * A cascade of the given sections, first to last.
     *
     * @param sampleRateHz the sample rate its coefficients were made for, in hertz
     * @param sections at least one
     * @return the cascade
     * @throws IllegalArgumentException if {@code sampleRateHz} is not positive and finite, or there is no section
     * @throws NullPointerException if {@code sections} or one of them is null
     */
    public static Cascade of(double sampleRateHz, Section... sections) {
        return new Cascade(sampleRateHz, Arrays.asList(Objects.requireNonNull(sections, "sections")));
    }

    /**
     * A cascade of the given sections, first to last.
     *
     * @param sampleRateHz the sample rate its coefficients were made for, in hertz
     * @param sections at least one; copied
     * @return the cascade
     * @throws IllegalArgumentException if {@code sampleRateHz} is not positive and finite, or there is no section
     * @throws NullPointerException if {@code sections} or one of them is null
     */
    public static Cascade of(double sampleRateHz, List<Section> sections) {
        return new Cascade(sampleRateHz, Objects.requireNonNull(sections, "sections"));
    }

    /**
     * The sample rate the coefficients were made for.
     *
     * @return hertz
     */
    public double sampleRateHz() {
        return sampleRateHz;
    }

    /**
     * How many sections run in series.
     *
     * @return at least 1
     */
    public int sectionCount() {
        return sections.size();
    }

    /**
     * One section.
     *
     * @param index 0 is the first that the signal meets
     * @return the section
     * @throws IndexOutOfBoundsException if {@code index < 0 || index >= sectionCount()}
     */
    public Section section(int index) {
        Ranges.index("index", index, sections.size());
        return sections.get(index);
    }

    /**
     * All sections in the order the signal meets them.
     *
     * @return an unmodifiable list
     */
    public List<Section> sections() {
        return sections;
    }

    /**
     * This cascade followed by another.
     *
     * @param next runs after this one
     * @return the longer cascade
     * @throws IllegalArgumentException if the sample rates differ
     */
    public Cascade then(Cascade next) {
        Objects.requireNonNull(next, "next");
        if (next.sampleRateHz != sampleRateHz) {
            throw new IllegalArgumentException("next's sampleRateHz is " + next.sampleRateHz + "; it must be "
                    + sampleRateHz + ", as in the cascade it follows");
        }
        List<Section> joined = new ArrayList<>(sections);
        joined.addAll(next.sections);
        return new Cascade(sampleRateHz, joined);
    }

    /**
     * The total gain: the product of the sections' {@code b0}, which is the first sample of the impulse response and
     * the factor in front of the pole-zero form (where no section's {@code b0} is 0).
     *
     * @return a linear factor
     */
    public double gain() {
        double gain = 1;
        for (Section section : sections) {
            gain *= section.b0();
        }
        return gain;
    }

    /**
     * The same cascade with a constant gain, put into the first section.
     *
     * @param factor a linear factor; negative inverts the polarity
     * @return the scaled cascade
     * @throws IllegalArgumentException if the factor or a product is NaN or infinite
     */
    public Cascade scaledBy(double factor) {
        List<Section> scaled = new ArrayList<>(sections);
        scaled.set(0, sections.get(0).scaledBy(factor));
        return new Cascade(sampleRateHz, scaled);
    }

    /**
     * Whether every section is stable.
     *
     * @return true if all poles lie strictly inside the unit circle
     */
    public boolean isStable() {
        for (Section section : sections) {
            if (!section.isStable()) {
                return false;
            }
        }
        return true;
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Cascade that && sampleRateHz == that.sampleRateHz && sections.equals(that.sections);
    }

    @Override
    public int hashCode() {
        return 31 * Double.hashCode(sampleRateHz) + sections.hashCode();
    }

    /** One line for the rate, then a line a section with its coefficients at full precision. */
    @Override
    public String toString() {
        StringBuilder text = new StringBuilder();
        text.append(sections.size()).append(sections.size() == 1 ? " section at " : " sections at ");
        text.append(sampleRateHz).append(" Hz");
        for (int i = 0; i < sections.size(); i++) {
            text.append(System.lineSeparator()).append(i).append(": ").append(sections.get(i));
        }
        return text.toString();
    }
}
