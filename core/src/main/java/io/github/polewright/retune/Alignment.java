package io.github.polewright.retune;

import java.util.Arrays;

/** Pairs two ordered lists without crossings at the least total cost, by dynamic programming in O(n m). */
final class Alignment {

    private Alignment() {}

    /** The column of each row, or -1. A row or column left out costs {@code endCost}. */
    static int[] solve(double[][] costs, int columns, double endCost) {
        int rows = costs.length;
        double[][] best = new double[rows + 1][columns + 1];
        for (int i = 0; i <= rows; i++) {
            for (int j = 0; j <= columns; j++) {
                if (i == 0 || j == 0) {
                    best[i][j] = (i + j) * endCost;
                } else {
                    double end = Math.min(best[i - 1][j], best[i][j - 1]) + endCost;
                    best[i][j] = Math.min(end, best[i - 1][j - 1] + costs[i - 1][j - 1]);
                }
            }
        }
        int[] matches = new int[rows];
        Arrays.fill(matches, -1);
        int i = rows;
        int j = columns;
        while (i > 0 && j > 0) {
            if (best[i][j] == best[i - 1][j - 1] + costs[i - 1][j - 1]) {
                matches[--i] = --j;
            } else if (best[i][j] == best[i - 1][j] + endCost) {
                i--;
            } else {
                j--;
            }
        }
        return matches;
    }
}
