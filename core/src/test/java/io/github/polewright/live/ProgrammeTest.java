package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.design.Cookbook;
import io.github.polewright.mains.Recordings;
import io.github.polewright.retune.Pace;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.jtransforms.fft.DoubleFFT_1D;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * What a retune adds under a programme that ends at 2 kHz: whatever then lies above 6 kHz is the retune's own. Programmes
 * are pink noise, recorded speech where a folder is named, and a constant; the baselines are coefficients swapped hard
 * and a step a block in transposed form.
 */
class ProgrammeTest {

    private static final double RATE_HZ = 48_000;
    private static final int FRAMES = 2 * Clicks.WINDOW;
    private static final int AT = Clicks.WINDOW;
    private static final int GLIDE_FRAMES = 4_800;

    record Move(String name, Section before, Section after) {
        @Override
        public String toString() {
            return name;
        }
    }

    static List<Move> moves() {
        return List.of(
                new Move("peak", Cookbook.peaking(RATE_HZ, 1000, 1, -12), Cookbook.peaking(RATE_HZ, 1000, 1, 12)),
                new Move("low-pass up", Cookbook.lowPass(RATE_HZ, 1000, 4), Cookbook.lowPass(RATE_HZ, 2000, 4)),
                new Move("low-pass down", Cookbook.lowPass(RATE_HZ, 5000, 0.7), Cookbook.lowPass(RATE_HZ, 200, 0.7)),
                new Move("shelf", Cookbook.lowShelf(RATE_HZ, 200, 0.7, -12), Cookbook.lowShelf(RATE_HZ, 200, 0.7, 12)));
    }

    @ParameterizedTest
    @MethodSource("moves")
    void addsNothingToPinkNoise(Move move) {
        isQuiet(move, pink());
    }

    @ParameterizedTest
    @MethodSource("moves")
    void addsNothingToRecordedSpeech(Move move) {
        List<Double> chained = new ArrayList<>();
        for (Recordings.Recording recording : Recordings.all()) {
            if (recording.sampleRateHz() == RATE_HZ && !recording.name().equals("Noise.wav")) {
                Arrays.stream(recording.samples()).forEach(chained::add);
            }
        }
        assumeTrue(!chained.isEmpty(), "skipped: polewright.recordings names no folder of speech at 48 kHz");
        double[] speech = new double[FRAMES];
        for (int i = 0; i < FRAMES; i++) {
            speech[i] = chained.get(i % chained.size());
        }
        isQuiet(move, lowPart(speech));
    }

    @Test
    void leavesAConstantAsItIs() {
        double[] in = new double[FRAMES];
        Arrays.fill(in, 1);
        for (Move move : moves().subList(0, 3)) {
            double[] out = glided(move, in);
            for (int i = AT; i < FRAMES; i++) {
                assertEquals(1, out[i], 1e-11, move + ", frame " + i);
            }
        }
    }

    private static void isQuiet(Move move, double[] programme) {
        double hard = aboveDb(NaiveSwap.hard(move.before, move.after, AT, programme), programme, AT);
        double naive = aboveDb(
                NaiveSwap.transposedByBlocks(move.before, move.after, AT, GLIDE_FRAMES, 64, programme),
                programme,
                AT + GLIDE_FRAMES / 2);
        double ours = aboveDb(glided(move, programme), programme, AT + GLIDE_FRAMES / 2);
        String found = ours + " dB above 6 kHz, swapped hard " + hard + ", by blocks " + naive;
        // The window of the spectrum reaches down to -150 dB.
        assertTrue(hard > -130, "the baseline cannot be seen: " + found);
        assertTrue(ours <= hard - 40 && ours < naive, found);
    }

    private static double[] glided(Move move, double[] in) {
        double[] out = new double[in.length];
        LiveCascade live = LiveCascade.of(Cascade.of(RATE_HZ, move.before), 1);
        live.process(in, 0, out, 0, AT);
        live.retune(Cascade.of(RATE_HZ, move.after), Pace.SINGLE.atLeastSeconds(GLIDE_FRAMES / RATE_HZ));
        live.process(in, AT, out, AT, in.length - AT);
        assertTrue(live.isSettled());
        return out;
    }

    private static double aboveDb(double[] out, double[] programme, int middle) {
        int first = middle - Clicks.WINDOW / 2;
        double above = Clicks.band(Clicks.power(out, first), 6_000, RATE_HZ / 2, RATE_HZ);
        return 10 * Math.log10(above / Clicks.band(Clicks.power(programme, first), 0, RATE_HZ / 2, RATE_HZ));
    }

    private static double[] pink() {
        Random random = new Random(11);
        double[] spectrum = new double[FRAMES];
        for (int k = 1; k < FRAMES / 2; k++) {
            spectrum[2 * k] = random.nextGaussian() / Math.sqrt(k);
            spectrum[2 * k + 1] = random.nextGaussian() / Math.sqrt(k);
        }
        new DoubleFFT_1D(FRAMES).realInverse(spectrum, true);
        return lowPart(spectrum);
    }

    /** All below 2 kHz and nothing above, at a peak of 1. */
    private static double[] lowPart(double[] signal) {
        double[] low = signal.clone();
        DoubleFFT_1D transform = new DoubleFFT_1D(FRAMES);
        transform.realForward(low);
        Arrays.fill(low, (int) (2 * 2_000 / RATE_HZ * FRAMES), FRAMES, 0);
        low[1] = 0;
        transform.realInverse(low, true);
        double peak = RoundingBound.peak(low);
        return Arrays.stream(low).map(value -> value / peak).toArray();
    }
}
