package io.github.polewright.samples.command;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.stream.Stream;

/** Runs command lines and keeps what they print. */
abstract class CommandRun {

    String printed = "";
    String complained = "";

    final int run(Object... args) {
        StringWriter print = new StringWriter();
        StringWriter complaints = new StringWriter();
        String[] words = Stream.of(args).map(Object::toString).toArray(String[]::new);
        int status = Main.run(new PrintWriter(print, true), new PrintWriter(complaints, true), words);
        printed = print.toString();
        complained = complaints.toString();
        return status;
    }
}
