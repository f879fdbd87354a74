package io.github.polewright.bench.contender;

import io.github.polewright.Section;

/** Direct form I as textbooks print it (Oppenheim and Schafer, Discrete-Time Signal Processing, chapter 6). */
final class ObjectDirectForm1 implements ObjectSection {

    private final double b0;
    private final double b1;
    private final double b2;
    private final double a1;
    private final double a2;
    private double x1;
    private double x2;
    private double y1;
    private double y2;

    ObjectDirectForm1(Section section) {
        b0 = section.b0();
        b1 = section.b1();
        b2 = section.b2();
        a1 = section.a1();
        a2 = section.a2();
    }

    @Override
    public double next(double x) {
        double y = b0 * x + b1 * x1 + b2 * x2 - a1 * y1 - a2 * y2;
        x2 = x1;
        x1 = x;
        y2 = y1;
        y1 = y;
        return y;
    }
}
