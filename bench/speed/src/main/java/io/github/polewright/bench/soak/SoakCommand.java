package io.github.polewright.bench.soak;

import io.github.polewright.bench.command.ChainOptions;
import io.github.polewright.bench.command.Output;
import io.github.polewright.bench.report.Report;
import io.github.polewright.bench.workload.Chain;
import java.time.Duration;
import java.util.List;
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

/** Plays a callback for a while beside threads that get in its way. */
@Command(
        name = "soak",
        mixinStandardHelpOptions = true,
        description = "Plays a callback at wall-clock pace while other threads allocate hard and retune at random."
                + " Nothing is heard. Exit status 0 if no deadline was missed by our own work, the audio thread"
                + " allocated nothing, no sample was replaced and the last target was reached; 3 if not.")
public final class SoakCommand implements Callable<Integer> {

    @Spec
    private @Nullable CommandSpec spec;

    @Mixin
    private ChainOptions chainOptions = new ChainOptions();

    @Mixin
    private Output output = new Output();

    @Option(
            names = "--seconds",
            defaultValue = "60",
            paramLabel = "N",
            description = "Seconds to play (${DEFAULT-VALUE}).")
    private double seconds;

    @Option(
            names = "--allocators",
            defaultValue = "1",
            paramLabel = "N",
            description = "Threads that allocate (${DEFAULT-VALUE}).")
    private int allocators;

    @Option(
            names = "--warm-millis",
            defaultValue = "5000",
            paramLabel = "N",
            description = "Milliseconds the warm-up may take at most (${DEFAULT-VALUE}).")
    private long warmMillis;

    /** For the option parser. */
    public SoakCommand() {}

    @Override
    public Integer call() throws Exception {
        CommandSpec command = Objects.requireNonNull(spec);
        Chain chain = chainOptions.chain(command);
        if (!(seconds >= 1 && seconds <= 1_000_000) || allocators < 0 || allocators > 1000 || warmMillis < 0) {
            throw new ParameterException(
                    command.commandLine(),
                    "--seconds must be from 1 to 1000000, --allocators from 0 to 1000, --warm-millis at least 0");
        }
        output.begin(command, "Soak of " + ChainOptions.line(chain));
        Output.progress(command, "playing for " + seconds + " s ...");
        SoakResult result = Soak.play(chain, seconds, allocators, Duration.ofMillis(warmMillis));
        Map<String, String> setup = ChainOptions.setup(chain);
        setup.put("seconds", String.valueOf(seconds));
        setup.put("allocators", String.valueOf(allocators));
        setup.put("warmMillis", String.valueOf(warmMillis));
        Report report = Report.of(
                "soak",
                setup,
                result.rows(),
                List.of(
                        result.lateness().ours().curve("ours, inside process"),
                        result.lateness().machine().curve("the machine's, late to start")),
                result.verdict());
        return output.end(command, result.text(), report);
    }
}
