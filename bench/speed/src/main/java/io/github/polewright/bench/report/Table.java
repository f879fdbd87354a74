package io.github.polewright.bench.report;

import java.util.ArrayList;
import java.util.List;

/** A text table: the first column to the left, all others to the right. */
public final class Table {

    private static final String GAP = "  ";

    private final List<List<String>> lines = new ArrayList<>();

    /**
     * A table with its head.
     *
     * @param head a cell a column
     */
    public Table(String... head) {
        lines.add(List.of(head));
    }

    /**
     * Adds a line.
     *
     * @param cells as many as the head has
     * @return this
     * @throws IllegalArgumentException if there are more or fewer
     */
    public Table add(String... cells) {
        if (cells.length != lines.get(0).size()) {
            throw new IllegalArgumentException(
                    cells.length + " cells; there must be " + lines.get(0).size());
        }
        lines.add(List.of(cells));
        return this;
    }

    /** The table with a rule under its head. */
    @Override
    public String toString() {
        int[] widths = new int[lines.get(0).size()];
        for (List<String> cells : lines) {
            for (int i = 0; i < widths.length; i++) {
                widths[i] = Math.max(widths[i], cells.get(i).length());
            }
        }
        StringBuilder text = new StringBuilder();
        for (int i = 0; i < lines.size(); i++) {
            text.append(line(lines.get(i), widths)).append(System.lineSeparator());
            if (i == 0) {
                int width = GAP.length() * (widths.length - 1);
                for (int column : widths) {
                    width += column;
                }
                text.append("-".repeat(width)).append(System.lineSeparator());
            }
        }
        return text.toString();
    }

    private static String line(List<String> cells, int[] widths) {
        StringBuilder line = new StringBuilder();
        for (int i = 0; i < widths.length; i++) {
            String blanks = " ".repeat(widths[i] - cells.get(i).length());
            line.append(i == 0 ? "" : GAP);
            line.append(i == 0 ? cells.get(i) + blanks : blanks + cells.get(i));
        }
        return line.toString().stripTrailing();
    }
}
