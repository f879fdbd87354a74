package io.github.polewright.samples.command;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import io.github.polewright.samples.Sounds;
import io.github.polewright.samples.Wav;
import io.github.polewright.samples.files.Recording;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

final class CommandLineTest extends CommandRun {

    private static final double[] SIZES = {0.03, 0.015, 0.02, 0.006, 0.012, 0.003};

    @TempDir
    private Path folder;

    private Path in;
    private Path out;

    @BeforeEach
    void makeRecording() {
        in = folder.resolve("in.wav");
        out = folder.resolve("out.wav");
        Wav.write(in, 8000, 1, 16, false, hummed(8000, 6));
    }

    private static double[] hummed(double rate, double seconds) {
        return Sounds.plus(
                Sounds.sum(
                        Sounds.hum(rate, seconds, 50.04, SIZES, 1),
                        Sounds.noise(rate, seconds, 0.002, 2),
                        Sounds.sine(rate, seconds, 440, 0.1)),
                0.02);
    }

    private List<String> listing() throws IOException {
        try (Stream<Path> files = Files.walk(folder)) {
            return files.map(Path::toString).sorted().toList();
        }
    }

    @Test
    void surveyPrintsWhatTheJsonHolds() throws IOException {
        byte[] input = Files.readAllBytes(in);
        Path json = folder.resolve("survey.json");
        assertEquals(0, run("survey", in, "--json", json));
        assertEquals("", complained);
        JsonObject found = JsonParser.parseString(Files.readString(json)).getAsJsonObject();
        assertTrue(found.get("humFound").getAsBoolean());
        assertEquals(50.04, found.get("fundamentalHz").getAsDouble(), 0.005);
        assertEquals(0.02, found.get("dcOffset").getAsJsonArray().get(0).getAsDouble(), 2e-4);
        assertEquals(6, found.get("lines").getAsJsonArray().size());
        assertEquals(8000, found.get("sampleRateHz").getAsDouble());
        for (var line : found.get("lines").getAsJsonArray()) {
            double level = line.getAsJsonObject().get("levelDb").getAsDouble();
            assertTrue(printed.contains(String.format(Locale.ROOT, "%.1f", level)), printed);
        }
        assertTrue(printed.contains("licensed electrician"));
        assertArrayEquals(input, Files.readAllBytes(in));
        assertEquals(
                List.of(folder, in, json).stream().map(Path::toString).sorted().toList(), listing());
    }

    @ParameterizedTest
    @CsvSource({
        "8000, 1, 16, false",
        "11025, 2, 24, false",
        "44100, 2, 16, false",
        "48000, 1, 24, false",
        "48000, 3, 32, true",
        "96000, 2, 24, false",
        "192000, 1, 32, true",
        "16000, 1, 8, false",
        "16000, 1, 32, false",
        "8000, 1, 64, true",
    })
    void cleanKeepsTheFormatAndTakesOutHumAndDc(double rate, int channels, int bits, boolean floating)
            throws IOException {
        double[] one = hummed(rate, 6);
        double[][] all = new double[channels][];
        Arrays.fill(all, one);
        // An odd number of frames, so that an odd number of bytes occurs.
        double[] frames = Arrays.copyOf(Sounds.interleaved(all), channels * (one.length - 1));
        Wav.write(in, rate, channels, bits, floating, frames);
        byte[] input = Files.readAllBytes(in);
        assertEquals(0, run("clean", in, out, "--fixed"), complained);
        assertArrayEquals(input, Files.readAllBytes(in));
        byte[] output = Files.readAllBytes(out);
        assertEquals(input.length, output.length);
        assertArrayEquals(Arrays.copyOf(input, 44), Arrays.copyOf(output, 44), "the header");
        assertEquals(
                Recording.open(in).format().toString(),
                Recording.open(out).format().toString());
        double[] cleaned = Wav.read(out);
        double[] wanted = Sounds.interleaved(
                channels == 1
                        ? new double[][] {Sounds.sine(rate, 6, 440, 0.1)}
                        : Stream.generate(() -> Sounds.sine(rate, 6, 440, 0.1))
                                .limit(channels)
                                .toArray(double[][]::new));
        double[] rest = Sounds.sum(cleaned, Sounds.scaled(Arrays.copyOf(wanted, cleaned.length), -1));
        // The noise alone is 0.002; 8 bits add steps of 0.0078.
        assertEquals(0, Sounds.rms(rest), bits == 8 ? 0.004 : 0.0026);
        assertEquals(0, Arrays.stream(cleaned).average().orElseThrow(), bits == 8 ? 1e-3 : 1e-4);
    }

    /** A steady tone of three times the hum lies beside the ninth harmonic: hum of 0.03 goes down by 20 dB at least. */
    @ParameterizedTest
    @CsvSource({"8000, 1", "44100, 2", "192000, 1"})
    void followingTakesOutHumBesideATone(double rate, int channels) throws IOException {
        double[] one = hummed(rate, 6);
        double[][] all = new double[channels][];
        Arrays.fill(all, one);
        Wav.write(in, rate, channels, 24, false, Sounds.interleaved(all));
        assertEquals(0, run("clean", in, out), complained);
        assertTrue(printed.contains("follows the mains"), printed);
        assertEquals(
                Recording.open(in).format().toString(),
                Recording.open(out).format().toString());
        Arrays.fill(all, Sounds.scaled(Sounds.sine(rate, 6, 440, 0.1), -1));
        double[] rest = Sounds.sum(Wav.read(out), Sounds.interleaved(all));
        double left = Math.sqrt(Math.pow(Sounds.rms(rest), 2) - 0.002 * 0.002);
        assertEquals(0, left, 0.003);
    }

    @Test
    void withoutHumOnlyDcGoes() {
        double[] notes = Sounds.notes(44_100, 8, 3);
        Wav.write(in, 44_100, 1, 32, true, Sounds.plus(notes, 0.05));
        assertEquals(0, run("clean", in, out), complained);
        assertTrue(printed.contains("no hum found"), printed);
        assertTrue(printed.contains("only DC is removed"), printed);
        assertFalse(printed.contains("Caution"), printed);
        double[] rest = Sounds.sum(Wav.read(out), Sounds.scaled(notes, -1));
        // A notch of 1 Hz at DC turns a tone of 55 Hz by 1 degree, and higher ones less.
        assertEquals(0, Sounds.rms(rest) / Sounds.rms(notes), 0.02);
        assertEquals(0, Arrays.stream(Wav.read(out)).average().orElseThrow(), 1e-4);
    }

    /** Hum that fills a sixth of the recording: no hum of the recording to the survey, but the follower meets it. */
    @Test
    void humThatTheSurveyMissesIsToldWhereTheFollowerTakesItOut() {
        double[] sound = Sounds.noise(8000, 90, 0.002, 6);
        double[] hum = Sounds.hum(8000, 15, 50.04, SIZES, 1);
        for (int n = 0; n < hum.length; n++) {
            sound[60 * 8000 + n] += hum[n];
        }
        Wav.write(in, 8000, 1, 24, false, sound);
        assertEquals(0, run("clean", in, out), complained);
        assertTrue(printed.contains("no hum found"), printed);
        assertFalse(printed.contains("removed"), printed);
        Matcher told = Pattern.compile(
                        "met hum from ([\\d.]+) s on: up to (\\d) lines of 50.04\\d Hz taken out, for ([\\d.]+) s")
                .matcher(printed);
        assertTrue(told.find(), printed);
        double from = Double.parseDouble(told.group(1));
        double seconds = Double.parseDouble(told.group(3));
        assertTrue(from > 60 && from + seconds > 75 && from + seconds < 77, printed);
        assertTrue(printed.contains("low volume"), printed);
        // What is told is what was done: the hum is gone from a second after that on, and was there before it.
        assertEquals(0.002, Sounds.rms(part(Wav.read(out), from + 1, 75)), 0.0004);
        assertEquals(Sounds.rms(hum), Sounds.rms(part(Wav.read(out), 60, from - 0.5)), 0.001);

        assertEquals(0, run("clean", in, out, "--fixed"), complained);
        assertTrue(printed.contains("only DC is removed"), printed);
        assertFalse(printed.contains("Caution"), printed);
    }

    private static double[] part(double[] sound, double fromSeconds, double toSeconds) {
        return Arrays.copyOfRange(sound, (int) (fromSeconds * 8000), (int) (toSeconds * 8000));
    }

    @Test
    void withoutHumAndWithDcKeptNothingChanges() throws IOException {
        Wav.write(in, 44_100, 2, 24, false, Sounds.plus(Sounds.notes(44_100, 4, 3), 0.05));
        assertEquals(0, run("clean", "--no-dc", in, out), complained);
        assertArrayEquals(Files.readAllBytes(in), Files.readAllBytes(out));
    }

    /** A notch left where the hum was on average would let pass 2 d / width of a line d Hz away: here 0.006 each. */
    @Test
    void theNotchesFollowADrift() {
        double[] noise = Sounds.noise(8000, 60, 0.001, 4);
        double[] sound = noise.clone();
        for (int n = 0; n < sound.length; n++) {
            double t = n / 8000.0;
            double cycles = 49.97 * t + 0.001 * t * t / 2;
            for (int k = 1; k <= 6; k++) {
                sound[n] += 0.05 / k * Math.sin(2 * Math.PI * k * cycles + k);
            }
        }
        Wav.write(in, 8000, 1, 24, false, sound);
        assertEquals(0, run("clean", in, out), complained);
        double[] rest = Sounds.sum(Wav.read(out), Sounds.scaled(noise, -1));
        double atEndRms = Sounds.rms(Arrays.copyOfRange(rest, 50 * 8000, 60 * 8000));
        System.out.printf("drift of 1 mHz/s: %.5f left of hum of %.3f%n", atEndRms, 0.043);
        assertEquals(0, atEndRms, 0.002);
    }

    @Test
    void optionsAreHeeded() {
        assertEquals(0, run("clean", in, out, "--harmonics", "2", "--no-dc", "--width", "1", "--mains", "50"));
        assertTrue(printed.contains("2 lines"), printed);
        double[] cleaned = Wav.read(out);
        assertEquals(0.02, Arrays.stream(cleaned).average().orElseThrow(), 1e-3);
        assertEquals(0, run("clean", in, out, "--mains", "60"), complained);
        assertTrue(printed.contains("no hum found"), printed);
    }

    @Test
    void clippedAndNonFiniteSamplesAreCounted() {
        double[] sound = Sounds.sine(8000, 3, 440, 0.5);
        sound[100] = Double.NaN;
        sound[9000] = Double.NEGATIVE_INFINITY;
        Wav.write(in, 8000, 1, 32, true, sound);
        assertEquals(0, run("clean", in, out), complained);
        assertTrue(printed.contains("not finite 2 samples"), printed);
        for (double sample : Wav.read(out)) {
            assertTrue(Double.isFinite(sample));
        }
        double[] loud = Sounds.plus(Sounds.sine(8000, 3, 440, 0.999), 0);
        for (int n = 0; n < loud.length; n++) {
            loud[n] = n < 8000 ? 0.9 : loud[n];
        }
        Wav.write(in, 8000, 1, 16, false, loud);
        assertEquals(0, run("clean", in, out), complained);
        assertFalse(printed.contains("clipped    0 samples"), printed);
    }

    @Test
    void aReportHoldsChartsAndAPage() throws IOException {
        Path report = folder.resolve("new").resolve("report");
        assertEquals(0, run("clean", in, out, "--report", report), complained);
        assertReport(report, List.of("spectra-low", "spectra-whole", "track"));
        Path fixed = folder.resolve("fixed");
        assertEquals(0, run("clean", in, out, "--fixed", "--report", fixed), complained);
        assertReport(fixed, List.of("spectra-low", "spectra-whole", "track", "response"));
    }

    private static void assertReport(Path report, List<String> names) throws IOException {
        for (String name : names) {
            String svg = Files.readString(report.resolve(name + ".svg"));
            assertTrue(svg.contains("<svg"));
            byte[] png = Files.readAllBytes(report.resolve(name + ".png"));
            assertEquals(0x89504E47, ByteBuffer.wrap(png).getInt());
            assertTrue(Files.readString(report.resolve("index.html")).contains(name + ".svg"));
        }
        try (Stream<Path> files = Files.list(report)) {
            assertEquals(2 * names.size() + 2, files.count());
        }
        BufferedImage picture = ImageIO.read(report.resolve("spectrogram.png").toFile());
        // A line of hum stands out in the upper half and not in the lower one.
        double above = brightness(picture, 0);
        double below = brightness(picture, picture.getHeight() / 2);
        assertTrue(above > below + 1, above + " above, " + below + " below");
    }

    private static double brightness(BufferedImage picture, int top) {
        double sum = 0;
        for (int y = top; y < top + picture.getHeight() / 2; y++) {
            for (int x = 0; x < picture.getWidth(); x++) {
                sum += picture.getRGB(x, y) >> 8 & 0xff;
            }
        }
        return sum / picture.getWidth() / picture.getHeight() * 2;
    }

    /** Hum that wanders by 50 mHz to either side in twelve seconds: notches where the survey has them lag behind it. */
    @Test
    void followingBeatsTheFixedNotchesOnADrift() {
        double[] notes = Sounds.noise(16_000, 24, 0.02, 9);
        double[] sound = notes.clone();
        for (int n = 0; n < sound.length; n++) {
            double t = n / 16_000.0;
            double cycles = 50.1 * t - 0.05 * Math.cos(2 * Math.PI * t / 12) * 12 / (2 * Math.PI);
            for (int k = 1; k <= 10; k++) {
                sound[n] += 0.05 / k * Math.sin(2 * Math.PI * k * cycles + k);
            }
        }
        Wav.write(in, 16_000, 1, 24, false, sound);
        assertEquals(0, run("clean", in, out, "--no-dc"), complained);
        assertTrue(printed.contains("follows the mains"), printed);
        double following = Sounds.rms(Sounds.sum(Wav.read(out), Sounds.scaled(notes, -1)));
        assertEquals(0, run("clean", in, out, "--no-dc", "--fixed"), complained);
        assertTrue(printed.contains("by notches"), printed);
        double fixed = Sounds.rms(Sounds.sum(Wav.read(out), Sounds.scaled(notes, -1)));
        double gainDb = 20 * Math.log10(fixed / following);
        System.out.printf("hum that wanders: following leaves %.1f dB less than fixed notches%n", gainDb);
        assertTrue(gainDb > 6, "only " + gainDb + " dB better");
        assertEquals(0, run("survey", in), complained);
        assertTrue(printed.contains("drift of 0.1") || printed.contains("drift of 0.09"), printed);
        assertEquals(0, run("survey", in, "--mains", "60"), complained);
        assertFalse(printed.contains("drift of"), printed);
    }

    @Test
    void demoRunsTheWholePath() throws IOException {
        Path demo = folder.resolve("demo");
        assertEquals(0, run("demo", "--folder", demo), complained);
        assertTrue(printed.contains("found at 49.9"), printed);
        JsonObject found = JsonParser.parseString(Files.readString(demo.resolve("survey.json")))
                .getAsJsonObject();
        assertTrue(found.get("lines").getAsJsonArray().size() >= 10);
        assertTrue(Files.exists(demo.resolve("report").resolve("index.html")));
        double[] scene = Wav.read(demo.resolve("scene.wav"));
        double[] hummed = Wav.read(demo.resolve("scene-with-hum.wav"));
        double[] cleaned = Wav.read(demo.resolve("scene-cleaned.wav"));
        double before = Sounds.rms(Sounds.sum(hummed, Sounds.scaled(scene, -1)));
        double after = Sounds.rms(Sounds.sum(cleaned, Sounds.scaled(scene, -1)));
        double gainDb = 20 * Math.log10(before / after);
        System.out.printf("demo: what is not the scene falls by %.1f dB%n", gainDb);
        // The notches take a little of the scene, too, which counts here as if it were hum.
        assertTrue(gainDb > 15, "gain of " + gainDb + " dB");
    }

    @Test
    void helpAndVersionAreNoErrors() {
        assertEquals(0, run("--help"));
        assertTrue(printed.contains("survey") && printed.contains("clean") && printed.contains("demo"));
        assertEquals(0, run("clean", "--help"));
        assertTrue(printed.contains("--report"));
        assertEquals(0, run("--version"));
    }
}
