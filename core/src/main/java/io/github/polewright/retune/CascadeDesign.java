package io.github.polewright.retune;

import io.github.polewright.Cascade;

/**
 * A design that a glide can ask for the cascades on its way: the same number of sections at one sample rate for every
 * setting. Called on the control thread that makes the glide.
 */
@FunctionalInterface
public interface CascadeDesign {

    /**
     * The cascade for one setting.
     *
     * @param frequencyHz centre or corner, in hertz
     * @param q quality factor
     * @param gainDb gain in decibels
     * @return the cascade
     */
    Cascade design(double frequencyHz, double q, double gainDb);
}
