package io.github.polewright.inspect;

/** Grids of frequencies for a {@link Response}, ends included exactly. */
public final class FrequencyGrid {

    private FrequencyGrid() {}

    /**
     * Equal steps in hertz.
     *
     * @param fromHz the first frequency in hertz
     * @param toHz the last frequency in hertz
     * @param count how many, at least 2
     * @return the frequencies
     * @throws IllegalArgumentException if an end is not finite or negative, {@code toHz <= fromHz} or {@code count < 2}
     */
    public static double[] linear(double fromHz, double toHz, int count) {
        check(fromHz, toHz, count, 0);
        double[] frequenciesHz = new double[count];
        for (int i = 0; i < count; i++) {
            frequenciesHz[i] = fromHz + (toHz - fromHz) * i / (count - 1);
        }
        frequenciesHz[count - 1] = toHz;
        return frequenciesHz;
    }

    /**
     * Equal ratios.
     *
     * @param fromHz the first frequency in hertz, above 0
     * @param toHz the last frequency in hertz
     * @param count how many, at least 2
     * @return the frequencies
     * @throws IllegalArgumentException if an end is not finite or not above 0, {@code toHz <= fromHz} or
     *     {@code count < 2}
     */
    public static double[] logarithmic(double fromHz, double toHz, int count) {
        check(fromHz, toHz, count, Double.MIN_VALUE);
        double[] frequenciesHz = new double[count];
        for (int i = 0; i < count; i++) {
            frequenciesHz[i] = fromHz * Math.pow(toHz / fromHz, (double) i / (count - 1));
        }
        frequenciesHz[count - 1] = toHz;
        return frequenciesHz;
    }

    private static void check(double fromHz, double toHz, int count, double leastHz) {
        if (!(fromHz >= leastHz && fromHz < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException(
                    "fromHz is " + fromHz + "; it must be finite and " + (leastHz > 0 ? "above 0" : "at least 0"));
        }
        if (!(toHz > fromHz && toHz < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("toHz is " + toHz + "; it must be finite and above fromHz, " + fromHz);
        }
        if (count < 2) {
            throw new IllegalArgumentException("count is " + count + "; it must be at least 2");
        }
    }
}
