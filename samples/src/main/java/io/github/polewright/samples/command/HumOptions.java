package io.github.polewright.samples.command;

import io.github.polewright.samples.survey.MainsMoment;
import io.github.polewright.samples.survey.Surveyor;
import java.util.List;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;

/** Where to look for hum. */
final class HumOptions {

    @Option(
            names = "--mains",
            paramLabel = "HZ",
            description = "Look for hum within 0.95 Hz of this frequency only; otherwise around 50 and 60 Hz.")
    private double mainsHz;

    @Option(
            names = "--harmonics",
            paramLabel = "N",
            description = "The highest harmonic to look for (default ${DEFAULT-VALUE}).")
    private int harmonics = Surveyor.DEFAULT_HARMONICS;

    void check(CommandSpec spec) {
        if (spec.commandLine().getParseResult().hasMatchedOption("--mains")) {
            Checks.range(spec, "--mains", mainsHz, 10, 1000);
        }
        Checks.range(spec, "--harmonics", harmonics, 1, 200);
    }

    /** Whether a followed track lies where hum is looked for. */
    boolean covers(List<MainsMoment> track) {
        return mainsHz == 0
                || track.stream().allMatch(moment -> Math.abs(moment.frequencyHz() - mainsHz) <= Surveyor.REACH_HZ);
    }

    double mainsHz() {
        return mainsHz;
    }

    int harmonics() {
        return harmonics;
    }
}
