/** The benchmarks, one class a contender, all on the same parameters. */
@NullMarked
package io.github.polewright.bench.jmh;

import org.jspecify.annotations.NullMarked;
