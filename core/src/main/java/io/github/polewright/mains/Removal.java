package io.github.polewright.mains;

/** How a proven line is taken out of the programme. */
public enum Removal {
    /**
     * A narrow notch a line: it takes the programme in its width away with the hum. Steady when the hum itself changes.
     */
    NOTCHES,
    /**
     * The lines are rebuilt from the follower's phase and subtracted. The programme between and under the lines stays
     * whole; learning pauses while programme covers a line. Better on speech, and where the programme has gaps.
     */
    SUBTRACTION
}
