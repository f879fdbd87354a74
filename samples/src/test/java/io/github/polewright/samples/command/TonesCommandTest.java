package io.github.polewright.samples.command;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import io.github.polewright.samples.Sounds;
import io.github.polewright.samples.Wav;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Frequencies of the symbols from ITU-T Q.23. */
final class TonesCommandTest extends CommandRun {

    @TempDir
    private Path folder;

    /** Adds a sine to part of a sound. */
    private static void sound(double[] sound, double rate, double from, double to, double hertz, double levelDb) {
        double size = Math.pow(10, levelDb / 20);
        for (int n = (int) Math.round(from * rate); n < Math.min(sound.length, Math.round(to * rate)); n++) {
            sound[n] += size * Math.sin(2 * Math.PI * hertz * n / rate);
        }
    }

    /** Symbols 5, # and A; the last of them sounds to the very end. */
    private static double[] dialled(double rate) {
        double[] sound = Sounds.noise(rate, 1, 0.001, 3);
        sound(sound, rate, 0.1, 0.2, 770 * 1.01, -12);
        sound(sound, rate, 0.1, 0.2, 1336, -10);
        sound(sound, rate, 0.4, 0.45, 941, -20);
        sound(sound, rate, 0.4, 0.45, 1477, -20);
        sound(sound, rate, 0.8, 1, 697, -14);
        sound(sound, rate, 0.8, 1, 1633 * 0.99, -16);
        return sound;
    }

    @ParameterizedTest
    @CsvSource({"8000,1,16,false", "44100,2,24,false", "48000,1,32,true", "11025,3,8,false", "192000,2,16,false"})
    void pairsArePrintedAsCommaSeparatedLines(double rate, int channels, int bits, boolean floating)
            throws IOException {
        double[] other = Sounds.notes(rate, 1, 5);
        double[][] sounds = new double[channels][];
        for (int c = 0; c < channels; c++) {
            sounds[c] = c == channels - 1 ? dialled(rate) : Sounds.scaled(other, 0.5);
        }
        Path in = Wav.write(folder.resolve("in.wav"), rate, channels, bits, floating, Sounds.interleaved(sounds));
        byte[] before = Files.readAllBytes(in);
        assertEquals(0, run("tones", in, "--channel", channels), complained);
        assertEquals("", complained);
        List<String> lines = printed.lines().toList();
        assertEquals(4, lines.size(), printed);
        assertEquals("start_s,end_s,symbol", lines.get(0));
        expect(lines.get(1), 0.1, 0.2, "5");
        expect(lines.get(2), 0.4, 0.45, "#");
        expect(lines.get(3), 0.8, 1, "A");
        assertArrayEquals(before, Files.readAllBytes(in));
    }

    private static void expect(String line, double start, double end, String symbol) {
        String[] cells = line.split(",", -1);
        assertEquals(3, cells.length, line);
        assertEquals(start, Double.parseDouble(cells[0]), 0.003, line);
        assertEquals(end, Double.parseDouble(cells[1]), 0.003, line);
        assertEquals(symbol, cells[2], line);
    }

    @Test
    void theJsonHoldsLevelsTwistAndErrors() throws IOException {
        Path in = Wav.write(folder.resolve("in.wav"), 48_000, 1, 24, false, dialled(48_000));
        Path json = folder.resolve("tones.json");
        assertEquals(0, run("tones", in, "--json", json), complained);
        JsonObject root = JsonParser.parseString(Files.readString(json)).getAsJsonObject();
        assertEquals(48_000, root.get("sampleRateHz").getAsDouble());
        assertEquals(1, root.get("channel").getAsInt());
        JsonArray pairs = root.getAsJsonArray("pairs");
        assertEquals(printed.lines().count() - 1, pairs.size());
        JsonObject five = pairs.get(0).getAsJsonObject();
        assertEquals("5", five.get("symbol").getAsString());
        assertEquals(0.1, five.get("startSeconds").getAsDouble(), 0.003);
        assertEquals(0.2, five.get("endSeconds").getAsDouble(), 0.003);
        assertEquals(-12, five.get("lowLevelDbfs").getAsDouble(), 0.3);
        assertEquals(-10, five.get("highLevelDbfs").getAsDouble(), 0.3);
        assertEquals(2, five.get("twistDb").getAsDouble(), 0.4);
        assertEquals(7.7, five.get("lowErrorHz").getAsDouble(), 1);
        assertEquals(1, five.get("lowErrorPercent").getAsDouble(), 0.13);
        assertEquals(0, five.get("highErrorHz").getAsDouble(), 1);
        JsonObject last = pairs.get(2).getAsJsonObject();
        assertEquals(-16.33, last.get("highErrorHz").getAsDouble(), 1);
        assertEquals(-1, last.get("highErrorPercent").getAsDouble(), 0.07);
        assertEquals(-2, last.get("twistDb").getAsDouble(), 0.4);
    }

    @Test
    void namedTonesAreWatched() throws IOException {
        double rate = 44_100;
        double[] sound = Sounds.noise(rate, 3, 0.001, 3);
        sound(sound, rate, 0.2, 1, 1000, -20);
        sound(sound, rate, 0.5, 1.5, 2100, -10);
        sound(sound, rate, 2, 3, 1000, -30);
        sound(sound, rate, 0.2, 3, 1500, -30);
        Path in = Wav.write(folder.resolve("in.wav"), rate, 1, 16, false, sound);
        Path json = folder.resolve("tones.json");
        assertEquals(0, run("tones", in, "--watch", "2100,1000,437.5", "--json", json), complained);
        List<String> lines = printed.lines().toList();
        assertEquals(4, lines.size(), printed);
        assertEquals("start_s,end_s,symbol", lines.get(0));
        expectNear(lines.get(1), 0.2, 1, "1000");
        expectNear(lines.get(2), 0.5, 1.5, "2100");
        expectNear(lines.get(3), 2, 3, "1000");
        JsonArray tones =
                JsonParser.parseString(Files.readString(json)).getAsJsonObject().getAsJsonArray("tones");
        assertEquals(3, tones.size());
        assertEquals(2100, tones.get(1).getAsJsonObject().get("frequencyHz").getAsDouble());
        assertEquals(-20, tones.get(0).getAsJsonObject().get("levelDbfs").getAsDouble(), 0.3);
        assertEquals(-10, tones.get(1).getAsJsonObject().get("levelDbfs").getAsDouble(), 0.3);
        assertEquals(-30, tones.get(2).getAsJsonObject().get("levelDbfs").getAsDouble(), 0.3);
        assertEquals(0, run("tones", in, "--watch", "1500", "--width", "5"), complained);
        assertTrue(printed.lines().toList().get(1).endsWith(",1500"), printed);
        assertEquals(0, run("tones", in, "--watch", "437.5"), complained);
        assertEquals(List.of("start_s,end_s,symbol"), printed.lines().toList());
        assertEquals(
                List.of("no tones found in channel 1 of " + in),
                complained.lines().toList());
        assertEquals(0, run("tones", in), complained);
        assertEquals(List.of("start_s,end_s,symbol"), printed.lines().toList());
        assertEquals(
                List.of("no tone pairs found in channel 1 of " + in),
                complained.lines().toList());
    }

    private static void expectNear(String line, double start, double end, String symbol) {
        String[] cells = line.split(",", -1);
        assertEquals(start, Double.parseDouble(cells[0]), 0.005, line);
        assertEquals(end, Double.parseDouble(cells[1]), 0.005, line);
        assertEquals(symbol, cells[2], line);
    }

    @Test
    void wrongUsageIsRefusedInOneLine() throws IOException {
        Path in = Wav.write(folder.resolve("in.wav"), 8000, 1, 16, false, dialled(8000));
        refused(Main.USAGE, "IN.wav", "tones");
        refused(Main.USAGE, "--channel is 2; it must be 1 to 1 ", "tones", in, "--channel", "2");
        refused(Main.USAGE, "--channel is 0; it must be 1 to 1 ", "tones", in, "--channel", "0");
        refused(Main.USAGE, "--watch is 3995", "tones", in, "--watch", "1000,3995");
        refused(Main.USAGE, "--watch is 5", "tones", in, "--watch", "5");
        refused(Main.USAGE, "--watch", "tones", in, "--watch", "low");
        refused(Main.USAGE, "--width is 0", "tones", in, "--watch", "1000", "--width", "0");
        refused(Main.USAGE, "--width is of use with --watch only", "tones", in, "--width", "5");
        refused(Main.USAGE, "never written", "tones", in, "--json", in);
        refused(Main.FAILED, "does not exist", "tones", folder.resolve("none.wav"));
        refused(
                Main.FAILED,
                "does not exist",
                "tones",
                in,
                "--json",
                folder.resolve("none").resolve("a.json"));
        Wav.write(in, 6000, 1, 16, false, dialled(6000));
        refused(Main.FAILED, "sample rate of 6000", "tones", in);
        assertEquals(0, run("tones", "--help"));
        assertTrue(printed.contains("--watch"));
    }

    private void refused(int status, String words, Object... args) throws IOException {
        try (Stream<Path> before = Files.list(folder)) {
            long count = before.count();
            assertEquals(status, run(args), complained);
            assertEquals("", printed);
            assertEquals(1, complained.lines().count(), complained);
            assertTrue(complained.contains(words), complained);
            try (Stream<Path> after = Files.list(folder)) {
                assertEquals(count, after.count());
            }
        }
        assertFalse(complained.isBlank());
    }
}
