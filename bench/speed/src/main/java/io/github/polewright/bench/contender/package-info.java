/** What a live cascade is measured against: the textbook filter, an object a section, a call a sample a section. */
@NullMarked
package io.github.polewright.bench.contender;

import org.jspecify.annotations.NullMarked;
