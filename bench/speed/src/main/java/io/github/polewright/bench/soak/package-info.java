/** The soak command: a callback at wall-clock pace beside threads that allocate and retune. */
@NullMarked
package io.github.polewright.bench.soak;

import org.jspecify.annotations.NullMarked;
