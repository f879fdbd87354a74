package io.github.polewright.retune;

/**
 * A bound of one section's output for every input with |x| at most 1, followed frame by frame while its coefficients
 * change, in direct form I arithmetic. Derived for this project.
 *
 * <p>With gamma = b2/a2 the section is y = b0 x + u1 with a state (u1, u2) into which each input sample injects
 * I = |(b1 - a1 b0) - conj(w)(b0 - gamma)| / sqrt(h) in the norm of the home w. F bounds that norm: a frame makes it
 * sigma F + I; a change of coefficients over the home distance delta makes it
 * e^(delta/2) F + (|b0' - b0| + |w'| |gamma' - gamma|)/sqrt(h'). Then |y| is at most |b0| + |w| F / sqrt(h). Where
 * |a2| is below 1e-3, gamma is 0 and I has |b2|/sqrt(h) more.
 */
final class ForcedBound {

    private static final double LEAST_A2 = 1e-3;

    private double b0;
    private double gamma;
    private double a1;
    private double a2;
    private double size;
    private double decay;
    private double injection;
    private double norm;

    /** A section that has run for ever. */
    ForcedBound(double b0, double b1, double b2, double a1, double a2) {
        set(b0, b1, b2, a1, a2);
        norm = injection / decay;
    }

    /** Coefficients change before the next sample. */
    void change(double b0, double b1, double b2, double a1, double a2) {
        double beforeB0 = this.b0;
        double beforeGamma = gamma;
        double growth = 1;
        if (a1 != this.a1 || a2 != this.a2) {
            growth = Distance.growth(Distance.halfSinh(this.a1, this.a2, a1, a2));
        }
        set(b0, b1, b2, a1, a2);
        double moved = Math.abs(b0 - beforeB0);
        double turned = Math.abs(gamma - beforeGamma);
        // size is |w| / sqrt(h) and size / |w| is 1 / sqrt(h).
        norm = growth * norm + moved / Math.sqrt(Poles.height(a1, a2)) + size * turned;
    }

    /** One frame of input. */
    void step() {
        norm = norm - decay * norm + injection;
    }

    /** The bound of |y| for the frame just stepped. */
    double output() {
        return Math.abs(b0) + size * norm;
    }

    /** The bound of |y| from here on while the coefficients stay. */
    double rest() {
        return Math.abs(b0) + size * Math.max(norm, injection / decay);
    }

    private void set(double b0, double b1, double b2, double a1, double a2) {
        this.b0 = b0;
        this.a1 = a1;
        this.a2 = a2;
        boolean divides = Math.abs(a2) >= LEAST_A2;
        gamma = divides ? b2 / a2 : 0;
        double centre = Poles.centre(a1);
        double height = Poles.height(a1, a2);
        double root = Math.sqrt(height);
        decay = Poles.decay(a1, a2);
        size = Math.hypot(centre, height) / root;
        injection = Math.hypot(b1 - a1 * b0 - centre * (b0 - gamma), height * (b0 - gamma)) / root;
        if (!divides) {
            injection += Math.abs(b2) / root;
        }
    }
}
