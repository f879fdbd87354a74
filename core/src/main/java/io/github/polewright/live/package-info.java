/**
 * Running cascades: {@link io.github.polewright.live.LiveCascade} filters blocks on the audio thread and is retuned
 * from any other.
 *
 * <p>Where the work is done, for a reader who looks for the hot loop: {@code LiveCascade.process} cuts a block into
 * pieces that end at every 64th frame and where a ramp ends, loads a piece into a slab, and lets an {@code Engine} run
 * it. The engine picks the loops, a static method a shape:
 *
 * <table>
 * <caption>Loops</caption>
 * <tr><th>case</th><th>method</th><th>why it exists</th></tr>
 * </table>
 */
@NullMarked
package io.github.polewright.live;

import org.jspecify.annotations.NullMarked;
