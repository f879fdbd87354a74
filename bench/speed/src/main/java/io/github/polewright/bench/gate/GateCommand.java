package io.github.polewright.bench.gate;

import io.github.polewright.bench.command.Output;
import io.github.polewright.bench.measure.Contest;
import io.github.polewright.bench.report.Report;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Verdict;
import io.github.polewright.live.Form;
import java.io.IOException;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;

/** Checks what a build may fail on. */
@Command(
        name = "gate",
        mixinStandardHelpOptions = true,
        description =
                "What a build may fail on: allocation, the cost of decays and subnormal input over noise, a budget"
                        + " ten times the usual cost, and cost that grows as frames and sections do. Takes about a minute."
                        + " Exit status 0 if all is met, 3 if not.")
public final class GateCommand implements Callable<Integer> {

    private static final Duration WARM_UP = Duration.ofMillis(1500);
    private static final int ROUNDS = 41;

    @Spec
    private @Nullable CommandSpec spec;

    @Mixin
    private Output output = new Output();

    /** For the option parser. */
    public GateCommand() {}

    @Override
    public Integer call() throws IOException {
        CommandSpec command = Objects.requireNonNull(spec);
        output.begin(command, "Gate");
        List<Check> checks = new ArrayList<>();
        for (Form form : Form.values()) {
            Output.progress(command, form + " ...");
            GateChecks gate = new GateChecks(form);
            Contest contest = new Contest(WARM_UP, ROUNDS);
            gate.enter(contest);
            checks.addAll(gate.times(contest.play()));
            checks.addAll(gate.allocation());
        }
        Verdict verdict = Verdict.of(Check.complaints(checks), checks.size() + " checks passed");
        List<Row> rows = checks.stream().map(Check::row).toList();
        Report report = Report.of("gate", Map.of(), rows, List.of(), verdict);
        return output.end(command, Check.table(checks).toString(), report);
    }
}
