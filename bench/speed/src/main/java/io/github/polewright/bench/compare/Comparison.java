package io.github.polewright.bench.compare;

import io.github.polewright.bench.report.Report;
import io.github.polewright.bench.report.Row;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/**
 * New over old, row by row.
 *
 * @param lines for all rows that both reports have and whose old value is above 0
 * @param warnings what makes the two hard to compare
 */
record Comparison(List<Line> lines, List<String> warnings) {

    /** Copies the lists. */
    Comparison {
        lines = List.copyOf(lines);
        warnings = List.copyOf(warnings);
    }

    /**
     * A ratio with its spread.
     *
     * @param before in the old report
     * @param after in the new one
     * @param ratio of the middles
     * @param low the least ratio that the two spreads allow
     * @param high the greatest
     */
    record Line(Row before, Row after, double ratio, double low, double high) {

        /** What the spread allows to say. */
        String verdict() {
            if (low > 1) {
                return "more";
            }
            return high < 1 ? "less" : "within the spread";
        }
    }

    static Comparison of(Report before, Report after) {
        Map<String, Row> old = new LinkedHashMap<>();
        before.rows().forEach(row -> old.put(key(row), row));
        List<Line> lines = new ArrayList<>();
        for (Row row : after.rows()) {
            Row match = old.get(key(row));
            if (match != null && match.low() > 0) {
                lines.add(new Line(
                        match, row, row.value() / match.value(), row.low() / match.high(), row.high() / match.low()));
            }
        }
        return new Comparison(lines, warnings(before, after));
    }

    private static String key(Row row) {
        return row.name() + " / " + row.unit();
    }

    private static List<String> warnings(Report before, Report after) {
        List<String> warnings = new ArrayList<>();
        differ(warnings, "commands", before.command(), after.command());
        differ(warnings, "setups", before.setup(), after.setup());
        differ(
                warnings,
                "processors",
                before.machine().processor(),
                after.machine().processor());
        return warnings;
    }

    private static void differ(List<String> warnings, String what, Object before, Object after) {
        if (!Objects.equals(before, after)) {
            warnings.add("the " + what + " differ: " + before + " and " + after);
        }
    }
}
