/** One retune heard two ways: as a glide, and with the coefficients swapped hard. */
@org.jspecify.annotations.NullMarked
package io.github.polewright.samples.retune;
