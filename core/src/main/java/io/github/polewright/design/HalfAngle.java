package io.github.polewright.design;

/**
 * Sine and cosine of {@code w / 2} for a frequency {@code w} in radians a sample. The half angle is what keeps designs
 * accurate: {@code 1 - cos w} is {@code 2 sin^2(w/2)}, {@code 1 + cos w} is {@code 2 cos^2(w/2)}, and neither cancels.
 */
record HalfAngle(double sin, double cos) {

    static HalfAngle of(double sampleRateHz, double hertz) {
        if (hertz <= sampleRateHz / 4) {
            double angle = Math.PI * (hertz / sampleRateHz);
            return new HalfAngle(Math.sin(angle), Math.cos(angle));
        }
        // Near Nyquist the distance to it is exact, the angle is not.
        double angle = Math.PI * ((sampleRateHz / 2 - hertz) / sampleRateHz);
        return new HalfAngle(Math.cos(angle), Math.sin(angle));
    }

    double tan() {
        return sin / cos;
    }

    double sinOfWhole() {
        return 2 * sin * cos;
    }

    double cosOfWhole() {
        if (sin < 0.5) {
            return Math.fma(-2 * sin, sin, 1);
        }
        return cos < 0.5 ? Math.fma(2 * cos, cos, -1) : (cos - sin) * (cos + sin);
    }
}
