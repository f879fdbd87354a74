package io.github.polewright.tone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import javax.sound.sampled.AudioFileFormat;
import javax.sound.sampled.AudioFormat;
import javax.sound.sampled.AudioInputStream;
import javax.sound.sampled.AudioSystem;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Symbols read in what holds none; and that {@link TalkOff} would see them. */
final class TalkOffTest {

    @Test
    void theRunSeesWhatIsThere(@TempDir Path folder) throws IOException {
        wav(
                folder.resolve("one.wav"),
                new PairSignal(16000, 1).pause(0.5).pair('7', -10, 0.1).pause(60));
        wav(folder.resolve("none.WAV"), new PairSignal(44100, 1).pause(30).noise(-20, 0));
        Files.writeString(folder.resolve("text.wav"), "no sound");
        ByteArrayOutputStream printed = new ByteArrayOutputStream();
        TalkOff run = new TalkOff(1, 0, new PrintStream(printed, true, StandardCharsets.UTF_8));
        run.folder(folder);
        String text = printed.toString(StandardCharsets.UTF_8);
        assertEquals(1, run.symbols());
        assertEquals(2, run.files());
        assertEquals(3600 / 90.6, run.symbolsAnHour(), 1e-6);
        assertTrue(text.contains("one.wav: 7 at 0.5"), text);
        assertTrue(text.contains("text.wav: skipped"), text);
    }

    private static void wav(Path path, PairSignal signal) throws IOException {
        double[] samples = signal.samples();
        byte[] bytes = new byte[2 * samples.length];
        for (int i = 0; i < samples.length; i++) {
            int value = (int) Math.round(32767 * Math.max(-1, Math.min(1, samples[i])));
            bytes[2 * i] = (byte) value;
            bytes[2 * i + 1] = (byte) (value >> 8);
        }
        AudioFormat format = new AudioFormat((float) signal.rateHz, 16, 1, true, false);
        AudioInputStream in = new AudioInputStream(new ByteArrayInputStream(bytes), format, samples.length);
        AudioSystem.write(in, AudioFileFormat.Type.WAVE, path.toFile());
    }

    /**
     * Half an hour of each, with two clean parts above one another in the very octave of the low tones, which no recorded
     * music that was tried has for long. There is no promise for it; the counts only keep it from growing worse unseen.
     */
    @Tag("slow")
    @ParameterizedTest
    @CsvSource({"ORGAN,1", "PLUCKED,16", "BOWED,8", "FLUTE,5", "SINE,7"})
    void inventedMusicHoldsNoMoreThanItDid(PlayedMusic.Style style, int most) {
        double rate = 16000;
        PairReader reader = PairReader.of(rate);
        PlayedMusic music = new PlayedMusic(rate, style, 9);
        PairEvent event = new PairEvent();
        long frames = 0;
        int symbols = 0;
        while (frames < 1800 * rate) {
            double[] bar = music.bar();
            reader.process(bar, 0, bar.length);
            frames += bar.length;
            while (reader.poll(event)) {
                symbols += event.isEnd() ? 0 : 1;
            }
        }
        System.out.printf("%s: %d symbols in %.0f minutes of invented music%n", style, symbols, frames / rate / 60);
        assertTrue(symbols <= most, style + ": " + symbols);
    }
}
