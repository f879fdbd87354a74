package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The search alone, on samples at its own rate that the test makes. */
class ProposerTest {

    private final Rates rates = Rates.of(16000);
    private final Recent recent = new Recent(2);
    private final java.util.Random random = new java.util.Random(6);
    private int count;

    /** Seven lines of hum in either channel, in noise of a tenth of a line. */
    private void push(double hz, double left, double right) {
        double t = count++ / rates.proposalHz;
        double sum = 0;
        for (int k = 1; k <= 7; k++) {
            sum += Math.cos(2 * Math.PI * k * hz * t + k * k);
        }
        recent.push(new double[] {left * sum + 0.1 * random.nextGaussian(), right * sum + 0.1 * random.nextGaussian()});
    }

    private double refined(Refinement refinement, double fromHz) {
        refinement.begin(fromHz, recent);
        int slices = 1;
        while (!refinement.advance()) {
            slices++;
        }
        assertEquals(42, slices, "three passes over seven lines in two halves");
        return refinement.frequencyHz();
    }

    /** In noise of a tenth of a line the bound for a second of seven lines lies under a millihertz (Kay, 1993). */
    @ParameterizedTest
    @CsvSource({"50.3, 50.4, 1, 0", "50.3, 50.2, 0, 1", "60.04, 60.1, 1, -1", "47.1, 47, 1, 1"})
    void aProposalIsSharpened(double hz, double fromHz, double left, double right) {
        for (int n = 0; n < Recent.LENGTH; n++) {
            push(hz, left, right);
        }
        assertEquals(hz, refined(new Refinement(rates.proposalHz, 2), fromHz), 0.003);
    }

    /** A refinement that was cut short, by a reset, leaves nothing behind for the next one. */
    @ParameterizedTest
    @ValueSource(ints = {2, 5, 13, 20})
    void aRefinementCutShortIsForgotten(int slices) {
        for (int n = 0; n < Recent.LENGTH; n++) {
            push(50.3, 1, 0.5);
        }
        double expected = refined(new Refinement(rates.proposalHz, 2), 50.35);
        Refinement used = new Refinement(rates.proposalHz, 2);
        used.begin(57, recent);
        for (int n = 0; n < slices; n++) {
            assertFalse(used.advance());
        }
        assertEquals(expected, refined(used, 50.35));
    }

    @ParameterizedTest
    @CsvSource({"45.3, 1, 0", "50.3, 0, 1", "60.2, 1, -1", "64.6, 0, 1"})
    void humInAnyChannelIsProposedWithinTwoSeconds(double hz, double left, double right) {
        Proposer proposer = new Proposer(rates, recent);
        double found = Double.NaN;
        while (count < 2 * rates.proposalHz && Double.isNaN(found)) {
            push(hz, left, right);
            found = proposer.advance(true) ? proposer.candidateHz() : Double.NaN;
        }
        assertEquals(hz, found, 0.01);
        assertTrue(proposer.strength() > 5);
    }

    @Test
    void noiseIsNotProposed() {
        Proposer proposer = new Proposer(rates, recent);
        for (int n = 0; n < 20 * rates.proposalHz; n++) {
            push(50, 0, 0);
            assertFalse(proposer.advance(true), "proposed " + proposer.candidateHz() + " Hz");
        }
    }
}
