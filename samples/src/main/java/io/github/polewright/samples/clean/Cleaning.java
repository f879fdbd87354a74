package io.github.polewright.samples.clean;

import io.github.polewright.samples.survey.HumLine;
import io.github.polewright.samples.survey.Survey;
import java.util.List;

/**
 * What a cleaning did.
 *
 * @param before what the survey of the recording found
 * @param followed whether a remover followed the mains; if not, the survey's notches were kept
 * @param removed what that remover took out, whatever the survey found
 * @param linesAfter the same lines, measured in the cleaned file
 * @param dcAfter the mean of each channel of the cleaned file
 * @param clippedSamples samples that left the range of the file's format
 * @param nonFiniteSamples samples that were no numbers; taken as silence
 * @param filterSeconds how long reading, filtering and writing took
 */
public record Cleaning(
        Survey before,
        boolean followed,
        FollowedHum removed,
        List<HumLine> linesAfter,
        List<Double> dcAfter,
        long clippedSamples,
        long nonFiniteSamples,
        double filterSeconds) {

    public Cleaning {
        linesAfter = List.copyOf(linesAfter);
        dcAfter = List.copyOf(dcAfter);
    }

    /** Whether hum was taken out by either. */
    public boolean humRemoved() {
        return before.humFound() || removed.lines() > 0;
    }

    /** How far a line was turned down, in decibels. */
    public double removedDb(int line) {
        return before.lines().get(line).levelDb() - linesAfter.get(line).levelDb();
    }
}
