package io.github.polewright.samples.command;

import io.github.polewright.samples.files.Failure;
import io.github.polewright.samples.files.WholeFile;
import java.nio.file.Files;
import java.nio.file.Path;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;

/** Checks of options and paths, before anything is done. */
final class Checks {

    private Checks() {}

    static void range(CommandSpec spec, String name, double value, double least, double most) {
        if (!(value >= least && value <= most)) {
            throw new ParameterException(
                    spec.commandLine(), name + " is " + value + "; it must be " + least + " to " + most);
        }
    }

    /** The same of a whole number, which is printed as one. */
    static void range(CommandSpec spec, String name, int value, int least, int most) {
        if (value < least || value > most) {
            throw new ParameterException(
                    spec.commandLine(), name + " is " + value + "; it must be " + least + " to " + most);
        }
    }

    static void differs(CommandSpec spec, String name, Path output, Path input) {
        if (WholeFile.same(output, input)) {
            throw new ParameterException(
                    spec.commandLine(), name + " is the input file " + input + ", which is never written to");
        }
    }

    /** That a folder can be written in, or made. */
    static void folder(Path folder) {
        Path existing = folder.toAbsolutePath().normalize();
        while (existing.getParent() != null && !Files.exists(existing)) {
            existing = existing.getParent();
        }
        if (!Files.isDirectory(existing)) {
            throw new Failure("cannot make the folder " + folder + ": " + existing + " is a file");
        }
        if (!Files.isWritable(existing)) {
            throw new Failure("cannot write in the folder " + existing);
        }
    }

    /** That a file can be written, so that nobody waits in vain. */
    static void writable(Path file) {
        if (Files.isDirectory(file)) {
            throw new Failure(file + " is a folder, not a file");
        }
        Path folder = file.toAbsolutePath().normalize().getParent();
        if (folder == null || !Files.isDirectory(folder)) {
            throw new Failure("the folder of " + file + " does not exist");
        }
        if (!Files.isWritable(folder)) {
            throw new Failure("cannot write in the folder of " + file);
        }
    }
}
