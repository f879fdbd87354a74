package io.github.polewright.samples.clean;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.design.DcNotch;
import io.github.polewright.live.LiveCascade;
import io.github.polewright.mains.HumRemover;
import io.github.polewright.mains.MainsReading;
import io.github.polewright.mains.MainsState;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.survey.OpeningHum;

/**
 * A hum remover that follows the mains by itself, and a DC notch behind it.
 *
 * <p>So that hum is out from the first frame on, the remover first hears some seconds of the very hum that the survey
 * found at the beginning, extended backwards.
 */
final class FollowingStream implements FrameFilter {

    private static final double LOWEST_RATE_HZ = 8000;
    private static final double HIGHEST_RATE_HZ = 192_000;
    private static final int MOST_CHANNELS = 64;
    private static final int FEWEST_LINES = 2;
    private static final int MOST_LINES = 20;
    /** Hum near a note of the scale needs ten to be proven. */
    private static final double RUN_UP_SECONDS = 12;

    private final HumRemover remover;
    private final LiveCascade dc;
    private final double sampleRateHz;
    private final int channels;
    private long framesDone;
    private FollowedHum removed = FollowedHum.NONE;

    FollowingStream(Recording recording, CleanWish wish) {
        sampleRateHz = recording.sampleRateHz();
        channels = recording.channels();
        int lines = Math.max(FEWEST_LINES, Math.min(MOST_LINES, wish.harmonics()));
        remover = HumRemover.builder(sampleRateHz, channels).lines(lines).build();
        Section section =
                wish.removeDc() ? DcNotch.byCorner(sampleRateHz, HumCascade.DC_CORNER_HZ) : Section.PASS_THROUGH;
        dc = LiveCascade.of(Cascade.of(sampleRateHz, section), channels);
    }

    /** Whether the remover can do what is wished for. */
    static boolean suits(Recording recording, CleanWish wish) {
        double rate = recording.sampleRateHz();
        return !wish.fixed()
                && wish.mainsHz() == 0
                && rate >= LOWEST_RATE_HZ
                && rate <= HIGHEST_RATE_HZ
                && recording.channels() <= MOST_CHANNELS;
    }

    /** Lets it hear what came before the recording. */
    void runUp(OpeningHum opening) {
        long frames = (long) (RUN_UP_SECONDS * sampleRateHz);
        double[] block = new double[CleaningStream.BLOCK_FRAMES * channels];
        for (long frame = -frames; frame < 0; frame += CleaningStream.BLOCK_FRAMES) {
            int count = (int) Math.min(CleaningStream.BLOCK_FRAMES, -frame);
            opening.extend(frame, count, block);
            process(block, count);
        }
        framesDone = 0;
        removed = FollowedHum.NONE;
    }

    /** Whether mains are followed now. */
    boolean isFollowing() {
        MainsState state = remover.reading().state();
        return state == MainsState.FOLLOWING || state == MainsState.HOLDING;
    }

    @Override
    public void process(double[] block, int frames) {
        remover.process(block, 0, block, 0, frames);
        dc.process(block, 0, block, 0, frames);
        note(remover.reading(), frames);
        framesDone += frames;
    }

    private void note(MainsReading reading, int frames) {
        int lines = reading.state() == MainsState.FOLLOWING ? linesThere(reading) : 0;
        if (lines > 0) {
            removed = new FollowedHum(
                    Math.max(lines, removed.lines()),
                    reading.frequencyHz(),
                    removed.lines() == 0 ? framesDone / sampleRateHz : removed.fromSeconds(),
                    removed.seconds() + frames / sampleRateHz);
        }
    }

    private static int linesThere(MainsReading reading) {
        int there = 0;
        for (int harmonic = 1; harmonic <= reading.lines(); harmonic++) {
            for (int channel = 0; channel < reading.channels(); channel++) {
                if (reading.levelDb(harmonic, channel) > Double.NEGATIVE_INFINITY) {
                    there++;
                    break;
                }
            }
        }
        return there;
    }

    /** What was taken out of the recording so far. */
    FollowedHum removed() {
        return removed;
    }

    @Override
    public long nonFiniteSamples() {
        return remover.replacedSamples();
    }
}
