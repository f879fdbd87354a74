package io.github.polewright.live;

/**
 * How a steady section is computed. Both give the same filter but for rounding, need no division and run on
 * {@code double} states. While a retune glides, both run the arithmetic of direct form I, so they sound alike.
 */
public enum Form {

    /**
     * Direct form I: the section keeps its last two inputs and outputs. The usual choice: it has nothing to convert
     * when a glide begins or ends.
     */
    DIRECT_FORM_1,

    /**
     * Transposed direct form II, computed as a state-space step on its two states. Rounds less than direct form I for
     * high-pass and peaking sections far below the sample rate.
     */
    TRANSPOSED_DIRECT_FORM_2
}
