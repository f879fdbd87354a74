package io.github.polewright.bench;

import io.github.polewright.bench.budget.BudgetCommand;
import io.github.polewright.bench.cold.ColdCommand;
import io.github.polewright.bench.cold.ColdFork;
import io.github.polewright.bench.compare.CompareCommand;
import io.github.polewright.bench.contest.ContendersCommand;
import io.github.polewright.bench.contest.ContendersFork;
import io.github.polewright.bench.gate.GateCommand;
import io.github.polewright.bench.hum.HumCommand;
import io.github.polewright.bench.soak.SoakCommand;
import io.github.polewright.bench.tones.TonesCommand;
import java.io.IOException;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import org.openjdk.jmh.Main;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.IVersionProvider;

/** Entry point. */
@Command(
        name = "polewright-bench",
        mixinStandardHelpOptions = true,
        versionProvider = Bench.Version.class,
        description = "What filtering a block of audio costs, and whether it keeps its deadline.",
        subcommands = {
            BudgetCommand.class,
            SoakCommand.class,
            ColdCommand.class,
            CompareCommand.class,
            ContendersCommand.class,
            GateCommand.class,
            TonesCommand.class,
            HumCommand.class,
            ColdFork.class,
            ContendersFork.class
        },
        footer = {
            "",
            "  jmh         All that follows goes to the benchmark runner (JMH) as it stands;",
            "                try jmh -l and jmh -h.",
            "",
            "Exit status: 0 met, 1 failure, 2 bad option, 3 measured and not met."
        })
public final class Bench {

    private static final int FAILURE = 1;

    private Bench() {}

    /** The version that the jar carries. */
    static final class Version implements IVersionProvider {
        @Override
        public String[] getVersion() {
            String version = Bench.class.getPackage().getImplementationVersion();
            return new String[] {"polewright-bench " + (version == null ? "not packaged" : version)};
        }
    }

    /**
     * Runs a command and ends the process with its exit status.
     *
     * @param arguments the command and its options
     * @throws IOException what the benchmark runner throws
     */
    public static void main(String[] arguments) throws IOException {
        if (arguments.length > 0 && arguments[0].equals("jmh")) {
            Main.main(Arrays.copyOfRange(arguments, 1, arguments.length));
            return;
        }
        System.setProperty("java.awt.headless", "true");
        PrintWriter out = new PrintWriter(System.out, true, StandardCharsets.UTF_8);
        PrintWriter err = new PrintWriter(System.err, true, StandardCharsets.UTF_8);
        System.exit(commandLine(out, err).execute(arguments));
    }

    /**
     * The command line, for one run.
     *
     * @param out where tables go
     * @param err where progress and complaints go, a line each
     * @return ready to execute
     */
    static CommandLine commandLine(PrintWriter out, PrintWriter err) {
        return new CommandLine(new Bench())
                .setOut(out)
                .setErr(err)
                .setExpandAtFiles(false)
                .setCaseInsensitiveEnumValuesAllowed(true)
                .setParameterExceptionHandler((wrong, given) -> {
                    err.println(oneLine(wrong));
                    return CommandLine.ExitCode.USAGE;
                })
                .setExecutionExceptionHandler((failure, command, given) -> {
                    err.println(oneLine(failure));
                    return FAILURE;
                });
    }

    private static String oneLine(Exception problem) {
        String message = problem.getMessage() == null ? problem.toString() : problem.getMessage();
        return "polewright-bench: " + message.strip().replaceAll("\\s*\\R\\s*", " ");
    }
}
