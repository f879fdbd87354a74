package io.github.polewright.bench.contest;

import io.github.polewright.bench.measure.Score;
import io.github.polewright.bench.report.Row;
import java.util.Locale;
import java.util.Map;

/**
 * A promised ratio of two players of one contest.
 *
 * @param name of the row
 * @param over the player whose time is divided
 * @param under the player whose time divides it
 * @param least the lowest ratio that keeps the promise
 * @param most the highest
 */
record Goal(String name, String over, String under, double least, double most) {

    static Goal atMost(String name, String over, String under, double most) {
        return new Goal(name, over, under, 0, most);
    }

    static Goal atLeast(String name, String over, String under, double least) {
        return new Goal(name, over, under, least, Double.POSITIVE_INFINITY);
    }

    static Goal shown(String name, String over, String under) {
        return new Goal(name, over, under, 0, Double.POSITIVE_INFINITY);
    }

    /** The ratio round by round, so that a wandering clock cancels: median, and the quartiles for its spread. */
    Row row(Map<String, Score> scores) {
        Score ratios = score(scores, over).over(score(scores, under));
        return new Row(name, "ratio", ratios.median(), ratios.quantile(0.25), ratios.quantile(0.75));
    }

    /** The ratio of the quickest turns. */
    double ratioOfLeast(Map<String, Score> scores) {
        return score(scores, over).least() / score(scores, under).least();
    }

    private static Score score(Map<String, Score> scores, String player) {
        Score score = scores.get(player);
        if (score == null) {
            throw new IllegalArgumentException("no player " + player);
        }
        return score;
    }

    boolean promised() {
        return least > 0 || most < Double.POSITIVE_INFINITY;
    }

    boolean keptBy(double ratio) {
        return ratio >= least && ratio <= most;
    }

    /** The promise for the eye. */
    String promise() {
        if (!promised()) {
            return "-";
        }
        return least > 0 ? String.format(Locale.ROOT, ">= %.2f", least) : String.format(Locale.ROOT, "<= %.2f", most);
    }

    /** What became of it, judged on the median. */
    String outcome(double ratio) {
        if (!promised()) {
            return "shown";
        }
        return keptBy(ratio) ? "kept" : "NOT KEPT";
    }
}
