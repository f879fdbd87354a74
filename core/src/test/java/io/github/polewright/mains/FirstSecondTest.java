package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The question about the first second, on seconds and lines that the test sets (derived for this project). */
class FirstSecondTest {

    private static final double HUM_HZ = 50.3;
    private static final double TICK = 0.02;
    private static final int LINES = 4;

    private final Rates rates = Rates.of(16000);
    private final LineBank bank = new LineBank(LINES, 1);
    private final Innovation innovation = new Innovation(bank);
    private final Presence presence = new Presence(bank, new Amplitudes(bank, innovation));
    private final Recent recent = new Recent(1);
    private final FirstSecond firstSecond = new FirstSecond(rates, recent, bank, innovation, presence);

    /** Lines of amplitude 1 as followed now. */
    private void now(int count, double noise) {
        for (int i = 0; i < LINES; i++) {
            bank.re[i] = i < count ? 1 : 0;
            presence.clear[i] = i < count;
            innovation.noise[i] = noise;
        }
    }

    /** A first second of lines of one amplitude from a time to a time. */
    private void heard(int count, double amplitude, double fromSeconds, double toSeconds) {
        double[] sample = new double[1];
        for (int n = 0; n < Recent.LENGTH; n++) {
            double t = n / rates.proposalHz;
            sample[0] = 1e-6;
            for (int k = 1; k <= count; k++) {
                boolean there = t >= fromSeconds && t < toSeconds;
                sample[0] += there ? amplitude * Math.cos(2 * Math.PI * k * HUM_HZ * t + k * k) : 0;
            }
            recent.push(sample);
        }
        assertTrue(recent.firstIsWhole());
    }

    private boolean matches() {
        firstSecond.begin(HUM_HZ);
        int slices = 1;
        while (!firstSecond.advance()) {
            slices++;
        }
        assertEquals(12, slices, "half a line's second is one slice");
        assertTrue(firstSecond.isIdle());
        return firstSecond.matches(TICK);
    }

    @ParameterizedTest
    @CsvSource({
        "1, 0, 2, true", // there from the first sample, as now
        "1, 0.15, 2, false", // missing in most of the first fifth of a second alone
        "1, 0.25, 2, false", // begins after it
        "1, 0, 0.6, false", // gone after it
        "0.5, 0, 2, false", // 6 dB weaker than now
        "2, 0, 2, false", // 6 dB stronger
        "0, 0, 2, false",
    })
    void humIsAsStrongInTheFirstSecondAsNow(double amplitude, double from, double to, boolean expected) {
        now(LINES, 1e-6);
        heard(LINES, amplitude, from, to);
        assertEquals(expected, matches());
    }

    @Test
    void aSingleLineIsNoHum() {
        now(1, 1e-6);
        heard(LINES, 1, 0, 2);
        assertFalse(matches());
    }

    @ParameterizedTest
    @CsvSource({"3, true", "2, false"})
    void twoLinesOfThreeMustHaveBeenThere(int there, boolean expected) {
        now(4, 1e-6);
        heard(there, 1, 0, 2);
        assertEquals(expected, matches());
    }

    /**
     * Under programme the answer is worth nothing: noise of 40 times a line's power a tick leaves an amplitude of
     * sqrt(40 * 0.02 / 2 / 0.2) = 1.4 lines in the first fifth of a second, so everything would match.
     */
    @Test
    void linesThatTheNoiseHidesProveNothing() {
        now(LINES, 40);
        heard(LINES, 1, 0, 2);
        assertFalse(matches());
    }

    /** A fifth of the power in noise leaves sqrt(0.4 * 0.02 / 2 / 0.2) = 0.14 of a line: 25 per cent off is no miss. */
    @Test
    void noiseWidensWhatIsTakenForTheSame() {
        now(LINES, 0.4);
        heard(LINES, 0.75, 0, 2);
        assertTrue(matches());
        now(LINES, 1e-6);
        assertFalse(matches());
    }
}
