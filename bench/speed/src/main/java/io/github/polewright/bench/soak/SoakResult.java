package io.github.polewright.bench.soak;

import io.github.polewright.bench.measure.Times;
import io.github.polewright.bench.report.Row;
import io.github.polewright.bench.report.Table;
import io.github.polewright.bench.report.Verdict;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * What a soak found.
 *
 * @param blocks played
 * @param lateness of the callbacks
 * @param allocatedBytes on the audio thread
 * @param surroundings what went on beside it
 * @param counters of the live cascade
 * @param settled whether the coefficients stand on the last target in the end
 */
record SoakResult(
        long blocks,
        Lateness lateness,
        long allocatedBytes,
        Surroundings surroundings,
        Counters counters,
        boolean settled) {

    private static final double NANOS_PER_MICRO = 1000;

    /**
     * What went on beside the audio thread.
     *
     * @param retunes handed over
     * @param allocatedBytes by other threads
     * @param collections of garbage
     * @param collectionMillis they took
     */
    record Surroundings(long retunes, long allocatedBytes, long collections, long collectionMillis) {}

    /**
     * The live cascade's own counters.
     *
     * @param replacedInputSamples not finite
     * @param replacedOutputSamples not finite
     * @param channelRestarts after an overflow
     */
    record Counters(long replacedInputSamples, long replacedOutputSamples, long channelRestarts) {

        long sum() {
            return replacedInputSamples + replacedOutputSamples + channelRestarts;
        }
    }

    /** Judges what is ours: misses of the machine's making are shown and not judged. */
    Verdict verdict() {
        List<String> complaints = new ArrayList<>();
        if (blocks == 0) {
            complaints.add("no block was played");
        }
        if (lateness.missedByOurs() > 0) {
            complaints.add(lateness.missedByOurs() + " blocks took longer than the period by themselves");
        }
        if (allocatedBytes != 0) {
            complaints.add("the audio thread allocated " + allocatedBytes + " bytes");
        }
        if (counters.sum() != 0) {
            complaints.add("samples were replaced or channels restarted");
        }
        if (!settled) {
            complaints.add("the last target was not reached");
        }
        return Verdict.of(
                complaints,
                "no deadline missed by our own work, nothing allocated, nothing replaced, settled on the last target");
    }

    List<Row> rows() {
        List<Row> rows = new ArrayList<>();
        times(rows, "ours, inside process", lateness.ours());
        times(rows, "ours, of which off the processor", lateness.offProcessor());
        times(rows, "the machine's, late to start", lateness.machine());
        rows.add(Row.count("blocks", "blocks", blocks));
        rows.add(Row.count("deadlines missed by our own work", "blocks", lateness.missedByOurs()));
        rows.add(Row.count("deadlines missed by the machine", "blocks", lateness.missedByMachine()));
        rows.add(Row.count("allocated on the audio thread", "bytes", allocatedBytes));
        return rows;
    }

    private static void times(List<Row> rows, String name, Times times) {
        rows.add(Row.exact(name + ": mean", "us", times.meanMicros()));
        rows.add(Row.exact(name + ": 99 % take less than", "us", times.micros(99)));
        rows.add(Row.exact(name + ": longest", "us", times.longestMicros()));
    }

    String text() {
        Table table = new Table("time of a callback, us", "mean", "p50", "p99", "p99.99", "max");
        line(table, "ours, inside process", lateness.ours());
        line(table, "  of which off the processor", lateness.offProcessor());
        line(table, "the machine's, late to start", lateness.machine());
        return table
                + String.format(
                        Locale.ROOT,
                        "%nblocks %d, deadlines missed by our own work %d, by the machine %d (%d callbacks skipped)%n"
                                + "worst lateness %.1f us after the deadline: ours %.1f us (%.1f us of it off the"
                                + " processor), the machine's %.1f us%n"
                                + "audio thread allocated %d bytes; replaced samples %d in, %d out; restarts %d;"
                                + " settled: %s%n"
                                + "meanwhile: %d retunes, %.1f GB allocated by others, %d collections in %d ms%n",
                        blocks,
                        lateness.missedByOurs(),
                        lateness.missedByMachine(),
                        lateness.skipped(),
                        lateness.worstNanos() / NANOS_PER_MICRO,
                        lateness.worstOursNanos() / NANOS_PER_MICRO,
                        lateness.worstOffProcessorNanos() / NANOS_PER_MICRO,
                        lateness.worstMachineNanos() / NANOS_PER_MICRO,
                        allocatedBytes,
                        counters.replacedInputSamples(),
                        counters.replacedOutputSamples(),
                        counters.channelRestarts(),
                        settled ? "yes" : "no",
                        surroundings.retunes(),
                        surroundings.allocatedBytes() / 1e9,
                        surroundings.collections(),
                        surroundings.collectionMillis());
    }

    private static void line(Table table, String name, Times times) {
        table.add(
                name,
                micros(times.meanMicros()),
                micros(times.micros(50)),
                micros(times.micros(99)),
                micros(times.micros(99.99)),
                micros(times.longestMicros()));
    }

    private static String micros(double value) {
        return String.format(Locale.ROOT, "%.1f", value);
    }
}
