/**
 * Control threads and the audio thread of one live cascade, run against each other by jcstress. All cascades here are
 * three equal gains that jump in one frame, so that one output sample tells which coefficients made it: the cube of a
 * gain, or, were a set ever torn, some other product.
 *
 * <p>{@code java -jar bench/stress/target/polewright-stress.jar -m quick} takes about a minute.
 */
@NullMarked
package io.github.polewright.stress;

import org.jspecify.annotations.NullMarked;
