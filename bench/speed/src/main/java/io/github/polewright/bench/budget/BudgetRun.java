package io.github.polewright.bench.budget;

import io.github.polewright.bench.jmh.BlockBenchmark;
import io.github.polewright.bench.jmh.RetunedBlocks;
import io.github.polewright.bench.jmh.SteadyBlocks;
import io.github.polewright.bench.measure.Times;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.Samples;
import io.github.polewright.bench.workload.Signal;
import java.util.Collection;
import java.util.Iterator;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import java.util.regex.Pattern;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.Options;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.TimeValue;
import org.openjdk.jmh.runner.options.VerboseMode;
import org.openjdk.jmh.util.Statistics;

/**
 * Lets the benchmark runner measure a chain in its own JVMs, once for the average and once for single blocks.
 *
 * @param chain what is measured
 * @param forks JVMs a mode
 * @param warmSeconds a fork
 * @param seconds measured a fork
 */
record BudgetRun(Chain chain, int forks, int warmSeconds, int seconds) {

    private static final double NANOS_PER_MICRO = 1000;

    Situation steady(String name, Signal signal) throws RunnerException {
        return situation(name, SteadyBlocks.class, signal);
    }

    Situation retuned(String name) throws RunnerException {
        return situation(name, RetunedBlocks.class, Signal.NOISE);
    }

    private Situation situation(String name, Class<? extends BlockBenchmark> benchmark, Signal signal)
            throws RunnerException {
        Statistics average = one(benchmark, signal, Mode.AverageTime);
        Statistics blocks = one(benchmark, signal, Mode.SampleTime);
        Row mean = new Row(
                name,
                "us",
                average.getMean() / NANOS_PER_MICRO,
                average.getMin() / NANOS_PER_MICRO,
                average.getMax() / NANOS_PER_MICRO);
        Times times = new Times();
        for (Iterator<Map.Entry<Double, Long>> raw = blocks.getRawData(); raw.hasNext(); ) {
            Map.Entry<Double, Long> entry = raw.next();
            times.record(Math.round(entry.getKey()), entry.getValue());
        }
        return new Situation(name, mean, times);
    }

    private Statistics one(Class<? extends BlockBenchmark> benchmark, Signal signal, Mode mode) throws RunnerException {
        Options options = new OptionsBuilder()
                .include("^" + Pattern.quote(benchmark.getName() + ".block") + "$")
                .mode(mode)
                .timeUnit(TimeUnit.NANOSECONDS)
                .forks(forks)
                .warmupIterations(warmSeconds)
                .warmupTime(TimeValue.seconds(1))
                .measurementIterations(seconds)
                .measurementTime(TimeValue.seconds(1))
                .param("sampleRateHz", String.valueOf(chain.sampleRateHz()))
                .param("channels", String.valueOf(chain.channels()))
                .param("frames", String.valueOf(chain.frames()))
                .param("sections", String.valueOf(chain.sections()))
                .param("form", chain.form().name())
                .param("samples", Samples.FLOAT.name())
                .param("signal", signal.name())
                .verbosity(VerboseMode.SILENT)
                .shouldFailOnError(true)
                .build();
        Collection<RunResult> results = new Runner(options).run();
        return results.iterator().next().getPrimaryResult().getStatistics();
    }
}
