/**
 * Find the frequency of the mains in what is heard, follow it, and remove its hum.
 *
 * <p>{@link io.github.polewright.mains.MainsFollower} only listens; {@link io.github.polewright.mains.HumRemover}
 * listens and removes. Both ride on the blocks of an audio callback and allocate nothing there.
 *
 * <p>Hum can be the sound of faulty wiring, a broken earth or a failing power supply. Removing the sound does not
 * remove the fault: where equipment hums anew, tingles or smells, switch it off and ask a licensed electrician. Nothing
 * here is meant for medical use.
 */
@NullMarked
package io.github.polewright.mains;

import org.jspecify.annotations.NullMarked;
