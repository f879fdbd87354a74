package io.github.polewright.bench.report;

import java.io.IOException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import org.jspecify.annotations.Nullable;

/** Files that appear whole or not at all: written beside, then renamed. */
public final class WholeFile {

    private WholeFile() {}

    /**
     * Complains before hours are spent on something that could not be kept.
     *
     * @param file that will be written, or null if none will
     * @throws IOException if its folder is missing or cannot be written, or it is a folder itself
     */
    public static void check(@Nullable Path file) throws IOException {
        if (file == null) {
            return;
        }
        if (Files.isDirectory(file)) {
            throw new IOException(file + " is a folder; it must be a file");
        }
        Path folder = folder(file);
        if (!Files.isDirectory(folder) || !Files.isWritable(folder)) {
            throw new IOException(
                    folder + " is no folder that can be written, so " + file.getFileName() + " cannot be put there");
        }
    }

    /**
     * Writes a file whole, in place of an earlier one.
     *
     * @param file where to
     * @param content all of it
     * @throws IOException if it cannot be written; an earlier file is then still there
     */
    public static void write(Path file, byte[] content) throws IOException {
        check(file);
        Path beside = folder(file)
                .resolve(
                        "." + file.getFileName() + "." + ProcessHandle.current().pid() + ".part");
        try {
            Files.write(beside, content, StandardOpenOption.CREATE, StandardOpenOption.TRUNCATE_EXISTING);
            move(beside, file);
        } finally {
            Files.deleteIfExists(beside);
        }
    }

    private static void move(Path from, Path to) throws IOException {
        try {
            Files.move(from, to, StandardCopyOption.ATOMIC_MOVE);
        } catch (AtomicMoveNotSupportedException elsewhere) {
            Files.move(from, to, StandardCopyOption.REPLACE_EXISTING);
        }
    }

    private static Path folder(Path file) {
        Path parent = file.toAbsolutePath().getParent();
        return parent == null ? file.toAbsolutePath() : parent;
    }
}
