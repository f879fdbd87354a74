package io.github.polewright.samples.report;

import java.math.BigDecimal;
import java.util.Locale;

/** Numbers as text, the same in every country. */
final class Numbers {

    private Numbers() {}

    static String format(String pattern, Object... values) {
        return String.format(Locale.ROOT, pattern, values);
    }

    /** A linear size in decibels, with a word for nothing. */
    static String decibels(double size) {
        return size == 0 ? "none" : format("%.1f dB", 20 * Math.log10(Math.abs(size)));
    }

    /** A number without an exponent, and without a fraction where it has none. */
    static String plain(double value) {
        return BigDecimal.valueOf(value).stripTrailingZeros().toPlainString();
    }
}
