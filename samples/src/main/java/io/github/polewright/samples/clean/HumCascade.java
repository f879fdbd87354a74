package io.github.polewright.samples.clean;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.design.DcNotch;
import io.github.polewright.design.HumComb;
import io.github.polewright.samples.survey.HumLine;
import io.github.polewright.samples.survey.Survey;
import java.util.ArrayList;
import java.util.List;

/** The cascade that takes out what a survey found: a DC notch, and a notch on each line that is there. */
public final class HumCascade {

    public static final double DC_CORNER_HZ = 1;

    private final double sampleRateHz;
    private final CleanWish wish;
    private final List<HumLine> lines;

    public HumCascade(double sampleRateHz, Survey survey, CleanWish wish) {
        this.sampleRateHz = sampleRateHz;
        this.wish = wish;
        this.lines = survey.lines();
    }

    /** For a fundamental; the order of sections is always the same. */
    public Cascade at(double fundamentalHz) {
        List<Section> sections = new ArrayList<>();
        if (wish.removeDc()) {
            sections.add(DcNotch.byCorner(sampleRateHz, DC_CORNER_HZ));
        }
        if (!lines.isEmpty()) {
            int highest = lines.get(lines.size() - 1).harmonic();
            Cascade comb = HumComb.at(fundamentalHz)
                    .lines(highest)
                    .widthHz(wish.widthHz())
                    .design(sampleRateHz);
            for (HumLine line : lines) {
                sections.add(comb.section(line.harmonic() - 1));
            }
        }
        return Cascade.of(sampleRateHz, sections.isEmpty() ? List.of(Section.PASS_THROUGH) : sections);
    }
}
