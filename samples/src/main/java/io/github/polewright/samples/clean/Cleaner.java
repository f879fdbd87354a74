package io.github.polewright.samples.clean;

import io.github.polewright.samples.files.Frames;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.files.WavFile;
import io.github.polewright.samples.survey.OpeningHum;
import io.github.polewright.samples.survey.Survey;
import io.github.polewright.samples.survey.Surveyor;
import java.nio.file.Path;
import java.util.function.LongConsumer;

/** Streams a recording through the cascade its survey asks for, and measures what that did. */
public final class Cleaner {

    private Cleaner() {}

    /**
     * Writes the cleaned recording.
     *
     * @param progress told of the frames done
     */
    public static Cleaning clean(Recording in, Path out, Survey survey, CleanWish wish, LongConsumer progress) {
        HumCascade cascade = new HumCascade(in.sampleRateHz(), survey, wish);
        CleaningStream stream = new CleaningStream(cascade, survey, in.sampleRateHz(), in.channels());
        long start = System.nanoTime();
        stream.runUp(OpeningHum.of(in, survey), wish);
        long clipped;
        try (Frames frames = in.read()) {
            CleanedBytes bytes = new CleanedBytes(in, frames, stream, progress);
            WavFile.write(out, in.format(), in.frames(), bytes);
            clipped = bytes.clippedSamples();
        }
        double seconds = (System.nanoTime() - start) / 1e9;
        Surveyor.Measured after = Surveyor.measure(Recording.open(out), survey);
        return new Cleaning(survey, after.lines(), after.dcOffset(), clipped, stream.nonFiniteSamples(), seconds);
    }
}
