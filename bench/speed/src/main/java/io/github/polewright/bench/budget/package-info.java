/** The budget command: what a chain takes of the callback period. */
@NullMarked
package io.github.polewright.bench.budget;

import org.jspecify.annotations.NullMarked;
