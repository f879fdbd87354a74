package io.github.polewright.bench.workload;

/** How samples come and go. */
public enum Samples {

    /** 32-bit. */
    FLOAT,

    /** 64-bit. */
    DOUBLE
}
