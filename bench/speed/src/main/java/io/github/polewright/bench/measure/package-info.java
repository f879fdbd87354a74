/** How time and allocation are taken: turns in one JVM, block by block into histograms, bytes of a thread. */
@NullMarked
package io.github.polewright.bench.measure;

import org.jspecify.annotations.NullMarked;
