package io.github.polewright.mains;

/**
 * The whole analysis: takes slabs at the sample rate, decimates them, searches, follows, and knows at any time the
 * phase, the lines and whether they may be removed. All channels share one phase; amplitudes are each channel's own.
 */
final class Tracker {

    private static final double SILENT_SHARE = 1e-3;
    private static final double JUMP_SHARE = 0.25;
    private static final double RIVAL_HZ = 1;
    private static final double NEAR_RIVAL_HZ = 0.3;
    private static final double SURE_HZ = 0.05;
    private static final double NOTE_CENTS = 10;
    private static final int MATCH_TICKS = 10;
    /** So many slabs of exact zeros are silence before a tick can tell. */
    private static final int ZERO_SLABS = 4;

    final Rates rates;
    final LineBank bank;
    final Innovation innovation;
    final Amplitudes amplitudes;
    final Presence presence;
    final FrequencyLoop loop = new FrequencyLoop();
    final Proof proof;
    private final Decimator[] decimators;
    private final ProposalFilter proposalFilter;
    private final Recent recent;
    private final Proposer proposer;
    private final FirstSecond firstSecond;
    private final double[][] analysis;
    private final double[] sample;
    private double phase;
    private double step;
    private double power;
    private double trialHz;
    private double tickSeconds = 0.02;
    private double moved;
    private int samples;
    private int ticks;
    private int untilMatch;
    private int zeroSlabs;
    private boolean silent;
    private boolean digital;
    private boolean ticked;

    Tracker(Rates rates, int channels, int lines) {
        this.rates = rates;
        bank = new LineBank(lines, channels);
        innovation = new Innovation(bank);
        amplitudes = new Amplitudes(bank, innovation);
        presence = new Presence(bank, amplitudes);
        proof = new Proof(presence);
        recent = new Recent(channels);
        proposer = new Proposer(rates, recent);
        firstSecond = new FirstSecond(rates, recent, bank, innovation, presence);
        proposalFilter = new ProposalFilter(channels);
        decimators = new Decimator[channels];
        for (int c = 0; c < channels; c++) {
            decimators[c] = new Decimator(rates);
        }
        analysis = new double[channels][rates.steps];
        sample = new double[channels];
    }

    void reset() {
        for (Decimator decimator : decimators) {
            decimator.reset();
        }
        proposalFilter.reset();
        recent.reset();
        proposer.reset();
        stopTrial();
        proof.reset();
    }

    /** Takes one whole slab of finite samples. */
    void slab(double[][] input) {
        for (int c = 0; c < decimators.length; c++) {
            decimators[c].run(input[c], rates.slabFrames, analysis[c]);
        }
        ticked = false;
        zeroSlabs = isZero(input) ? Math.min(zeroSlabs + 1, ZERO_SLABS) : 0;
        for (int s = 0; s < rates.steps; s++) {
            for (int c = 0; c < sample.length; c++) {
                sample[c] = analysis[c][s];
            }
            step();
        }
    }

    private boolean isZero(double[][] input) {
        for (double[] channel : input) {
            for (int n = 0; n < rates.slabFrames; n++) {
                if (channel[n] != 0) {
                    return false;
                }
            }
        }
        return true;
    }

    private void step() {
        if (proposalFilter.push(sample)) {
            recent.push(proposalFilter.output());
            propose();
        }
        if (proof.state() == MainsState.SEARCHING) {
            proof.searchSeconds(1 / rates.analysisHz);
            return;
        }
        bank.sample(sample);
        for (double x : sample) {
            power += x * x;
        }
        samples++;
        phase += step;
        if (phase >= 2 * Math.PI) {
            tick();
        }
    }

    private void propose() {
        boolean searching = proof.state() == MainsState.SEARCHING;
        boolean found = proposer.advance(searching);
        if (found && (searching || isRival(proposer.candidateHz()))) {
            startTrial(proposer.candidateHz());
        }
        if (!firstSecond.isIdle() && firstSecond.advance()) {
            proof.match(firstSecond.matches(tickSeconds));
        }
    }

    /** Whether a candidate may take the place of a trial without proof, or of a frequency that no line bears out. */
    private boolean isRival(double frequencyHz) {
        double away = Math.abs(frequencyHz - loop.frequencyHz());
        if (proof.state() == MainsState.HOLDING && !isSilent()) {
            return away > NEAR_RIVAL_HZ;
        }
        if (proof.hasDropped() && !isSilent()) {
            return away > RIVAL_HZ;
        }
        if (!proof.isSlow() || TemperedNotes.centsAway(frequencyHz) < NOTE_CENTS) {
            return false;
        }
        return away > RIVAL_HZ || (away > NEAR_RIVAL_HZ && presence.clearLines() < 3 && loop.uncertaintyHz() > SURE_HZ);
    }

    private void startTrial(double frequencyHz) {
        bank.reset();
        innovation.reset();
        amplitudes.reset();
        presence.reset();
        firstSecond.cancel();
        loop.start(frequencyHz);
        proof.begin(frequencyHz);
        trialHz = frequencyHz;
        phase = 0;
        ticks = 0;
        samples = 0;
        power = 0;
        untilMatch = 0;
        retune();
    }

    private void stopTrial() {
        firstSecond.cancel();
        bank.reset();
        presence.reset();
        silent = false;
    }

    private void tick() {
        tickSeconds = samples / rates.analysisHz;
        bank.close(samples);
        silent = power / samples < SILENT_SHARE * bank.meanPower();
        digital = silent && zeroSlabs > 0;
        loop.predict(tickSeconds);
        ticks++;
        moved = 0;
        if (ticks == 1) {
            amplitudes.adoptFirst();
        } else if (silent) {
            proof.silence(tickSeconds);
        } else {
            learn();
        }
        phase -= 2 * Math.PI;
        samples = 0;
        power = 0;
        ticked = true;
        if (proof.state() == MainsState.SEARCHING) {
            stopTrial();
        }
        retune();
    }

    private void learn() {
        boolean running = proof.holds() && !loop.isSettled();
        innovation.evaluate(ticks - 1, tickSeconds, loop.phaseVariance(), running);
        moved = loop.correct(innovation.radians(), innovation.phaseInformation(), tickSeconds);
        phase += moved;
        amplitudes.update(moved, tickSeconds, loop.isSettled());
        presence.update(moved, tickSeconds);
        proof.tick(tickSeconds, loop.frequencyHz(), jumped());
        if (proof.state() == MainsState.PROVING && firstSecond.isIdle() && recent.firstIsWhole() && --untilMatch <= 0) {
            boolean early = ticks * tickSeconds < 0.6;
            untilMatch = early ? 1 : MATCH_TICKS;
            firstSecond.begin(ticks % 2 == 0 ? trialHz : loop.frequencyHz());
        }
    }

    private boolean jumped() {
        int seen = 0;
        int jumping = 0;
        for (int i = 0; i < bank.size(); i++) {
            if (presence.held[i]) {
                seen++;
                boolean far = amplitudes.meanPower(i) > JUMP_SHARE * presence.remembered[i];
                jumping += far && amplitudes.changed(i) ? 1 : 0;
            }
        }
        return seen > 0 && 2 * jumping >= seen;
    }

    private void retune() {
        step = 2 * Math.PI * loop.frequencyHz() / rates.analysisHz;
        bank.tune(phase, step);
    }

    /** Phase of the fundamental at the first frame after the last slab, as the input will have it. */
    double nextPhase() {
        int frames = 1 + Decimator.delayFrames(rates) - rates.factor;
        return phase + step * frames / rates.factor;
    }

    /** Whether the last slab ended a tick. */
    boolean ticked() {
        return ticked;
    }

    /** Whether the input is silent beside the known hum. */
    boolean isSilent() {
        return zeroSlabs == ZERO_SLABS || (silent && !digital);
    }

    /** By how much the last tick moved the phase of the fundamental, beyond its running on. */
    double moved() {
        return moved;
    }

    double tickSeconds() {
        return tickSeconds;
    }

    int channels() {
        return sample.length;
    }
}
