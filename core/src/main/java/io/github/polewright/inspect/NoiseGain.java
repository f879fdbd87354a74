package io.github.polewright.inspect;

import io.github.polewright.Cascade;
import io.github.polewright.Section;

/**
 * Energy at the output for an impulse at a section's adder, by the observability Gramian {@code W} of the cascade's
 * state space: the sum over n of {@code (A^T)^n C^T C A^n}, doubled in length each step until it stands.
 *
 * <p>Each section is realized as {@code A = [[s, g], [d / g, s]], C = [1, 0]} with {@code s = -a1 / 2} and
 * {@code d = a1^2 / 4 - a2}: eigenvalues {@code s +- sqrt d}, and with {@code g = sqrt |d|} a normal matrix, so
 * squaring it does not amplify rounding the way a companion matrix would near {@code z = 1}.
 */
final class NoiseGain {

    private static final int MOST_DOUBLINGS = 64;

    private final Cascade cascade;
    private final int states;
    private final double[][] gramian;

    NoiseGain(Cascade cascade) {
        this.cascade = cascade;
        states = 2 * cascade.sectionCount();
        gramian = cascade.isStable() ? gramian() : new double[0][0];
    }

    double ofSection(int index) {
        if (!cascade.isStable()) {
            return Double.POSITIVE_INFINITY;
        }
        double[] state = new double[states];
        double direct = feed(state, index, recursionAlone(cascade.section(index)));
        double energy = direct * direct;
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                energy += state[i] * gramian[i][j] * state[j];
            }
        }
        return energy;
    }

    private static Section recursionAlone(Section section) {
        return Section.of(1, 0, 0, section.a1(), section.a2());
    }

    /** Puts an impulse through {@code first} in the place of section {@code index}; returns what reaches the output. */
    private double feed(double[] state, int index, Section first) {
        double sample = 1;
        for (int i = index; i < cascade.sectionCount(); i++) {
            Section section = i == index ? first : cascade.section(i);
            double[] input = input(section);
            state[2 * i] += sample * input[0];
            state[2 * i + 1] += sample * input[1];
            sample *= section.b0();
        }
        return sample;
    }

    private static double coupling(double mean, double square) {
        return Math.max(Math.sqrt(Math.abs(square)), 1 - Math.abs(mean));
    }

    private static double square(Section section) {
        return new Quadratic(1, section.a1(), section.a2()).discriminant();
    }

    /** {@code B} for which {@code C (z - A)^-1 B} is the section less its {@code b0}. */
    private static double[] input(Section section) {
        double mean = -section.a1() / 2;
        double first = Math.fma(-section.a1(), section.b0(), section.b1());
        double second = Math.fma(-section.a2(), section.b0(), section.b2());
        return new double[] {first, Math.fma(first, mean, second) / coupling(mean, square(section))};
    }

    private double[][] gramian() {
        double[][] step = transition();
        double[] output = new double[states];
        double factor = 1;
        for (int i = cascade.sectionCount() - 1; i >= 0; i--) {
            output[2 * i] = factor;
            factor *= cascade.section(i).b0();
        }
        double[][] sum = new double[states][states];
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                sum[i][j] = output[i] * output[j];
            }
        }
        for (int doubling = 0; doubling < MOST_DOUBLINGS; doubling++) {
            double[][] later = times(transposed(step), times(sum, step));
            if (!add(sum, later)) {
                break;
            }
            step = times(step, step);
        }
        return sum;
    }

    /** The whole cascade's {@code A}: each section is driven by the outputs of those before it. */
    private double[][] transition() {
        double[][] matrix = new double[states][states];
        for (int i = 0; i < cascade.sectionCount(); i++) {
            Section section = cascade.section(i);
            double mean = -section.a1() / 2;
            double square = square(section);
            double coupling = coupling(mean, square);
            int row = 2 * i;
            matrix[row][row] = mean;
            matrix[row][row + 1] = coupling;
            matrix[row + 1][row] = square / coupling;
            matrix[row + 1][row + 1] = mean;
            double[] input = input(section);
            double through = 1;
            for (int before = i - 1; before >= 0; before--) {
                matrix[row][2 * before] = through * input[0];
                matrix[row + 1][2 * before] = through * input[1];
                through *= cascade.section(before).b0();
            }
        }
        return matrix;
    }

    private static double[][] transposed(double[][] matrix) {
        double[][] result = new double[matrix.length][matrix.length];
        for (int i = 0; i < matrix.length; i++) {
            for (int j = 0; j < matrix.length; j++) {
                result[j][i] = matrix[i][j];
            }
        }
        return result;
    }

    private static double[][] times(double[][] left, double[][] right) {
        int size = left.length;
        double[][] product = new double[size][size];
        for (int i = 0; i < size; i++) {
            for (int k = 0; k < size; k++) {
                double factor = left[i][k];
                if (factor != 0) {
                    for (int j = 0; j < size; j++) {
                        product[i][j] += factor * right[k][j];
                    }
                }
            }
        }
        return product;
    }

    /** Whether the sum still changed. */
    private static boolean add(double[][] sum, double[][] later) {
        boolean changed = false;
        for (int i = 0; i < sum.length; i++) {
            for (int j = 0; j < sum.length; j++) {
                double before = sum[i][j];
                sum[i][j] += later[i][j];
                changed |= sum[i][j] != before;
            }
        }
        return changed;
    }
}
