package io.github.polewright.retune;

import io.github.polewright.Section;

/** Two by two matrices, written out: state matrices, their products, and norms in a changed basis. */
record Plane(double a, double b, double c, double d) {

    static final Plane IDENTITY = new Plane(1, 0, 0, 1);

    /** x[n] = A x[n-1] on x = (y[n-1], y[n-2]). */
    static Plane state(double a1, double a2) {
        return new Plane(-a1, -a2, 1, 0);
    }

    static Plane state(Section section) {
        return state(section.a1(), section.a2());
    }

    /** The basis in which |y1 - conj(w) y2| / sqrt(Im w) is the Euclidean norm. */
    static Plane basis(double centre, double height) {
        double root = Math.sqrt(height);
        return new Plane(1 / root, -centre / root, 0, height / root);
    }

    Plane times(Plane right) {
        return new Plane(
                a * right.a + b * right.c,
                a * right.b + b * right.d,
                c * right.a + d * right.c,
                c * right.b + d * right.d);
    }

    Plane power(int exponent) {
        Plane result = IDENTITY;
        Plane square = this;
        for (int rest = exponent; rest > 0; rest >>= 1) {
            result = (rest & 1) == 1 ? square.times(result) : result;
            square = square.times(square);
        }
        return result;
    }

    Plane inverse() {
        double determinant = a * d - b * c;
        return new Plane(d / determinant, -b / determinant, -c / determinant, a / determinant);
    }

    double spectralRadius() {
        double half = (a + d) / 2;
        double determinant = a * d - b * c;
        double discriminant = half * half - determinant;
        return discriminant < 0 ? Math.sqrt(determinant) : Math.abs(half) + Math.sqrt(discriminant);
    }

    /** The largest singular value. */
    double norm() {
        return (Math.hypot(a + d, b - c) + Math.hypot(a - d, b + c)) / 2;
    }

    /** The norm of this map from one basis to another. */
    double norm(Plane from, Plane to) {
        return to.times(this).times(from.inverse()).norm();
    }

    /** The norm's basis of a section's own poles, found here from their real and imaginary parts. */
    static Plane basisOf(Section section) {
        double centre = -section.a1() / 2;
        double square = section.a2() - centre * centre;
        double radius = square >= 0 ? Math.sqrt(section.a2()) : Math.abs(centre) + Math.sqrt(-square);
        return basis(centre, Math.max(Math.sqrt(Math.abs(square)), (1 - radius) / 2));
    }
}
