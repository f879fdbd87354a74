package io.github.polewright.live;

import io.github.polewright.retune.Walk;
import java.util.concurrent.atomic.AtomicLong;

/** What the audio thread makes known about its retunes at every block's end, for any thread to read. */
final class StatusBoard {

    private final AtomicLong framesLeft = new AtomicLong();
    private final AtomicLong framesHeld = new AtomicLong();
    private final AtomicLong highestLevel = new AtomicLong();
    private final AtomicLong adoptions = new AtomicLong();
    private final AtomicLong number = new AtomicLong();

    /** Audio thread. The number comes last: who sees it sees the figures of that order or of a later one. */
    void writeRelease(Walk walk, int gainFramesLeft, long adopted, long orderNumber) {
        framesLeft.setRelease(Math.max(walk.framesLeft(), gainFramesLeft));
        framesHeld.setRelease(walk.framesHeld());
        highestLevel.setRelease(Double.doubleToRawLongBits(walk.highestLevel()));
        adoptions.setRelease(adopted);
        number.setRelease(orderNumber);
    }

    boolean isSettledAcquire(Order latest) {
        return latest.number() == number.getAcquire() && framesLeft.getAcquire() == 0;
    }

    RetuneStatus readAcquire(Order latest) {
        long adoptedNumber = number.getAcquire();
        long adopted = adoptions.getAcquire();
        long left = framesLeft.getAcquire();
        boolean isSettled = latest.number() == adoptedNumber && left == 0;
        return new RetuneStatus(
                isSettled,
                left,
                Math.exp(Double.longBitsToDouble(highestLevel.getAcquire())),
                adopted,
                Math.max(0, adoptedNumber - adopted),
                framesHeld.getAcquire());
    }
}
