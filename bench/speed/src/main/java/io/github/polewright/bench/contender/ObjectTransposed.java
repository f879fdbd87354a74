package io.github.polewright.bench.contender;

import io.github.polewright.Section;

/** Transposed direct form II as textbooks print it (Oppenheim and Schafer, Discrete-Time Signal Processing, ch. 6). */
final class ObjectTransposed implements ObjectSection {

    private final double b0;
    private final double b1;
    private final double b2;
    private final double a1;
    private final double a2;
    private double s1;
    private double s2;

    ObjectTransposed(Section section) {
        b0 = section.b0();
        b1 = section.b1();
        b2 = section.b2();
        a1 = section.a1();
        a2 = section.a2();
    }

    @Override
    public double next(double x) {
        double y = b0 * x + s1;
        s1 = b1 * x - a1 * y + s2;
        s2 = b2 * x - a2 * y;
        return y;
    }
}
