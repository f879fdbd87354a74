package io.github.polewright.bench.contest;

import io.github.polewright.bench.command.FreshJvm;
import io.github.polewright.bench.command.Output;
import io.github.polewright.bench.measure.Contest;
import io.github.polewright.bench.measure.Score;
import io.github.polewright.bench.report.Json;
import io.github.polewright.bench.report.Report;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Verdict;
import io.github.polewright.live.Form;
import java.io.IOException;
import java.time.Duration;
import java.util.ArrayList;
import java.util.LinkedHashMap;
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

/** Prints the promised ratios, all taken in one run. */
@Command(
        name = "contenders",
        mixinStandardHelpOptions = true,
        description =
                "The promised ratios: against the textbook cascade of objects, between shapes, signals, formats and"
                        + " motions, and without a fused multiply-add. Taken in turn in one JVM, so that they hold"
                        + " where times do not. Always exit status 0: on a shared machine a ratio informs, it does not judge.")
public final class ContendersCommand implements Callable<Integer> {

    private static final double MOST_WITHOUT_FUSION = 1.35;

    @Spec
    private @Nullable CommandSpec spec;

    @Mixin
    private Output output = new Output();

    @Option(
            names = "--warm-millis",
            defaultValue = "1500",
            paramLabel = "N",
            description = "Milliseconds of warm-up for each contender (${DEFAULT-VALUE}).")
    private long warmMillis;

    @Option(
            names = "--rounds",
            defaultValue = "41",
            paramLabel = "N",
            description = "How many turns each contender takes (${DEFAULT-VALUE}).")
    private int rounds;

    /** For the option parser. */
    public ContendersCommand() {}

    @Override
    public Integer call() throws Exception {
        CommandSpec command = Objects.requireNonNull(spec);
        if (warmMillis < 1 || rounds < 3) {
            throw new ParameterException(
                    command.commandLine(), "--warm-millis must be at least 1, --rounds at least 3");
        }
        output.begin(command, "Contenders: medians of " + rounds + " rounds, time per sample per section");
        List<Outcome> outcomes = new ArrayList<>();
        for (Form form : Form.values()) {
            Output.progress(command, form + " ...");
            outcomes.addAll(play(new Goals(form)));
        }
        Output.progress(command, "without a fused multiply-add ...");
        outcomes.addAll(withoutFusion());
        Map<String, String> setup = new LinkedHashMap<>();
        setup.put("rounds", String.valueOf(rounds));
        setup.put("warmMillis", String.valueOf(warmMillis));
        List<Row> rows = outcomes.stream().map(Outcome::row).toList();
        Verdict verdict = new Verdict(true, Outcome.line(outcomes));
        Report report = Report.of("contenders", setup, rows, List.of(), verdict);
        return output.end(command, Outcome.table(outcomes).toString(), report);
    }

    private List<Outcome> play(Goals goals) {
        Contest contest = new Contest(Duration.ofMillis(warmMillis), rounds);
        goals.enter(contest);
        Map<String, Score> scores = contest.play();
        return goals.list().stream().map(goal -> Outcome.of(goal, scores)).toList();
    }

    /** Two JVMs share no clock, but both time the same objects, which never fuse: they are the yardstick. */
    private List<Outcome> withoutFusion() throws IOException, InterruptedException {
        Map<String, Double> fused = fork(List.of());
        Map<String, Double> emulated = fork(List.of("-XX:-UseFMA"));
        List<Outcome> outcomes = new ArrayList<>();
        for (Form form : Form.values()) {
            double ratio =
                    Objects.requireNonNull(emulated.get(form.name())) / Objects.requireNonNull(fused.get(form.name()));
            String name = Goals.prefix(form) + "without FMA / with, by way of the objects";
            outcomes.add(new Outcome(
                    Goal.atMost(name, "", "", MOST_WITHOUT_FUSION), Row.exact(name, "ratio", ratio), ratio));
        }
        return outcomes;
    }

    private Map<String, Double> fork(List<String> flags) throws IOException, InterruptedException {
        List<String> arguments = List.of("contenders-fork", "--warm-millis=" + warmMillis, "--rounds=" + rounds);
        return Json.parse(FreshJvm.run(flags, arguments), ContendersFork.Ratios.class)
                .ratios();
    }
}
