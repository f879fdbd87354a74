package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.retune.Glide;
import io.github.polewright.retune.Pace;
import java.util.Collections;
import java.util.concurrent.atomic.AtomicReference;
import java.util.function.Function;

/**
 * The slot through which control threads hand orders to the audio thread. An order is prepared from the one that is in
 * the slot and takes its place if that is still there; else it is prepared again, so the latest call wins and no call
 * waits for another.
 */
final class Orders {

    /** After so many calls by others in between, a glide is handed over although it was made for an earlier start. */
    private static final int ATTEMPTS = 8;

    private final AtomicReference<Order> slot;
    private final Cascade silentSlots;

    Orders(Cascade start) {
        silentSlots = Cascade.of(start.sampleRateHz(), Collections.nCopies(start.sectionCount(), Section.PASS_THROUGH));
        slot = new AtomicReference<>(new Order(0, Glide.between(start, start, Pace.FOLLOWING), 0, start, false, 1));
    }

    /** The audio thread's single look at the slot. */
    Order latestAcquire() {
        return slot.getAcquire();
    }

    Glide retune(Cascade target, Pace pace) {
        return handOver(wish -> Glide.sweeping(wish, target, pace));
    }

    Glide retune(Glide glide) {
        return handOver(glide::inSlotsOf);
    }

    private Glide handOver(Function<Cascade, Glide> prepare) {
        for (int attempt = 1; ; attempt++) {
            Order before = latestAcquire();
            Glide glide = prepare.apply(before.wish());
            if (slot.compareAndSet(before, before.retuned(glide))) {
                return glide;
            }
            if (attempt == ATTEMPTS) {
                // The walk takes any glide from wherever the coefficients are; only the pairing may be a poorer one.
                slot.updateAndGet(latest -> latest.retuned(glide));
                return glide;
            }
        }
    }

    void bypass(boolean on) {
        boolean isDone = false;
        while (!isDone) {
            Order before = latestAcquire();
            isDone = before.bypassed() == on || slot.compareAndSet(before, before.bypassed(on, fade(before, on)));
        }
    }

    private Glide fade(Order before, boolean on) {
        Cascade from = on ? before.wish() : silentSlots;
        return Glide.between(from, on ? silentSlots : before.wish(), Pace.SINGLE);
    }

    void gain(double factor) {
        slot.updateAndGet(before -> before.amplified(factor));
    }
}
