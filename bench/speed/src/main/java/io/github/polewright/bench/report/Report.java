package io.github.polewright.bench.report;

import java.util.List;
import java.util.Map;

/**
 * What a command found, as it is kept in a file.
 *
 * @param format name and version of this layout
 * @param command that ran
 * @param machine it ran on
 * @param setup what was asked for, name to value
 * @param rows the numbers
 * @param curves distributions of block times
 * @param verdict one line
 * @param met whether what was asked for was met
 */
public record Report(
        String format,
        String command,
        Machine machine,
        Map<String, String> setup,
        List<Row> rows,
        List<Curve> curves,
        String verdict,
        boolean met) {

    /** The layout that this version writes and reads. */
    public static final String FORMAT = "polewright-bench 1";

    /**
     * A report in the present layout.
     *
     * @param command that ran
     * @param setup what was asked for
     * @param rows the numbers
     * @param curves distributions
     * @param verdict its line and its answer
     * @return the report
     */
    public static Report of(
            String command, Map<String, String> setup, List<Row> rows, List<Curve> curves, Verdict verdict) {
        return new Report(FORMAT, command, Machine.here(), setup, rows, curves, verdict.line(), verdict.met());
    }
}
