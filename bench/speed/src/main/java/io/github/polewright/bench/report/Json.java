package io.github.polewright.bench.report;

import com.google.gson.Gson;
import com.google.gson.GsonBuilder;
import com.google.gson.JsonParseException;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.jspecify.annotations.Nullable;

/** Reports as JSON. */
public final class Json {

    private static final Gson GSON =
            new GsonBuilder().setPrettyPrinting().disableHtmlEscaping().create();

    private Json() {}

    /**
     * Writes any record.
     *
     * @param value a record of numbers, texts, lists and maps
     * @return JSON text
     */
    public static String text(Object value) {
        return GSON.toJson(value) + "\n";
    }

    /**
     * Reads any record.
     *
     * @param <T> the record
     * @param text JSON
     * @param type the record's class
     * @return the record
     * @throws IOException if the text is not such a record
     */
    public static <T> T parse(String text, Class<T> type) throws IOException {
        try {
            @Nullable T value = GSON.fromJson(text, type);
            if (value == null) {
                throw new IOException("the text is empty");
            }
            return value;
        } catch (JsonParseException | IllegalArgumentException wrong) {
            throw new IOException("this is not such JSON: " + firstLine(wrong), wrong);
        }
    }

    private static String firstLine(RuntimeException wrong) {
        return String.valueOf(wrong.getMessage()).lines().findFirst().orElse("no reason given");
    }

    /**
     * Writes a report whole.
     *
     * @param report the report
     * @param file where to
     * @throws IOException if it cannot be written
     */
    public static void write(Report report, Path file) throws IOException {
        WholeFile.write(file, text(report).getBytes(StandardCharsets.UTF_8));
    }

    /**
     * Reads a report.
     *
     * @param file where from
     * @return the report
     * @throws IOException if there is none, or it has another layout
     */
    public static Report read(Path file) throws IOException {
        if (!Files.isRegularFile(file)) {
            throw new IOException(file + " is not there or is not a file");
        }
        try {
            Report report = parse(Files.readString(file), Report.class);
            if (!Report.FORMAT.equals(report.format())) {
                throw new IOException("its format is " + report.format() + "; it must be " + Report.FORMAT);
            }
            return report;
        } catch (IOException wrong) {
            throw new IOException(file + " holds no report: " + wrong.getMessage(), wrong);
        }
    }
}
