package io.github.polewright.samples.survey;

/**
 * One line of the hum.
 *
 * @param harmonic 1 is the fundamental
 * @param levelDb its level over all channels, 0 dB being a sine of full scale
 * @param overFloorDb its power over that of what lies beside it, in a band of 1 Hz
 * @param steadyShare the share of the moments quiet enough to tell in which it stood as strong as on average
 */
public record HumLine(int harmonic, double frequencyHz, double levelDb, double overFloorDb, double steadyShare) {}
