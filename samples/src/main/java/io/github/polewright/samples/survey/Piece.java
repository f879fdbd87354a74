package io.github.polewright.samples.survey;

import java.util.ArrayList;
import java.util.List;

/** A few seconds of the recording as overlapping snapshots, a list for each moment and in it one for each channel. */
final class Piece {

    private final double centreSeconds;
    private final List<Snapshot[]> moments = new ArrayList<>();
    private final List<Double> secondsFromCentre = new ArrayList<>();

    Piece(double centreSeconds) {
        this.centreSeconds = centreSeconds;
    }

    void add(double seconds, Snapshot[] channels) {
        moments.add(channels);
        secondsFromCentre.add(seconds - centreSeconds);
    }

    double centreSeconds() {
        return centreSeconds;
    }

    int moments() {
        return moments.size();
    }

    Snapshot snapshot(int moment, int channel) {
        return moments.get(moment)[channel];
    }

    /** From one moment to the next; all are the same way apart. */
    double secondsApart() {
        return secondsFromCentre.size() < 2 ? 0 : secondsFromCentre.get(1) - secondsFromCentre.get(0);
    }

    double secondsFromCentre(int moment) {
        return secondsFromCentre.get(moment);
    }
}
