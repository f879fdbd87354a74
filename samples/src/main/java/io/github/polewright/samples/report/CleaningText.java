package io.github.polewright.samples.report;

import io.github.polewright.samples.clean.Cleaning;
import io.github.polewright.samples.clean.FollowedHum;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.survey.HumLine;
import io.github.polewright.samples.survey.Survey;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** What a cleaning did, as lines of text. */
public final class CleaningText {

    public static final String LOUDNESS =
            "Start playing the result at a low volume: what was under the hum may be louder than expected.";

    private CleaningText() {}

    public static List<String> of(Recording in, Path out, Cleaning cleaning, boolean dcWanted) {
        Survey before = cleaning.before();
        List<String> lines = new ArrayList<>(SurveyText.head(in, before));
        lines.add(removal(cleaning, dcWanted));
        lines.add("");
        if (dcWanted) {
            for (int c = 0; c < cleaning.dcAfter().size(); c++) {
                lines.add(Numbers.format(
                        "DC offset  channel %d: %+.6f before, %+.6f after",
                        c + 1, before.dcOffset().get(c), cleaning.dcAfter().get(c)));
            }
        }
        lines.addAll(table(cleaning));
        lines.add(Numbers.format(
                "written    %s in %.2f s, %.0f times as fast as it plays",
                out, cleaning.filterSeconds(), in.seconds() / cleaning.filterSeconds()));
        lines.add("clipped    " + cleaning.clippedSamples() + " samples");
        lines.add("not finite " + cleaning.nonFiniteSamples() + " samples");
        lines.add("");
        if (cleaning.humRemoved()) {
            lines.add("Caution: " + SurveyText.WIRING);
            lines.add("Caution: " + LOUDNESS);
        }
        return lines;
    }

    private static String removal(Cleaning cleaning, boolean dcWanted) {
        if (cleaning.before().humFound()) {
            return "removal    " + (cleaning.followed() ? "follows the mains" : "by notches where the survey has them");
        }
        FollowedHum removed = cleaning.removed();
        if (removed.lines() > 0) {
            return Numbers.format(
                    "removal    the survey missed it, but the remover that follows the mains met hum from %.1f s on: up to"
                            + " %d %s of %.3f Hz taken out, for %.1f s in all",
                    removed.fromSeconds(),
                    removed.lines(),
                    removed.lines() == 1 ? "line" : "lines",
                    removed.frequencyHz(),
                    removed.seconds());
        }
        return dcWanted ? "           so only DC is removed" : "           so nothing is removed";
    }

    private static List<String> table(Cleaning cleaning) {
        List<String> lines = new ArrayList<>();
        List<HumLine> found = cleaning.before().lines();
        if (!found.isEmpty()) {
            lines.add("");
            lines.add("harmonic  frequency   before    after     removed");
            lines.add("          Hz          dB        dB        dB");
        }
        for (int i = 0; i < found.size(); i++) {
            lines.add(Numbers.format(
                    "%8d  %-10.3f  %-8.1f  %-8.1f  %.1f",
                    found.get(i).harmonic(),
                    found.get(i).frequencyHz(),
                    found.get(i).levelDb(),
                    cleaning.linesAfter().get(i).levelDb(),
                    cleaning.removedDb(i)));
        }
        if (!found.isEmpty()) {
            lines.add("");
            lines.add(
                    "Before and after are measured at the line; after is what the sound itself has there, less what the notch took of"
                            + " it, and what is left of the hum.");
            lines.add("");
        }
        return lines;
    }
}
