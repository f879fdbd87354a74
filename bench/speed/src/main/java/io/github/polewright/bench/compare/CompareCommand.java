package io.github.polewright.bench.compare;

import io.github.polewright.bench.report.Json;
import io.github.polewright.bench.report.Machine;
import io.github.polewright.bench.report.Report;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Table;
import io.github.polewright.bench.report.Verdict;
import java.io.IOException;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Puts two reports side by side. */
@Command(
        name = "compare",
        mixinStandardHelpOptions = true,
        description = "Ratios of two reports, new over old, with their spread: two JVMs, or two releases."
                + " Exit status 0; with --most, 3 if a ratio is above it and its spread excludes 1.")
public final class CompareCommand implements Callable<Integer> {

    @Spec
    private @Nullable CommandSpec spec;

    @Parameters(index = "0", paramLabel = "OLD.json", description = "The report to divide by.")
    private @Nullable Path before;

    @Parameters(index = "1", paramLabel = "NEW.json", description = "The report to divide.")
    private @Nullable Path after;

    @Option(names = "--most", paramLabel = "RATIO", description = "The highest ratio of times that is accepted.")
    private double most = Double.POSITIVE_INFINITY;

    /** For the option parser. */
    public CompareCommand() {}

    @Override
    public Integer call() throws IOException {
        CommandSpec command = Objects.requireNonNull(spec);
        if (!(most > 0)) {
            throw new ParameterException(command.commandLine(), "--most is " + most + "; it must be above 0");
        }
        Report old = Json.read(Objects.requireNonNull(before));
        Report fresh = Json.read(Objects.requireNonNull(after));
        Comparison comparison = Comparison.of(old, fresh);
        if (comparison.lines().isEmpty()) {
            throw new IOException(before + " and " + after + " have no row in common that can be divided");
        }
        PrintWriter out = command.commandLine().getOut();
        headers(out, old.machine(), fresh.machine());
        comparison.warnings().forEach(warning -> out.println("Caution: " + warning));
        out.println(table(comparison));
        Verdict verdict = verdict(comparison, most);
        out.println(verdict.line());
        out.flush();
        return verdict.exitStatus();
    }

    private static void headers(PrintWriter out, Machine old, Machine fresh) {
        List<String> left = old.header();
        List<String> right = fresh.header();
        for (int i = 0; i < left.size(); i++) {
            if (left.get(i).equals(right.get(i))) {
                out.println("both  " + left.get(i));
            } else {
                out.println("old   " + left.get(i));
                out.println("new   " + right.get(i));
            }
        }
        out.println();
    }

    private static String table(Comparison comparison) {
        Table table = new Table("row", "unit", "old", "new", "new/old", "spread", "");
        for (Comparison.Line line : comparison.lines()) {
            table.add(
                    line.after().name(),
                    line.after().unit(),
                    text(line.before()),
                    text(line.after()),
                    String.format(Locale.ROOT, "%.3f", line.ratio()),
                    String.format(Locale.ROOT, "%.3f to %.3f", line.low(), line.high()),
                    line.verdict());
        }
        return table.toString();
    }

    private static String text(Row row) {
        return String.format(Locale.ROOT, "%.4g", row.value());
    }

    static Verdict verdict(Comparison comparison, double most) {
        List<String> complaints = comparison.lines().stream()
                .filter(line -> line.ratio() > most && line.low() > 1)
                .map(line -> String.format(
                        Locale.ROOT, "%s: ratio %.3f, may be %.3f", line.after().name(), line.ratio(), most))
                .toList();
        long more = count(comparison, "more");
        long less = count(comparison, "less");
        return Verdict.of(
                complaints,
                more + " rows clearly more, " + less + " clearly less, "
                        + (comparison.lines().size() - more - less) + " within the spread");
    }

    private static long count(Comparison comparison, String verdict) {
        return comparison.lines().stream()
                .filter(line -> line.verdict().equals(verdict))
                .count();
    }
}
