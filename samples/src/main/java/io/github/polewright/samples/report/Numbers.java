package io.github.polewright.samples.report;

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
}
