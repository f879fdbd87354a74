package io.github.polewright.bench.workload;

/**
 * Everything that makes a live rig.
 *
 * @param chain what runs
 * @param samples how samples come and go
 * @param signal what flows in
 * @param motion what the coefficients do
 */
public record Case(Chain chain, Samples samples, Signal signal, Motion motion) {

    /**
     * Noise in doubles through steady coefficients.
     *
     * @param chain what runs
     * @return the plain case
     */
    public static Case plain(Chain chain) {
        return new Case(chain, Samples.DOUBLE, Signal.NOISE, Motion.STEADY);
    }

    /**
     * Another format.
     *
     * @param format of the samples
     * @return the case
     */
    public Case with(Samples format) {
        return new Case(chain, format, signal, motion);
    }

    /**
     * Another signal.
     *
     * @param input what flows in
     * @return the case
     */
    public Case with(Signal input) {
        return new Case(chain, samples, input, motion);
    }

    /**
     * Another motion.
     *
     * @param change what the coefficients do
     * @return the case
     */
    public Case with(Motion change) {
        return new Case(chain, samples, signal, change);
    }

    /**
     * A live cascade for it.
     *
     * @return a fresh rig
     */
    public Rig live() {
        return new LiveRig(chain, new Tape(chain, samples, signal), motion);
    }

    /**
     * A textbook cascade for it, whose coefficients stand still.
     *
     * @return a fresh rig
     */
    public Rig objects() {
        return new ObjectRig(chain, new Tape(chain, samples, signal));
    }

    /** The case as a key: equal cases, equal texts. */
    @Override
    public String toString() {
        return chain.form() + ", " + chain.sections() + " sections, " + chain.channels() + " channels, "
                + chain.frames() + " frames, " + samples + " " + signal + " " + motion;
    }
}
