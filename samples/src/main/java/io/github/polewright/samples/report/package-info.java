/** What was found and done, as a table, JSON, charts and a page. */
@NullMarked
package io.github.polewright.samples.report;

import org.jspecify.annotations.NullMarked;
