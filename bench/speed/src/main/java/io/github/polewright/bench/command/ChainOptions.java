package io.github.polewright.bench.command;

import io.github.polewright.bench.workload.Chain;
import io.github.polewright.live.Form;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;

/** Options that describe a chain. */
public final class ChainOptions {

    @Option(
            names = "--rate-hz",
            defaultValue = "48000",
            paramLabel = "HZ",
            description = "Sample rate (${DEFAULT-VALUE}).")
    private double sampleRateHz;

    @Option(names = "--channels", defaultValue = "2", paramLabel = "N", description = "Channels (${DEFAULT-VALUE}).")
    private int channels;

    @Option(
            names = "--frames",
            defaultValue = "64",
            paramLabel = "N",
            description = "Frames a block, which is one callback (${DEFAULT-VALUE}).")
    private int frames;

    @Option(
            names = "--sections",
            defaultValue = "16",
            paramLabel = "N",
            description = "Sections in series, a comb of notches (${DEFAULT-VALUE}).")
    private int sections;

    @Option(
            names = "--form",
            defaultValue = "DIRECT_FORM_1",
            paramLabel = "FORM",
            description = "How a section is computed: ${COMPLETION-CANDIDATES} (${DEFAULT-VALUE}).")
    private Form form = Form.DIRECT_FORM_1;

    /** For the option parser. */
    public ChainOptions() {}

    /**
     * The chain described.
     *
     * @param command whose options these are
     * @return the chain
     * @throws ParameterException if a value is out of range
     */
    public Chain chain(CommandSpec command) {
        try {
            return new Chain(sampleRateHz, channels, frames, sections, form);
        } catch (IllegalArgumentException outOfRange) {
            throw new ParameterException(command.commandLine(), String.valueOf(outOfRange.getMessage()), outOfRange);
        }
    }

    /**
     * A chain as options, for a forked JVM.
     *
     * @param chain the chain
     * @return options and values
     */
    public static String[] arguments(Chain chain) {
        return new String[] {
            "--rate-hz=" + chain.sampleRateHz(),
            "--channels=" + chain.channels(),
            "--frames=" + chain.frames(),
            "--sections=" + chain.sections(),
            "--form=" + chain.form()
        };
    }

    /**
     * A chain for the eye.
     *
     * @param chain the chain
     * @return one line
     */
    public static String line(Chain chain) {
        return String.format(
                Locale.ROOT,
                "%d sections, %s, %d channels, %d frames a block at %.0f Hz: a period of %.1f us",
                chain.sections(),
                chain.form(),
                chain.channels(),
                chain.frames(),
                chain.sampleRateHz(),
                chain.periodNanos() / 1000);
    }

    /**
     * A chain for a report.
     *
     * @param chain the chain
     * @return name to value, to which more may be added
     */
    public static Map<String, String> setup(Chain chain) {
        Map<String, String> setup = new LinkedHashMap<>();
        setup.put("sampleRateHz", String.valueOf(chain.sampleRateHz()));
        setup.put("channels", String.valueOf(chain.channels()));
        setup.put("frames", String.valueOf(chain.frames()));
        setup.put("sections", String.valueOf(chain.sections()));
        setup.put("form", String.valueOf(chain.form()));
        return setup;
    }
}
