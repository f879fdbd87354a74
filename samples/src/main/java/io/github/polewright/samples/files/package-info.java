/** Recordings and other files: read them, and write them whole or not at all. */
@NullMarked
package io.github.polewright.samples.files;

import org.jspecify.annotations.NullMarked;
