package io.github.polewright.bench.cold;

import io.github.polewright.bench.command.ChainOptions;
import io.github.polewright.bench.command.FreshJvm;
import io.github.polewright.bench.command.Output;
import io.github.polewright.bench.report.Json;
import io.github.polewright.bench.report.Report;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Verdict;
import io.github.polewright.bench.workload.Chain;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Measures the first blocks of fresh JVMs, with and without a warm-up. */
@Command(
        name = "cold",
        mixinStandardHelpOptions = true,
        description = "What the first blocks of a fresh JVM cost at the callback's pace, with and without the warm-up,"
                + " and how many would have missed the deadline. Always exit status 0: it informs, it does not judge.")
public final class ColdCommand implements Callable<Integer> {

    private static final double NANOS_PER_MICRO = 1000;

    @Spec
    private @Nullable CommandSpec spec;

    @Mixin
    private ChainOptions chainOptions = new ChainOptions();

    @Mixin
    private Output output = new Output();

    @Option(
            names = "--blocks",
            defaultValue = "2000",
            paramLabel = "N",
            description = "Blocks in each JVM (${DEFAULT-VALUE}).")
    private int blocks;

    @Option(
            names = "--forks",
            defaultValue = "3",
            paramLabel = "N",
            description = "JVMs with the warm-up, and as many without (${DEFAULT-VALUE}).")
    private int forks;

    @Option(
            names = "--warm-millis",
            defaultValue = "5000",
            paramLabel = "N",
            description = "Milliseconds the warm-up may take at most (${DEFAULT-VALUE}).")
    private long warmMillis;

    @Option(
            names = "--share",
            defaultValue = "5",
            paramLabel = "PERCENT",
            description = "Share of the period the chain may take (${DEFAULT-VALUE}).")
    private double sharePercent;

    /** For the option parser. */
    public ColdCommand() {}

    @Override
    public Integer call() throws Exception {
        CommandSpec command = Objects.requireNonNull(spec);
        Chain chain = chainOptions.chain(command);
        if (blocks < 1 || forks < 1 || warmMillis < 1 || !(sharePercent > 0 && sharePercent <= 100)) {
            throw new ParameterException(
                    command.commandLine(),
                    "--blocks, --forks and --warm-millis must each be at least 1, --share above 0 and at most 100");
        }
        output.begin(command, "First blocks of " + ChainOptions.line(chain));
        List<ColdTimes> cold = new ArrayList<>();
        List<ColdTimes> warmed = new ArrayList<>();
        for (int i = 1; i <= forks; i++) {
            Output.progress(command, "JVM " + i + " of " + forks + ", cold ...");
            cold.add(fork(chain, 0));
            Output.progress(command, "JVM " + i + " of " + forks + ", warmed up ...");
            warmed.add(fork(chain, warmMillis));
        }
        double periodMicros = chain.periodNanos() / NANOS_PER_MICRO;
        double allowedMicros = periodMicros * sharePercent / 100;
        ColdSummary left = new ColdSummary("cold", cold, periodMicros, allowedMicros);
        ColdSummary right = new ColdSummary("warmed up", warmed, periodMicros, allowedMicros);
        return output.end(command, ColdSummary.table(left, right), report(chain, left, right));
    }

    private ColdTimes fork(Chain chain, long millis) throws IOException, InterruptedException {
        List<String> arguments = new ArrayList<>(List.of("cold-fork", "--blocks=" + blocks, "--warm-millis=" + millis));
        arguments.addAll(List.of(ChainOptions.arguments(chain)));
        return Json.parse(FreshJvm.run(List.of(), arguments), ColdTimes.class);
    }

    private Report report(Chain chain, ColdSummary cold, ColdSummary warmed) {
        Map<String, String> setup = ChainOptions.setup(chain);
        setup.put("blocks", String.valueOf(blocks));
        setup.put("warmMillis", String.valueOf(warmMillis));
        setup.put("sharePercent", String.valueOf(sharePercent));
        List<Row> rows = new ArrayList<>(cold.rows());
        rows.addAll(warmed.rows());
        return Report.of("cold", setup, rows, List.of(), new Verdict(true, verdict(cold, warmed)));
    }

    private String verdict(ColdSummary cold, ColdSummary warmed) {
        return String.format(
                Locale.ROOT,
                "Of %d blocks, %.0f would have missed the deadline cold and %.0f warmed up.",
                blocks,
                missed(cold),
                missed(warmed));
    }

    private static double missed(ColdSummary summary) {
        return summary.rows().stream()
                .filter(row -> row.name().endsWith("over the period"))
                .mapToDouble(Row::value)
                .sum();
    }
}
