package io.github.polewright.bench.report;

/**
 * A number with its spread.
 *
 * @param name what it is of; rows of two reports are matched by name and unit
 * @param unit of the three numbers
 * @param value the middle: a mean or a median
 * @param low the lower end of its spread
 * @param high the upper end of its spread
 */
public record Row(String name, String unit, double value, double low, double high) {

    /** Checks that the numbers are finite. */
    public Row {
        if (!Double.isFinite(value) || !Double.isFinite(low) || !Double.isFinite(high)) {
            throw new IllegalArgumentException(
                    name + " is " + value + " (" + low + " to " + high + ") " + unit + "; it must be finite");
        }
    }

    /**
     * A number without a spread.
     *
     * @param name what it is of
     * @param unit of the number
     * @param value the number
     * @return the row
     */
    public static Row exact(String name, String unit, double value) {
        return new Row(name, unit, value, value, value);
    }

    /**
     * A count.
     *
     * @param name what it is of
     * @param unit of what is counted
     * @param count how many
     * @return the row
     */
    public static Row count(String name, String unit, long count) {
        return exact(name, unit, (double) count);
    }
}
