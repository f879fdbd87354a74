package io.github.polewright.bench.contender;

/** One section of one channel as an object: state and coefficients in fields. */
interface ObjectSection {

    /** Filters one sample. */
    double next(double x);
}
