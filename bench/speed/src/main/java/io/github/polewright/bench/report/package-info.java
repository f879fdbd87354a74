/** What a command hands back: the machine it ran on, rows of numbers with their spread, tables, files and charts. */
@NullMarked
package io.github.polewright.bench.report;

import org.jspecify.annotations.NullMarked;
