package io.github.polewright.tone;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.function.DoubleFunction;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Where reading ends. Each edge is walked outwards from what must be read to what must be refused (for noise, where the share
 * asked for refuses it): up to the first value all is read, from the second on nothing.
 */
@Tag("slow")
final class PairEdgeTest {

    private static final int ROUNDS = 4;

    @ParameterizedTest
    @ValueSource(doubles = {8000, 44100, 48000})
    void everyEdgeLiesBetweenWhatMustBeReadAndWhatMustBeRefused(double rate) {
        PairCase plain = PairCase.of("edge", true);
        walk("error of the low tone, %", rate, 1.5, 3.5, 0.05, v -> plain.low(v / 100, 0));
        walk("error of the low tone, %", rate, -1.5, -3.5, 0.05, v -> plain.low(v / 100, 0));
        walk("error of the high tone, %", rate, 1.5, 3.5, 0.05, v -> plain.high(v / 100, 0));
        walk("error of the high tone, %", rate, -1.5, -3.5, 0.05, v -> plain.high(v / 100, 0));
        walk("twist, dB", rate, 4, 10, 0.1, v -> plain.levels(-10 - v, -10));
        walk("twist, dB", rate, -8, -14, 0.1, v -> plain.levels(-10, -10 + v));
        walk("level, dBFS", rate, -28, -40, 0.2, v -> plain.levels(v, v));
        walk("signal to noise, dB", rate, 12, 6, 0.25, plain::noise);
        walk("tone, ms", rate, 40, 23, 0.5, v -> plain.lasting(v / 1000, 0.06));
    }

    /** A tone of 60 ms, a gap, and the tone again: one symbol or two. */
    @ParameterizedTest
    @ValueSource(doubles = {8000, 44100, 48000})
    void theEdgeBetweenInterruptionAndPauseLiesBetween10And30Milliseconds(double rate) {
        double bridged = 0;
        double parted = Double.POSITIVE_INFINITY;
        for (double gap = 5; gap <= 40; gap += 0.5) {
            int ones = 0;
            int twos = 0;
            for (int i = 0; i < 16 * ROUNDS; i++) {
                PairSignal signal = new PairSignal(rate, i).pause(0.1);
                char symbol = PairSignal.SYMBOLS.charAt(i % 16);
                signal.pair(symbol, -10, 0.06)
                        .pause(gap / 1000)
                        .pair(symbol, -10, 0.06)
                        .pause(0.1);
                int read = PairReadings.symbols(PairReadings.read(PairReader.of(rate), signal.frames()))
                        .length();
                ones += read == 1 ? 1 : 0;
                twos += read == 2 ? 1 : 0;
            }
            bridged = ones == 16 * ROUNDS ? gap : bridged;
            parted = twos == 16 * ROUNDS ? Math.min(parted, gap) : Double.POSITIVE_INFINITY;
        }
        System.out.printf("gap, ms at %.0f Hz: bridged up to %.1f, a pause from %.1f%n", rate, bridged, parted);
        assertTrue(bridged >= 10 && parted <= 30, bridged + " and " + parted);
    }

    private static void walk(
            String what, double rate, double inside, double outside, double step, DoubleFunction<PairCase> made) {
        double all = Double.NaN;
        double none = Double.NaN;
        boolean allSoFar = true;
        int steps = (int) Math.round(Math.abs(outside - inside) / step);
        for (int i = 0; i <= steps; i++) {
            double value = inside + (outside - inside) * i / steps;
            PairReadings readings = made.apply(value).at(rate, ROUNDS);
            assertTrue(readings.wrong == 0, what + " of " + value + " at " + rate + " Hz: " + readings);
            allSoFar &= readings.right == 16 * ROUNDS;
            all = allSoFar ? value : all;
            none = readings.right > 0 ? Double.NaN : Double.isNaN(none) ? value : none;
        }
        System.out.printf("%s at %.0f Hz: all read up to %.2f, none from %.2f%n", what, rate, all, none);
        assertTrue(Double.isFinite(all) && Double.isFinite(none), what + " at " + rate + " Hz");
    }
}
