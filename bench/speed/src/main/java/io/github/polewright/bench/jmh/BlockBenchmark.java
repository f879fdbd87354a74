package io.github.polewright.bench.jmh;

import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.Rig;
import io.github.polewright.bench.workload.Samples;
import io.github.polewright.bench.workload.Signal;
import io.github.polewright.bench.workload.Tape;
import io.github.polewright.live.Form;
import java.util.Objects;
import java.util.concurrent.TimeUnit;
import org.jspecify.annotations.Nullable;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * One block of a chain. The defaults are few; other values go on the command line, such as
 * {@code -p sections=1,2,4,8,16,64 -p channels=1,2,8,32 -p frames=64,512,4096 -p samples=FLOAT,DOUBLE}.
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(2)
@Warmup(iterations = 2, time = 1)
@Measurement(iterations = 5, time = 1)
public abstract class BlockBenchmark {

    /** Hertz. */
    @Param("48000")
    public double sampleRateHz;

    /** Samples a frame. */
    @Param("1")
    public int channels;

    /** Frames a block. */
    @Param("64")
    public int frames;

    /** Notches in series. */
    @Param({"1", "8"})
    public int sections;

    /** How a steady section is computed. */
    @Param({"DIRECT_FORM_1", "TRANSPOSED_DIRECT_FORM_2"})
    public Form form = Form.DIRECT_FORM_1;

    /** The sample format. */
    @Param("FLOAT")
    public Samples samples = Samples.FLOAT;

    /** What flows in. */
    @Param({"NOISE", "DECAY"})
    public Signal signal = Signal.NOISE;

    private @Nullable Rig rig;

    /** Builds the rig. */
    @Setup(Level.Trial)
    public void prepare() {
        Chain chain = new Chain(sampleRateHz, channels, frames, sections, form);
        rig = rig(chain, new Tape(chain, samples, signal));
    }

    /** Starts the decay anew, so that every iteration runs through it and stays in what it leaves behind. */
    @Setup(Level.Iteration)
    public void excite() {
        current().excite();
    }

    /** What is timed. */
    @Benchmark
    public void block() {
        current().block();
    }

    final Rig current() {
        return Objects.requireNonNull(rig, "prepare() comes first");
    }

    abstract Rig rig(Chain chain, Tape tape);
}
