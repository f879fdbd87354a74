package io.github.polewright.retune;

import java.util.Arrays;

/**
 * The assignment of least total cost, by the Hungarian method with potentials (H. Kuhn, 1955, and J. Munkres, 1957; the
 * shortest augmenting path form, O(n^3)), with a way out for rows and columns that are better left alone.
 */
final class Assignment {

    /** Added to the cost of a pair that should not be made. */
    static final double FAR = 1e6;

    private Assignment() {}

    /** The column of each row, or -1. A row or column left out costs {@code endCost}. */
    static int[] solve(double[][] costs, double endCost) {
        int rows = costs.length;
        int columns = rows == 0 ? 0 : costs[0].length;
        int size = rows + columns;
        double[][] square = new double[size][size];
        for (int i = 0; i < size; i++) {
            for (int j = 0; j < size; j++) {
                if (i < rows && j < columns) {
                    square[i][j] = costs[i][j];
                } else {
                    square[i][j] = i < rows || j < columns ? endCost : 0;
                }
            }
        }
        int[] all = complete(square);
        int[] matches = new int[rows];
        for (int i = 0; i < rows; i++) {
            matches[i] = all[i] < columns ? all[i] : -1;
        }
        return matches;
    }

    /** Rows are added one by one; index 0 of the potentials stands for no row or column. */
    private static int[] complete(double[][] costs) {
        int size = costs.length;
        double[] rowPotential = new double[size + 1];
        double[] columnPotential = new double[size + 1];
        int[] rowOf = new int[size + 1];
        for (int row = 1; row <= size; row++) {
            augment(costs, row, rowPotential, columnPotential, rowOf);
        }
        int[] matches = new int[size];
        for (int column = 1; column <= size; column++) {
            matches[rowOf[column] - 1] = column - 1;
        }
        return matches;
    }

    private static void augment(
            double[][] costs, int start, double[] rowPotential, double[] columnPotential, int[] rowOf) {
        int size = costs.length;
        double[] least = new double[size + 1];
        int[] before = new int[size + 1];
        boolean[] used = new boolean[size + 1];
        Arrays.fill(least, Double.POSITIVE_INFINITY);
        rowOf[0] = start;
        int column = 0;
        while (rowOf[column] != 0) {
            used[column] = true;
            int row = rowOf[column];
            int next = 0;
            double step = Double.POSITIVE_INFINITY;
            for (int j = 1; j <= size; j++) {
                if (!used[j]) {
                    double reduced = costs[row - 1][j - 1] - rowPotential[row] - columnPotential[j];
                    if (reduced < least[j]) {
                        least[j] = reduced;
                        before[j] = column;
                    }
                    if (least[j] < step) {
                        step = least[j];
                        next = j;
                    }
                }
            }
            for (int j = 0; j <= size; j++) {
                if (used[j]) {
                    rowPotential[rowOf[j]] += step;
                    columnPotential[j] -= step;
                } else {
                    least[j] -= step;
                }
            }
            column = next;
        }
        while (column != 0) {
            rowOf[column] = rowOf[before[column]];
            column = before[column];
        }
    }
}
