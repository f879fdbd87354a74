package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.retune.Glide;

/**
 * What a live cascade is to do from the next block on: immutable, handed from a control thread to the audio thread
 * whole.
 *
 * @param number one more than the order it follows in the slot
 * @param glide the glide to walk
 * @param glideNumber the number of the order that brought that glide
 * @param wish what is heard when nothing is bypassed, one section a slot
 * @param bypassed whether the sections are faded out
 * @param gain the output gain, a linear factor
 */
record Order(long number, Glide glide, long glideNumber, Cascade wish, boolean bypassed, double gain) {

    /** Where the coefficients go, one section a slot. */
    Cascade heading() {
        return glide.target();
    }

    /** While bypassed the wish changes and nothing is heard of it. */
    Order retuned(Glide next) {
        Cascade target = next.target();
        return bypassed
                ? new Order(number + 1, glide, glideNumber, target, true, gain)
                : new Order(number + 1, next, number + 1, target, false, gain);
    }

    Order bypassed(boolean on, Glide next) {
        return new Order(number + 1, next, number + 1, wish, on, gain);
    }

    Order amplified(double factor) {
        return new Order(number + 1, glide, glideNumber, wish, bypassed, factor);
    }
}
