package io.github.polewright.bench.report;

import java.util.List;

/**
 * Whether what was asked for was met.
 *
 * @param met the answer
 * @param line the answer and its reasons in one line
 */
public record Verdict(boolean met, String line) {

    /** Exit status where what was asked for was met, or nothing was asked for. */
    public static final int MET = 0;

    /** Exit status where it was measured and not met. */
    public static final int NOT_MET = 3;

    /**
     * Met if there is no complaint.
     *
     * @param complaints what was not met
     * @param praise the line to print if there are none
     * @return the verdict
     */
    public static Verdict of(List<String> complaints, String praise) {
        return complaints.isEmpty()
                ? new Verdict(true, "MET: " + praise)
                : new Verdict(false, "NOT MET: " + String.join("; ", complaints));
    }

    /**
     * What the process ends with.
     *
     * @return {@link #MET} or {@link #NOT_MET}
     */
    public int exitStatus() {
        return met ? MET : NOT_MET;
    }
}
