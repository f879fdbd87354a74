package io.github.polewright.bench.measure;

import java.util.Arrays;

/** What one player's turns took, in the order they were taken. Immutable. */
public final class Score {

    private final double[] turns;
    private final double[] sorted;

    /**
     * The times of at least one turn.
     *
     * @param turns in any unit, as long as all scores have the same; copied
     */
    public Score(double... turns) {
        if (turns.length == 0) {
            throw new IllegalArgumentException("0 turns; there must be at least 1");
        }
        this.turns = turns.clone();
        this.sorted = turns.clone();
        Arrays.sort(sorted);
    }

    /**
     * The quickest turn.
     *
     * @return its time
     */
    public double least() {
        return sorted[0];
    }

    /**
     * The middle turn.
     *
     * @return its time
     */
    public double median() {
        return quantile(0.5);
    }

    /**
     * The time that a share of the turns stays under, on a line between neighbours (Hyndman and Fan, American
     * Statistician 50, 1996, definition 7).
     *
     * @param share 0 to 1
     * @return the time
     */
    public double quantile(double share) {
        double at = share * (sorted.length - 1);
        int below = (int) Math.floor(at);
        int above = Math.min(below + 1, sorted.length - 1);
        return sorted[below] + (at - below) * (sorted[above] - sorted[below]);
    }

    /**
     * Turn by turn, this over another that was played in the same rounds, so that a clock that changes between rounds
     * cancels.
     *
     * @param other played in turn with this one
     * @return the ratios
     * @throws IllegalArgumentException if the other has more or fewer turns
     */
    public Score over(Score other) {
        if (other.turns.length != turns.length) {
            throw new IllegalArgumentException(
                    other.turns.length + " turns; there must be " + turns.length + " as in the score they divide");
        }
        double[] ratios = new double[turns.length];
        for (int i = 0; i < ratios.length; i++) {
            ratios[i] = turns[i] / other.turns[i];
        }
        return new Score(ratios);
    }
}
