/** The cold command: what the first blocks of a fresh JVM cost. */
@NullMarked
package io.github.polewright.bench.cold;

import org.jspecify.annotations.NullMarked;
