package io.github.polewright.tone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * What must be read and what must be refused, over all sixteen symbols: bands of ITU-T Q.23 and Q.24 (accept 1.5 % + 2
 * Hz, refuse 3.5 %; twist −8 to +4 dB; 40 ms accepted, 20 and 23 ms refused; pause 30 ms).
 */
final class PairGridTest {

    private static final double PAUSE = 0.05;

    /** Errors as a share and in hertz, twist and levels in dB, durations in seconds; infinite dB is no noise. */
    private record Case(
            String name,
            boolean read,
            double lowShare,
            double lowHz,
            double highShare,
            double highHz,
            double lowDb,
            double highDb,
            double tone,
            double pause,
            double signalToNoiseDb) {

        static Case of(String name, boolean read) {
            return new Case(name, read, 0, 0, 0, 0, -10, -10, 0.06, PAUSE, Double.POSITIVE_INFINITY);
        }

        Case low(double share, double hertz) {
            return new Case(name, read, share, hertz, highShare, highHz, lowDb, highDb, tone, pause, signalToNoiseDb);
        }

        Case high(double share, double hertz) {
            return new Case(name, read, lowShare, lowHz, share, hertz, lowDb, highDb, tone, pause, signalToNoiseDb);
        }

        Case levels(double low, double high) {
            return new Case(name, read, lowShare, lowHz, highShare, highHz, low, high, tone, pause, signalToNoiseDb);
        }

        Case lasting(double toneSeconds, double pauseSeconds) {
            return new Case(
                    name,
                    read,
                    lowShare,
                    lowHz,
                    highShare,
                    highHz,
                    lowDb,
                    highDb,
                    toneSeconds,
                    pauseSeconds,
                    signalToNoiseDb);
        }

        Case noise(double db) {
            return new Case(name, read, lowShare, lowHz, highShare, highHz, lowDb, highDb, tone, pause, db);
        }

        @Override
        public String toString() {
            return name;
        }
    }

    private static List<Case> cases() {
        List<Case> all = new ArrayList<>();
        all.add(Case.of("nominal", true));
        for (double low : new double[] {-1, 0, 1}) {
            for (double high : new double[] {-1, 0, 1}) {
                Case edge = Case.of("edge " + low + " " + high, true)
                        .low(0.015 * low, 2 * low)
                        .high(0.015 * high, 2 * high);
                all.add(edge);
                all.add(edge.lasting(0.04, 0.03).noise(15));
                all.add(edge.lasting(0.04, 0.03).levels(-12, -20));
                all.add(edge.lasting(0.04, 0.03).levels(-14, -10));
            }
        }
        for (double noise : new double[] {Double.POSITIVE_INFINITY, 15, 12}) {
            all.add(Case.of("level -3", true).levels(-3, -3).noise(noise));
            all.add(Case.of("level -7", true).levels(-7, -7).noise(noise));
            all.add(Case.of("level -28", true).levels(-28, -28).noise(noise));
            all.add(Case.of("40/30 ms", true).lasting(0.04, 0.03).noise(noise));
            all.add(Case.of("twist +4", true).levels(-14, -10).noise(noise));
            all.add(Case.of("twist -8", true).levels(-10, -18).noise(noise));
        }
        for (double sign : new double[] {-1, 1}) {
            all.add(Case.of("low beyond", false).low(0.035 * sign, 0));
            all.add(Case.of("high beyond", false).high(0.035 * sign, 0));
            all.add(Case.of("low beyond, noise", false).low(0.035 * sign, 0).noise(15));
            all.add(Case.of("high beyond, noise", false).high(0.035 * sign, 0).noise(15));
            all.add(Case.of("both beyond", false).low(0.035 * sign, 0).high(0.035 * sign, 0));
            all.add(Case.of("both beyond, crossed", false).low(0.035 * sign, 0).high(-0.035 * sign, 0));
        }
        all.add(Case.of("20 ms", false).lasting(0.020, 0.06));
        all.add(Case.of("20 ms, noise", false).lasting(0.020, 0.06).noise(15));
        all.add(Case.of("23 ms", false).lasting(0.023, 0.06));
        all.add(Case.of("23 ms, noise", false).lasting(0.023, 0.06).noise(15));
        all.add(Case.of("twist +10", false).levels(-20, -10));
        all.add(Case.of("twist -14", false).levels(-10, -24));
        all.add(Case.of("too soft", false).levels(-40, -40));
        all.add(Case.of("low alone", false).levels(-10, -200));
        all.add(Case.of("high alone", false).levels(-200, -10));
        return all;
    }

    private static Stream<Case> fast() {
        return cases().stream();
    }

    @ParameterizedTest
    @MethodSource("fast")
    void readsOrRefusesAtCommonRates(Case c) {
        for (double rate : new double[] {8000, 44100, 48000}) {
            check(c, rate, 2);
        }
    }

    @Tag("slow")
    @ParameterizedTest
    @MethodSource("fast")
    void readsOrRefusesAtEveryRate(Case c) {
        for (double rate : new double[] {
            8000, 9000, 11025, 12000, 15999, 16000, 17000, 22050, 32000, 44100, 48000, 88200, 96000, 176400, 192000
        }) {
            check(c, rate, 10);
        }
    }

    private static void check(Case c, double rate, int rounds) {
        PairSignal signal = new PairSignal(rate, 7);
        signal.pause(0.1);
        for (int i = 0; i < 16 * rounds; i++) {
            char symbol = PairSignal.SYMBOLS.charAt(i * 7 % 16);
            double low = PairSignal.LOW_HZ[i * 7 % 16 / 4];
            double high = PairSignal.HIGH_HZ[i * 7 % 16 % 4];
            signal.pair(
                    symbol,
                    low * (1 + c.lowShare) + c.lowHz,
                    high * (1 + c.highShare) + c.highHz,
                    c.lowDb,
                    c.highDb,
                    c.tone);
            signal.pause(c.pause + signal.random(0, 0.003));
        }
        signal.pause(0.1);
        if (c.signalToNoiseDb < 100) {
            // The ratio counts both tones.
            double mean = 10 * Math.log10((Math.pow(10, c.lowDb / 10) + Math.pow(10, c.highDb / 10)) / 2);
            signal.noise(mean, c.signalToNoiseDb);
        }
        PairReadings readings = PairReadings.compare(signal, PairReader.of(rate));
        String what = c + " at " + rate + " Hz: " + readings;
        assertEquals(0, readings.wrong, what);
        assertEquals(c.read ? 16 * rounds : 0, readings.right, what);
        assertTrue(readings.worstStartMs <= 3 && readings.worstEndMs <= 3, what);
        assertTrue(readings.worstDecisionMs <= 45, what);
    }
}
