package io.github.polewright.live;

/**
 * How far the retunes of a live cascade have got, as of its last block. Read while the audio thread runs, single figures
 * may already be those of the block after.
 *
 * @param settled whether the coefficients and the output gain stand still on the latest target
 * @param framesLeft frames until the glide under way ends, if nothing is held back; 0 when it has
 * @param stateBound by how much all changes together, of whatever age, can have multiplied the state of any section, in
 *     the norm that belongs to the section; a factor, at least 1
 * @param adopted orders the audio thread has taken up: retunes, bypasses and gains
 * @param superseded orders that a later one replaced before a block began
 * @param framesHeld frames for which coefficients were held back, since earlier changes had not died away yet
 */
public record RetuneStatus(
        boolean settled, long framesLeft, double stateBound, long adopted, long superseded, long framesHeld) {}
