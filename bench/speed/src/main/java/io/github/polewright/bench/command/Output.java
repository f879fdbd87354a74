package io.github.polewright.bench.command;

import io.github.polewright.bench.report.Json;
import io.github.polewright.bench.report.Machine;
import io.github.polewright.bench.report.Report;
import io.github.polewright.bench.report.Verdict;
import io.github.polewright.bench.report.WholeFile;
import java.io.IOException;
import java.io.PrintWriter;
import java.nio.file.Path;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;

/** Where a command's results go: the table to standard output, the report to a file if one is named. */
public final class Output {

    @Option(
            names = "--json",
            paramLabel = "FILE",
            description = "Also write the report to this file, as compare reads it.")
    private @Nullable Path json;

    /** For the option parser. */
    public Output() {}

    /**
     * Prints the header, after it is sure that a report could be written.
     *
     * @param command that begins
     * @param title what it does, one line
     * @throws IOException if the file named could not be written
     */
    public void begin(CommandSpec command, String title) throws IOException {
        WholeFile.check(json);
        PrintWriter out = command.commandLine().getOut();
        out.println(title);
        Machine.here().header().forEach(out::println);
        out.println();
        out.flush();
    }

    /**
     * Says on standard error what is going on.
     *
     * @param command that goes on
     * @param line what it does now
     */
    public static void progress(CommandSpec command, String line) {
        PrintWriter err = command.commandLine().getErr();
        err.println(line);
        err.flush();
    }

    /**
     * Prints the table and the verdict and writes the report.
     *
     * @param command that ends
     * @param tables what to print
     * @param report what to keep
     * @return the exit status
     * @throws IOException if the report cannot be written
     */
    public int end(CommandSpec command, String tables, Report report) throws IOException {
        PrintWriter out = command.commandLine().getOut();
        out.println(tables);
        out.println(report.verdict());
        out.flush();
        if (json != null) {
            Json.write(report, json);
        }
        return new Verdict(report.met(), report.verdict()).exitStatus();
    }
}
