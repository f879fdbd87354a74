package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.zip.ZipInputStream;
import org.jtransforms.fft.DoubleFFT_1D;
import org.junit.jupiter.api.Test;

/**
 * Recordings from outside, in the folder that the system property {@code polewright.recordings} names: Debian's
 * alsa-utils voices (usr/share/sounds/alsa/*.wav) and python3-scipy 1.10.1's scipy/misc/ecg.dat, an excerpt of record
 * 208 of the MIT-BIH Arrhythmia Database with real mains in it (doi 10.13026/C2F305). Skipped where they are absent.
 */
class RecordedTest {

    @Test
    void recordedSpeechIsFreedOfHum() {
        List<Recordings.Recording> all = Recordings.all();
        assumeTrue(!all.isEmpty(), "no recordings: name a folder of WAV files by -D" + Recordings.PROPERTY);
        double[] speech = Recordings.chain(all, 0, 14);
        Goals.Clean clean = new Goals.Clean("recorded", all.get(0).sampleRateHz(), speech);
        Cases.assertKept(Goals.removal(clean, 50.02, 0.02, 0, Hum.mixed(12, 7), 7));
        Cases.assertKept(Goals.removal(clean, 60.3, 0.05, 6, Hum.mixed(20, 8), 8));
    }

    @Test
    void recordedSpeechWithoutHumIsLeftAlone() {
        List<Recordings.Recording> all = Recordings.all();
        assumeTrue(!all.isEmpty(), "no recordings: name a folder of WAV files by -D" + Recordings.PROPERTY);
        double[] speech = Recordings.chain(all, 0, 60);
        Trace trace = Trace.of(speech, all.get(0).sampleRateHz(), Removal.SUBTRACTION);
        assertTrue(Double.isNaN(trace.followingAfter(0)), "mains at " + trace.followingAfter(0) + " s");
    }

    /** The track by complex demodulation (SciPy; call in the file's header), in windows of 20 s. */
    @Test
    void realMainsAreTracked() throws IOException {
        Path file = Path.of(System.getProperty(Recordings.PROPERTY, ""), "ecg.dat");
        assumeTrue(Files.exists(file), "no ecg.dat in the folder of -D" + Recordings.PROPERTY);
        double rate = 8000;
        double[] input = resample(read(file), 360, rate);
        // The record was taken at 360 Hz: its third line is the last.
        MainsFollower follower = MainsFollower.of(rate, 1, 3);
        int step = 800;
        double[] sums = new double[15];
        int[] counts = new int[15];
        for (int at = 0; at + step <= input.length; at += step) {
            follower.follow(input, at, step);
            MainsReading reading = follower.reading();
            if (reading.state() != MainsState.SEARCHING) {
                int window = (int) (at / rate / 20);
                sums[window] += reading.frequencyHz();
                counts[window]++;
            }
        }
        double[] track = track();
        for (int w = 1; w < 15; w++) {
            assertTrue(counts[w] > 100, "window " + w + " was followed half of the time");
            assertEquals(track[w], sums[w] / counts[w], 0.005, "window " + w);
        }
    }

    private static double[] track() throws IOException {
        List<Double> values = new ArrayList<>();
        try (BufferedReader lines = new BufferedReader(new InputStreamReader(
                Objects.requireNonNull(RecordedTest.class.getResourceAsStream("mains_track_ecg.csv")),
                StandardCharsets.UTF_8))) {
            for (String line = lines.readLine(); line != null; line = lines.readLine()) {
                if (!line.startsWith("#")) {
                    values.add(Double.valueOf(line.split(",")[2]));
                }
            }
        }
        return values.stream().mapToDouble(Double::doubleValue).toArray();
    }

    private static double[] read(Path file) throws IOException {
        try (ZipInputStream zip = new ZipInputStream(Files.newInputStream(file))) {
            zip.getNextEntry();
            ByteBuffer bytes = ByteBuffer.wrap(zip.readAllBytes()).order(ByteOrder.LITTLE_ENDIAN);
            int header = 10 + bytes.getShort(8);
            double[] samples = new double[(bytes.limit() - header) / 2];
            for (int n = 0; n < samples.length; n++) {
                samples[n] = ((bytes.getShort(header + 2 * n) & 0xffff) - 1024) / 200.0;
            }
            return samples;
        }
    }

    /** By padding the spectrum with zeros. */
    private static double[] resample(double[] input, double fromHz, double toHz) {
        int count = (int) Math.round(input.length * toHz / fromHz);
        double[] spectrum = new double[2 * count];
        System.arraycopy(input, 0, spectrum, 0, input.length);
        new DoubleFFT_1D(input.length).realForward(spectrum);
        spectrum[1] = 0;
        double[] output = java.util.Arrays.copyOf(spectrum, count);
        new DoubleFFT_1D(count).realInverse(output, true);
        for (int n = 0; n < count; n++) {
            output[n] *= toHz / fromHz;
        }
        return output;
    }
}
