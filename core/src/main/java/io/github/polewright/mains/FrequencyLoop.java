package io.github.polewright.mains;

/**
 * A two-state Kalman filter of phase and frequency. Its drift grows at once, and for as long, as innovations agree with
 * each other (a ramp), and slowly to what a wandering generator needs. The constants were chosen for this project on
 * speech with hum at -10 to +10 dB.
 */
final class FrequencyLoop {

    private static final double FIRST_VARIANCE = 0.09;
    /** Of a quiet grid, in hertz squared a second; a generator of 250 mHz spread that forgets in 60 s has 2e-3. */
    private static final double DRIFT = 2e-4;

    /** What agreeing innovations add, in drifts times their square. */
    private static final double RUNNING = 0.5;

    private static final double MOST_LEARNT = 3.3;
    private static final double LEARN_PER_SECOND = 1;
    /** The mean of the normalised squares that is left as it is; 1 if the model were exact, 0.3 on a quiet grid. */
    private static final double EXPECTED_SQUARE = 0.8;

    private static final double MOST_SQUARE = 4;
    private static final double MOST_DRIFT = 1;
    private static final double MOST_STEP_HZ = 0.2;
    private static final double AGREE_SECONDS = 0.15;
    private static final double RISE_SECONDS = 0.08;
    private static final double FALL_SECONDS = 0.4;

    private static final double SETTLED = 10;

    private double frequencyHz;
    private double phaseVariance;
    private double cross;
    private double frequencyVariance;
    private double agreement;
    private double excess;
    /** Natural logarithm of the factor on the drift. */
    private double learnt;

    void start(double fromHz) {
        frequencyHz = fromHz;
        phaseVariance = 0.01;
        cross = 0;
        frequencyVariance = FIRST_VARIANCE;
        agreement = 0;
        excess = 1;
        learnt = 0;
    }

    /** A tick passes. */
    void predict(double seconds) {
        double turn = 2 * Math.PI * seconds;
        double strength = Math.max(1, excess);
        double drift = Math.min(DRIFT * (Math.exp(learnt) + RUNNING * (strength * strength - 1)), MOST_DRIFT);
        phaseVariance += 2 * turn * cross + turn * turn * frequencyVariance;
        cross += turn * frequencyVariance;
        frequencyVariance = Math.min(frequencyVariance + drift * seconds, FIRST_VARIANCE);
        double most = Math.sqrt(phaseVariance * frequencyVariance);
        cross = Math.min(cross, 0.999 * most);
    }

    /** Variance of the phase, in radians squared. */
    double phaseVariance() {
        return phaseVariance;
    }

    /** Takes a phase error with its information; returns by how much the phase moves. */
    double correct(double radians, double information, double seconds) {
        if (!(information > 1e-12)) {
            return 0;
        }
        double innovationVariance = phaseVariance + 0.5 / information;
        double phaseGain = phaseVariance / innovationVariance;
        double frequencyGain = cross / innovationVariance;
        watch(radians / Math.sqrt(innovationVariance), seconds);
        double step = frequencyGain * radians;
        frequencyHz += Math.max(-MOST_STEP_HZ, Math.min(MOST_STEP_HZ, step));
        frequencyVariance -= frequencyGain * cross;
        cross -= phaseGain * cross;
        phaseVariance -= phaseGain * phaseVariance;
        return phaseGain * radians;
    }

    private void watch(double normalized, double seconds) {
        agreement += Math.min(1, seconds / AGREE_SECONDS) * (normalized - agreement);
        double square = agreement * agreement * 2 * AGREE_SECONDS / seconds;
        double surprise = Math.min(MOST_SQUARE, square) - EXPECTED_SQUARE;
        learnt = Math.max(0, Math.min(MOST_LEARNT, learnt + LEARN_PER_SECOND * seconds * surprise));
        double pace = square > excess ? RISE_SECONDS : FALL_SECONDS;
        excess += Math.min(1, seconds / pace) * (square - excess);
    }

    /** Whether phase errors do not agree with each other: the frequency does not run. */
    boolean isSettled() {
        return excess < SETTLED;
    }

    double frequencyHz() {
        return frequencyHz;
    }

    double uncertaintyHz() {
        return Math.sqrt(frequencyVariance * Math.max(1, excess));
    }
}
