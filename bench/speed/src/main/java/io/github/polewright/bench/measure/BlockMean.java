package io.github.polewright.bench.measure;

import io.github.polewright.bench.report.Row;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import java.util.regex.Pattern;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.ChainedOptionsBuilder;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.TimeValue;
import org.openjdk.jmh.runner.options.VerboseMode;
import org.openjdk.jmh.util.Statistics;

/** The mean time of a benchmark's method {@code block}, by the benchmark runner in JVMs of its own. */
public final class BlockMean {

    private static final int WARM_SECONDS = 2;
    private static final double NANOS_PER_MICRO = 1000;

    private BlockMean() {}

    /**
     * Measures.
     *
     * @param name of the row
     * @param benchmark its class
     * @param parameters of the benchmark, name to value
     * @param forks JVMs
     * @param seconds measured a JVM, after two of warm-up
     * @return microseconds, with the fastest and the slowest second
     * @throws RunnerException if the benchmark fails
     */
    public static Row micros(String name, Class<?> benchmark, Map<String, String> parameters, int forks, int seconds)
            throws RunnerException {
        ChainedOptionsBuilder options = new OptionsBuilder()
                .include("^" + Pattern.quote(benchmark.getName() + ".block") + "$")
                .mode(Mode.AverageTime)
                .timeUnit(TimeUnit.NANOSECONDS)
                .forks(forks)
                .warmupIterations(WARM_SECONDS)
                .warmupTime(TimeValue.seconds(1))
                .measurementIterations(seconds)
                .measurementTime(TimeValue.seconds(1))
                .verbosity(VerboseMode.SILENT)
                .shouldFailOnError(true);
        parameters.forEach(options::param);
        Statistics statistics = new Runner(options.build())
                .run()
                .iterator()
                .next()
                .getPrimaryResult()
                .getStatistics();
        return new Row(
                name,
                "us",
                statistics.getMean() / NANOS_PER_MICRO,
                statistics.getMin() / NANOS_PER_MICRO,
                statistics.getMax() / NANOS_PER_MICRO);
    }
}
