package io.github.polewright.samples.command;

import io.github.polewright.pcm.PcmFormat;
import io.github.polewright.samples.files.WavFile;
import io.github.polewright.samples.files.WholeFile;
import io.github.polewright.samples.report.Spectrogram;
import io.github.polewright.samples.retune.Comparison;
import java.io.ByteArrayInputStream;
import java.io.PrintWriter;
import java.nio.ByteOrder;
import java.nio.file.Path;
import java.util.List;
import javax.sound.sampled.AudioFormat;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

@Command(
        name = "retune",
        description = "Moves a low-pass under a chord, swapped hard and as glides: two sounds and their spectrograms.",
        mixinStandardHelpOptions = true)
@SuppressWarnings("NullAway.Init")
final class RetuneCommand implements Runnable {

    private static final float RATE_HZ = 48_000;
    private static final double SECONDS = 3;

    @Spec
    private CommandSpec spec;

    @Option(
            names = "--folder",
            paramLabel = "FOLDER",
            description = "Where to put the files (default ${DEFAULT-VALUE}).")
    private Path folder = Path.of("samples", "target", "retune");

    @Override
    public void run() {
        Checks.folder(folder);
        WholeFile.makeFolder(folder);
        PrintWriter out = spec.commandLine().getOut();
        Comparison comparison = new Comparison(RATE_HZ, SECONDS);
        double[] swapped = comparison.swapped();
        double[] glided = comparison.glided(out::println);
        Path before = folder.resolve("swapped.wav");
        Path after = folder.resolve("glided.wav");
        Path picture = folder.resolve("retune.png");
        write(before, swapped);
        write(after, glided);
        Spectrogram.write(
                picture,
                RATE_HZ,
                List.of("Low-pass 5000 Hz - 200 Hz and back, coefficients swapped hard", "The same as glides"),
                List.of(swapped, glided));
        out.println("listen     " + before);
        out.println("           " + after);
        out.println("see        " + picture);
    }

    private static void write(Path path, double[] samples) {
        PcmFormat pcm = PcmFormat.integer(24, ByteOrder.LITTLE_ENDIAN);
        byte[] bytes = new byte[samples.length * pcm.bytesPerSample()];
        pcm.encode(samples, 0, bytes, 0, samples.length);
        AudioFormat format = new AudioFormat(RATE_HZ, 24, 1, true, false);
        WavFile.write(path, format, samples.length, new ByteArrayInputStream(bytes));
    }
}
