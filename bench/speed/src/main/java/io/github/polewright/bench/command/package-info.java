/** What the command lines share: options that describe a chain, where results go, how a failure ends. */
@NullMarked
package io.github.polewright.bench.command;

import org.jspecify.annotations.NullMarked;
