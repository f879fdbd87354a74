/**
 * Control threads and the audio thread of one live cascade, run against each other by jcstress. All cascades here are
 * three equal gains that jump in one frame, so that one output sample tells which coefficients made it: the cube of a
 * gain, or, were a set ever torn, some other product.
 *
 * <p>Two actors each, so that they run where there are two processors. {@code java -jar
 * bench/stress/target/polewright-stress.jar} runs every way of compiling them, for hours; with {@code -m quick -sc false
 * -af NONE -f 1 -jvmArgs -Xms64m} it runs one JVM a test, within a minute.
 */
@NullMarked
package io.github.polewright.stress;

import org.jspecify.annotations.NullMarked;
