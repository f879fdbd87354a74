package io.github.polewright.bench.contest;

import io.github.polewright.bench.measure.Score;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Table;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/**
 * What became of a promise in one run.
 *
 * @param goal the promise
 * @param row the median ratio and its quartiles
 * @param ratioOfLeast of the quickest turns
 */
record Outcome(Goal goal, Row row, double ratioOfLeast) {

    static Outcome of(Goal goal, Map<String, Score> scores) {
        return new Outcome(goal, goal.row(scores), goal.ratioOfLeast(scores));
    }

    boolean broken() {
        return !goal.keptBy(row.value());
    }

    static Table table(List<Outcome> outcomes) {
        Table table = new Table("ratio", "promise", "median", "quartiles", "of minima", "");
        for (Outcome outcome : outcomes) {
            Row row = outcome.row();
            table.add(
                    row.name(),
                    outcome.goal().promise(),
                    text(row.value()),
                    text(row.low()) + " to " + text(row.high()),
                    text(outcome.ratioOfLeast()),
                    outcome.goal().outcome(row.value()));
        }
        return table;
    }

    static String line(List<Outcome> outcomes) {
        long broken = outcomes.stream().filter(Outcome::broken).count();
        long promised =
                outcomes.stream().filter(outcome -> outcome.goal().promised()).count();
        return (promised - broken) + " of " + promised + " promises kept in this run.";
    }

    private static String text(double ratio) {
        return String.format(Locale.ROOT, "%.2f", ratio);
    }
}
