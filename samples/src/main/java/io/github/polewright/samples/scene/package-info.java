/** An invented scene, synthesised, with hum of known frequency under it. */
@NullMarked
package io.github.polewright.samples.scene;

import org.jspecify.annotations.NullMarked;
