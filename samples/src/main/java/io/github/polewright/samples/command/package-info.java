/** The command line. */
@NullMarked
package io.github.polewright.samples.command;

import org.jspecify.annotations.NullMarked;
