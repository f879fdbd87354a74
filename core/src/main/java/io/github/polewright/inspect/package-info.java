/**
 * What {@link io.github.polewright.Cascade a cascade} does, as numbers: response, delay, poles and zeros, ring time,
 * round-off noise, bounds on what it can put out. For control threads and tests: everything here may allocate.
 */
@NullMarked
package io.github.polewright.inspect;

import org.jspecify.annotations.NullMarked;
