package io.github.polewright.live;

/**
 * What a warm-up did: how the cost of a block fell while the JVM compiled the loops.
 *
 * @param blocks of 64 frames that were run on scratch state
 * @param seconds it took
 * @param firstBlockMicros what the very first block took, microseconds
 * @param lastBlockMicros what a block took in the quickest of the last rounds, microseconds; a mean of steady and
 *     gliding blocks in all sample formats
 * @param levelled whether the cost had stopped falling before the time was up
 */
public record WarmUp(int blocks, double seconds, double firstBlockMicros, double lastBlockMicros, boolean levelled) {

    /**
     * How many times faster the last blocks were than the first.
     *
     * @return 1 for no gain
     */
    public double gain() {
        return firstBlockMicros / lastBlockMicros;
    }
}
