package io.github.polewright.tone;

import java.util.concurrent.atomic.AtomicLong;

/**
 * Records of some longs and some doubles, from one writing thread to one reading thread, both wait-free.
 *
 * <p>A record is published by the release of {@code written} and freed by the release of {@code read}; each side reads
 * the other's count with acquire, and its own plainly. A full ring drops the new record and counts it.
 */
final class RecordRing {

    final long[] longs;
    final double[] doubles;
    private final int capacity;
    private final int longsEach;
    private final int doublesEach;
    private final AtomicLong written = new AtomicLong();
    private final AtomicLong read = new AtomicLong();
    private final AtomicLong dropped = new AtomicLong();

    RecordRing(int capacity, int longsEach, int doublesEach) {
        if (capacity < 1 || capacity > 1 << 20) {
            throw new IllegalArgumentException("eventCapacity is " + capacity + "; it must be 1 to " + (1 << 20));
        }
        this.capacity = capacity;
        this.longsEach = longsEach;
        this.doublesEach = doublesEach;
        longs = new long[capacity * longsEach];
        doubles = new double[capacity * doublesEach];
    }

    /** Writing thread: the slot to fill, or -1 if the ring is full, which is counted. */
    int claim() {
        long count = written.getPlain();
        if (count - read.getAcquire() >= capacity) {
            dropped.setRelease(dropped.getPlain() + 1);
            return -1;
        }
        return (int) (count % capacity);
    }

    /** Writing thread: hands over the claimed slot. */
    void publish() {
        written.setRelease(written.getPlain() + 1);
    }

    /** Reading thread: the oldest slot, or -1 if there is none. */
    int oldest() {
        long count = read.getPlain();
        return count == written.getAcquire() ? -1 : (int) (count % capacity);
    }

    /** Reading thread: frees the oldest slot. */
    void free() {
        read.setRelease(read.getPlain() + 1);
    }

    int firstLong(int slot) {
        return slot * longsEach;
    }

    int firstDouble(int slot) {
        return slot * doublesEach;
    }

    long dropped() {
        return dropped.getAcquire();
    }
}
