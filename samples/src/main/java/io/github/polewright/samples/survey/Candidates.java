package io.github.polewright.samples.survey;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;

/** Fundamentals that are worth a close look: those on whose multiples something stands in most moments. */
final class Candidates {

    private static final double STEP_HZ = 0.05;
    private static final int HARMONICS = 20;
    private static final int MOST_MOMENTS = 60;
    private static final double MOST_DB_PER_LINE = 60;
    private static final int PER_BAND = 5;
    private static final double APART_HZ = 0.3;

    private Candidates() {}

    /** The best fundamentals within a reach of a nominal one, in hertz. */
    static List<Double> around(List<Piece> pieces, int channels, double nominalHz, double reachHz, double topHz) {
        List<Snapshot[]> moments = thinned(pieces, channels);
        int steps = (int) Math.floor(reachHz / STEP_HZ);
        List<double[]> scored = new ArrayList<>();
        for (int i = -steps; i <= steps; i++) {
            double fundamentalHz = nominalHz + i * STEP_HZ;
            scored.add(new double[] {fundamentalHz, score(moments, fundamentalHz, topHz)});
        }
        scored.sort(Comparator.comparingDouble((double[] row) -> row[1]).reversed());
        List<Double> best = new ArrayList<>();
        for (double[] row : scored) {
            if (best.size() < PER_BAND && best.stream().allMatch(other -> Math.abs(other - row[0]) > APART_HZ)) {
                best.add(row[0]);
            }
        }
        return best;
    }

    private static List<Snapshot[]> thinned(List<Piece> pieces, int channels) {
        List<Snapshot[]> all = new ArrayList<>();
        for (Piece piece : pieces) {
            for (int s = 0; s < piece.moments(); s++) {
                Snapshot[] moment = new Snapshot[channels];
                for (int c = 0; c < channels; c++) {
                    moment[c] = piece.snapshot(s, c);
                }
                all.add(moment);
            }
        }
        int stride = Math.max(1, all.size() / MOST_MOMENTS);
        List<Snapshot[]> some = new ArrayList<>();
        for (int i = 0; i < all.size(); i += stride) {
            some.add(all.get(i));
        }
        return some;
    }

    private static double score(List<Snapshot[]> moments, double fundamentalHz, double topHz) {
        double sum = 0;
        double[] value = new double[2];
        double[] ratios = new double[moments.size()];
        for (int k = 1; k <= HARMONICS && k * fundamentalHz < topHz; k++) {
            for (int s = 0; s < ratios.length; s++) {
                double ratio = 0;
                for (Snapshot snapshot : moments.get(s)) {
                    snapshot.amplitude(k * fundamentalHz, value);
                    ratio += (value[0] * value[0] + value[1] * value[1]) / snapshot.floor(k * fundamentalHz);
                }
                ratios[s] = ratio / moments.get(s).length;
            }
            Arrays.sort(ratios);
            double overFloorDb = 10 * Math.log10(Math.max(1, ratios[ratios.length / 2]));
            // The low lines lead: on a high one, something stands by chance more easily.
            sum += Math.min(MOST_DB_PER_LINE, overFloorDb) / Math.sqrt(k);
        }
        return sum;
    }
}
