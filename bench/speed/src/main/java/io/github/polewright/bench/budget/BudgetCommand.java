package io.github.polewright.bench.budget;

import io.github.polewright.bench.command.ChainOptions;
import io.github.polewright.bench.command.Output;
import io.github.polewright.bench.report.Curve;
import io.github.polewright.bench.report.Report;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Table;
import io.github.polewright.bench.report.WholeFile;
import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.Signal;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import org.openjdk.jmh.runner.RunnerException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Measures a described chain against its callback period. */
@Command(
        name = "budget",
        mixinStandardHelpOptions = true,
        description = "What a chain takes of the callback period: on noise, on a decay into silence, and with a new"
                + " target at every block's start. Exit status 0 if the share is kept, 3 if not.")
public final class BudgetCommand implements Callable<Integer> {

    @Spec
    private @Nullable CommandSpec spec;

    @Mixin
    private ChainOptions chainOptions = new ChainOptions();

    @Mixin
    private Output output = new Output();

    @Option(
            names = "--share",
            defaultValue = "5",
            paramLabel = "PERCENT",
            description = "Share of the period the chain may take (${DEFAULT-VALUE}).")
    private double sharePercent;

    @Option(
            names = "--chart",
            paramLabel = "FILE.png",
            description = "Draw how the times of the blocks are distributed, beside the period.")
    private @Nullable Path chart;

    @Option(
            names = "--forks",
            defaultValue = "1",
            paramLabel = "N",
            description = "JVMs to measure in (${DEFAULT-VALUE}).")
    private int forks;

    @Option(
            names = "--warm-seconds",
            defaultValue = "3",
            paramLabel = "N",
            description = "Seconds of warm-up in each JVM (${DEFAULT-VALUE}).")
    private int warmSeconds;

    @Option(
            names = "--seconds",
            defaultValue = "5",
            paramLabel = "N",
            description = "Seconds measured in each JVM (${DEFAULT-VALUE}).")
    private int seconds;

    /** For the option parser. */
    public BudgetCommand() {}

    @Override
    public Integer call() throws Exception {
        CommandSpec command = Objects.requireNonNull(spec);
        Chain chain = chainOptions.chain(command);
        check(command);
        WholeFile.check(chart);
        output.begin(command, "Budget of " + ChainOptions.line(chain));
        List<Situation> situations = measure(command, chain);
        Report report = report(chain, situations);
        if (chart != null) {
            BudgetChart.write(
                    chain, sharePercent, report.curves(), report.machine().jvm(), chart);
        }
        return output.end(command, table(chain, situations), report);
    }

    private void check(CommandSpec command) {
        if (!(sharePercent > 0 && sharePercent <= 100)) {
            throw new ParameterException(
                    command.commandLine(), "--share is " + sharePercent + "; it must be above 0 and at most 100");
        }
        if (chart != null && !chart.toString().toLowerCase(Locale.ROOT).endsWith(".png")) {
            throw new ParameterException(command.commandLine(), "--chart is " + chart + "; its name must end in .png");
        }
        if (forks < 1 || warmSeconds < 1 || seconds < 1) {
            throw new ParameterException(
                    command.commandLine(), "--forks, --warm-seconds and --seconds must each be at least 1");
        }
    }

    private List<Situation> measure(CommandSpec command, Chain chain) throws RunnerException {
        BudgetRun run = new BudgetRun(chain, forks, warmSeconds, seconds);
        List<Situation> situations = new ArrayList<>();
        Output.progress(command, "noise ...");
        situations.add(run.steady("noise", Signal.NOISE));
        Output.progress(command, "decay into silence ...");
        situations.add(run.steady("decay into silence", Signal.DECAY));
        Output.progress(command, "retuned every block ...");
        situations.add(run.retuned("retuned every block"));
        return situations;
    }

    private Report report(Chain chain, List<Situation> situations) {
        Map<String, String> setup = ChainOptions.setup(chain);
        setup.put("sharePercent", String.valueOf(sharePercent));
        List<Row> rows = new ArrayList<>();
        List<Curve> curves = new ArrayList<>();
        for (Situation situation : situations) {
            rows.addAll(situation.rows(chain));
            curves.add(situation.times().curve(situation.name()));
        }
        return Report.of("budget", setup, rows, curves, BudgetVerdict.of(chain, sharePercent, situations));
    }

    private static String table(Chain chain, List<Situation> situations) {
        Table table = new Table(
                "situation", "ns/sample/section", "us/block", "% of period", "p50", "p99", "p99.99", "max us");
        for (Situation situation : situations) {
            table.add(
                    situation.name(),
                    text("%.3f", situation.nanosPerSamplePerSection(chain)),
                    text("%.3f", situation.meanMicros().value()),
                    text("%.3f", situation.sharePercent(chain)),
                    text("%.2f", situation.times().micros(50)),
                    text("%.2f", situation.times().micros(99)),
                    text("%.2f", situation.times().micros(99.99)),
                    text("%.2f", situation.times().longestMicros()));
        }
        return table.toString();
    }

    private static String text(String format, double value) {
        return String.format(Locale.ROOT, format, value);
    }
}
