package io.github.polewright.bench.command;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** Another JVM like this one: the same java, the same flags, the same jar. */
public final class FreshJvm {

    private FreshJvm() {}

    /**
     * Runs a command of this program there.
     *
     * @param moreFlags JVM flags on top of this JVM's own
     * @param arguments command and options
     * @return what it printed on standard output
     * @throws IOException if it cannot be started or does not end with 0
     * @throws InterruptedException if this thread is interrupted meanwhile
     */
    public static String run(List<String> moreFlags, List<String> arguments) throws IOException, InterruptedException {
        Process process = new ProcessBuilder(commandLine(moreFlags, arguments))
                .redirectError(ProcessBuilder.Redirect.INHERIT)
                .start();
        try {
            process.getOutputStream().close();
            String printed = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
            int status = process.waitFor();
            if (status != 0) {
                throw new IOException("the forked JVM ended with status " + status);
            }
            return printed;
        } finally {
            process.destroy();
        }
    }

    static List<String> commandLine(List<String> moreFlags, List<String> arguments) {
        List<String> line = new ArrayList<>();
        line.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        for (String flag : ManagementFactory.getRuntimeMXBean().getInputArguments()) {
            // A debugger's port can be opened only once.
            if (!flag.startsWith("-agentlib:jdwp")) {
                line.add(flag);
            }
        }
        line.addAll(moreFlags);
        line.add("-cp");
        line.add(System.getProperty("java.class.path"));
        line.add("io.github.polewright.bench.Bench");
        line.addAll(arguments);
        return line;
    }
}
