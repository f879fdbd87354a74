package io.github.polewright.mains;

/** The median of a window that slides over an array, by a sorted copy of the window. */
final class SlidingMedian {

    private final double[] sorted;
    private int size;

    SlidingMedian(int most) {
        sorted = new double[most];
    }

    void clear() {
        size = 0;
    }

    void add(double value) {
        int i = size++;
        while (i > 0 && sorted[i - 1] > value) {
            sorted[i] = sorted[i - 1];
            i--;
        }
        sorted[i] = value;
    }

    void remove(double value) {
        int i = 0;
        while (i < size - 1 && sorted[i] != value) {
            i++;
        }
        size--;
        while (i < size) {
            sorted[i] = sorted[i + 1];
            i++;
        }
    }

    double median() {
        return sorted[size / 2];
    }
}
