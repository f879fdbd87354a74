package io.github.polewright.live;

import io.github.polewright.Cascade;
import java.util.Objects;

/**
 * Chooses what a {@link LiveCascade} is built with. One thread; every call but {@link #build()} returns this builder.
 */
public final class LiveCascadeBuilder {

    private static final double DEFAULT_RAMP_SECONDS = 0.05;
    private static final int MOST_CHANNELS = 1024;
    private static final int MOST_SECTIONS = 1024;

    private final Cascade cascade;
    private int channels = 1;
    private Form form = Form.DIRECT_FORM_1;
    private int mostSections;
    private int rampFrames;

    LiveCascadeBuilder(Cascade cascade) {
        this.cascade = Objects.requireNonNull(cascade, "cascade");
        this.mostSections = cascade.sectionCount();
        this.rampFrames = (int) Math.max(1, Math.round(DEFAULT_RAMP_SECONDS * cascade.sampleRateHz()));
    }

    /**
     * Channels of every frame; 1 unless said.
     *
     * @param count 1 to 1024
     * @return this
     * @throws IllegalArgumentException if {@code count} is out of range
     */
    public LiveCascadeBuilder channels(int count) {
        channels = inRange("channels", count, 1, MOST_CHANNELS);
        return this;
    }

    /**
     * The form a steady section is computed in; direct form I unless said.
     *
     * @param choice the form
     * @return this
     */
    public LiveCascadeBuilder form(Form choice) {
        form = Objects.requireNonNull(choice, "choice");
        return this;
    }

    /**
     * The most sections a target of {@link LiveCascade#retune} may have; as many as the first cascade has unless said.
     *
     * @param count from the first cascade's own count to 1024
     * @return this
     * @throws IllegalArgumentException if {@code count} is out of range
     */
    public LiveCascadeBuilder mostSections(int count) {
        mostSections = inRange("mostSections", count, cascade.sectionCount(), MOST_SECTIONS);
        return this;
    }

    /**
     * The frames a retune takes; 50 ms unless said.
     *
     * @param frames 1 to 2^24
     * @return this
     * @throws IllegalArgumentException if {@code frames} is out of range
     */
    public LiveCascadeBuilder rampFrames(int frames) {
        rampFrames = inRange("rampFrames", frames, 1, 1 << 24);
        return this;
    }

    /**
     * Builds the live cascade.
     *
     * @return silent and settled
     * @throws IllegalArgumentException if the cascade is unstable
     */
    public LiveCascade build() {
        LiveCascade.checkFits(cascade, mostSections);
        Rehearsal.held();
        return new LiveCascade(cascade, channels, form, mostSections, rampFrames);
    }

    private static int inRange(String name, int value, int least, int most) {
        if (value < least || value > most) {
            throw new IllegalArgumentException(name + " is " + value + "; it must be from " + least + " to " + most);
        }
        return value;
    }
}
