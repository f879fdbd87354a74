/** Entry point of the runnable jar: which command lines there are and what their exit statuses mean. */
@NullMarked
package io.github.polewright.bench;

import org.jspecify.annotations.NullMarked;
