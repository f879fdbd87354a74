/** The contenders command: the ratios the library promises, taken in one run. */
@NullMarked
package io.github.polewright.bench.contest;

import org.jspecify.annotations.NullMarked;
