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
 * @param bypassed whether the input is heard instead of the sections
 * @param gain the output gain, a linear factor
 */
record Order(long number, Glide glide, long glideNumber, boolean bypassed, double gain) {

    /** Where the coefficients go, one section a slot. */
    Cascade heading() {
        return glide.target();
    }

    Order retuned(Glide next) {
        return new Order(number + 1, next, number + 1, bypassed, gain);
    }

    Order bypassed(boolean on) {
        return on == bypassed ? this : new Order(number + 1, glide, glideNumber, on, gain);
    }

    Order amplified(double factor) {
        return new Order(number + 1, glide, glideNumber, bypassed, factor);
    }
}
