package io.github.polewright.samples.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.samples.Sounds;
import io.github.polewright.samples.Wav;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.scene.Scene;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Every recording is synthesised here, so what is in it is known exactly. */
final class SurveyorTest {

    private static final double[] SIZES = {1, 0.5, 0.7, 0.2, 0.4, 0.1, 0.2, 0.05};

    @TempDir
    private Path folder;

    private Survey survey(double rate, int channels, double[] frames) {
        Path path = Wav.write(folder.resolve("in.wav"), rate, channels, 24, false, frames);
        return Surveyor.survey(Recording.open(path), 0, Surveyor.DEFAULT_HARMONICS);
    }

    @ParameterizedTest
    @CsvSource({
        "8000, 50.031, 0.05, 0.02",
        "8000, 49.873, 0.003, 0.02",
        "11025, 59.962, 0.01, 0.02",
        "44100, 49.4, 0.003, 0.01",
        "48000, 60.417, 0.02, 0.05",
        "48000, 50.9, 0.1, 0.0001",
        "96000, 59.19, 0.005, 0.02",
        "192000, 50.0, 0.01, 0.02",
    })
    void theFundamentalOfFiveSecondsIsFound(double rate, double fundamentalHz, double size, double noise) {
        double[] hum = Sounds.hum(rate, 5, fundamentalHz, Sounds.scaled(SIZES, size), 3);
        double[] sound = Sounds.plus(Sounds.sum(hum, Sounds.noise(rate, 5, noise, 4)), 0.0125);
        Survey survey = survey(rate, 1, sound);
        assertTrue(survey.humFound());
        System.out.printf(
                "%.0f Hz, hum of %.3f Hz, %.4f in noise of %.4f: off by %.2f mHz, %d lines%n",
                rate,
                fundamentalHz,
                size,
                noise,
                1000 * (survey.fundamentalHz() - fundamentalHz),
                survey.lines().size());
        assertEquals(fundamentalHz, survey.fundamentalHz(), 0.02);
        double mean = Arrays.stream(sound).average().orElseThrow();
        assertEquals(mean, survey.dcOffset().get(0), 1e-6);
    }

    @Test
    void levelsAndFloorsAreThoseThatWerePutIn() {
        double rate = 48_000;
        double[] sizes = Sounds.scaled(SIZES, 0.05);
        double noise = 0.02;
        double[] sound = Sounds.sum(Sounds.hum(rate, 12, 50.07, sizes, 5), Sounds.noise(rate, 12, noise, 6));
        Survey survey = survey(rate, 1, sound);
        assertEquals(
                IntStream.rangeClosed(1, 8).boxed().toList(),
                survey.lines().stream().map(HumLine::harmonic).toList());
        // White noise of variance v has v / (rate / 2) in a band of 1 Hz.
        double floorDb = 10 * Math.log10(noise * noise / (rate / 2));
        for (HumLine line : survey.lines()) {
            double levelDb = 20 * Math.log10(sizes[line.harmonic() - 1]);
            assertEquals(levelDb, line.levelDb(), 0.6);
            assertEquals(levelDb - 10 * Math.log10(2) - floorDb, line.overFloorDb(), 2);
            assertEquals(line.harmonic() * 50.07, line.frequencyHz(), 0.01 * line.harmonic());
        }
    }

    @Test
    void humIsFoundUnderAScene() {
        double[] scene = Scene.of(44_100, 15);
        double[] hum = Sounds.hum(44_100, 15, 59.94, Sounds.scaled(SIZES, 0.002), 7);
        double[] frames = Sounds.sum(scene, Sounds.interleaved(hum, hum));
        Survey survey = survey(44_100, 2, frames);
        assertTrue(survey.humFound());
        assertEquals(59.94, survey.fundamentalHz(), 0.01);
    }

    @ParameterizedTest
    @ValueSource(longs = {501, 502, 503, 504, 505, 506, 507, 508, 509, 510})
    void loudNotesDoNotMislead(long seed) {
        double fundamentalHz = (seed % 2 == 0 ? 50 : 60) + 0.17 * (seed - 505);
        double[] hum = Sounds.hum(16_000, 5, fundamentalHz, Sounds.scaled(SIZES, 0.03), seed);
        double[] notes = Sounds.sum(Sounds.notes(16_000, 5, seed), Sounds.noise(16_000, 5, 0.002, seed));
        Survey survey = survey(16_000, 1, Sounds.sum(notes, hum));
        assertTrue(survey.humFound());
        assertEquals(fundamentalHz, survey.fundamentalHz(), 0.005);
    }

    @Test
    void humInAntiPhaseIsFoundAsWell() {
        double[] hum = Sounds.hum(44_100, 6, 50.02, Sounds.scaled(SIZES, 0.01), 8);
        double[] left = Sounds.sum(hum, Sounds.noise(44_100, 6, 0.01, 1));
        double[] right = Sounds.sum(Sounds.scaled(hum, -1), Sounds.noise(44_100, 6, 0.01, 2));
        Survey survey = survey(44_100, 2, Sounds.interleaved(left, right));
        assertTrue(survey.humFound());
        assertEquals(50.02, survey.fundamentalHz(), 0.005);
        assertEquals(-40, survey.lines().get(0).levelDb(), 0.5);
    }

    @Test
    void humInOneOfThreeChannelsIsFound() {
        double[] quiet = Sounds.noise(16_000, 6, 0.003, 1);
        double[] hum = Sounds.hum(16_000, 6, 50.02, Sounds.scaled(SIZES, 0.02), 8);
        double[] frames = Sounds.interleaved(quiet, Sounds.sum(hum, quiet), Sounds.noise(16_000, 6, 0.05, 2));
        Survey survey = survey(16_000, 3, frames);
        assertTrue(survey.humFound());
        assertEquals(50.02, survey.fundamentalHz(), 0.005);
    }

    @Test
    void aDriftIsFollowed() {
        double rate = 8000;
        double[] sound = Sounds.noise(rate, 60, 0.01, 9);
        for (int n = 0; n < sound.length; n++) {
            double t = n / rate;
            double cycles = 49.95 * t + 0.001 * t * t / 2;
            for (int k = 1; k <= 6; k++) {
                sound[n] += 0.05 / k * Math.sin(2 * Math.PI * k * cycles + k);
            }
        }
        Survey survey = survey(rate, 1, sound);
        assertTrue(survey.humFound());
        for (double t = 5; t < 56; t += 5) {
            assertEquals(49.95 + 0.001 * t, survey.fundamentalHz(t), 0.003);
        }
        assertEquals(0.054, survey.driftHz(), 0.006);
    }

    @Test
    void rectifiedHumHasEvenLinesOnly() {
        double rate = 16_000;
        double[] sound = Sounds.noise(rate, 8, 0.001, 3);
        for (int n = 0; n < sound.length; n++) {
            sound[n] += 0.1 * Math.abs(Math.sin(2 * Math.PI * 49.98 * n / rate));
        }
        Survey survey = survey(rate, 1, sound);
        assertTrue(survey.humFound());
        assertEquals(49.98, survey.fundamentalHz(), 0.002);
        assertTrue(survey.lines().stream().allMatch(line -> line.harmonic() % 2 == 0));
        // |sin| has lines of 4 / pi / (4 k^2 - 1) at 2 k times the frequency, here 0.1 times that.
        assertEquals(20 * Math.log10(0.4 / Math.PI / 3), survey.lines().get(0).levelDb(), 0.2);
        assertEquals(20 * Math.log10(0.4 / Math.PI / 15), survey.lines().get(1).levelDb(), 0.2);
    }

    @Test
    void aSingleStrongLineAtTheMainsFrequencyIsHum() {
        double[] sound = Sounds.sum(Sounds.sine(48_000, 6, 50.01, 0.05), Sounds.noise(48_000, 6, 0.01, 1));
        Survey survey = survey(48_000, 1, sound);
        assertTrue(survey.humFound());
        assertEquals(50.01, survey.fundamentalHz(), 0.005);
    }

    private void assertNoHum(String what, double rate, int channels, double[] frames) {
        Survey survey = survey(rate, channels, frames);
        assertFalse(survey.humFound(), () -> what + ": " + survey);
        assertEquals(List.of(), survey.lines());
        assertFalse(survey.tooShortToTell());
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
    void noiseAndNotesAreNoHum(long seed) {
        assertNoHum("noise", 8000, 1, Sounds.noise(8000, 5 + seed, 0.1, seed));
        assertNoHum("notes", 16_000, 1, Sounds.notes(16_000, 6 + 2 * seed, seed));
        double[] both = Sounds.sum(Sounds.notes(16_000, 9, seed + 50), Sounds.noise(16_000, 9, 0.003, seed));
        assertNoHum("notes in noise", 16_000, 1, both);
    }

    @ParameterizedTest
    @ValueSource(doubles = {440, 1000, 103.83, 220, 82.41, 61.74, 55, 48.999, 51.913, 58.27, 52.4})
    void aSteadyToneIsNoHum(double hertz) {
        double[] partials = {0.2, 0.1, 0.05, 0.02, 0.01};
        assertNoHum("sine", 48_000, 1, Sounds.sine(48_000, 6, hertz, 0.5));
        assertNoHum("tone", 48_000, 1, Sounds.hum(48_000, 6, hertz, partials, 1));
        double[] softer = Sounds.sum(Sounds.hum(48_000, 6, hertz, partials, 1), Sounds.noise(48_000, 6, 0.01, 1));
        assertNoHum("tone in noise", 48_000, 1, softer);
    }

    @Test
    void silenceAndASceneAreNoHum() {
        assertNoHum("silence", 48_000, 2, new double[48_000 * 2 * 6]);
        assertNoHum("DC", 48_000, 1, Sounds.plus(new double[48_000 * 6], 0.1));
        assertNoHum("scene", 44_100, 2, Scene.of(44_100, 6));
        assertNoHum("scene", 44_100, 2, Scene.of(44_100, 31));
    }

    @Test
    void lessThanASecondIsTooShortToTell() {
        Survey survey = survey(48_000, 1, Sounds.sine(48_000, 0.9, 50, 0.5));
        assertTrue(survey.tooShortToTell());
        assertFalse(survey.humFound());
        assertEquals(0, survey.dcOffset().get(0), 1e-3);
        assertTrue(survey(48_000, 1, new double[] {0.25}).tooShortToTell());
    }

    @Test
    void anotherMainsFrequencyIsFoundIfTold() {
        double[] sound = Sounds.sum(
                Sounds.hum(48_000, 6, 52.3, Sounds.scaled(SIZES, 0.02), 2), Sounds.noise(48_000, 6, 0.01, 1));
        Path path = Wav.write(folder.resolve("in.wav"), 48_000, 1, 24, false, sound);
        Survey survey = Surveyor.survey(Recording.open(path), 52, 10);
        assertTrue(survey.humFound());
        assertEquals(52.3, survey.fundamentalHz(), 0.005);
        assertFalse(Surveyor.survey(Recording.open(path), 60, 10).humFound());
    }

    @Test
    void samplesThatAreNoNumbersAreCountedAndTakenAsNothing() {
        double[] sound =
                Sounds.sum(Sounds.hum(8000, 5, 50, Sounds.scaled(SIZES, 0.02), 2), Sounds.noise(8000, 5, 0.01, 1));
        sound[777] = Double.NaN;
        sound[20_000] = Double.POSITIVE_INFINITY;
        Path path = Wav.write(folder.resolve("in.wav"), 8000, 1, 32, true, sound);
        Survey survey = Surveyor.survey(Recording.open(path), 0, 40);
        assertEquals(2, survey.nonFiniteSamples());
        assertEquals(50, survey.fundamentalHz(), 0.01);
    }
}
