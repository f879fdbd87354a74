package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;

/** What a live cascade may become. */
final class Fit {

    private Fit() {}

    static void checkRate(Cascade target, double sampleRateHz) {
        if (Objects.requireNonNull(target, "target").sampleRateHz() != sampleRateHz) {
            throw new IllegalArgumentException(
                    "target's sampleRateHz is " + target.sampleRateHz() + "; it must be " + sampleRateHz);
        }
    }

    static void check(Cascade cascade, int mostSections) {
        Objects.requireNonNull(cascade, "cascade");
        if (cascade.sectionCount() > mostSections) {
            throw new IllegalArgumentException(
                    "the cascade has " + cascade.sectionCount() + " sections; it must have 1 to " + mostSections);
        }
        for (int i = 0; i < cascade.sectionCount(); i++) {
            if (!cascade.section(i).isStable()) {
                throw new IllegalArgumentException("section " + i + " is " + cascade.section(i)
                        + "; it must be stable (|a2| < 1 and |a1| < 1 + a2)");
            }
        }
    }

    /** One section a slot; free slots pass through. */
    static Cascade inSlots(Cascade cascade, int slots) {
        List<Section> sections = new ArrayList<>(cascade.sections());
        while (sections.size() < slots) {
            sections.add(Section.PASS_THROUGH);
        }
        return Cascade.of(cascade.sampleRateHz(), sections);
    }
}
