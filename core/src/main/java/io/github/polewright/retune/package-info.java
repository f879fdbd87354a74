/**
 * From one cascade to another while it runs: {@link io.github.polewright.retune.Glide a glide} is a path whose effect
 * is bounded before its first sample is computed. Its {@link io.github.polewright.retune.Certificate certificate} says
 * by which rule and by how much, {@link io.github.polewright.retune.Bucket the bucket} holds back what many glides
 * together could do, and {@link io.github.polewright.retune.Walk the walk} is how an audio thread goes along it.
 *
 * <p><b>Where to start</b> A user of a live cascade needs {@link io.github.polewright.retune.Pace} (how long and how
 * evenly), {@link io.github.polewright.retune.Glide} with its {@link io.github.polewright.retune.Certificate} (what will
 * happen and what it can do), {@link io.github.polewright.retune.CascadeDesign} and {@link
 * io.github.polewright.retune.Setting} (a glide through a design of one's own), and at times {@link
 * io.github.polewright.retune.Pairing} (which section becomes which). {@link io.github.polewright.retune.Walk}, {@link
 * io.github.polewright.retune.Bucket} and {@link io.github.polewright.retune.Distance} are for building an engine of
 * one's own; the live cascade has them inside.
 *
 * <p>That every coefficient set on the way is stable bounds nothing: two stable sets in alternation can grow without
 * limit. Published results on this: J. Laroche, "On the stability of time-varying recursive filters", JAES 55(6),
 * 2007 (one change of basis in which every state matrix contracts); R. Shorten and K. Narendra, IEEE Transactions on
 * Automatic Control, 2003, and M. Akar and K. Narendra, International Journal of Adaptive Control and Signal
 * Processing 16, 2002 (when two second-order systems share a quadratic norm); K. Werner and R. McClellan, DAFx-22, A.
 * Wishnick, DAFx-14, and A. Carini, V. Mathews and G. Sicuranza, IEEE Transactions on Signal Processing 47(9), 1999
 * (other sufficient conditions); L. Zetterberg and Q. Zhang, 1988, R. Rabenstein, 1988, and V. Valimaki and T.
 * Laakso, IEEE Transactions on Signal Processing 46(12), 1998 (setting the state at a change). The forms used here,
 * the hyperbolic path length, the ramp length, the bucket and the forced bound were derived for this project.
 */
@NullMarked
package io.github.polewright.retune;

import org.jspecify.annotations.NullMarked;
