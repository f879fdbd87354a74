package io.github.polewright.bench.cold;

import io.github.polewright.bench.measure.Score;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Table;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.function.ToDoubleFunction;

/** Several fresh JVMs in a few numbers, each the median of the JVMs between the least and the most of them. */
final class ColdSummary {

    private static final int[] ENDS = {1, 10, 100, 500};

    private final List<Row> rows = new ArrayList<>();

    ColdSummary(String name, List<ColdTimes> forks, double periodMicros, double allowedMicros) {
        int blocks = forks.get(0).blocks();
        int first = 1;
        for (int end : ENDS) {
            if (end < blocks) {
                span(name, forks, first, end);
                first = end + 1;
            }
        }
        span(name, forks, first, blocks);
        add(name + ": blocks over the period", "blocks", forks, fork -> fork.over(periodMicros));
        add(name + ": blocks over the share", "blocks", forks, fork -> fork.over(allowedMicros));
        add(name + ": last block over the share", "blocks", forks, fork -> fork.lastOver(allowedMicros));
        add(name + ": warm-up took", "ms", forks, ColdTimes::warmUpMillis);
    }

    private void span(String name, List<ColdTimes> forks, int first, int last) {
        String span = first == last ? "block " + first : "blocks " + first + " to " + last;
        add(name + ": " + span + ", mean", "us", forks, fork -> fork.meanMicros(first, last));
        add(name + ": " + span + ", longest", "us", forks, fork -> fork.longestMicros(first, last));
    }

    private void add(String name, String unit, List<ColdTimes> forks, ToDoubleFunction<ColdTimes> number) {
        Score score = new Score(forks.stream().mapToDouble(number).toArray());
        rows.add(new Row(name, unit, score.median(), score.least(), score.quantile(1)));
    }

    List<Row> rows() {
        return List.copyOf(rows);
    }

    /** Both summaries side by side. */
    static String table(ColdSummary cold, ColdSummary warmed) {
        Table table = new Table("of a fresh JVM", "cold", "least to most", "warmed up", "least to most", "unit");
        for (int i = 0; i < cold.rows.size(); i++) {
            Row left = cold.rows.get(i);
            Row right = warmed.rows.get(i);
            String name = left.name().substring(left.name().indexOf(": ") + 2);
            table.add(name, text(left.value()), spread(left), text(right.value()), spread(right), left.unit());
        }
        return table.toString();
    }

    private static String spread(Row row) {
        return text(row.low()) + " to " + text(row.high());
    }

    private static String text(double value) {
        return String.format(Locale.ROOT, value == Math.rint(value) ? "%.0f" : "%.1f", value);
    }
}
