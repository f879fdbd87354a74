package io.github.polewright.samples.report;

import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.survey.HumLine;
import io.github.polewright.samples.survey.MainsMoment;
import io.github.polewright.samples.survey.MainsTrack;
import io.github.polewright.samples.survey.Survey;
import java.util.ArrayList;
import java.util.List;

/** A survey as lines of text. */
public final class SurveyText {

    public static final String WIRING = "Hum can come from faulty wiring or a missing protective earth. If touching"
            + " equipment tingles or the hum is new, stop and have a licensed electrician look.";

    private SurveyText() {}

    public static List<String> head(Recording recording, Survey survey) {
        List<String> lines = new ArrayList<>();
        lines.add("recording  " + recording.path());
        lines.add(Numbers.format("format     %s, %.2f s", recording.describe(), recording.seconds()));
        for (int c = 0; c < survey.dcOffset().size(); c++) {
            double dc = survey.dcOffset().get(c);
            lines.add(Numbers.format(
                    "%-10s channel %d: %+.6f (%s)", c == 0 ? "DC offset" : "", c + 1, dc, Numbers.decibels(dc)));
        }
        if (survey.nonFiniteSamples() > 0) {
            lines.add("samples    " + survey.nonFiniteSamples() + " are not finite; taken as 0");
        }
        lines.add("mains hum  " + verdict(survey));
        return lines;
    }

    public static String verdict(Survey survey) {
        if (survey.tooShortToTell()) {
            return "the recording is too short to tell; at least 1 s is needed";
        }
        if (!survey.humFound()) {
            return "no hum found";
        }
        String drift = survey.track().isEmpty() ? "steady" : Numbers.format("drifting over %.3f Hz", survey.driftHz());
        int count = survey.lines().size();
        return Numbers.format(
                "found at %.3f Hz, %s, %d %s", survey.fundamentalHz(), drift, count, count == 1 ? "line" : "lines");
    }

    /** Where the mains went, as the follower hears them. */
    public static List<String> track(List<MainsMoment> track) {
        if (track.isEmpty()) {
            return List.of();
        }
        MainsMoment first = track.get(0);
        MainsMoment last = track.get(track.size() - 1);
        return List.of(Numbers.format(
                "track      %.3f Hz at %.2f s, %.3f Hz at %.2f s, drift of %.3f Hz in all",
                first.frequencyHz(), first.seconds(), last.frequencyHz(), last.seconds(), MainsTrack.driftHz(track)));
    }

    public static List<String> table(Survey survey) {
        List<String> lines = new ArrayList<>();
        if (!survey.humFound()) {
            return lines;
        }
        lines.add("");
        lines.add("harmonic  frequency   level     over floor  steady");
        lines.add("          Hz          dB        dB          %");
        for (HumLine line : survey.lines()) {
            lines.add(Numbers.format(
                    "%8d  %-10.3f  %-8.1f  %-10.1f  %.0f",
                    line.harmonic(), line.frequencyHz(), line.levelDb(), line.overFloorDb(), 100 * line.steadyShare()));
        }
        lines.add("");
        lines.add("0 dB is a sine of full scale; the floor is what lies beside the line, in a band of 1 Hz.");
        lines.add("");
        lines.add("Caution: " + WIRING);
        return lines;
    }
}
