package io.github.polewright.tone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Pairs with something else: interruptions (ITU-T Q.24: 10 ms bridged), third tones, dial tone, and sounds that are no
 * pair. Also the figures an event carries, and the columns of table A-1.
 */
final class PairImpairmentTest {

    @ParameterizedTest
    @CsvSource({
        "60,5,60,1",
        "60,10,60,1",
        "25,5,25,1",
        "25,10,25,1",
        "15,10,40,1",
        "60,30,60,2",
        "60,40,60,2",
        "20,20,20,0",
        "20,30,20,0"
    })
    void bridgesInterruptionsAndNoPauses(double before, double gap, double after, int symbols) {
        for (double rate : new double[] {8000, 48000}) {
            for (char symbol : PairSignal.SYMBOLS.toCharArray()) {
                PairSignal signal = new PairSignal(rate, symbol).pause(0.1);
                signal.pair(symbol, -10, before / 1000)
                        .pause(gap / 1000)
                        .pair(symbol, -10, after / 1000)
                        .pause(0.1);
                String read = PairReadings.symbols(PairReadings.read(PairReader.of(rate), signal.frames()));
                assertEquals(String.valueOf(symbol).repeat(symbols), read);
            }
        }
    }

    @ParameterizedTest
    @CsvSource({
        "50,-3,0.91",
        "60,-3,0.91",
        "400,-8,0.91",
        "1000,-10,0.91",
        "1800,-8,0.91",
        "2500,-8,0.91",
        "400,-6,0.8",
        "1800,-6,0.8",
        "2500,-6,0.8"
    })
    void readsPairsOverAThirdTone(double hertz, double relativeDb, double share) {
        PairReader reader = PairReader.builder(8000)
                .limits(PairLimits.RECOMMENDED.withShare(share))
                .build();
        assertEquals(PairSignal.SYMBOLS, readOver(reader, hertz, relativeDb));
    }

    @Test
    void refusesPairsThatAreTooSmallAShareOfTheSound() {
        assertEquals("", readOver(PairReader.of(8000), 400, -6));
        assertEquals("", readOver(PairReader.of(8000), 1800, -6));
    }

    /** Without a pause, the end of one is the start of the next, even if its release would take longer than the next. */
    @ParameterizedTest
    @CsvSource({"8000,0.02", "48000,0.02", "8000,0.06", "48000,0.06"})
    void tellsSymbolsThatFollowOneAnotherAtOnce(double rate, double releaseSeconds) {
        PairSignal signal = new PairSignal(rate, 2).pause(0.1);
        for (char symbol : "159D7".toCharArray()) {
            signal.pair(symbol, -10, 0.05);
        }
        PairReader reader = PairReader.builder(rate)
                .limits(PairLimits.RECOMMENDED.withRelease(releaseSeconds))
                .build();
        List<PairReadings.Kept> events =
                PairReadings.read(reader, signal.pause(0.1).frames());
        assertEquals("159D7", PairReadings.symbols(events));
        for (int i = 0; i < 5; i++) {
            assertTrue(events.get(2 * i + 1).isEnd() && events.get(2 * i + 1).symbol() == "159D7".charAt(i));
            assertEquals(0.1 + 0.05 * i, events.get(2 * i).start() / rate, 0.006);
            assertEquals(0.15 + 0.05 * i, events.get(2 * i + 1).end() / rate, 0.006);
        }
    }

    @Test
    void readsPairsOverASoftDialToneAndDc() {
        PairSignal signal = new PairSignal(8000, 11).pause(0.2);
        for (char symbol : PairSignal.SYMBOLS.toCharArray()) {
            signal.pair(symbol, -15, 0.06).pause(0.06);
        }
        float[] frames = signal.pause(0.1).under(350, -26).under(440, -26).frames();
        for (int i = 0; i < frames.length; i++) {
            frames[i] += 0.3f;
        }
        assertEquals(PairSignal.SYMBOLS, PairReadings.symbols(PairReadings.read(PairReader.of(8000), frames)));
    }

    @Test
    void readsPairsOverALoudDialToneThroughItsNotches() {
        PairReader plain = PairReader.of(8000);
        PairReader notched = PairReader.builder(8000).dialTone(350, 440).build();
        assertEquals("", readOver(plain, 440, 3));
        assertEquals(PairSignal.SYMBOLS, readOver(notched, 440, 3));
        assertEquals(
                PairSignal.SYMBOLS,
                readOver(PairReader.builder(8000).dialTone(440).build(), 443, -3));
    }

    private static String readOver(PairReader reader, double hertz, double relativeDb) {
        PairSignal signal = new PairSignal(8000, 11).pause(0.2);
        for (char symbol : PairSignal.SYMBOLS.toCharArray()) {
            signal.pair(symbol, -15, 0.06).pause(0.06);
        }
        signal.pause(0.1).under(hertz, -15 + relativeDb);
        return PairReadings.symbols(PairReadings.read(reader, signal.frames()));
    }

    @Test
    void refusesWhatIsNoPair() {
        double[][] sounds = {
            {350, 440},
            {440, 480},
            {480, 620},
            {425},
            {700, 900},
            {1100, 1700},
            {900, 1500},
            {985, 1428, 1777},
            {2000},
            {697, 770},
            {1209, 1336},
            {697, 770, 1209},
            {697, 1209, 1477},
            {697, 1209, 2000},
            {835, 1670},
            {697, 1209, 1394, 2418},
            {941, 1882},
            {852, 1209, 941, 1477}
        };
        for (double rate : new double[] {8000, 48000}) {
            for (double[] sound : sounds) {
                PairSignal signal = new PairSignal(rate, 1).pause(3);
                for (double hertz : sound) {
                    signal.under(hertz, -12);
                }
                assertEquals(
                        0,
                        PairReadings.read(PairReader.of(rate), signal.frames()).size(),
                        hertz(sound));
            }
            float[] noise = new PairSignal(rate, 2).pause(20).noise(-20, 0).frames();
            assertEquals(0, PairReadings.read(PairReader.of(rate), noise).size());
        }
    }

    private static String hertz(double[] sound) {
        return Arrays.toString(sound);
    }

    @ParameterizedTest
    @CsvSource({"8000,-10,-14,1.2,-0.9", "44100,-6,-4,-1.5,1.5", "48000,-28,-26,0,0", "192000,-12,-12,1,1"})
    void tellsLevelTwistAndFrequency(double rate, double lowDb, double highDb, double lowPercent, double highPercent) {
        PairSignal signal = new PairSignal(rate, 4).pause(0.1);
        for (int i = 0; i < 16; i++) {
            signal.pair(
                    PairSignal.SYMBOLS.charAt(i),
                    PairSignal.LOW_HZ[i / 4] * (1 + lowPercent / 100),
                    PairSignal.HIGH_HZ[i % 4] * (1 + highPercent / 100),
                    lowDb,
                    highDb,
                    0.08);
            signal.pause(0.05);
        }
        List<PairReadings.Kept> events =
                PairReadings.read(PairReader.of(rate), signal.pause(0.1).frames());
        assertEquals(32, events.size());
        for (int i = 0; i < 16; i++) {
            PairReadings.Kept end = events.get(2 * i + 1);
            assertEquals(lowDb, end.lowDb(), 0.3, "low level");
            assertEquals(highDb, end.highDb(), 0.3, "high level");
            assertEquals(PairSignal.LOW_HZ[i / 4] * lowPercent / 100, end.lowErrorHz(), 2, "low error");
            assertEquals(PairSignal.HIGH_HZ[i % 4] * highPercent / 100, end.highErrorHz(), 2, "high error");
        }
    }

    @ParameterizedTest
    @CsvSource({
        // column, level operated in dBm, level not, error percent, Hz, twist dB, interruption ms, pause ms
        "NTT,-24,-29,1.8,0,5,10,30",
        "AT_AND_T,-25,-55,1.5,0,4,10,40",
        "DANISH,-27,-36,1.5,2,6,20,40",
        "AUSTRALIAN,-27,-30,1.5,4,10,12,70",
        "BRAZILIAN,-25,-50,1.8,0,9,10,30"
    })
    void followsTheColumnsOfTableA1(
            String column,
            double operated,
            double not,
            double percent,
            double hertz,
            double twist,
            double gap,
            double pause) {
        PairLimits limits =
                switch (column) {
                    case "NTT" -> PairLimits.NTT;
                    case "AT_AND_T" -> PairLimits.AT_AND_T;
                    case "DANISH" -> PairLimits.DANISH;
                    case "AUSTRALIAN" -> PairLimits.AUSTRALIAN;
                    default -> PairLimits.BRAZILIAN;
                };
        double dbfs = operated - 3.14;
        PairSignal weak = new PairSignal(8000, 6).pause(0.1);
        PairSignal weaker = new PairSignal(8000, 6).pause(0.1);
        for (int i = 0; i < 16; i++) {
            char symbol = PairSignal.SYMBOLS.charAt(i);
            double sign = i % 3 - 1;
            double low = PairSignal.LOW_HZ[i / 4] * (1 + sign * percent / 100) + sign * hertz;
            double high = PairSignal.HIGH_HZ[i % 4] * (1 - sign * percent / 100) - sign * hertz;
            weak.pair(symbol, low, high, dbfs, dbfs, 0.04).pause(pause / 1000);
            weak.pair(symbol, low, high, dbfs, dbfs + twist, 0.04).pause(pause / 1000);
            weak.pair(symbol, low, high, dbfs, dbfs, 0.06).pause(gap / 1000);
            weak.pair(symbol, low, high, dbfs, dbfs, 0.06).pause(0.1);
            weaker.pair(symbol, not - 3.14, 0.1).pause(0.1);
        }
        StringBuilder expected = new StringBuilder();
        for (char symbol : PairSignal.SYMBOLS.toCharArray()) {
            expected.append(symbol).append(symbol).append(symbol);
        }
        PairReader reader = PairReader.builder(8000).limits(limits).build();
        assertEquals(expected.toString(), PairReadings.symbols(PairReadings.read(reader, weak.frames())));
        reader.reset();
        assertTrue(PairReadings.read(reader, weaker.frames()).isEmpty());
    }
}
