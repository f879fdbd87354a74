package io.github.polewright.tone;

/** What reads the samples behind the front end. */
interface InnerSamples {

    /**
     * Takes the next samples at the inner rate.
     *
     * @param samples read from index 0
     * @param count at most {@link Intake#CHUNK_FRAMES}, and possibly 0
     */
    void take(double[] samples, int count);

    /** Called after every 32nd frame since the start: the time to guard state that decays. */
    void guard();
}
