package io.github.polewright.bench.workload;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;

/** The cascades that are measured: notches on a hum line and its multiples. */
public final class Combs {

    private static final double LINE_HZ = 50;
    private static final double MOVED_LINE_HZ = 50.1;
    /** Wide enough that a decay runs through all magnitudes of a double in half a minute of audio. */
    private static final double WIDTH_HZ = 10;

    private static final double HIGHEST_SHARE_OF_RATE = 0.45;

    private Combs() {}

    /**
     * The comb of a chain.
     *
     * @param chain tells rate and count
     * @return notches at 50 Hz and its multiples, closer together where they would not fit under 0.45 of the rate
     */
    public static Cascade comb(Chain chain) {
        return comb(chain, LINE_HZ);
    }

    /**
     * The comb a chain is retuned to.
     *
     * @param chain tells rate and count
     * @return the same at 50.1 Hz: a mains frequency that has moved
     */
    public static Cascade movedComb(Chain chain) {
        return comb(chain, MOVED_LINE_HZ);
    }

    private static Cascade comb(Chain chain, double lineHz) {
        double highestHz = HIGHEST_SHARE_OF_RATE * chain.sampleRateHz() * lineHz / MOVED_LINE_HZ;
        double spacingHz = Math.min(lineHz, highestHz / chain.sections());
        List<Section> notches = new ArrayList<>();
        for (int i = 1; i <= chain.sections(); i++) {
            notches.add(notch(chain.sampleRateHz(), i * spacingHz));
        }
        return Cascade.of(chain.sampleRateHz(), notches);
    }

    /** H(z) = (1 − 2 cos w z^-1 + z^-2) over the same with poles drawn in: tan(pi width / rate) sets their radius. */
    private static Section notch(double sampleRateHz, double centreHz) {
        double t = Math.tan(Math.PI * WIDTH_HZ / sampleRateHz);
        double cosine = Math.cos(2 * Math.PI * centreHz / sampleRateHz);
        return Section.normalized(1, -2 * cosine, 1, 1 + t, -2 * cosine, 1 - t);
    }
}
