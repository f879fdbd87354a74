package io.github.polewright.samples.clean;

import io.github.polewright.samples.files.Frames;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.files.WavFile;
import io.github.polewright.samples.survey.OpeningHum;
import io.github.polewright.samples.survey.Survey;
import io.github.polewright.samples.survey.Surveyor;
import java.nio.file.Path;
import java.util.function.LongConsumer;

/** Streams a recording through a remover that follows the hum, or the notches its survey asks for, and measures what that did. */
public final class Cleaner {

    private Cleaner() {}

    /**
     * Writes the cleaned recording.
     *
     * @param progress told of the frames done
     */
    public static Cleaning clean(Recording in, Path out, Survey survey, CleanWish wish, LongConsumer progress) {
        long start = System.nanoTime();
        FrameFilter filter = filter(in, survey, wish);
        long clipped;
        try (Frames frames = in.read()) {
            CleanedBytes bytes = new CleanedBytes(in, frames, filter, progress);
            WavFile.write(out, in.format(), in.frames(), bytes);
            clipped = bytes.clippedSamples();
        }
        double seconds = (System.nanoTime() - start) / 1e9;
        Surveyor.Measured after = Surveyor.measure(Recording.open(out), survey);
        boolean followed = filter instanceof FollowingStream;
        FollowedHum removed = filter instanceof FollowingStream stream ? stream.removed() : FollowedHum.NONE;
        long nonFinite = filter.nonFiniteSamples();
        return new Cleaning(survey, followed, removed, after.lines(), after.dcOffset(), clipped, nonFinite, seconds);
    }

    /** Hum that the survey found and the remover does not take for mains is left to the survey's notches. */
    private static FrameFilter filter(Recording in, Survey survey, CleanWish wish) {
        OpeningHum opening = OpeningHum.of(in, survey);
        if (FollowingStream.suits(in, wish)) {
            FollowingStream following = new FollowingStream(in, wish);
            following.runUp(opening);
            if (following.isFollowing() || !survey.humFound()) {
                return following;
            }
        }
        HumCascade cascade = new HumCascade(in.sampleRateHz(), survey, wish);
        CleaningStream stream = new CleaningStream(cascade, survey, in.sampleRateHz(), in.channels());
        stream.runUp(opening, wish);
        return stream;
    }
}
