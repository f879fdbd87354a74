package io.github.polewright.bench.tones;

import io.github.polewright.bench.command.Output;
import io.github.polewright.bench.jmh.ToneBlocks;
import io.github.polewright.bench.measure.BlockMean;
import io.github.polewright.bench.report.Report;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Table;
import io.github.polewright.bench.report.Verdict;
import io.github.polewright.bench.workload.Listener;
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

/** Measures what listens for tones, one channel each, as a share of that channel's time. */
@Command(
        name = "tones",
        mixinStandardHelpOptions = true,
        description = "What reading tone pairs, meters and cadences take of one channel's time, at 8 and 48 kHz. Exit"
                + " status 0 if each of the library's own keeps the share, 3 if not.")
public final class TonesCommand implements Callable<Integer> {

    private static final double[] RATES_HZ = {8000, 48_000};
    private static final double BLOCK_MICROS = 1e6 / ToneBlocks.BLOCKS;

    @Spec
    private @Nullable CommandSpec spec;

    @Mixin
    private Output output = new Output();

    @Option(
            names = "--share",
            defaultValue = "2",
            paramLabel = "PERCENT",
            description = "Share of a channel's time that each may take (${DEFAULT-VALUE}).")
    private double sharePercent;

    @Option(
            names = "--forks",
            defaultValue = "1",
            paramLabel = "N",
            description = "JVMs to measure in (${DEFAULT-VALUE}).")
    private int forks;

    @Option(
            names = "--seconds",
            defaultValue = "3",
            paramLabel = "N",
            description = "Seconds measured in each JVM, after two of warm-up (${DEFAULT-VALUE}).")
    private int seconds;

    /** For the option parser. */
    public TonesCommand() {}

    @Override
    public Integer call() throws Exception {
        CommandSpec command = Objects.requireNonNull(spec);
        if (!(sharePercent > 0 && sharePercent <= 100)) {
            throw new ParameterException(
                    command.commandLine(), "--share is " + sharePercent + "; it must be above 0 and at most 100");
        }
        if (forks < 1 || seconds < 1) {
            throw new ParameterException(command.commandLine(), "--forks and --seconds must each be at least 1");
        }
        output.begin(command, "Listening for tones in one channel, blocks of 10 ms");
        List<Row> rows = new ArrayList<>();
        List<String> complaints = new ArrayList<>();
        Table table = new Table("listener", "Hz", "us a block", "spread", "share %");
        for (double rate : RATES_HZ) {
            for (Listener listener : Listener.values()) {
                Output.progress(command, listener.title() + " at " + rate + " Hz ...");
                Row row = row(listener, rate);
                rows.add(row);
                double share = 100 * row.value() / BLOCK_MICROS;
                table.add(
                        listener.title(),
                        text("%.0f", rate),
                        text("%.2f", row.value()),
                        text("%.2f to %.2f", row.low(), row.high()),
                        text("%.3f", share));
                if (share > sharePercent && listener.isOurs()) {
                    complaints.add(row.name() + text(" takes %.2f %%", share));
                }
            }
        }
        Map<String, String> setup =
                Map.of("sharePercent", String.valueOf(sharePercent), "forks", String.valueOf(forks));
        Verdict verdict = Verdict.of(complaints, text("each keeps %.1f %% of a channel's time", sharePercent));
        return output.end(command, table.toString(), Report.of("tones", setup, rows, List.of(), verdict));
    }

    private Row row(Listener listener, double rateHz) throws RunnerException {
        Map<String, String> parameters = Map.of("sampleRateHz", String.valueOf(rateHz), "listener", listener.name());
        return BlockMean.micros(
                listener.title() + text(" at %.0f Hz", rateHz), ToneBlocks.class, parameters, forks, seconds);
    }

    private static String text(String pattern, Object... values) {
        return String.format(Locale.ROOT, pattern, values);
    }
}
