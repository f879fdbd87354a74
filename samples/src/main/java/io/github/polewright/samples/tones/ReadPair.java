package io.github.polewright.samples.tones;

/** One symbol that was read: when, and what its two tones were like on average. Levels are those of the tone's sine. */
public record ReadPair(
        double startSeconds,
        double endSeconds,
        String symbol,
        double lowLevelDbfs,
        double highLevelDbfs,
        double twistDb,
        double lowErrorHz,
        double highErrorHz,
        double lowErrorPercent,
        double highErrorPercent) {}
