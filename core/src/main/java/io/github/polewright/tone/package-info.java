/**
 * Named tones: {@link io.github.polewright.tone.ToneMeter their levels}, {@link
 * io.github.polewright.tone.CadenceReader their cadence}, and {@link io.github.polewright.tone.PairReader tone pairs}
 * after ITU-T Q.23 and Q.24.
 *
 * <p>One thread, the audio thread, feeds frames; another may drain the events, through a ring of fixed size. Nothing here
 * allocates, locks or waits while it is fed.
 *
 * <p><b>Caution</b> A tone in a channel proves nothing about who sent it, and every reader of tones can miss one or take
 * speech and music for one. Do not build alarms, emergency calls, access control or anything that protects people or
 * property on these readings alone.
 */
@NullMarked
package io.github.polewright.tone;

import org.jspecify.annotations.NullMarked;
