package io.github.polewright.retune;

/**
 * The three numbers a filter is usually turned by. A glide between two settings is even in log frequency, log Q and
 * decibels. A design that has no use for one of them ignores it: pass the same value at both ends.
 *
 * <p><b>Threads</b> immutable. <b>Errors</b> see the constructor.
 *
 * @param frequencyHz centre or corner, in hertz, positive and finite
 * @param q quality factor, positive and finite
 * @param gainDb gain in decibels, finite
 */
public record Setting(double frequencyHz, double q, double gainDb) {

    /**
     * A setting.
     *
     * @param frequencyHz centre or corner, in hertz
     * @param q quality factor
     * @param gainDb gain in decibels
     * @throws IllegalArgumentException if {@code frequencyHz} or {@code q} is not positive and finite, or {@code
     *     gainDb} is not finite
     */
    public Setting {
        requirePositive("frequencyHz", frequencyHz);
        requirePositive("q", q);
        if (!Double.isFinite(gainDb)) {
            throw new IllegalArgumentException("gainDb is " + gainDb + "; it must be finite");
        }
    }

    private static void requirePositive(String name, double value) {
        if (!(value > 0 && value < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException(name + " is " + value + "; it must be positive and finite");
        }
    }

    /** How far apart two settings are in frequency, in octaves. */
    double octavesTo(Setting other) {
        return Math.abs(Math.log(other.frequencyHz / frequencyHz)) / Math.log(2);
    }

    /** The setting at a share of the way, exact at both ends. */
    Setting towards(Setting other, double share) {
        if (share <= 0) {
            return this;
        }
        if (share >= 1) {
            return other;
        }
        return new Setting(
                frequencyHz * Math.pow(other.frequencyHz / frequencyHz, share),
                q * Math.pow(other.q / q, share),
                share * (other.gainDb - gainDb) + gainDb);
    }
}
