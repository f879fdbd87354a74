package io.github.polewright.tone;

/**
 * The beginning or the end of one cadence, filled by {@link CadenceReader#poll(CadenceEvent)}: make one and use it again.
 *
 * <p><b>Units</b> frames since the reader's start. <b>Threads</b> one at a time. <b>Allocation</b> none.
 */
public final class CadenceEvent {

    private boolean end;
    private int cadence;
    private long startFrame;
    private long endFrame;

    /** An event to be filled. */
    public CadenceEvent() {}

    void fill(boolean isEnd, int index, long start, long ended) {
        end = isEnd;
        cadence = index;
        startFrame = start;
        endFrame = ended;
    }

    /**
     * Whether this is the end of a cadence; every end follows its beginning.
     *
     * @return true for an end, false for a beginning
     */
    public boolean isEnd() {
        return end;
    }

    /**
     * Which cadence.
     *
     * @return its index in the order they were named
     */
    public int cadence() {
        return cadence;
    }

    /**
     * When the first interval that fits began.
     *
     * @return frames since the reader's start
     */
    public long startFrame() {
        return startFrame;
    }

    /**
     * When the last interval that fits ended.
     *
     * @return frames since the reader's start, or -1 for a beginning
     */
    public long endFrame() {
        return endFrame;
    }

    /** One line, for logs. */
    @Override
    public String toString() {
        return "cadence " + cadence
                + (end ? " ended, frames " + startFrame + " to " + endFrame : " began at frame " + startFrame);
    }
}
