/**
 * Running cascades: {@link io.github.polewright.live.LiveCascade} filters blocks on the audio thread and is retuned
 * from any other.
 *
 * <p>Where the work is done, for a reader who looks for the hot loop: {@code LiveCascade.process} cuts a block into
 * pieces that end at every 64th frame and where a ramp ends, loads a piece into a slab, and lets an {@code Engine} run
 * it. The engine picks the loops, a static method a shape. All shapes of one form give the same output bit for bit.
 * Ratios are of the time a sample takes a section, without load and store, on a server processor of 2024.
 *
 * <table>
 * <caption>Loops</caption>
 * <tr><th>case</th><th>method</th><th>why it exists</th></tr>
 * <tr><td>direct form I, one channel, two sections</td><td>{@code RawDirectForm1.pair}</td>
 * <td>half the delay lines and half the waiting: 0.75 of {@code one}; four at once gain nothing more and spill</td></tr>
 * <tr><td>direct form I, one channel, the odd section</td><td>{@code RawDirectForm1.one}</td>
 * <td>the remainder of the pairs; one multiply-add a frame on the loop</td></tr>
 * <tr><td>direct form I, two channels, one section</td><td>{@code RawDirectForm1.stereo}</td>
 * <td>two independent loops at once: 0.88 of {@code pair}; two sections on top spill with 16 registers</td></tr>
 * <tr><td>transposed direct form II, one channel</td><td>{@code RawTransposed.pair}, {@code one}</td>
 * <td>as above; s2 is put into s1, so the loop waits for one multiply-add instead of two</td></tr>
 * <tr><td>transposed direct form II, two channels</td><td>{@code RawTransposed.stereo}</td>
 * <td>0.90 of {@code pair} a channel, 0.77 with 16 registers</td></tr>
 * <tr><td>glide, the odd channel</td><td>{@code RawGlide.one}</td>
 * <td>coefficients worked out beside the samples: for one channel arrays of them cost more than they save</td></tr>
 * <tr><td>glide, two channels</td><td>{@code RawGlide.coefficients}, {@code stereo}</td>
 * <td>coefficients worked out once for all channels, in vectors; 0.60 of doing it in the loop with 16 registers</td></tr>
 * <tr><td>32 channels and 8 sections or more, any motion</td><td>{@code Rows}, {@code RawRows}</td>
 * <td>a frame at a time, channels in vectors: 0.9 of {@code stereo} steady and 0.6 gliding at 32 channels, 0.7 and 0.5
 * at 64, although the slab has to be turned and turned back</td></tr>
 * </table>
 */
@NullMarked
package io.github.polewright.live;

import org.jspecify.annotations.NullMarked;
