/**
 * The values everything else is made of: {@link io.github.polewright.Section a section} of five coefficients and
 * {@link io.github.polewright.Cascade a cascade} of sections at one sample rate. Immutable, safe to share between
 * threads.
 */
@NullMarked
package io.github.polewright;

import org.jspecify.annotations.NullMarked;
