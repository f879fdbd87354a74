package io.github.polewright.samples.clean;

/**
 * How a recording is to be cleaned.
 *
 * @param mainsHz where to look for hum, or 0 for the surroundings of 50 and of 60 Hz
 * @param harmonics the highest harmonic to take out
 * @param widthHz the width of each notch
 * @param removeDc whether DC goes too
 * @param fixed whether the notches stay where the survey has them, instead of following the mains
 */
public record CleanWish(double mainsHz, int harmonics, double widthHz, boolean removeDc, boolean fixed) {}
