package io.github.polewright.samples.command;

import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.files.WholeFile;
import io.github.polewright.samples.report.ToneReport;
import io.github.polewright.samples.tones.HeardTone;
import io.github.polewright.samples.tones.ReadPair;
import io.github.polewright.samples.tones.Tones;
import io.github.polewright.tone.Tone;
import java.nio.file.Path;
import java.util.List;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

@Command(
        name = "tones",
        description = {
            "Reads the tone pairs of push-button dialling in a WAV file, or listens for tones that are named.",
            "Prints a line for each: start_s,end_s,symbol. A named tone's symbol is its frequency. Where nothing is"
                    + " found, a line on standard error says so.",
            "Speech and music hold such tones now and then, and a line can swallow one: let nothing that protects"
                    + " people or property hang on it alone."
        },
        mixinStandardHelpOptions = true)
@SuppressWarnings("NullAway.Init")
final class TonesCommand implements Runnable {

    @Spec
    private CommandSpec spec;

    @Parameters(paramLabel = "IN.wav", description = "The recording; it is only read.")
    private Path in;

    @Option(
            names = "--json",
            paramLabel = "FILE",
            description = "Also write levels, twist and frequency errors to a file, as JSON.")
    private @Nullable Path json;

    @Option(
            names = "--watch",
            paramLabel = "HZ",
            split = ",",
            description = "Listen for these tones instead of tone pairs; several are parted by commas.")
    private List<Double> watchHz = List.of();

    @Option(
            names = "--width",
            paramLabel = "HZ",
            description = "How wide to listen around each tone of --watch (default ${DEFAULT-VALUE}). Narrow tells"
                    + " neighbours apart, wide is quicker.")
    private double widthHz = 20;

    @Option(names = "--channel", paramLabel = "N", description = "The channel to read (default ${DEFAULT-VALUE}).")
    private int channel = 1;

    @Override
    public void run() {
        Checks.range(spec, "--width", widthHz, 0.5, 1000);
        if (watchHz.isEmpty() && spec.commandLine().getParseResult().hasMatchedOption("--width")) {
            throw new ParameterException(
                    spec.commandLine(), "--width is of use with --watch only, which names the tones to listen for");
        }
        if (json != null) {
            Checks.differs(spec, "--json", json, in);
            Checks.writable(json);
        }
        Recording recording = Recording.open(in);
        Checks.range(spec, "--channel", channel, 1, recording.channels());
        try (Progress progress = Progress.of("tones", recording)) {
            Tones tones = Tones.of(recording, channel - 1, progress);
            if (watchHz.isEmpty()) {
                readPairs(recording, tones);
            } else {
                watch(recording, tones);
            }
        }
    }

    private void readPairs(Recording recording, Tones tones) {
        List<ReadPair> pairs = tones.pairs();
        if (json != null) {
            WholeFile.writeText(json, ToneReport.pairJson(recording, channel, pairs));
        }
        ToneReport.pairLines(pairs).forEach(spec.commandLine().getOut()::println);
        if (pairs.isEmpty()) {
            tellNone("tone pairs");
        }
    }

    private void watch(Recording recording, Tones tones) {
        double highest = Math.floor(recording.sampleRateHz() / 2 - widthHz / 2 - 1);
        for (double hertz : watchHz) {
            Checks.range(spec, "--watch", hertz, 20, highest);
        }
        List<HeardTone> heard = tones.named(
                watchHz.stream().map(hertz -> Tone.byWidth(hertz, widthHz)).toList());
        if (json != null) {
            WholeFile.writeText(json, ToneReport.toneJson(recording, channel, heard));
        }
        ToneReport.toneLines(heard).forEach(spec.commandLine().getOut()::println);
        if (heard.isEmpty()) {
            tellNone("tones");
        }
    }

    /** On standard error, so that what reads the comma-separated lines never meets a sentence. */
    private void tellNone(String what) {
        spec.commandLine().getErr().println("no " + what + " found in channel " + channel + " of " + in);
    }
}
