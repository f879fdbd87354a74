package io.github.polewright.retune;

/**
 * How long a glide takes and how evenly. A glide is never shorter than its certificate allows; a pace only adds to
 * that. A narrow notch or bell that is replaced by one far away fades and must ring out first, at any pace: that takes
 * about 4.4 s divided by its width in hertz, twice for one that is born as narrow. {@link Glide#totalFrames} tells.
 *
 * <p><b>Units</b> seconds. <b>Threads</b> immutable. The lengths were chosen for this project from the energy that a
 * glide puts beside a tone.
 */
public final class Pace {

    /** A control that is being turned: 50 ms at an even speed, so that the next event can take over at any moment. */
    public static final Pace TURNING = new Pace(false, 1, 0.05, 0);

    /**
     * A single change: it starts and ends gently, and takes twice the certified length, 60 ms, or 25 ms an octave,
     * whichever is longest.
     */
    public static final Pace SINGLE = new Pace(true, 2, 0.06, 0.025);

    /** Following a slow drift: even speed, no longer than the certificate asks for. */
    public static final Pace FOLLOWING = new Pace(false, 1, 0, 0);

    private final boolean gentle;
    private final double certifiedFactor;
    private final double leastSeconds;
    private final double secondsPerOctave;

    private Pace(boolean gentle, double certifiedFactor, double leastSeconds, double secondsPerOctave) {
        this.gentle = gentle;
        this.certifiedFactor = certifiedFactor;
        this.leastSeconds = leastSeconds;
        this.secondsPerOctave = secondsPerOctave;
    }

    /**
     * The same pace, taking at least this long.
     *
     * @param seconds a lower limit; the longer of this and the present one holds
     * @return the slower pace
     * @throws IllegalArgumentException if {@code seconds} is not from 0 to 600
     */
    public Pace atLeastSeconds(double seconds) {
        if (!(seconds >= 0 && seconds <= 600)) {
            throw new IllegalArgumentException("seconds is " + seconds + "; it must be from 0 to 600");
        }
        return new Pace(gentle, certifiedFactor, Math.max(leastSeconds, seconds), secondsPerOctave);
    }

    /** The pace in one line. */
    @Override
    public String toString() {
        return (gentle ? "gentle" : "even") + ", " + certifiedFactor + " times the certified length, at least "
                + leastSeconds + " s and " + secondsPerOctave + " s an octave";
    }

    /** Whether the glide starts and ends gently (smoothstep, 3u^2 - 2u^3) rather than at an even speed. */
    boolean isGentle() {
        return gentle;
    }

    /** How long the whole glide should take, in frames. */
    double frames(double sampleRateHz, double certifiedFrames, double octaves) {
        double seconds = Math.max(leastSeconds, secondsPerOctave * octaves);
        return Math.max(certifiedFactor * certifiedFrames, Math.rint(seconds * sampleRateHz));
    }
}
