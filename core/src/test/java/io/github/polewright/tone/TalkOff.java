package io.github.polewright.tone;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import javax.sound.sampled.AudioFormat;
import javax.sound.sampled.AudioInputStream;
import javax.sound.sampled.AudioSystem;
import javax.sound.sampled.UnsupportedAudioFileException;

/**
 * Counts the symbols read in a folder of 16-bit WAV files that hold none: recorded speech, music.
 *
 * <p>Run by hand: {@code java -cp core/target/classes:core/target/test-classes io.github.polewright.tone.TalkOff FOLDER
 * [PITCH [LEVEL_DB]]}. A pitch of 1.05 claims a sample rate 5 % higher, which gives other material from the same files.
 */
final class TalkOff {

    private TalkOff() {}

    public static void main(String... arguments) throws IOException {
        double pitch = arguments.length > 1 ? Double.parseDouble(arguments[1]) : 1;
        double gain = Math.pow(10, (arguments.length > 2 ? Double.parseDouble(arguments[2]) : 0) / 20);
        double minutes = 0;
        int symbols = 0;
        int files = 0;
        List<Path> paths;
        try (Stream<Path> walk = Files.walk(Path.of(arguments[0]))) {
            paths = walk.filter(path -> path.toString().endsWith(".wav"))
                    .sorted()
                    .toList();
        }
        for (Path path : paths) {
            try (AudioInputStream in = AudioSystem.getAudioInputStream(path.toFile())) {
                double rate = in.getFormat().getSampleRate() * pitch;
                float[] frames = frames(in, gain);
                PairReader reader = PairReader.of(rate);
                for (PairReadings.Kept event : PairReadings.read(reader, frames)) {
                    if (!event.isEnd()) {
                        symbols++;
                        System.out.printf("%s: %s at %.3f s%n", path, event, event.start() / rate);
                    }
                }
                minutes += frames.length / rate / 60;
                files++;
            } catch (UnsupportedAudioFileException | IllegalArgumentException e) {
                System.out.printf("%s: skipped, %s%n", path, e.getMessage());
            }
        }
        System.out.printf("%d symbols in %.1f minutes of %d files%n", symbols, minutes, files);
    }

    /** The first channel. */
    private static float[] frames(AudioInputStream in, double gain) throws IOException {
        AudioFormat format = in.getFormat();
        if (format.getSampleSizeInBits() != 16 || format.isBigEndian()) {
            throw new IllegalArgumentException("not 16-bit PCM: " + format);
        }
        byte[] bytes = in.readAllBytes();
        int step = format.getFrameSize();
        float[] frames = new float[bytes.length / step];
        for (int i = 0; i < frames.length; i++) {
            int value = bytes[i * step] & 0xff | bytes[i * step + 1] << 8;
            frames[i] = (float) (Math.max(-1, Math.min(1, gain * value / 32768)));
        }
        return frames;
    }
}
