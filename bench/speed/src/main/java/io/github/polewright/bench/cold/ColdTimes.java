package io.github.polewright.bench.cold;

/** How long each of the first blocks of a JVM took, in order: what the forked JVM prints. */
final class ColdTimes {

    private final double warmUpMillis;
    private final double[] micros;

    ColdTimes(double warmUpMillis, double[] micros) {
        this.warmUpMillis = warmUpMillis;
        this.micros = micros.clone();
    }

    double warmUpMillis() {
        return warmUpMillis;
    }

    int blocks() {
        return micros.length;
    }

    /** Mean of the blocks from one (counted from 1) to another, both included. */
    double meanMicros(int first, int last) {
        double sum = 0;
        for (int i = first; i <= last; i++) {
            sum += micros[i - 1];
        }
        return sum / (last - first + 1);
    }

    /** Longest of the blocks from one (counted from 1) to another, both included. */
    double longestMicros(int first, int last) {
        double longest = 0;
        for (int i = first; i <= last; i++) {
            longest = Math.max(longest, micros[i - 1]);
        }
        return longest;
    }

    /** Blocks that took longer than a limit. */
    int over(double limitMicros) {
        int count = 0;
        for (double block : micros) {
            count += block > limitMicros ? 1 : 0;
        }
        return count;
    }

    /** The last block, counted from 1, that took longer than a limit; 0 if none did. */
    int lastOver(double limitMicros) {
        for (int i = micros.length; i > 0; i--) {
            if (micros[i - 1] > limitMicros) {
                return i;
            }
        }
        return 0;
    }
}
