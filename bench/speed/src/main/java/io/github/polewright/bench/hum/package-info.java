/** What removing hum costs a core, and its dearest block. */
@NullMarked
package io.github.polewright.bench.hum;

import org.jspecify.annotations.NullMarked;
