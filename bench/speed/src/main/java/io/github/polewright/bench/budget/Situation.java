package io.github.polewright.bench.budget;

import io.github.polewright.bench.measure.Times;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.workload.Chain;
import java.util.List;

/**
 * What a chain took in one situation.
 *
 * @param name of the situation
 * @param meanMicros mean time of a block over each iteration: middle, least and most
 * @param times of single blocks
 */
record Situation(String name, Row meanMicros, Times times) {

    private static final double PERCENT = 100;
    private static final double NANOS_PER_MICRO = 1000;

    double nanosPerSamplePerSection(Chain chain) {
        return meanMicros.value() * NANOS_PER_MICRO / chain.work();
    }

    double sharePercent(Chain chain) {
        return PERCENT * meanMicros.value() * NANOS_PER_MICRO / chain.periodNanos();
    }

    List<Row> rows(Chain chain) {
        double toNanos = NANOS_PER_MICRO / chain.work();
        double toShare = PERCENT * NANOS_PER_MICRO / chain.periodNanos();
        return List.of(
                scaled("mean a sample a section", "ns", toNanos),
                scaled("mean", "us a block", 1),
                scaled("mean", "% of the period", toShare),
                Row.exact(name + ": half of the blocks take less than", "us", times.micros(50)),
                Row.exact(name + ": 99 % take less than", "us", times.micros(99)),
                Row.exact(name + ": 99.99 % take less than", "us", times.micros(99.99)),
                Row.exact(name + ": longest", "us", times.longestMicros()));
    }

    private Row scaled(String what, String unit, double factor) {
        return new Row(
                name + ": " + what,
                unit,
                factor * meanMicros.value(),
                factor * meanMicros.low(),
                factor * meanMicros.high());
    }
}
