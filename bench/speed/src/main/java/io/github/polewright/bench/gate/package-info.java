/** The gate command: what a build may fail on, and nothing that depends on a shared machine's mood. */
@NullMarked
package io.github.polewright.bench.gate;

import org.jspecify.annotations.NullMarked;
