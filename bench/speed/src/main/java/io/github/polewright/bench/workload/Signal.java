package io.github.polewright.bench.workload;

/** What flows in. */
public enum Signal {

    /** White noise at half of full scale. */
    NOISE,

    /** A burst of noise, then digital silence for ever: what is left rings down through every magnitude. */
    DECAY,

    /** Noise whose every sample is a subnormal number of the sample format. */
    SUBNORMAL
}
