package io.github.polewright.samples.survey;

import io.github.polewright.mains.MainsFollower;
import io.github.polewright.mains.MainsReading;
import io.github.polewright.mains.MainsState;
import io.github.polewright.samples.files.Frames;
import io.github.polewright.samples.files.Recording;
import java.util.ArrayList;
import java.util.List;

/** The mains frequency over time as the follower hears it, a moment each quarter of a second where it is sure. */
public final class MainsTrack {

    private static final double STEP_SECONDS = 0.25;
    private static final double LOWEST_RATE_HZ = 8000;
    private static final double HIGHEST_RATE_HZ = 192_000;
    private static final int MOST_CHANNELS = 64;

    private MainsTrack() {}

    /** Listens to the whole recording; empty where no mains are heard, or the follower does not take the format. */
    public static List<MainsMoment> of(Recording recording) {
        double rate = recording.sampleRateHz();
        int channels = recording.channels();
        List<MainsMoment> track = new ArrayList<>();
        if (rate < LOWEST_RATE_HZ || rate > HIGHEST_RATE_HZ || channels > MOST_CHANNELS) {
            return track;
        }
        MainsFollower follower = MainsFollower.of(rate, channels);
        int step = (int) Math.round(STEP_SECONDS * rate);
        double[] block = new double[step * channels];
        long done = 0;
        try (Frames frames = recording.read()) {
            for (int count = frames.read(block, step); count > 0; count = frames.read(block, step)) {
                follower.follow(block, 0, count);
                done += count;
                MainsReading reading = follower.reading();
                if (reading.state() == MainsState.FOLLOWING) {
                    track.add(new MainsMoment(done / rate, reading.frequencyHz()));
                }
            }
        }
        return track;
    }

    /** From the lowest to the highest frequency of a track. */
    public static double driftHz(List<MainsMoment> track) {
        double lowest =
                track.stream().mapToDouble(MainsMoment::frequencyHz).min().orElse(0);
        double highest =
                track.stream().mapToDouble(MainsMoment::frequencyHz).max().orElse(0);
        return highest - lowest;
    }
}
