/** What listening for tones costs a channel. */
@NullMarked
package io.github.polewright.bench.tones;

import org.jspecify.annotations.NullMarked;
