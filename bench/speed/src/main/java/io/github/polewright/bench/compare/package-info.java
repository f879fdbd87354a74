/** The compare command: two reports side by side. */
@NullMarked
package io.github.polewright.bench.compare;

import org.jspecify.annotations.NullMarked;
