package io.github.polewright.tone;

/**
 * The beginning or the end of one symbol, filled by {@link PairReader#poll(PairEvent)}: make one and use it again.
 *
 * <p><b>Units</b> frames since the reader's start, dBFS (a full-scale sine is 0 dBFS), dB, hertz. <b>Threads</b> one at a
 * time. <b>Allocation</b> none.
 */
public final class PairEvent {

    private boolean end;
    private char symbol;
    private long startFrame;
    private long endFrame;
    private long decisionFrame;
    private double lowNominalHz;
    private double highNominalHz;
    private double lowLevelDbfs;
    private double highLevelDbfs;
    private double lowErrorHz;
    private double highErrorHz;

    /** An event to be filled. */
    public PairEvent() {}

    void fill(boolean isEnd, char read, long start, long ended, long decided) {
        end = isEnd;
        symbol = read;
        startFrame = start;
        endFrame = ended;
        decisionFrame = decided;
    }

    void fillLow(double nominalHz, double levelDbfs, double errorHz) {
        lowNominalHz = nominalHz;
        lowLevelDbfs = levelDbfs;
        lowErrorHz = errorHz;
    }

    void fillHigh(double nominalHz, double levelDbfs, double errorHz) {
        highNominalHz = nominalHz;
        highLevelDbfs = levelDbfs;
        highErrorHz = errorHz;
    }

    /**
     * Whether this is the end of a symbol; every end follows its beginning.
     *
     * @return true for an end, false for a beginning
     */
    public boolean isEnd() {
        return end;
    }

    /**
     * The symbol.
     *
     * @return one of {@code 1 2 3 A 4 5 6 B 7 8 9 C * 0 # D}; 0 before the first event
     */
    public char symbol() {
        return symbol;
    }

    /**
     * When the tone pair began, within 3 ms.
     *
     * @return frames since the reader's start
     */
    public long startFrame() {
        return startFrame;
    }

    /**
     * When the tone pair ended, within 3 ms.
     *
     * @return frames since the reader's start, or -1 for a beginning
     */
    public long endFrame() {
        return endFrame;
    }

    /**
     * How many frames had been fed when this was decided.
     *
     * @return frames since the reader's start
     */
    public long decisionFrame() {
        return decisionFrame;
    }

    /**
     * Nominal frequency of the symbol's low tone.
     *
     * @return hertz
     */
    public double lowNominalHz() {
        return lowNominalHz;
    }

    /**
     * Nominal frequency of the symbol's high tone.
     *
     * @return hertz
     */
    public double highNominalHz() {
        return highNominalHz;
    }

    /**
     * Level of the low tone: at an end the mean over the tone, at a beginning that of the last 18 ms.
     *
     * @return dBFS
     */
    public double lowLevelDbfs() {
        return lowLevelDbfs;
    }

    /**
     * Level of the high tone: at an end the mean over the tone, at a beginning that of the last 18 ms.
     *
     * @return dBFS
     */
    public double highLevelDbfs() {
        return highLevelDbfs;
    }

    /**
     * Level of the high tone over that of the low one.
     *
     * @return dB
     */
    public double twistDb() {
        return highLevelDbfs - lowLevelDbfs;
    }

    /**
     * How far the low tone was from its nominal frequency, on average until it was read, within 2 Hz in a clean signal.
     *
     * @return hertz, positive if too high
     */
    public double lowErrorHz() {
        return lowErrorHz;
    }

    /**
     * How far the high tone was from its nominal frequency, on average until it was read, within 2 Hz in a clean signal.
     *
     * @return hertz, positive if too high
     */
    public double highErrorHz() {
        return highErrorHz;
    }

    /** One line, for logs. */
    @Override
    public String toString() {
        return symbol + (end ? " ended, frames " + startFrame + " to " + endFrame : " began at frame " + startFrame)
                + ", levels " + lowLevelDbfs + " and " + highLevelDbfs + " dBFS, errors " + lowErrorHz + " and "
                + highErrorHz + " Hz";
    }
}
