package io.github.polewright.tone;

import io.github.polewright.Section;
import io.github.polewright.design.DcNotch;
import io.github.polewright.design.Resonator;
import java.util.Arrays;
import java.util.List;

/**
 * Resonators, one a tone, and the powers of all every millisecond.
 *
 * <p>A resonator can be read at any sample and forgets gradually; a Goertzel recursion saves a little, but can be read once
 * a window. The package's description has the measurement.
 */
final class ToneBank implements InnerSamples {

    /** Told at every hop. */
    interface Hops {
        void hop(double[] powers, double meanSquare, long index);
    }

    static final double LOWEST_INNER_RATE_HZ = 8000;

    private static final double DC_CORNER_HZ = 20;
    private static final double HOP_SECONDS = 0.001;
    private static final double PASS_SHARE = 0.375;
    private static final double SMALLEST = 1e-30;
    private static final double LN_2 = Math.log(2);

    private final FrontEnd frontEnd;
    private final Hops hops;
    private final int tones;
    private final double[] a1;
    private final double[] a2;
    private final double[] b0;
    private final double[] quadrature;
    private final double[] correction;
    private final double[] delayFrames;
    private final double[] state1;
    private final double[] state2;
    private final double[] powers;
    private final double energyShare;
    private final int hopSamples;
    private double meanSquare;
    private int position;
    private long index;

    ToneBank(double sampleRateHz, List<Tone> list, Hops hops) {
        this.hops = hops;
        tones = list.size();
        frontEnd = frontEnd(sampleRateHz, list);
        double rate = frontEnd.innerRateHz();
        hopSamples = Math.max(1, (int) Math.round(HOP_SECONDS * rate));
        a1 = new double[tones];
        a2 = new double[tones];
        b0 = new double[tones];
        quadrature = new double[tones];
        correction = new double[tones];
        delayFrames = new double[tones];
        state1 = new double[tones];
        state2 = new double[tones];
        powers = new double[tones];
        double longest = 0;
        for (int k = 0; k < tones; k++) {
            Tone tone = list.get(k);
            Section section = Resonator.byWidth(rate, tone.frequencyHz(), tone.widthHz());
            a1[k] = section.a1();
            a2[k] = section.a2();
            b0[k] = section.b0();
            // For a tone at the centre w[n] - w[n-2] is a quarter turn ahead of w[n-1] times this over b0.
            quadrature[k] = 2 * section.b0() * Math.sin(2 * Math.PI * tone.frequencyHz() / rate);
            correction[k] = 1 / frontEnd.powerGain(tone.frequencyHz());
            delayFrames[k] = LN_2 * tone.decaySeconds() * sampleRateHz + frontEnd.delayFrames(tone.frequencyHz());
            longest = Math.max(longest, tone.decaySeconds());
        }
        energyShare = 1 - Math.exp(-1 / (longest * rate));
    }

    private static FrontEnd frontEnd(double sampleRateHz, List<Tone> list) {
        double highest = 0;
        for (Tone tone : list) {
            double edge = tone.frequencyHz() + tone.widthHz() / 2;
            if (!(edge < sampleRateHz / 2)) {
                throw new IllegalArgumentException("a tone of " + tone
                        + " at a sample rate of " + sampleRateHz + " Hz; its upper edge must be below "
                        + sampleRateHz / 2);
            }
            highest = Math.max(highest, edge);
        }
        double wanted = Math.max(LOWEST_INNER_RATE_HZ, highest / PASS_SHARE);
        int factor = Math.max(1, (int) Math.floor(sampleRateHz / wanted));
        double corner = PASS_SHARE * sampleRateHz / factor;
        Section dc = DcNotch.byCorner(sampleRateHz, DC_CORNER_HZ);
        boolean filtered = sampleRateHz > LOWEST_INNER_RATE_HZ && highest <= corner;
        return FrontEnd.of(sampleRateHz, factor, filtered ? corner : Double.POSITIVE_INFINITY, List.of(dc));
    }

    FrontEnd frontEnd() {
        return frontEnd;
    }

    double hopSeconds() {
        return hopSamples / frontEnd.innerRateHz();
    }

    /** The frame at which the sound changed, for a tone whose amplitude passed half its change at this hop. */
    long frameOf(int tone, double hop) {
        double sample = (hop + 1) * hopSamples - 1;
        return Math.max(0, Math.round(sample * frontEnd.factor() + 0.5 - delayFrames[tone]));
    }

    void reset() {
        Arrays.fill(state1, 0);
        Arrays.fill(state2, 0);
        meanSquare = 0;
        position = 0;
        index = 0;
    }

    boolean isSilent() {
        for (int k = 0; k < tones; k++) {
            if (state1[k] != 0 || state2[k] != 0) {
                return false;
            }
        }
        return meanSquare == 0 && frontEnd.isSilent();
    }

    @Override
    public void take(double[] samples, int count) {
        int at = 0;
        while (at < count) {
            int some = Math.min(count - at, hopSamples - position);
            for (int k = 0; k < tones; k++) {
                resonate(k, samples, at, some);
            }
            for (int i = at; i < at + some; i++) {
                meanSquare += energyShare * (samples[i] * samples[i] - meanSquare);
            }
            at += some;
            position += some;
            if (position == hopSamples) {
                position = 0;
                hops.hop(powers, meanSquare, index++);
            }
        }
    }

    /** One resonator in direct form II, whose state holds the output's quadrature; its power as of the last sample. */
    private void resonate(int k, double[] samples, int at, int count) {
        double c1 = a1[k];
        double c2 = a2[k];
        double w1 = state1[k];
        double w2 = state2[k];
        double w3 = 0;
        for (int i = at; i < at + count; i++) {
            double w = samples[i] - c1 * w1 - c2 * w2;
            w3 = w2;
            w2 = w1;
            w1 = w;
        }
        state1[k] = w1;
        state2[k] = w2;
        double inPhase = b0[k] * (w1 - w3);
        double quarter = quadrature[k] * w2;
        powers[k] = correction[k] * (inPhase * inPhase + quarter * quarter);
    }

    @Override
    public void guard() {
        for (int k = 0; k < tones; k++) {
            state1[k] = Math.abs(state1[k]) < SMALLEST ? 0 : state1[k];
            state2[k] = Math.abs(state2[k]) < SMALLEST ? 0 : state2[k];
        }
        meanSquare = meanSquare < SMALLEST * SMALLEST ? 0 : meanSquare;
    }
}
