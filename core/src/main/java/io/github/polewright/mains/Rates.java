package io.github.polewright.mains;

/** The rates that follow from the sample rate: analysis near 4 kHz, proposals near 1 kHz, and slabs of a few steps. */
final class Rates {

    static final double LOWEST_HZ = 8000;
    static final double HIGHEST_HZ = 192000;
    /** Fundamentals the search looks at. */
    static final double LOWEST_MAINS_HZ = 45;

    static final double HIGHEST_MAINS_HZ = 65;
    static final int MOST_LINES = 20;
    /** Analysis samples to one sample of the search for proposals. */
    static final int PROPOSAL_FACTOR = 4;

    private static final double ANALYSIS_HZ = 4000;
    /** Seven harmonics of 65 Hz must lie below half the proposal rate. */
    private static final double LEAST_ANALYSIS_HZ = 3640;

    private static final int MOST_SLAB_FRAMES = 64;
    private static final int MOST_STEPS = 5;

    final double sampleRateHz;
    /** Frames to one analysis sample. */
    final int factor;
    /** Analysis samples in one slab. */
    final int steps;

    final int slabFrames;
    final double analysisHz;
    final double proposalHz;

    private Rates(double sampleRateHz) {
        this.sampleRateHz = sampleRateHz;
        int nearest = (int) Math.round(sampleRateHz / ANALYSIS_HZ);
        factor = sampleRateHz / nearest < LEAST_ANALYSIS_HZ ? nearest - 1 : nearest;
        steps = Math.max(1, Math.min(MOST_STEPS, MOST_SLAB_FRAMES / factor));
        slabFrames = factor * steps;
        analysisHz = sampleRateHz / factor;
        proposalHz = analysisHz / PROPOSAL_FACTOR;
    }

    static Rates of(double sampleRateHz) {
        if (!(sampleRateHz >= LOWEST_HZ && sampleRateHz <= HIGHEST_HZ)) {
            throw new IllegalArgumentException(
                    "sampleRateHz is " + sampleRateHz + "; it must be from " + LOWEST_HZ + " to " + HIGHEST_HZ);
        }
        return new Rates(sampleRateHz);
    }
}
