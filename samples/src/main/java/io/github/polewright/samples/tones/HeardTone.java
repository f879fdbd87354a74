package io.github.polewright.samples.tones;

/** One named tone while it sounded. */
public record HeardTone(double startSeconds, double endSeconds, double frequencyHz, double levelDbfs) {}
