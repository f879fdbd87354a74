package io.github.polewright.bench.gate;

import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Table;
import java.util.List;
import java.util.Locale;

/**
 * A number and the range it must lie in.
 *
 * @param row the number
 * @param least the lowest that passes
 * @param most the highest that passes
 */
record Check(Row row, double least, double most) {

    static Check atMost(Row row, double most) {
        return new Check(row, 0, most);
    }

    boolean passed() {
        return row.value() >= least && row.value() <= most;
    }

    String complaint() {
        return String.format(
                Locale.ROOT,
                "%s is %.3g %s and must be from %.3g to %.3g",
                row.name(),
                row.value(),
                row.unit(),
                least,
                most);
    }

    static List<String> complaints(List<Check> checks) {
        return checks.stream()
                .filter(check -> !check.passed())
                .map(Check::complaint)
                .toList();
    }

    static Table table(List<Check> checks) {
        Table table = new Table("check", "value", "spread", "least", "most", "unit", "");
        for (Check check : checks) {
            table.add(
                    check.row.name(),
                    text(check.row.value()),
                    text(check.row.low()) + " to " + text(check.row.high()),
                    text(check.least),
                    text(check.most),
                    check.row.unit(),
                    check.passed() ? "passed" : "FAILED");
        }
        return table;
    }

    private static String text(double value) {
        return String.format(Locale.ROOT, "%.3g", value);
    }
}
