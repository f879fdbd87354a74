package io.github.polewright;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** Rows of a committed table of reference values; lines that begin with # tell where they come from. */
public final class Table {

    private Table() {}

    public static List<Row> rows(Class<?> beside, String name, String separator) {
        try (InputStream stream = beside.getResourceAsStream(name)) {
            if (stream == null) {
                throw new IllegalArgumentException("no table " + name + " beside " + beside);
            }
            return new String(stream.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .filter(line -> !line.isBlank() && !line.startsWith("#"))
                    .map(line -> new Row(List.of(line.split(separator))))
                    .toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** One line, split at the separator. */
    public record Row(List<String> columns) {

        public String text(int column) {
            return columns.get(column);
        }

        public double number(int column) {
            return Double.parseDouble(columns.get(column).strip());
        }

        /** Five columns from {@code first}: b0, b1, b2, a1, a2. */
        public Section section(int first) {
            return Section.of(
                    number(first), number(first + 1), number(first + 2), number(first + 3), number(first + 4));
        }

        @Override
        public String toString() {
            return String.join(" ", columns.subList(0, Math.min(5, columns.size())));
        }
    }
}
