package io.github.polewright.bench.budget;

import io.github.polewright.bench.report.Verdict;
import io.github.polewright.bench.workload.Chain;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Judges the mean and the 99th percentile of every situation. The rarer blocks are shown and not judged: there the
 * machine's interruptions are longer than the filter.
 */
final class BudgetVerdict {

    private BudgetVerdict() {}

    static Verdict of(Chain chain, double sharePercent, List<Situation> situations) {
        double allowedMicros = chain.periodNanos() / 1000 * sharePercent / 100;
        List<String> complaints = new ArrayList<>();
        for (Situation situation : situations) {
            judge(situation.name(), "mean", situation.meanMicros().value(), allowedMicros, complaints);
            judge(situation.name(), "99th percentile", situation.times().micros(99), allowedMicros, complaints);
        }
        return Verdict.of(
                complaints,
                String.format(
                        Locale.ROOT,
                        "mean and 99th percentile are within %.3g us, %.3g %% of the period",
                        allowedMicros,
                        sharePercent));
    }

    private static void judge(String name, String what, double micros, double allowed, List<String> complaints) {
        if (!(micros <= allowed)) {
            complaints.add(
                    String.format(Locale.ROOT, "%s: %s is %.3g us and may be %.3g us", name, what, micros, allowed));
        }
    }
}
