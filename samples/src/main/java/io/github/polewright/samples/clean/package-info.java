/** Takes DC and hum out of a recording, streaming it through a live cascade. */
@NullMarked
package io.github.polewright.samples.clean;

import org.jspecify.annotations.NullMarked;
