package io.github.polewright.samples.command;

import io.github.polewright.samples.files.Failure;
import java.io.PrintWriter;
import java.nio.charset.Charset;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine;
import picocli.CommandLine.Command;

/** The program: survey a recording, clean it, read the tones in it, or see a demonstration. */
@Command(
        name = "polewright-samples",
        description = "Finds mains hum and DC offset in recordings and takes them out; reads tones in them.",
        mixinStandardHelpOptions = true,
        versionProvider = Main.Version.class,
        synopsisSubcommandLabel = "COMMAND",
        subcommands = {
            SurveyCommand.class,
            CleanCommand.class,
            TonesCommand.class,
            RetuneCommand.class,
            DemoCommand.class
        },
        footer = {"", "Exit status: 0 done, 1 failed, 2 wrong usage."})
public final class Main implements Runnable {

    static final int FAILED = 1;
    static final int USAGE = 2;

    /** The version in the jar's manifest. */
    static final class Version implements CommandLine.IVersionProvider {
        @Override
        public String[] getVersion() {
            String version = Main.class.getPackage().getImplementationVersion();
            return new String[] {"polewright-samples " + (version == null ? "(not packaged)" : version)};
        }
    }

    public static void main(String[] args) {
        // Charts are drawn without a screen.
        System.setProperty("java.awt.headless", "true");
        // From Java 22 on, this keeps System.console() null where nobody sits at a terminal.
        System.setProperty("jdk.console", "java.base");
        Charset charset = Charset.defaultCharset();
        PrintWriter out = new PrintWriter(System.out, true, charset);
        PrintWriter err = new PrintWriter(System.err, true, charset);
        System.exit(run(out, err, args));
    }

    /** Runs a command line and returns its exit status. */
    static int run(PrintWriter out, PrintWriter err, String... args) {
        CommandLine line = new CommandLine(new Main());
        line.setOut(out);
        line.setErr(err);
        line.setParameterExceptionHandler((e, given) -> {
            err.println("polewright-samples: " + oneLine(e.getMessage()) + " (--help tells more)");
            return USAGE;
        });
        line.setExecutionExceptionHandler((e, command, result) -> {
            String message = e instanceof Failure ? e.getMessage() : "unexpected " + e;
            err.println("polewright-samples: " + oneLine(message));
            return FAILED;
        });
        return line.execute(args);
    }

    private static String oneLine(@Nullable String message) {
        return message == null ? "failed" : message.strip().replaceAll("\\s*[\\r\\n]+\\s*", "; ");
    }

    @Override
    public void run() {
        throw new CommandLine.ParameterException(
                new CommandLine(this), "a command is missing: survey, clean, tones, retune or demo");
    }
}
