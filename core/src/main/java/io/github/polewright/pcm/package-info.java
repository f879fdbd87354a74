/**
 * PCM bytes to samples and back: 8, 16, 24 and 32-bit integers, 32 and 64-bit floating point, both byte orders. No
 * method allocates, locks or throws on a sample's value, so all of it may run on the audio thread.
 */
@NullMarked
package io.github.polewright.pcm;

import org.jspecify.annotations.NullMarked;
