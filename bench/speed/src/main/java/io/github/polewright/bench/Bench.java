package io.github.polewright.bench;

import java.util.Arrays;
import org.openjdk.jmh.Main;

/** Entry point. */
public final class Bench {

    private Bench() {}

    /**
     * Runs a command.
     *
     * @param arguments the command and its options
     * @throws Exception what the benchmark runner throws
     */
    public static void main(String[] arguments) throws Exception {
        if (arguments.length > 0 && arguments[0].equals("jmh")) {
            Main.main(Arrays.copyOfRange(arguments, 1, arguments.length));
        }
    }
}
