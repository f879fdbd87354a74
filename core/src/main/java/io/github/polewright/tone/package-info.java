/**
 * Named tones: {@link io.github.polewright.tone.ToneMeter their levels}, {@link
 * io.github.polewright.tone.CadenceReader their cadence}, and {@link io.github.polewright.tone.PairReader tone pairs}
 * after ITU-T Q.23 and Q.24.
 *
 * <p>One thread, the audio thread, feeds frames; another may drain the events, through a ring of fixed size. Nothing here
 * allocates, locks or waits while it is fed.
 *
 * <p><b>Resonator or Goertzel</b> For eight tones of one channel at 8 kHz, a microsecond in 10 ms being 0.01 % of the time
 * (command {@code tones} of the bench, one core of an AMD EPYC, OpenJDK 17):
 *
 * <table>
 * <caption>Cost of the two recursions</caption>
 * <tr><th>recursion</th><th>a reading every</th><th>µs in 10 ms</th></tr>
 * <tr><td>resonators, the whole meter</td><td>1 ms</td><td>1.5</td></tr>
 * <tr><td>Goertzel, textbook, windows end to end</td><td>18 ms</td><td>0.9</td></tr>
 * <tr><td>Goertzel, textbook, windows that overlap</td><td>2 ms</td><td>8.8</td></tr>
 * <tr><td>Goertzel under Hann windows, the whole pair reader</td><td>2 ms</td><td>5.0</td></tr>
 * </table>
 *
 * <p>So levels that are followed all the time come from resonators, and Goertzel recursions would only pay where one
 * reading a window is enough. The pair reader runs them all the same: its tests need a window that ends, whose side lobes
 * keep the two groups apart, and which forgets a loud past at once.
 *
 * <p><b>Caution</b> A tone in a channel proves nothing about who sent it, and every reader of tones can miss one or take
 * speech and music for one. Do not build alarms, emergency calls, access control or anything that protects people or
 * property on these readings alone.
 */
@NullMarked
package io.github.polewright.tone;

import org.jspecify.annotations.NullMarked;
