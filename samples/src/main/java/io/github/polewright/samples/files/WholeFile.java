package io.github.polewright.samples.files;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.AccessDeniedException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/** Files that appear whole or not at all: written beside their place under another name, then renamed. */
public final class WholeFile {

    /** Fills the file it is given. */
    public interface Writing {
        void to(Path beside) throws IOException;
    }

    private WholeFile() {}

    public static void write(Path target, Writing writing) {
        if (Files.isDirectory(target)) {
            throw new Failure(target + " is a folder, not a file");
        }
        Path folder = target.toAbsolutePath().normalize().getParent();
        if (folder == null || !Files.isDirectory(folder)) {
            throw new Failure("the folder of " + target + " does not exist");
        }
        Path name = target.getFileName();
        Path beside = folder.resolve("." + name + "." + ProcessHandle.current().pid() + ".part");
        try {
            try {
                writing.to(beside);
                rename(beside, folder.resolve(name));
            } finally {
                Files.deleteIfExists(beside);
            }
        } catch (IOException e) {
            throw new Failure("cannot write " + target + ": " + reason(e), e);
        }
    }

    public static void writeText(Path target, String text) {
        write(target, beside -> Files.writeString(beside, text, StandardCharsets.UTF_8));
    }

    /** Makes a folder and those it lies in, or fails if that cannot be. */
    public static void makeFolder(Path folder) {
        try {
            Files.createDirectories(folder);
        } catch (IOException e) {
            throw new Failure("cannot make the folder " + folder + ": " + reason(e), e);
        }
        if (!Files.isWritable(folder)) {
            throw new Failure("cannot write in the folder " + folder);
        }
    }

    /** Whether both names lead to one file, through links and relative names too. */
    public static boolean same(Path one, Path other) {
        try {
            if (Files.exists(one) && Files.exists(other)) {
                return Files.isSameFile(one, other);
            }
            return one.toAbsolutePath()
                    .normalize()
                    .equals(other.toAbsolutePath().normalize());
        } catch (IOException e) {
            throw new Failure("cannot compare " + one + " and " + other + ": " + reason(e), e);
        }
    }

    private static void rename(Path from, Path to) throws IOException {
        try {
            Files.move(from, to, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
        } catch (AtomicMoveNotSupportedException e) {
            Files.move(from, to, StandardCopyOption.REPLACE_EXISTING);
        }
    }

    static String reason(IOException e) {
        if (e instanceof AccessDeniedException) {
            return "access denied";
        }
        if (e instanceof NoSuchFileException) {
            return "no such file or folder";
        }
        String message = e.getMessage();
        return message == null ? e.getClass().getSimpleName() : message.replaceAll("\\s+", " ");
    }
}
