/** Tones in a recording: tone pairs of push-button dialling, or any that are named. */
@NullMarked
package io.github.polewright.samples.tones;

import org.jspecify.annotations.NullMarked;
