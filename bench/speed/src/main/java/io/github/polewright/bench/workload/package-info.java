/** What is measured: a described chain, its cascade and its signals, and rigs that run one block of them at a time. */
@NullMarked
package io.github.polewright.bench.workload;

import org.jspecify.annotations.NullMarked;
