/** What is in a recording: its DC offset, and whether mains hum is there. */
@NullMarked
package io.github.polewright.samples.survey;

import org.jspecify.annotations.NullMarked;
