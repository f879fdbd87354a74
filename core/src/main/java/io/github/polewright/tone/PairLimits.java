package io.github.polewright.tone;

/**
 * What a {@link PairReader} takes for a tone pair. Immutable; each {@code with} method gives a changed copy.
 *
 * <p>A limit says what must be read. The reader refuses a little beyond it: frequencies by another 0.3 % + 0.5 Hz on
 * average over the tone, twist by another 2 dB, since noise moves what is measured.
 *
 * <p>The presets follow the columns of table A-1 in annex A of ITU-T Q.24 (from memory) as far as this reader has the
 * setting: frequency error, twist, level, interruption and pause. The table's levels are in dBm; here 0 dBm0 is a sine 3.14 dB
 * below full scale, as in ITU-T G.711 (A-law), and the floor lies between the table's operate and non-operate levels. All
 * five operate on 40 ms of tone.
 *
 * <p><b>Units</b> hertz, percent, dB, dBFS (a full-scale sine is 0 dBFS), seconds. <b>Threads</b> immutable.
 */
public final class PairLimits {

    private static final double DBFS_OF_0_DBM0 = -3.14;

    /** 12 dB of signal to noise give 0.94, and hardly ever less than this; vowels that resemble a pair mostly stay below. */
    private static final double LEAST_SHARE = 0.91;

    /** Error 1.5 % + 2 Hz, twist −8 to +4 dB, floor −36 dBFS, release 20 ms, share 0.91: what a reader uses unless told. */
    public static final PairLimits RECOMMENDED = new PairLimits(1.5, 2, -8, 4, -36, 0.020, LEAST_SHARE);

    /** Column NTT: error 1.8 %, twist ±5 dB, operates at −24 dBm and not below −29 dBm. */
    public static final PairLimits NTT = new PairLimits(1.8, 0, -5, 5, -26.5 + DBFS_OF_0_DBM0, 0.020, LEAST_SHARE);

    /** Column AT&amp;T: error 1.5 %, twist −8 to +4 dB, operates at −25 dBm and not below −55 dBm. */
    public static final PairLimits AT_AND_T = new PairLimits(1.5, 0, -8, 4, -40 + DBFS_OF_0_DBM0, 0.020, LEAST_SHARE);

    /** Column Danish: error 1.5 % + 2 Hz, twist ±6 dB, operates at −27 dBm and not below −36 dBm, bridges 20 ms. */
    public static final PairLimits DANISH = new PairLimits(1.5, 2, -6, 6, -31.5 + DBFS_OF_0_DBM0, 0.030, LEAST_SHARE);

    /** Column Australian: error 1.5 % + 4 Hz, twist ±10 dB, operates at −27 dBm and not below −30 dBm. */
    public static final PairLimits AUSTRALIAN =
            new PairLimits(1.5, 4, -10, 10, -28.5 + DBFS_OF_0_DBM0, 0.022, LEAST_SHARE);

    /** Column Brazilian: error 1.8 %, twist ±9 dB, operates at −25 dBm and not below −50 dBm. */
    public static final PairLimits BRAZILIAN =
            new PairLimits(1.8, 0, -9, 9, -37.5 + DBFS_OF_0_DBM0, 0.020, LEAST_SHARE);

    private static final double MEAN_TWIST_MARGIN_DB = 2;
    private static final double HOP_TWIST_MARGIN_DB = 3;

    private final double errorPercent;
    private final double errorHz;
    private final double lowestTwistDb;
    private final double highestTwistDb;
    private final double floorDbfs;
    private final double releaseSeconds;
    private final double leastShare;

    private PairLimits(
            double errorPercent,
            double errorHz,
            double lowestTwistDb,
            double highestTwistDb,
            double floorDbfs,
            double releaseSeconds,
            double leastShare) {
        this.errorPercent = errorPercent;
        this.errorHz = errorHz;
        this.lowestTwistDb = lowestTwistDb;
        this.highestTwistDb = highestTwistDb;
        this.floorDbfs = floorDbfs;
        this.releaseSeconds = releaseSeconds;
        this.leastShare = leastShare;
    }

    /**
     * These limits with another frequency error: {@code errorPercent} of the nominal frequency plus {@code errorHz}.
     *
     * @param errorPercent 0 to 2 percent
     * @param errorHz 0 to 5 Hz
     * @return the changed copy
     * @throws IllegalArgumentException if a value is outside its range, or both are so small or large that their sum at
     *     1633 Hz is not 8 to 33 Hz
     */
    public PairLimits withError(double errorPercent, double errorHz) {
        check("errorPercent", errorPercent, 0, 2);
        check("errorHz", errorHz, 0, 5);
        check("the error at 1633 Hz", 16.33 * errorPercent + errorHz, 8, 33);
        return new PairLimits(
                errorPercent, errorHz, lowestTwistDb, highestTwistDb, floorDbfs, releaseSeconds, leastShare);
    }

    /**
     * These limits with another twist: the level of the high tone over that of the low one.
     *
     * @param lowestTwistDb −12 to 0 dB
     * @param highestTwistDb 0 to 12 dB
     * @return the changed copy
     * @throws IllegalArgumentException if a value is outside its range
     */
    public PairLimits withTwist(double lowestTwistDb, double highestTwistDb) {
        check("lowestTwistDb", lowestTwistDb, -12, 0);
        check("highestTwistDb", highestTwistDb, 0, 12);
        return new PairLimits(
                errorPercent, errorHz, lowestTwistDb, highestTwistDb, floorDbfs, releaseSeconds, leastShare);
    }

    /**
     * These limits with another floor: a tone below it isn't read. Leave a few dB below the weakest tone that must be.
     *
     * @param floorDbfs −120 to 0 dBFS, for each tone
     * @return the changed copy
     * @throws IllegalArgumentException if the value is outside its range
     */
    public PairLimits withFloor(double floorDbfs) {
        check("floorDbfs", floorDbfs, -120, 0);
        return new PairLimits(
                errorPercent, errorHz, lowestTwistDb, highestTwistDb, floorDbfs, releaseSeconds, leastShare);
    }

    /**
     * These limits with another release: a gap shorter than it is bridged, a longer one ends the symbol. Set it between
     * the longest interruption and the shortest pause.
     *
     * @param releaseSeconds 0.01 to 0.1 s
     * @return the changed copy
     * @throws IllegalArgumentException if the value is outside its range
     */
    public PairLimits withRelease(double releaseSeconds) {
        check("releaseSeconds", releaseSeconds, 0.01, 0.1);
        return new PairLimits(
                errorPercent, errorHz, lowestTwistDb, highestTwistDb, floorDbfs, releaseSeconds, leastShare);
    }

    /**
     * These limits with another share: how much of the power from 150 to 3000 Hz must be the pair's, on average until it
     * is read. More keeps off more speech; less reads pairs under noise or other tones, down to 6 dB of signal to noise.
     *
     * @param leastShare 0.8 to 0.95, and 0.91 unless set
     * @return the changed copy
     * @throws IllegalArgumentException if the value is outside its range
     */
    public PairLimits withShare(double leastShare) {
        check("leastShare", leastShare, 0.8, 0.95);
        return new PairLimits(
                errorPercent, errorHz, lowestTwistDb, highestTwistDb, floorDbfs, releaseSeconds, leastShare);
    }

    private static void check(String name, double value, double least, double most) {
        if (!(value >= least && value <= most)) {
            throw new IllegalArgumentException(name + " is " + value + "; it must be " + least + " to " + most);
        }
    }

    /**
     * The part of the frequency error that grows with frequency.
     *
     * @return percent of nominal
     */
    public double errorPercent() {
        return errorPercent;
    }

    /**
     * The part of the frequency error that is the same for all tones.
     *
     * @return hertz
     */
    public double errorHz() {
        return errorHz;
    }

    /**
     * The lowest level of the high tone over the low one that is read.
     *
     * @return dB, at most 0
     */
    public double lowestTwistDb() {
        return lowestTwistDb;
    }

    /**
     * The highest level of the high tone over the low one that is read.
     *
     * @return dB, at least 0
     */
    public double highestTwistDb() {
        return highestTwistDb;
    }

    /**
     * The level below which a tone isn't read.
     *
     * @return dBFS
     */
    public double floorDbfs() {
        return floorDbfs;
    }

    /**
     * How long a tone must be away for its symbol to end.
     *
     * @return seconds
     */
    public double releaseSeconds() {
        return releaseSeconds;
    }

    /**
     * The least share of the pair in the power from 150 to 3000 Hz.
     *
     * @return 0.8 to 0.95
     */
    public double leastShare() {
        return leastShare;
    }

    /** The limits in one line. */
    @Override
    public String toString() {
        return "error " + errorPercent + " % + " + errorHz + " Hz, twist " + lowestTwistDb + " to " + highestTwistDb
                + " dB, floor " + floorDbfs + " dBFS, release " + releaseSeconds + " s, share " + leastShare;
    }

    /** Over 24 ms the average allows a tight gate: two of them stay below the 4.3 % by which 770 and 1477 miss an octave. */
    double meanToleranceHz(double frequencyHz) {
        return (errorPercent + 0.3) / 100 * frequencyHz + errorHz + 0.5;
    }

    double hopToleranceHz(double frequencyHz) {
        return (errorPercent + 0.7) / 100 * frequencyHz + errorHz;
    }

    double leastHopTwist() {
        return Math.pow(10, (lowestTwistDb - HOP_TWIST_MARGIN_DB) / 10);
    }

    double greatestHopTwist() {
        return Math.pow(10, (highestTwistDb + HOP_TWIST_MARGIN_DB) / 10);
    }

    double leastMeanTwist() {
        return Math.pow(10, (lowestTwistDb - MEAN_TWIST_MARGIN_DB) / 10);
    }

    double greatestMeanTwist() {
        return Math.pow(10, (highestTwistDb + MEAN_TWIST_MARGIN_DB) / 10);
    }

    double floorPower() {
        return Math.pow(10, floorDbfs / 10);
    }
}
