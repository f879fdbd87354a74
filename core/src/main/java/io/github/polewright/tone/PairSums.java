package io.github.polewright.tone;

/** Sums over the good hops of one symbol: phase advance for the mean deviation, power for the levels. */
final class PairSums {

    int low;
    int high;
    double lowReal;
    double lowImaginary;
    double highReal;
    double highImaginary;
    private double lowPower;
    private double highPower;
    private int powers;

    void clear(int lowTone, int highTone) {
        low = lowTone;
        high = highTone;
        lowReal = 0;
        lowImaginary = 0;
        highReal = 0;
        highImaginary = 0;
        lowPower = 0;
        highPower = 0;
        powers = 0;
    }

    /** Another's symbol and mean deviation, with no power yet. */
    void copyAdvance(PairSums other) {
        clear(other.low, other.high);
        lowReal = other.lowReal;
        lowImaginary = other.lowImaginary;
        highReal = other.highReal;
        highImaginary = other.highImaginary;
    }

    boolean sameAs(PairSums other) {
        return low == other.low && high == other.high;
    }

    void add(PairHop hop) {
        addPower(hop);
        lowReal += hop.advanceReal(low);
        lowImaginary += hop.advanceImaginary(low);
        highReal += hop.advanceReal(high);
        highImaginary += hop.advanceImaginary(high);
    }

    void addPower(PairHop hop) {
        lowPower += hop.lowPower;
        highPower += hop.highPower;
        powers++;
    }

    /** Whether the mean deviation of both tones lies within the tangents of their tolerances. */
    boolean isNear(double lowTolerance, double highTolerance) {
        return Math.abs(lowImaginary) <= lowTolerance * lowReal && Math.abs(highImaginary) <= highTolerance * highReal;
    }

    /** Whether the mean power of the high tone over that of the low one lies within the two ratios. */
    boolean isBalanced(double least, double greatest) {
        return highPower >= least * lowPower && highPower <= greatest * lowPower;
    }

    double meanLowPower() {
        return lowPower / powers;
    }

    double meanHighPower() {
        return highPower / powers;
    }
}
