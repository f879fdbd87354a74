package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.retune.Glide;
import io.github.polewright.retune.Pace;
import java.util.Collections;
import java.util.concurrent.atomic.AtomicReference;
import java.util.function.Function;

/**
 * The slot through which control threads hand orders to the audio thread, and the one through which they see what it has
 * adopted. A glide is prepared from where the adopted one ends, so that orders nobody has heard leave no trace.
 */
final class Orders {

    /** After so many adoptions during one call a glide is left as it is; it is right from any start. */
    private static final int ATTEMPTS = 4;

    private final AtomicReference<Order> slot;
    private final AtomicReference<Order> adopted;
    private final Cascade silentSlots;

    Orders(Cascade start) {
        silentSlots = Cascade.of(start.sampleRateHz(), Collections.nCopies(start.sectionCount(), Section.PASS_THROUGH));
        Order first = new Order(0, Glide.between(start, start, Pace.FOLLOWING), 0, start, false, 1);
        slot = new AtomicReference<>(first);
        adopted = new AtomicReference<>(first);
    }

    /** The audio thread's single look at the slot, and anyone else's. */
    Order latestAcquire() {
        return slot.getAcquire();
    }

    /** Audio thread: from here on glides are prepared from that order's end. */
    void adoptedRelease(Order order) {
        adopted.setRelease(order);
    }

    Glide retune(Cascade target, Pace pace) {
        return handOver(heading -> Glide.sweeping(heading, target, pace));
    }

    Glide retune(Glide glide) {
        return handOver(glide::inSlotsOf);
    }

    /**
     * Whatever is handed over by others meanwhile, this call ends. If the audio thread adopted another order while the
     * glide was prepared, and nothing newer waits, the glide is replaced by one from that order's end.
     */
    private Glide handOver(Function<Cascade, Glide> prepare) {
        Order basis = adopted.getAcquire();
        Glide glide = prepare.apply(basis.heading());
        Glide first = glide;
        Order own = slot.updateAndGet(latest -> latest.retuned(first));
        for (int attempt = 1; attempt < ATTEMPTS; attempt++) {
            Order now = adopted.getAcquire();
            if (now.number() == basis.number() || now.number() >= own.number()) {
                return glide;
            }
            basis = now;
            Glide again = prepare.apply(basis.heading());
            Order replacement = own.retuned(again);
            if (!slot.compareAndSet(own, replacement)) {
                return glide;
            }
            glide = again;
            own = replacement;
        }
        return glide;
    }

    void bypass(boolean on) {
        boolean isDone = false;
        while (!isDone) {
            Order before = latestAcquire();
            isDone = before.bypassed() == on || slot.compareAndSet(before, before.bypassed(on, fade(before, on)));
        }
    }

    private Glide fade(Order before, boolean on) {
        return Glide.between(adopted.getAcquire().heading(), on ? silentSlots : before.wish(), Pace.SINGLE);
    }

    void gain(double factor) {
        slot.updateAndGet(before -> before.amplified(factor));
    }
}
