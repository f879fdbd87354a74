package io.github.polewright.samples.clean;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import io.github.polewright.design.HumComb;
import io.github.polewright.live.LiveCascade;
import io.github.polewright.samples.Sounds;
import io.github.polewright.samples.Wav;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.survey.HumLine;
import io.github.polewright.samples.survey.OpeningHum;
import io.github.polewright.samples.survey.Survey;
import io.github.polewright.samples.survey.Surveyor;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;
import org.jtransforms.fft.DoubleFFT_1D;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Recorded speech with hum put on it. The folder of WAV files at 48 kHz, such as the spoken channel names of Debian's
 * package alsa-utils, is named by the system property {@code polewright.recordings}; they are not part of this project.
 */
final class SpeechTest {

    private static final int RATE_HZ = 48_000;
    private static final int SETTLE = 2 * RATE_HZ;
    private static final int HARMONICS = 12;

    @TempDir
    private Path folder;

    private static double[] speech() throws IOException {
        String name = System.getProperty("polewright.recordings", "");
        assumeTrue(!name.isBlank(), "skipped: the system property polewright.recordings names no folder");
        List<double[]> parts = new ArrayList<>();
        try (Stream<Path> files = Files.list(Path.of(name))) {
            for (Path file : files.sorted().toList()) {
                // One of the files is noise, not speech.
                if (file.toString().endsWith(".wav") && !file.endsWith("Noise.wav")) {
                    Recording recording = Recording.open(file);
                    if (recording.channels() == 1 && recording.sampleRateHz() == RATE_HZ) {
                        parts.add(Wav.read(file));
                    }
                }
            }
        }
        assertTrue(!parts.isEmpty(), "no WAV file of one channel at 48 kHz in " + name);
        int length = 0;
        for (int i = 0; length < 12 * RATE_HZ; i++) {
            parts.add(parts.get(i));
            length = parts.stream().mapToInt(part -> part.length).sum();
        }
        double[] speech = new double[length];
        int at = 0;
        for (double[] part : parts) {
            System.arraycopy(part, 0, speech, at, part.length);
            at += part.length;
        }
        return speech;
    }

    /** A sound alone through the stream made for the whole mixture. */
    private static double[] streamed(double[] sound, CleaningStream stream) {
        double[] result = sound.clone();
        double[] block = new double[CleaningStream.BLOCK_FRAMES];
        for (int at = 0; at < result.length; at += block.length) {
            int count = Math.min(block.length, result.length - at);
            System.arraycopy(result, at, block, 0, count);
            stream.process(block, count);
            System.arraycopy(block, 0, result, at, count);
        }
        return result;
    }

    private static double[] late(double[] sound) {
        return Arrays.copyOfRange(sound, SETTLE, sound.length);
    }

    /** The amplitude of one frequency, with a Hann window over the whole sound. */
    private static double amplitude(double[] sound, double hertz) {
        double real = 0;
        double imaginary = 0;
        for (int n = 0; n < sound.length; n++) {
            double window = 1 - Math.cos(2 * Math.PI * n / sound.length);
            real += window * sound[n] * Math.cos(2 * Math.PI * hertz * n / RATE_HZ);
            imaginary += window * sound[n] * Math.sin(2 * Math.PI * hertz * n / RATE_HZ);
        }
        return 2 * Math.hypot(real, imaginary) / sound.length;
    }

    /** Scale-invariant ratio of signal to distortion: Le Roux and others, "SDR - half-baked or well done?", 2019. */
    private static double siSdrDb(double[] estimate, double[] truth) {
        double dot = 0;
        double energy = 0;
        for (int n = 0; n < truth.length; n++) {
            dot += estimate[n] * truth[n];
            energy += truth[n] * truth[n];
        }
        double scale = dot / energy;
        double error = 0;
        for (int n = 0; n < truth.length; n++) {
            error += Math.pow(estimate[n] - scale * truth[n], 2);
        }
        return 10 * Math.log10(scale * scale * energy / error);
    }

    private static double[] powerSpectrum(double[] sound) {
        double[] data = sound.clone();
        for (int n = 0; n < data.length; n++) {
            data[n] *= 1 - Math.cos(2 * Math.PI * n / data.length);
        }
        new DoubleFFT_1D(data.length).realForward(data);
        double[] power = new double[data.length / 2];
        for (int m = 1; m < power.length; m++) {
            power[m] = data[2 * m] * data[2 * m] + data[2 * m + 1] * data[2 * m + 1];
        }
        return power;
    }

    /** The largest change of level in a third of an octave, leaving out 3 Hz to either side of each line. */
    private static double largestBandChangeDb(double[] before, double[] after, double fundamentalHz) {
        double[] powerBefore = powerSpectrum(before);
        double[] powerAfter = powerSpectrum(after);
        double binHz = (double) RATE_HZ / before.length;
        double largest = 0;
        for (int band = -12; band <= 9; band++) {
            double centreHz = 1000 * Math.pow(10, band / 10.0);
            double sumBefore = 0;
            double sumAfter = 0;
            for (int m = 1; m < powerBefore.length; m++) {
                double hertz = m * binHz;
                double toLine = Math.abs(hertz - fundamentalHz * Math.rint(hertz / fundamentalHz));
                boolean onLine = toLine < 3 && hertz < (HARMONICS + 0.5) * fundamentalHz;
                if (!onLine && hertz >= centreHz * Math.pow(10, -0.05) && hertz < centreHz * Math.pow(10, 0.05)) {
                    sumBefore += powerBefore[m];
                    sumAfter += powerAfter[m];
                }
            }
            largest = Math.max(largest, Math.abs(10 * Math.log10(sumAfter / sumBefore)));
        }
        return largest;
    }

    private static double bestToldCombSiSdrDb(double[] mixture, double[] speech, double fundamentalHz) {
        double best = Double.NEGATIVE_INFINITY;
        for (double widthHz : new double[] {0.25, 0.5, 1, 2}) {
            Survey none = new Survey(List.of(0.0), false, false, 0, 0, List.of(), List.of(), 0);
            CleanWish dcOnly = new CleanWish(0, HARMONICS, widthHz, true, true);
            LiveCascade comb = LiveCascade.of(
                    new HumCascade(RATE_HZ, none, dcOnly)
                            .at(fundamentalHz)
                            .then(HumComb.at(fundamentalHz)
                                    .lines(HARMONICS)
                                    .widthHz(widthHz)
                                    .design(RATE_HZ)),
                    1);
            double[] result = mixture.clone();
            comb.process(result, 0, result, 0, result.length);
            double siSdrDb = siSdrDb(late(result), late(speech));
            System.out.printf("  comb of %.2f Hz told the frequency: SI-SDR %.2f dB%n", widthHz, siSdrDb);
            best = Math.max(best, siSdrDb);
        }
        return best;
    }

    @ParameterizedTest
    @ValueSource(doubles = {50, 49.973, 50.118})
    void humAndDcGoAndSpeechStays(double fundamentalHz) throws IOException {
        double[] speech = speech();
        double[] sizes = new double[HARMONICS];
        Arrays.setAll(sizes, i -> 1.0 / (i + 1));
        double[] hum = Sounds.hum(RATE_HZ, (double) speech.length / RATE_HZ, fundamentalHz, sizes, 11);
        hum = Sounds.scaled(hum, Sounds.rms(speech) / Sounds.rms(hum));
        double[] mixture = Sounds.plus(Sounds.sum(speech, hum), 0.02);
        Recording recording = Recording.open(Wav.write(folder.resolve("mixture.wav"), RATE_HZ, 1, 32, true, mixture));

        CleanWish wish = new CleanWish(0, Surveyor.DEFAULT_HARMONICS, 0.5, true, true);
        Survey survey = Surveyor.survey(recording, 0, wish.harmonics());
        assertTrue(survey.humFound());
        System.out.printf(
                "speech of %.1f s with hum of %.3f Hz: found %.5f Hz, off by %.3f mHz, lines %s%n",
                recording.seconds(),
                fundamentalHz,
                survey.fundamentalHz(),
                1000 * (survey.fundamentalHz() - fundamentalHz),
                survey.lines().stream().map(HumLine::harmonic).toList());
        assertEquals(fundamentalHz, survey.fundamentalHz(), 0.002);

        HumCascade cascade = new HumCascade(RATE_HZ, survey, wish);
        var forHum = new CleaningStream(cascade, survey, RATE_HZ, 1);
        forHum.runUp(OpeningHum.of(recording, survey), wish);
        double[] humLeft = streamed(Sounds.plus(hum, 0.02), forHum);
        var forSpeech = new CleaningStream(cascade, survey, RATE_HZ, 1);
        double[] speechLeft = streamed(speech, forSpeech);
        double[] cleaned = Sounds.sum(humLeft, speechLeft);

        double least = Double.POSITIVE_INFINITY;
        for (int k = 1; k <= HARMONICS; k++) {
            double downDb = 20
                    * Math.log10(amplitude(late(hum), k * fundamentalHz) / amplitude(late(humLeft), k * fundamentalHz));
            System.out.printf("  line %d: down %.1f dB%n", k, downDb);
            least = Math.min(least, downDb);
        }
        double dc = Arrays.stream(late(cleaned)).average().orElseThrow();
        double changeDb = largestBandChangeDb(speech, speechLeft, fundamentalHz);
        double siSdrDb = siSdrDb(late(cleaned), late(speech));
        double before = siSdrDb(late(mixture), late(speech));
        double best = bestToldCombSiSdrDb(mixture, speech, fundamentalHz);
        System.out.printf(
                "  least %.1f dB, DC %.1e, bands within %.3f dB, SI-SDR %.2f dB (before %.2f, best told %.2f)%n",
                least, dc, changeDb, siSdrDb, before, best);
        assertTrue(least >= 40, "a line is down by " + least + " dB only");
        assertEquals(0, dc, 1e-4);
        assertEquals(0, changeDb, 0.1);
        assertTrue(siSdrDb >= best - 3, siSdrDb + " dB against " + best);
    }
}
