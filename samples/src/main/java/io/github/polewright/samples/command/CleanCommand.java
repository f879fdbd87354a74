package io.github.polewright.samples.command;

import io.github.polewright.samples.clean.CleanWish;
import io.github.polewright.samples.clean.Cleaner;
import io.github.polewright.samples.clean.Cleaning;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.report.CleaningText;
import io.github.polewright.samples.report.Report;
import io.github.polewright.samples.survey.Survey;
import io.github.polewright.samples.survey.Surveyor;
import java.io.PrintWriter;
import java.nio.file.Path;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

@Command(
        name = "clean",
        description = {
            "Takes DC offset and mains hum out of a WAV file.",
            "The mains are followed as they drift, and only lines that are really there are taken out; where no hum is"
                    + " found, only DC goes.",
            "Sample rate, channels and sample format stay. What a file holds beside samples, such as cue points or"
                    + " titles, is not copied."
        },
        mixinStandardHelpOptions = true)
@SuppressWarnings("NullAway.Init")
final class CleanCommand implements Runnable {

    @Spec
    private CommandSpec spec;

    @Parameters(index = "0", paramLabel = "IN.wav", description = "The recording; it is only read.")
    private Path in;

    @Parameters(index = "1", paramLabel = "OUT.wav", description = "The cleaned recording, replaced if it exists.")
    private Path out;

    @Mixin
    private HumOptions hum;

    @Option(
            names = "--width",
            paramLabel = "HZ",
            description =
                    "The width of each notch with --fixed (default ${DEFAULT-VALUE}). Narrow keeps more of the sound.")
    private double widthHz = 0.5;

    @Option(
            names = "--fixed",
            description =
                    "Keep notches where the survey finds the lines, instead of following the mains; --mains implies it.")
    private boolean fixed;

    @Option(names = "--no-dc", description = "Leave the DC offset in.")
    private boolean noDc;

    @Option(
            names = "--report",
            paramLabel = "FOLDER",
            description = "Also write charts (SVG, PNG) and a page that shows them.")
    private @Nullable Path report;

    @Override
    public void run() {
        hum.check(spec);
        // Notches half as wide as their distance are no longer notches.
        Checks.range(spec, "--width", widthHz, 0.05, hum.mainsHz() > 0 ? Math.min(10, hum.mainsHz() / 2) : 10);
        boolean stands = fixed || hum.mainsHz() > 0;
        if (!stands && spec.commandLine().getParseResult().hasMatchedOption("--width")) {
            throw new ParameterException(spec.commandLine(), "--width is of use with --fixed or --mains only");
        }
        Checks.differs(spec, "OUT.wav", out, in);
        CleanWish wish = new CleanWish(hum.mainsHz(), hum.harmonics(), widthHz, !noDc, fixed);
        Recording recording = Recording.open(in);
        Checks.writable(out);
        if (report != null) {
            Checks.folder(report);
        }
        Survey survey = Surveyor.survey(recording, wish.mainsHz(), wish.harmonics());
        Cleaning cleaning;
        try (Progress progress = Progress.of("clean", recording)) {
            cleaning = Cleaner.clean(recording, out, survey, wish, progress);
        }
        PrintWriter print = spec.commandLine().getOut();
        CleaningText.of(recording, out, cleaning, wish.removeDc()).forEach(print::println);
        if (report != null) {
            Report.write(report, recording, Recording.open(out), cleaning, wish);
            print.println("report     " + report.resolve("index.html"));
        }
    }
}
