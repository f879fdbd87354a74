/**
 * Not exported. The slab: up to 64 frames of {@code double} samples, one plane a channel, that everything on the audio
 * thread works on, and the conversions that fill and empty it.
 */
@NullMarked
package io.github.polewright.slab;

import org.jspecify.annotations.NullMarked;
