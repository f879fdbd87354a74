package io.github.polewright.inspect;

/**
 * A point {@code e^{jw}} of the unit circle by the sine and cosine of {@code w / 2}, from which its distances to 1 and
 * to -1 come without cancellation.
 */
record UnitPoint(double sinHalf, double cosHalf) {

    static UnitPoint of(double sampleRateHz, double hertz) {
        if (!(hertz >= 0 && hertz <= sampleRateHz / 2)) {
            throw new IllegalArgumentException("frequencyHz is " + hertz + "; it must be from 0 to " + sampleRateHz / 2
                    + ", half the sample rate");
        }
        if (hertz <= sampleRateHz / 4) {
            double angle = Math.PI * (hertz / sampleRateHz);
            return new UnitPoint(Math.sin(angle), Math.cos(angle));
        }
        double angle = Math.PI * ((sampleRateHz / 2 - hertz) / sampleRateHz);
        return new UnitPoint(Math.cos(angle), Math.sin(angle));
    }

    boolean nearerToOne() {
        return sinHalf <= cosHalf;
    }

    double sin() {
        return 2 * sinHalf * cosHalf;
    }

    /** {@code 1 - cos w}. */
    double fromOne() {
        return 2 * sinHalf * sinHalf;
    }

    /** {@code 1 + cos w}. */
    double fromMinusOne() {
        return 2 * cosHalf * cosHalf;
    }
}
