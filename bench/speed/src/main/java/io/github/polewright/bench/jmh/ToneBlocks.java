package io.github.polewright.bench.jmh;

import io.github.polewright.bench.workload.Listener;
import java.util.Objects;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.jspecify.annotations.Nullable;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * Listening for tones in one channel: a block is 10 ms, so a microsecond a block is one ten-thousandth of the time. The
 * second of sound that goes round holds tone pairs of 50 ms, pauses of 50 ms, and noise 20 dB below.
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(2)
@Warmup(iterations = 2, time = 1)
@Measurement(iterations = 5, time = 1)
public class ToneBlocks {

    /** Blocks a second. */
    public static final int BLOCKS = 100;

    /** Hertz. */
    @Param({"8000", "48000"})
    public double sampleRateHz;

    /** What listens. */
    @Param
    public Listener listener = Listener.PAIR_READER;

    private final float[][] blocks = new float[BLOCKS][];
    private Listener.@Nullable Listening listening;
    private int next;

    /** Makes the sound and the listener. */
    @Setup
    public void prepare() {
        listening = listener.begin(sampleRateHz);
        SplittableRandom random = new SplittableRandom(20_260_101);
        int frames = (int) (sampleRateHz / BLOCKS);
        for (int b = 0; b < BLOCKS; b++) {
            blocks[b] = new float[frames];
            boolean sounds = b / 5 % 2 == 0;
            for (int i = 0; i < frames; i++) {
                double turn = 2 * Math.PI * (b * frames + i) / sampleRateHz;
                double pair = sounds ? 0.2 * (Math.sin(770 * turn) + Math.sin(1336 * turn)) : 0;
                blocks[b][i] = (float) (pair + 0.05 * (2 * random.nextDouble() - 1));
            }
        }
    }

    /** What is timed. */
    @Benchmark
    public void block() {
        float[] samples = blocks[next];
        next = next == BLOCKS - 1 ? 0 : next + 1;
        Objects.requireNonNull(listening, "prepare() comes first").process(samples, 0, samples.length);
    }
}
