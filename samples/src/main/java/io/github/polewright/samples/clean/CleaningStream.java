package io.github.polewright.samples.clean;

import io.github.polewright.live.LiveCascade;
import io.github.polewright.samples.survey.OpeningHum;
import io.github.polewright.samples.survey.Survey;

/**
 * A live cascade that is led along a recording block by block, its notches kept on the surveyed fundamental.
 *
 * <p>A narrow notch needs seconds to catch a line. So that hum and DC are out from the first frame on, the cascade
 * first hears some seconds of the very hum and DC that the survey found at the beginning, extended backwards.
 */
public final class CleaningStream implements FrameFilter {

    /** Frames a block, as an audio callback might bring. */
    public static final int BLOCK_FRAMES = 256;

    // A notch has let go of 80 dB of its start after 2.93 / width.
    private static final double RUN_UP_WIDTHS = 3;
    private static final double LONGEST_RUN_UP_SECONDS = 30;
    private static final double RETUNE_SECONDS = 0.25;
    private static final double RETUNE_HZ = 1e-5;

    private final HumCascade cascade;
    private final Survey survey;
    private final double sampleRateHz;
    private final LiveCascade live;
    private double tunedHz;
    private long framesDone;
    private long nextRetuneFrame;

    public CleaningStream(HumCascade cascade, Survey survey, double sampleRateHz, int channels) {
        this.cascade = cascade;
        this.survey = survey;
        this.sampleRateHz = sampleRateHz;
        this.tunedHz = survey.fundamentalHz(0);
        this.live = LiveCascade.of(cascade.at(tunedHz), channels);
    }

    /** Lets the cascade hear what came before the recording. */
    public void runUp(OpeningHum opening, CleanWish wish) {
        double seconds = survey.humFound() ? RUN_UP_WIDTHS / wish.widthHz() : RUN_UP_WIDTHS / HumCascade.DC_CORNER_HZ;
        long frames = (long) (Math.min(LONGEST_RUN_UP_SECONDS, seconds) * sampleRateHz);
        double[] block = new double[BLOCK_FRAMES * live.channels()];
        for (long frame = -frames; frame < 0; frame += BLOCK_FRAMES) {
            int count = (int) Math.min(BLOCK_FRAMES, -frame);
            opening.extend(frame, count, block);
            live.process(block, 0, block, 0, count);
        }
    }

    @Override
    public void process(double[] block, int frames) {
        if (survey.humFound() && framesDone >= nextRetuneFrame) {
            nextRetuneFrame = framesDone + (long) (RETUNE_SECONDS * sampleRateHz);
            double nowHz = survey.fundamentalHz(framesDone / sampleRateHz);
            if (Math.abs(nowHz - tunedHz) > RETUNE_HZ) {
                live.retune(cascade.at(nowHz));
                tunedHz = nowHz;
            }
        }
        live.process(block, 0, block, 0, frames);
        framesDone += frames;
    }

    @Override
    public long nonFiniteSamples() {
        return live.replacedInputSamples();
    }
}
