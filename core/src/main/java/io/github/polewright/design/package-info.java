/**
 * Designs: from a wish in hertz and decibels to {@link io.github.polewright.Section a section} or
 * {@link io.github.polewright.Cascade a cascade}, by published formulas in forms that do not cancel.
 *
 * <p>Every design is a pure function of its arguments, may be called from any thread, and allocates, so it belongs on a
 * control thread. Whatever it refuses, it refuses with an {@link java.lang.IllegalArgumentException} that names the
 * parameter, its value and the permitted range; whatever it returns is finite and stable.
 */
@NullMarked
package io.github.polewright.design;

import org.jspecify.annotations.NullMarked;
