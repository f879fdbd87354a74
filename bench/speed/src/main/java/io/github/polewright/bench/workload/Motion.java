package io.github.polewright.bench.workload;

/** What the coefficients do meanwhile. */
public enum Motion {

    /** They stand still. */
    STEADY,

    /** They glide all the time. */
    RAMPING,

    /** They glide, and a new target waits at every block's start. */
    RETUNED
}
