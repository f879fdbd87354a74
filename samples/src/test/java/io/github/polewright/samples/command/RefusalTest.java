package io.github.polewright.samples.command;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.samples.Sounds;
import io.github.polewright.samples.Wav;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What survey, clean and demo refuse: in one line, and before anything is written. */
final class RefusalTest extends CommandRun {

    @TempDir
    private Path folder;

    private Path in;
    private Path out;

    @BeforeEach
    void makeRecording() {
        in = folder.resolve("in.wav");
        out = folder.resolve("out.wav");
        Wav.write(in, 8000, 1, 16, false, Sounds.noise(8000, 6, 0.002, 2));
    }

    /** One line on standard error, nothing on the other, and the folder as it was. */
    private void refused(int status, String words, Object... args) throws IOException {
        List<String> before = listing();
        byte[] input = Files.readAllBytes(in);
        assertEquals(status, run(args), complained);
        assertEquals("", printed);
        assertEquals(1, complained.lines().count(), complained);
        assertTrue(complained.contains(words), complained);
        assertEquals(before, listing());
        assertArrayEquals(input, Files.readAllBytes(in));
    }

    private List<String> listing() throws IOException {
        try (Stream<Path> files = Files.walk(folder)) {
            return files.map(Path::toString).sorted().toList();
        }
    }

    @Test
    void wrongUsageIsRefused() throws IOException {
        refused(Main.USAGE, "a command is missing");
        refused(Main.USAGE, "washing", "washing", in, out);
        refused(Main.USAGE, "--loud", "clean", in, out, "--loud");
        refused(Main.USAGE, "--loud", "survey", in, "--loud");
        refused(Main.USAGE, "OUT.wav", "clean", in);
        refused(Main.USAGE, "IN.wav", "survey");
        refused(Main.USAGE, "--width", "clean", in, out, "--width", "0");
        refused(Main.USAGE, "--width", "clean", in, out, "--width", "NaN");
        refused(Main.USAGE, "--width", "clean", in, out, "--width", "wide");
        refused(Main.USAGE, "--mains", "clean", in, out, "--mains", "-50");
        refused(
                Main.USAGE,
                "--width is 6.0; it must be 0.05 to 5.0",
                "clean",
                in,
                out,
                "--mains",
                "10",
                "--width",
                "6");
        refused(Main.USAGE, "--width is of use with --fixed or --mains only", "clean", in, out, "--width", "2");
        refused(Main.USAGE, "--harmonics is 0; it must be 1 to 200 ", "survey", in, "--harmonics", "0");
        refused(Main.USAGE, "--harmonics is 201; it must be 1 to 200 ", "clean", in, out, "--harmonics", "201");
    }

    @Test
    void theInputIsNeverTheOutput() throws IOException {
        refused(Main.USAGE, "never written", "clean", in, in);
        refused(
                Main.USAGE,
                "never written",
                "clean",
                in,
                folder.resolve("x").resolve("..").resolve("in.wav"));
        refused(Main.USAGE, "never written", "survey", in, "--json", in);
        Path link = Files.createSymbolicLink(folder.resolve("link.wav"), in);
        refused(Main.USAGE, "never written", "clean", in, link);
        refused(Main.USAGE, "never written", "clean", link, in);
        Path hard = Files.createLink(folder.resolve("hard.wav"), in);
        refused(Main.USAGE, "never written", "clean", in, hard);
        Path relative = Path.of("").toAbsolutePath().relativize(in.toRealPath());
        refused(Main.USAGE, "never written", "clean", in, relative);
    }

    @Test
    void filesThatCannotBeReadAreRefused() throws IOException {
        refused(Main.FAILED, "does not exist", "survey", folder.resolve("none.wav"));
        refused(Main.FAILED, "does not exist", "clean", folder.resolve("none.wav"), out);
        refused(Main.FAILED, "is not a file", "survey", folder);
        byte[] whole = Files.readAllBytes(in);
        Path bad = folder.resolve("bad.wav");
        for (int length : new int[] {0, 10, 30, 44, 45, whole.length / 2, whole.length - 1}) {
            Files.write(bad, Arrays.copyOf(whole, length));
            String words = length == 0 ? "is empty" : length < 44 ? "not a whole WAV file" : "truncated";
            refused(Main.FAILED, words, "survey", bad);
            refused(Main.FAILED, words, "clean", bad, out, "--report", folder.resolve("report"));
        }
        byte[] noSamples = Arrays.copyOf(whole, 44);
        ByteBuffer.wrap(noSamples).order(ByteOrder.LITTLE_ENDIAN).putInt(40, 0).putInt(4, 36);
        Files.write(bad, noSamples);
        refused(Main.FAILED, "holds no samples", "clean", bad, out);
        Files.writeString(bad, "This is not a sound at all, but a text of some length.", StandardCharsets.US_ASCII);
        refused(Main.FAILED, "not a whole WAV file of uncompressed", "clean", bad, out);
    }

    @Test
    void compressedFilesAreRefused() throws IOException {
        byte[] whole = Files.readAllBytes(in);
        Path bad = folder.resolve("bad.wav");
        // A-law, mu-law, two kinds of ADPCM and MPEG layer 3, by the registered format tags.
        for (short tag : new short[] {6, 7, 2, 17, 0x55}) {
            byte[] other = whole.clone();
            ByteBuffer header = ByteBuffer.wrap(other).order(ByteOrder.LITTLE_ENDIAN);
            header.putShort(20, tag).putShort(32, (short) 1).putShort(34, (short) 8);
            Files.write(bad, other);
            refused(Main.FAILED, "compressed", "clean", bad, out);
            refused(Main.FAILED, "compressed", "survey", bad);
        }
    }

    @Test
    void placesThatCannotBeWrittenAreRefused() throws IOException {
        refused(
                Main.FAILED,
                "does not exist",
                "clean",
                in,
                folder.resolve("none").resolve("out.wav"));
        refused(Main.FAILED, "is a folder", "clean", in, folder);
        refused(
                Main.FAILED,
                "does not exist",
                "survey",
                in,
                "--json",
                folder.resolve("none").resolve("a.json"));
        refused(Main.FAILED, "cannot make the folder", "clean", in, out, "--report", in.resolve("report"));
        refused(Main.FAILED, "cannot make the folder", "demo", "--folder", in);
    }
}
