package io.github.polewright.bench.contest;

import io.github.polewright.bench.measure.Contest;
import io.github.polewright.bench.measure.Score;
import io.github.polewright.bench.report.Json;
import io.github.polewright.live.Form;
import java.time.Duration;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** The forked JVM's side of the contenders command: live over objects, in a JVM that may lack a fused multiply-add. */
@Command(name = "contenders-fork", hidden = true, description = "What contenders runs in a JVM with other flags.")
public final class ContendersFork implements Callable<Integer> {

    @Spec
    private @Nullable CommandSpec spec;

    @Option(names = "--warm-millis", required = true)
    private long warmMillis;

    @Option(names = "--rounds", required = true)
    private int rounds;

    /** For the option parser. */
    public ContendersFork() {}

    /**
     * Median ratios of live over objects.
     *
     * @param ratios by form
     */
    record Ratios(Map<String, Double> ratios) {}

    @Override
    public Integer call() {
        CommandSpec command = Objects.requireNonNull(spec);
        Contest contest = new Contest(Duration.ofMillis(warmMillis), rounds);
        Goals.enterForFusion(contest);
        Map<String, Score> scores = contest.play();
        Map<String, Double> ratios = new LinkedHashMap<>();
        for (Form form : Form.values()) {
            Goal goal = Goal.shown(form.name(), Goals.fusionLive(form), Goals.fusionObjects(form));
            ratios.put(form.name(), goal.row(scores).value());
        }
        command.commandLine().getOut().print(Json.text(new Ratios(ratios)));
        command.commandLine().getOut().flush();
        return 0;
    }
}
