package io.github.polewright.bench.cold;

import io.github.polewright.bench.command.ChainOptions;
import io.github.polewright.bench.measure.Pace;
import io.github.polewright.bench.report.Json;
import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.LiveRig;
import io.github.polewright.bench.workload.Motion;
import io.github.polewright.bench.workload.Samples;
import io.github.polewright.bench.workload.Signal;
import io.github.polewright.bench.workload.Tape;
import java.util.Objects;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** The forked JVM's side of the cold command: plays at the callback's pace and prints what each block took. */
@Command(name = "cold-fork", hidden = true, description = "What cold runs in a fresh JVM.")
public final class ColdFork implements Callable<Integer> {

    private static final double NANOS_PER_MICRO = 1000;

    @Spec
    private @Nullable CommandSpec spec;

    @Mixin
    private ChainOptions chainOptions = new ChainOptions();

    @Option(names = "--blocks", required = true)
    private int blocks;

    @Option(names = "--warm-millis", required = true)
    private long warmMillis;

    /** For the option parser. */
    public ColdFork() {}

    @Override
    public Integer call() {
        CommandSpec command = Objects.requireNonNull(spec);
        Chain chain = chainOptions.chain(command);
        LiveRig rig = new LiveRig(chain, new Tape(chain, Samples.FLOAT, Signal.NOISE), Motion.STEADY);
        long start = System.nanoTime();
        if (warmMillis > 0) {
            rig.live().warmUp(warmMillis / 1e3);
        }
        double warmUpMillis = (System.nanoTime() - start) / 1e6;
        command.commandLine().getOut().print(Json.text(new ColdTimes(warmUpMillis, play(rig))));
        command.commandLine().getOut().flush();
        return 0;
    }

    private double[] play(LiveRig rig) {
        double[] micros = new double[blocks];
        double period = rig.chain().periodNanos();
        long first = System.nanoTime();
        for (int i = 0; i < blocks; i++) {
            long begun = Pace.until(first + Math.round(i * period));
            rig.block();
            micros[i] = (System.nanoTime() - begun) / NANOS_PER_MICRO;
        }
        return micros;
    }
}
