package io.github.polewright.bench.hum;

import io.github.polewright.bench.command.Output;
import io.github.polewright.bench.jmh.HumRemoverBlocks;
import io.github.polewright.bench.measure.BlockMean;
import io.github.polewright.bench.measure.LeastTimes;
import io.github.polewright.bench.report.Report;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Table;
import io.github.polewright.bench.report.Verdict;
import io.github.polewright.mains.Removal;
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

/** Measures hum removal with 20 lines as a share of a core, and how far its dearest block stands above the mean. */
@Command(
        name = "hum",
        mixinStandardHelpOptions = true,
        description = "What following the mains and removing 20 lines takes of a core, by subtraction and by notches,"
                + " and the dearest block of a passage from the first search on. Exit status 0 if both keep the share"
                + " and the ratio, 3 if not.")
public final class HumCommand implements Callable<Integer> {

    private static final int MEASURED_SECONDS = 4;
    private static final int LEAST_RATE_HZ = 8000;
    private static final int MOST_RATE_HZ = 192_000;
    private static final int MOST_FRAMES = 8192;
    private static final int MOST_CHANNELS = 64;
    private static final int MOST_REPEATS = 10_000;
    private static final double LEAST_SHARE = 0.001;
    private static final double MOST_RATIO = 1000;

    @Spec
    private @Nullable CommandSpec spec;

    @Mixin
    private Output output = new Output();

    @Option(
            names = "--rate-hz",
            defaultValue = "48000",
            paramLabel = "HZ",
            description = "Sample rate, 8000 to 192000 (${DEFAULT-VALUE}).")
    private int sampleRateHz;

    @Option(
            names = "--channels",
            defaultValue = "2",
            paramLabel = "N",
            description = "Channels, 1 to 64 (${DEFAULT-VALUE}).")
    private int channels;

    @Option(
            names = "--frames",
            defaultValue = "128",
            paramLabel = "N",
            description = "Frames a block, 1 to 8192 (${DEFAULT-VALUE}).")
    private int frames;

    @Option(
            names = "--share",
            defaultValue = "1.5",
            paramLabel = "PERCENT",
            description = "Share of a core that either way may take (${DEFAULT-VALUE}).")
    private double sharePercent;

    @Option(
            names = "--ratio",
            defaultValue = "3",
            paramLabel = "R",
            description = "How many times the mean the dearest block may take (${DEFAULT-VALUE}).")
    private double mostRatio;

    @Option(
            names = "--repeats",
            defaultValue = "60",
            paramLabel = "N",
            description = "How often the passage is played; of each block the shortest time counts (${DEFAULT-VALUE}).")
    private int repeats;

    /** For the option parser. */
    public HumCommand() {}

    @Override
    public Integer call() throws Exception {
        CommandSpec command = Objects.requireNonNull(spec);
        require(command, "--rate-hz", sampleRateHz, LEAST_RATE_HZ, MOST_RATE_HZ);
        require(command, "--channels", channels, 1, MOST_CHANNELS);
        require(command, "--frames", frames, 1, MOST_FRAMES);
        require(command, "--repeats", repeats, 1, MOST_REPEATS);
        require(command, "--share", sharePercent, LEAST_SHARE, 100);
        require(command, "--ratio", mostRatio, 1, MOST_RATIO);
        output.begin(
                command,
                text(
                        "Hum removal with 20 lines, %d channels, %d frames a block at %d Hz",
                        channels, frames, sampleRateHz));
        double periodMicros = 1e6 * frames / sampleRateHz;
        List<Row> rows = new ArrayList<>();
        List<String> complaints = new ArrayList<>();
        Table table = new Table("removal", "us a block", "spread", "% of a core", "dearest us", "x mean");
        for (Removal removal : Removal.values()) {
            String name = removal.name().toLowerCase(Locale.ROOT);
            Output.progress(command, name + " ...");
            Row row = mean(removal, name);
            LeastTimes times = new HumPassage(sampleRateHz, channels, frames, repeats).play(removal);
            double share = 100 * row.value() / periodMicros;
            double ratio = times.worstMicros() / times.meanMicros();
            rows.add(row);
            rows.add(Row.exact(name + ", dearest block", "us", times.worstMicros()));
            table.add(
                    name,
                    text("%.2f", row.value()),
                    text("%.2f to %.2f", row.low(), row.high()),
                    text("%.3f", share),
                    text("%.2f", times.worstMicros()),
                    text("%.2f", ratio));
            if (share > sharePercent) {
                complaints.add(name + text(" takes %.2f %% of a core", share));
            }
            if (ratio > mostRatio) {
                complaints.add("the dearest block by " + name + text(" takes %.2f means", ratio));
            }
        }
        Map<String, String> setup = Map.of(
                "sampleRateHz", String.valueOf(sampleRateHz),
                "channels", String.valueOf(channels),
                "frames", String.valueOf(frames),
                "repeats", String.valueOf(repeats),
                "sharePercent", String.valueOf(sharePercent),
                "mostRatio", String.valueOf(mostRatio));
        Verdict verdict = Verdict.of(
                complaints,
                text("both keep %.1f %% of a core, and no block takes over %.1f means", sharePercent, mostRatio));
        return output.end(command, table.toString(), Report.of("hum", setup, rows, List.of(), verdict));
    }

    private static void require(CommandSpec command, String name, double value, double least, double most) {
        if (!(value >= least && value <= most)) {
            throw new ParameterException(
                    command.commandLine(),
                    name + " is " + plain(value) + "; it must be from " + plain(least) + " to " + plain(most));
        }
    }

    private static String plain(double value) {
        return value == Math.rint(value) && Math.abs(value) < 1e10
                ? String.valueOf((long) value)
                : String.valueOf(value);
    }

    private Row mean(Removal removal, String name) throws RunnerException {
        Map<String, String> parameters = Map.of(
                "sampleRateHz", String.valueOf(sampleRateHz),
                "channels", String.valueOf(channels),
                "frames", String.valueOf(frames),
                "removal", removal.name());
        return BlockMean.micros(name, HumRemoverBlocks.class, parameters, 1, MEASURED_SECONDS);
    }

    private static String text(String pattern, Object... values) {
        return String.format(Locale.ROOT, pattern, values);
    }
}
