package io.github.polewright.tone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * What must be read and what must be refused, over all sixteen symbols: bands of ITU-T Q.23 and Q.24 (accept 1.5 % + 2
 * Hz, refuse 3.5 %; twist −8 to +4 dB; 40 ms accepted, 20 and 23 ms refused; pause 30 ms). Every symbol that is read is
 * told within 45 ms, within 40 ms unless at its frequency edge, and its start and end within 3 ms.
 */
final class PairGridTest {

    private static final double[] SIGNS = {-1, 0, 1};
    private static final double[] NOISE_DB = {PairCase.NO_NOISE, 15};

    static List<PairCase> cases() {
        List<PairCase> all = new ArrayList<>();
        for (double low : SIGNS) {
            for (double high : SIGNS) {
                PairCase edge = PairCase.of("edges", true).edges(low, high);
                all.add(edge);
                all.add(edge.lasting(0.04, 0.03).noise(15));
                all.add(edge.lasting(0.04, 0.03).levels(-12, -20));
                all.add(edge.lasting(0.04, 0.03).levels(-14, -10));
            }
        }
        for (double noise : new double[] {PairCase.NO_NOISE, 15, 12}) {
            for (double level : new double[] {-3, -7, -28}) {
                all.add(PairCase.of("level", true).levels(level, level).noise(noise));
            }
            all.add(PairCase.of("short", true).lasting(0.04, 0.03).noise(noise));
            all.add(PairCase.of("twist +4", true).levels(-14, -10).noise(noise));
            all.add(PairCase.of("twist -8", true).levels(-10, -18).noise(noise));
        }
        refused(all);
        return all;
    }

    private static void refused(List<PairCase> all) {
        for (double noise : NOISE_DB) {
            for (double error : new double[] {-0.035, 0.035}) {
                PairCase beyond = PairCase.of("beyond", false).noise(noise);
                all.add(beyond.low(error, 0));
                all.add(beyond.high(error, 0));
                all.add(beyond.low(error, 0).high(error, 0));
                all.add(beyond.low(error, 0).high(-error, 0));
            }
            all.add(PairCase.of("too short", false).lasting(0.020, 0.06).noise(noise));
            all.add(PairCase.of("too short", false).lasting(0.023, 0.06).noise(noise));
        }
        all.add(PairCase.of("too much twist", false).levels(-20, -10));
        all.add(PairCase.of("too much twist", false).levels(-10, -24));
        all.add(PairCase.of("too much twist on average", false).levels(-16.5, -10));
        all.add(PairCase.of("too much twist on average", false).levels(-10, -20.5));
        all.add(PairCase.of("too soft", false).levels(-40, -40));
        all.add(PairCase.of("one too soft", false).levels(-38, -35));
        all.add(PairCase.of("one too soft", false).levels(-35, -38));
        all.add(PairCase.of("low alone", false).levels(-10, -200));
        all.add(PairCase.of("high alone", false).levels(-200, -10));
    }

    @ParameterizedTest
    @MethodSource("cases")
    void readsOrRefusesAtCommonRates(PairCase c) {
        for (double rate : new double[] {8000, 44100, 48000}) {
            check(c, rate, 2);
        }
    }

    @Tag("slow")
    @ParameterizedTest
    @MethodSource("cases")
    void readsOrRefusesAtEveryRate(PairCase c) {
        for (double rate : new double[] {
            8000, 9000, 11025, 12000, 15999, 16000, 17000, 22050, 32000, 44100, 48000, 88200, 96000, 176400, 192000
        }) {
            check(c, rate, 10);
        }
    }

    /** Every corner of the box of what must be read: errors, twist, level, duration with pause, noise. */
    @Tag("slow")
    @ParameterizedTest
    @ValueSource(doubles = {8000, 44100, 48000})
    void readsAtEveryCorner(double rate) {
        PairReadings sum = new PairReadings();
        for (double low : SIGNS) {
            for (double high : SIGNS) {
                PairCase edge = PairCase.of("corner", true).edges(low, high);
                for (double twist : new double[] {-8, 0, 4}) {
                    PairCase loud = edge.levels(-3 + Math.min(0, -twist), -3 + Math.min(0, twist));
                    PairCase soft = edge.levels(-28 + Math.max(0, -twist), -28 + Math.max(0, twist));
                    for (double noise : NOISE_DB) {
                        for (PairCase c : List.of(loud.noise(noise), soft.noise(noise))) {
                            sum.add(check(c.lasting(0.04, 0.03), rate, 4));
                            sum.add(check(c.lasting(0.1, 0.1), rate, 2));
                        }
                    }
                }
            }
        }
        System.out.printf("corners to be read at %.0f Hz: %s%n", rate, sum);
    }

    /** What must be refused at any corner of the rest: an error beyond, or a tone too short. */
    @Tag("slow")
    @ParameterizedTest
    @ValueSource(doubles = {8000, 44100, 48000})
    void refusesAtEveryCorner(double rate) {
        PairReadings sum = new PairReadings();
        for (double twist : new double[] {-8, 0, 4}) {
            for (double noise : NOISE_DB) {
                PairCase base = PairCase.of("refused corner", false)
                        .levels(-10 + Math.min(0, -twist), -10 + Math.min(0, twist))
                        .noise(noise);
                for (double one : SIGNS) {
                    for (double other : SIGNS) {
                        sum.add(check(base.edges(one, other).lasting(0.020, 0.06), rate, 10));
                        sum.add(check(base.edges(one, other).lasting(0.023, 0.06), rate, 10));
                    }
                    for (double error : new double[] {-0.035, 0.035}) {
                        sum.add(check(base.edges(0, one).low(error, 0), rate, 10));
                        sum.add(check(base.edges(one, 0).high(error, 0), rate, 10));
                    }
                }
            }
        }
        System.out.printf("corners to be refused at %.0f Hz: %s%n", rate, sum);
    }

    private static PairReadings check(PairCase c, double rate, int rounds) {
        PairReadings readings = c.at(rate, rounds);
        String what = c + " at " + rate + " Hz: " + readings;
        assertEquals(0, readings.wrong, what);
        assertEquals(c.read() ? 16 * rounds : 0, readings.right, what);
        assertTrue(readings.worstStartMs <= 3 && readings.worstEndMs <= 3, what);
        boolean nominal = c.lowShare() == 0 && c.highShare() == 0;
        assertTrue(readings.worstDecisionMs <= (nominal ? 40 : 45), what);
        return readings;
    }
}
