package io.github.polewright.samples.command;

import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.files.WholeFile;
import io.github.polewright.samples.report.SurveyJson;
import io.github.polewright.samples.report.SurveyText;
import io.github.polewright.samples.survey.MainsMoment;
import io.github.polewright.samples.survey.MainsTrack;
import io.github.polewright.samples.survey.Survey;
import io.github.polewright.samples.survey.Surveyor;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.List;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

@Command(
        name = "survey",
        description = "Tells the DC offset of a WAV file, whether mains hum is in it, and each of its lines.",
        mixinStandardHelpOptions = true)
@SuppressWarnings("NullAway.Init")
final class SurveyCommand implements Runnable {

    @Spec
    private CommandSpec spec;

    @Parameters(paramLabel = "IN.wav", description = "The recording; it is only read.")
    private Path in;

    @Option(names = "--json", paramLabel = "FILE", description = "Also write the findings to a file, as JSON.")
    private @Nullable Path json;

    @Mixin
    private HumOptions hum;

    @Override
    public void run() {
        hum.check(spec);
        if (json != null) {
            Checks.differs(spec, "--json", json, in);
            Checks.writable(json);
        }
        Recording recording = Recording.open(in);
        Survey survey = Surveyor.survey(recording, hum.mainsHz(), hum.harmonics());
        if (json != null) {
            WholeFile.writeText(json, SurveyJson.of(recording, survey));
        }
        PrintWriter out = spec.commandLine().getOut();
        SurveyText.head(recording, survey).forEach(out::println);
        List<MainsMoment> track = MainsTrack.of(recording);
        if (hum.covers(track)) {
            SurveyText.track(track).forEach(out::println);
        }
        SurveyText.table(survey).forEach(out::println);
    }
}
