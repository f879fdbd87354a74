package io.github.polewright.tone;

import java.io.IOException;
import java.io.PrintStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import javax.sound.sampled.AudioFormat;
import javax.sound.sampled.AudioInputStream;
import javax.sound.sampled.AudioSystem;
import javax.sound.sampled.UnsupportedAudioFileException;

/**
 * Counts the symbols read in the first channel of all 16-bit WAV files of a folder that hold none: recorded speech, such
 * as the spoken channel names of Debian's package alsa-utils, or music.
 *
 * <p>Run by hand after {@code mvn -pl core -am test-compile}: {@code java -cp core/target/classes:core/target/test-classes
 * io.github.polewright.tone.TalkOff FOLDER [MOST_AN_HOUR [PITCH [GAIN_DB]]]}. A pitch of 1.05 claims a sample rate 5 %
 * higher, which makes other material of the same files. Exit status 1 if there are more symbols than allowed (0 unless
 * told), 2 if nothing could be read.
 */
final class TalkOff {

    private final double pitch;
    private final double gain;
    private final PrintStream out;
    private double seconds;
    private int symbols;
    private int files;

    TalkOff(double pitch, double gainDb, PrintStream out) {
        this.pitch = pitch;
        this.gain = Math.pow(10, gainDb / 20);
        this.out = out;
    }

    public static void main(String... arguments) throws IOException {
        TalkOff run = new TalkOff(number(arguments, 2, 1), number(arguments, 3, 0), System.out);
        run.folder(Path.of(arguments[0]));
        System.out.println(run);
        if (run.files == 0) {
            System.exit(2);
        }
        System.exit(run.symbolsAnHour() > number(arguments, 1, 0) ? 1 : 0);
    }

    private static double number(String[] arguments, int index, double otherwise) {
        return arguments.length > index ? Double.parseDouble(arguments[index]) : otherwise;
    }

    void folder(Path folder) throws IOException {
        List<Path> paths;
        try (Stream<Path> walk = Files.walk(folder)) {
            paths = walk.filter(path -> path.toString().toLowerCase(Locale.ROOT).endsWith(".wav"))
                    .sorted()
                    .toList();
        }
        for (Path path : paths) {
            try (AudioInputStream in = AudioSystem.getAudioInputStream(path.toFile())) {
                file(path, in);
            } catch (UnsupportedAudioFileException | IllegalArgumentException e) {
                out.printf("%s: skipped, %s%n", path, e.getMessage());
            }
        }
    }

    private void file(Path path, AudioInputStream in) throws IOException {
        double rate = in.getFormat().getSampleRate() * pitch;
        PairReader reader = PairReader.of(rate);
        float[] frames = frames(in);
        for (PairReadings.Kept event : PairReadings.read(reader, frames)) {
            if (!event.isEnd()) {
                symbols++;
                out.printf("%s: %s at %.3f s%n", path, event.symbol(), event.start() / rate);
            }
        }
        seconds += frames.length / rate;
        files++;
    }

    private float[] frames(AudioInputStream in) throws IOException {
        AudioFormat format = in.getFormat();
        if (format.getSampleSizeInBits() != 16 || format.isBigEndian()) {
            throw new IllegalArgumentException("not 16-bit PCM: " + format);
        }
        byte[] bytes = in.readAllBytes();
        int step = format.getFrameSize();
        float[] frames = new float[bytes.length / step];
        for (int i = 0; i < frames.length; i++) {
            int value = bytes[i * step] & 0xff | bytes[i * step + 1] << 8;
            frames[i] = (float) Math.max(-1, Math.min(1, gain * value / 32768));
        }
        return frames;
    }

    int symbols() {
        return symbols;
    }

    int files() {
        return files;
    }

    double symbolsAnHour() {
        return symbols / (seconds / 3600);
    }

    @Override
    public String toString() {
        return String.format(
                Locale.ROOT,
                "%d symbols in %.1f minutes of %d files: %.2f an hour",
                symbols,
                seconds / 60,
                files,
                symbolsAnHour());
    }
}
