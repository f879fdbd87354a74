package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.retune.Pace;
import java.util.Objects;

/**
 * Chooses what a {@link LiveCascade} is built with. One thread; every call but {@link #build()} returns this builder.
 */
public final class LiveCascadeBuilder {

    private static final int MOST_CHANNELS = 1024;
    private static final int MOST_SECTIONS = 1024;

    private final Cascade cascade;
    private int channels = 1;
    private Form form = Form.DIRECT_FORM_1;
    private int mostSections;
    private Pace pace = Pace.SINGLE;

    LiveCascadeBuilder(Cascade cascade) {
        this.cascade = Objects.requireNonNull(cascade, "cascade");
        this.mostSections = cascade.sectionCount();
    }

    /**
     * Channels of every frame; 1 unless said.
     *
     * @param channels 1 to 1024
     * @return this
     * @throws IllegalArgumentException if {@code channels} is out of range
     */
    public LiveCascadeBuilder channels(int channels) {
        this.channels = inRange("channels", channels, 1, MOST_CHANNELS);
        return this;
    }

    /**
     * The form a steady section is computed in; direct form I unless said.
     *
     * @param form the form
     * @return this
     */
    public LiveCascadeBuilder form(Form form) {
        this.form = Objects.requireNonNull(form, "form");
        return this;
    }

    /**
     * The most sections a target of {@link LiveCascade#retune} may have; as many as the first cascade has unless said.
     *
     * @param mostSections from the first cascade's own count to 1024
     * @return this
     * @throws IllegalArgumentException if {@code mostSections} is out of range
     */
    public LiveCascadeBuilder mostSections(int mostSections) {
        this.mostSections = inRange("mostSections", mostSections, cascade.sectionCount(), MOST_SECTIONS);
        return this;
    }

    /**
     * How long and how evenly a retune glides that says nothing else; {@link Pace#SINGLE} unless said.
     *
     * @param pace a glide is never faster than is certified
     * @return this
     */
    public LiveCascadeBuilder pace(Pace pace) {
        this.pace = Objects.requireNonNull(pace, "pace");
        return this;
    }

    /**
     * Builds the live cascade.
     *
     * @return silent and settled
     * @throws IllegalArgumentException if the cascade is unstable
     */
    public LiveCascade build() {
        Fit.check(cascade, mostSections);
        Rehearsal.held();
        return new LiveCascade(cascade, channels, form, mostSections, pace);
    }

    private static int inRange(String name, int value, int least, int most) {
        if (value < least || value > most) {
            throw new IllegalArgumentException(name + " is " + value + "; it must be from " + least + " to " + most);
        }
        return value;
    }
}
