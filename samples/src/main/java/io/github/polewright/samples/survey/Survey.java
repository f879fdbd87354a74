package io.github.polewright.samples.survey;

import java.util.List;

/**
 * What a survey found.
 *
 * @param dcOffset the mean of each channel, full scale being 1
 * @param humFound whether mains hum is there; if not, the fundamental is 0 and there are no lines
 * @param tooShortToTell whether the recording is too short to decide on hum
 * @param driftHz from the lowest to the highest fundamental found in pieces of the recording
 * @param lines the lines that are there, lowest first
 * @param track the fundamental over time
 * @param nonFiniteSamples samples that were no numbers; taken as 0
 */
public record Survey(
        List<Double> dcOffset,
        boolean humFound,
        boolean tooShortToTell,
        double fundamentalHz,
        double driftHz,
        List<HumLine> lines,
        List<MainsMoment> track,
        long nonFiniteSamples) {

    public Survey {
        dcOffset = List.copyOf(dcOffset);
        lines = List.copyOf(lines);
        track = List.copyOf(track);
    }

    /** The fundamental at a time, on straight lines between the moments of the track. */
    public double fundamentalHz(double seconds) {
        if (track.isEmpty()) {
            return fundamentalHz;
        }
        MainsMoment before = track.get(0);
        for (MainsMoment moment : track) {
            if (moment.seconds() >= seconds) {
                double span = moment.seconds() - before.seconds();
                double share = span > 0 ? (seconds - before.seconds()) / span : 1;
                return before.frequencyHz() + Math.max(0, share) * (moment.frequencyHz() - before.frequencyHz());
            }
            before = moment;
        }
        return before.frequencyHz();
    }
}
