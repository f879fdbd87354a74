package io.github.polewright.tone;

/**
 * The beginning or the end of one tone, filled by {@link ToneMeter#poll(ToneEvent)}: make one and use it again.
 *
 * <p><b>Units</b> frames since the meter's start, dBFS (a full-scale sine is 0 dBFS). <b>Threads</b> one at a time.
 * <b>Allocation</b> none.
 */
public final class ToneEvent {

    private boolean end;
    private int tone;
    private long startFrame;
    private long endFrame;
    private double levelDbfs;

    /** An event to be filled. */
    public ToneEvent() {}

    void fill(boolean isEnd, int index, long start, long ended, double level) {
        end = isEnd;
        tone = index;
        startFrame = start;
        endFrame = ended;
        levelDbfs = level;
    }

    /**
     * Whether this is the end of a tone; every end follows its beginning.
     *
     * @return true for an end, false for a beginning
     */
    public boolean isEnd() {
        return end;
    }

    /**
     * Which tone.
     *
     * @return its index in the meter's list
     */
    public int tone() {
        return tone;
    }

    /**
     * When the tone began.
     *
     * @return frames since the meter's start
     */
    public long startFrame() {
        return startFrame;
    }

    /**
     * When the tone ended.
     *
     * @return frames since the meter's start, or -1 for a beginning
     */
    public long endFrame() {
        return endFrame;
    }

    /**
     * The level: at a beginning when it had settled, at an end as it was before.
     *
     * @return dBFS
     */
    public double levelDbfs() {
        return levelDbfs;
    }

    /** One line, for logs. */
    @Override
    public String toString() {
        return "tone " + tone
                + (end ? " ended, frames " + startFrame + " to " + endFrame : " began at frame " + startFrame)
                + ", level " + levelDbfs + " dBFS";
    }
}
