package io.github.polewright.samples.survey;

/** The mains frequency at a time of the recording. */
public record MainsMoment(double seconds, double frequencyHz) {}
