package io.github.polewright.bench.jmh;

import io.github.polewright.bench.workload.HumTape;
import io.github.polewright.mains.HumRemover;
import io.github.polewright.mains.MainsState;
import io.github.polewright.mains.Removal;
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
 * One block of a hum remover that follows 20 lines and removes them all: analysis, search, following and removal. Its
 * share of a core is microseconds a block over {@code frames / sampleRateHz}.
 */
@State(Scope.Thread)
@BenchmarkMode({Mode.AverageTime, Mode.SampleTime})
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(2)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class HumRemoverBlocks {

    /** Hertz. */
    @Param("48000")
    public int sampleRateHz;

    /** Samples a frame. */
    @Param("2")
    public int channels;

    /** Frames a block. */
    @Param({"64", "128", "512"})
    public int frames;

    /** The way of removal. */
    @Param({"SUBTRACTION", "NOTCHES"})
    public Removal removal = Removal.SUBTRACTION;

    private @Nullable HumRemover remover;
    private float[] tape = new float[0];
    private float[] destination = new float[0];
    private int at;

    /** Makes the tape and lets the remover find the hum. */
    @Setup(Level.Trial)
    public void prepare() {
        tape = HumTape.of(sampleRateHz, channels, frames);
        destination = new float[frames * channels];
        HumRemover made = HumRemover.builder(sampleRateHz, channels).by(removal).build();
        remover = made;
        for (int n = 0; n < tape.length / channels / frames; n++) {
            block();
        }
        if (made.reading().state() != MainsState.FOLLOWING) {
            throw new IllegalStateException("the hum on the tape was not found: " + made.reading());
        }
    }

    /** What is timed. */
    @Benchmark
    public void block() {
        Objects.requireNonNull(remover, "prepare() comes first").process(tape, at, destination, 0, frames);
        at += frames * channels;
        at = at + frames * channels > tape.length ? 0 : at;
    }
}
