package io.github.polewright.samples.command;

import io.github.polewright.pcm.PcmFormat;
import io.github.polewright.samples.files.Failure;
import io.github.polewright.samples.files.WavFile;
import io.github.polewright.samples.files.WholeFile;
import io.github.polewright.samples.scene.MainsHum;
import io.github.polewright.samples.scene.Scene;
import java.io.ByteArrayInputStream;
import java.io.PrintWriter;
import java.nio.ByteOrder;
import java.nio.file.Path;
import javax.sound.sampled.AudioFormat;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

@Command(
        name = "demo",
        description = "Invents a recording with DC offset and drifting hum, surveys it and cleans it.",
        mixinStandardHelpOptions = true)
@SuppressWarnings("NullAway.Init")
final class DemoCommand implements Runnable {

    private static final float RATE_HZ = 48_000;
    private static final double SECONDS = 40;
    private static final double[] DC = {0.02, -0.015};

    @Spec
    private CommandSpec spec;

    @Option(
            names = "--folder",
            paramLabel = "FOLDER",
            description = "Where to put the files (default ${DEFAULT-VALUE}).")
    private Path folder = Path.of("samples", "target", "demo");

    @Override
    public void run() {
        Checks.folder(folder);
        WholeFile.makeFolder(folder);
        double[] scene = Scene.of(RATE_HZ, SECONDS);
        double[] hummed = scene.clone();
        MainsHum hum = new MainsHum(49.97, 0.0008, 0.004, 15, 5);
        for (int n = 0; n < scene.length / 2; n++) {
            double value = 0.04 * hum.at(n / (double) RATE_HZ);
            hummed[2 * n] += value + DC[0];
            hummed[2 * n + 1] += DC[1] - 0.7 * value;
        }
        Path pure = folder.resolve("scene.wav");
        Path withHum = folder.resolve("scene-with-hum.wav");
        Path cleaned = folder.resolve("scene-cleaned.wav");
        write(pure, scene);
        write(withHum, hummed);
        PrintWriter out = spec.commandLine().getOut();
        out.println("An invented scene of " + (int) SECONDS
                + " s, with hum from 49.97 Hz upwards, the other way round in" + " the right channel, and DC:");
        out.println();
        step(
                "survey",
                withHum.toString(),
                "--json",
                folder.resolve("survey.json").toString());
        step(
                "clean",
                withHum.toString(),
                cleaned.toString(),
                "--report",
                folder.resolve("report").toString());
        out.println("listen     " + withHum);
        out.println("           " + cleaned);
        out.println("           " + pure + ", the scene as it was before the hum");
    }

    private void step(String... args) {
        PrintWriter out = spec.commandLine().getOut();
        out.println("> " + String.join(" ", args));
        CommandLine root = spec.parent().commandLine();
        int status = root.execute(args);
        out.println();
        if (status != 0) {
            throw new Failure(args[0] + " failed");
        }
    }

    private static void write(Path path, double[] frames) {
        PcmFormat pcm = PcmFormat.integer(24, ByteOrder.LITTLE_ENDIAN);
        byte[] bytes = new byte[frames.length * pcm.bytesPerSample()];
        pcm.encode(frames, 0, bytes, 0, frames.length);
        AudioFormat format = new AudioFormat(RATE_HZ, 24, 2, true, false);
        WavFile.write(path, format, frames.length / 2, new ByteArrayInputStream(bytes));
    }
}
