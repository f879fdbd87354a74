package io.github.polewright.tone;

/**
 * From hops to symbols: a run of good hops qualifies a symbol, which then stays on until its power has been away for
 * the release time. Fixed state, no allocation. Rules and constants derived for this project.
 */
final class PairTracker {

    /** A 23 ms tone gives at most 9 good hops, a 40 ms tone at least 15. */
    private static final int QUALIFYING_HOPS = 12;

    private static final int LOOK_BACK_HOPS = 12;

    /** At the first good hop the window is 80 to 90 % filled: this share of its power is half the final amplitude. */
    private static final double START_SHARE = 0.33;

    /** Greatest ratio of a tone's powers within a run, about 4 dB. */
    private static final double STEADY = 2.5;

    /** The first good hop of a run sees a window that is still filling: it says nothing about steadiness or share. */
    private static final int FILLING_HOPS = 1;

    /** Only a dip below this share of the run's peak energy may be bridged: sound that goes on is no interruption. */
    private static final double DIP = 0.9;

    private static final double LEAST_WEAKER = 0.02;
    private static final double FULL = 0.7;

    private final double[] tolerance = new double[PairSpectrum.TONES];
    private final double leastTwist;
    private final double greatestTwist;
    private final double leastPower;
    private final int releaseHops;
    private final PairSink sink;

    // The run that may become a symbol.
    private final PairSums run = new PairSums();
    private boolean running;
    private int runCount;
    private int runMisses;
    private double runStart;
    private double runPeakEnergy;
    private double runPower;
    private double runEnergy;
    private double lowLeast;
    private double lowGreatest;
    private double highLeast;
    private double highGreatest;

    // The symbol that is on.
    private final PairSums symbol = new PairSums();
    private boolean on;
    private double start;
    private double end;
    private double reference;
    private int absent;

    PairTracker(double hopSeconds, double[] frequenciesHz, PairLimits limits, PairSink sink) {
        for (int k = 0; k < PairSpectrum.TONES; k++) {
            tolerance[k] = Math.tan(2 * Math.PI * hopSeconds * limits.meanToleranceHz(frequenciesHz[k]));
        }
        leastTwist = limits.leastMeanTwist();
        greatestTwist = limits.greatestMeanTwist();
        // For sines alone the sum of their squared amplitudes is twice the mean square.
        leastPower = 2 * limits.leastShare();
        releaseHops = Math.max(1, (int) Math.round(limits.releaseSeconds() / hopSeconds));
        this.sink = sink;
    }

    void reset() {
        running = false;
        on = false;
    }

    void hop(PairHop hop, long index) {
        boolean accepted = qualify(hop, index);
        if (on && accepted && !symbol.sameAs(run)) {
            sink.ended(symbol, start, Math.min(absent > 0 ? end : index, runStart), index);
            on = false;
        }
        if (on) {
            follow(hop, index);
        } else if (accepted) {
            on = true;
            absent = 0;
            start = runStart;
            reference = hop.tonePower(run.low) + hop.tonePower(run.high);
            symbol.copyAdvance(run);
            symbol.addPower(hop);
            sink.began(symbol, start, index);
        }
    }

    /** Lengthens, restarts or drops the run; true if it qualifies at this hop. */
    private boolean qualify(PairHop hop, long index) {
        if (!hop.good) {
            runMisses++;
            running &= runMisses < releaseHops && hop.energy <= DIP * runPeakEnergy;
            return false;
        }
        if (running && run.low == hop.low && run.high == hop.high && isSteady(hop)) {
            runCount++;
            runPeakEnergy = Math.max(runPeakEnergy, hop.energy);
        } else {
            begin(hop, index);
        }
        runMisses = 0;
        if (runCount > FILLING_HOPS) {
            widen(hop);
        }
        run.add(hop);
        return runCount >= QUALIFYING_HOPS
                && runPower >= leastPower * runEnergy
                && run.isNear(tolerance[run.low], tolerance[run.high])
                && run.isBalanced(leastTwist, greatestTwist);
    }

    private void widen(PairHop hop) {
        runPower += hop.lowPower + hop.highPower;
        runEnergy += hop.energy;
        double lowPower = hop.tonePower(hop.low);
        double highPower = hop.tonePower(hop.high);
        lowLeast = Math.min(lowLeast, lowPower);
        lowGreatest = Math.max(lowGreatest, lowPower);
        highLeast = Math.min(highLeast, highPower);
        highGreatest = Math.max(highGreatest, highPower);
    }

    private boolean isSteady(PairHop hop) {
        double lowPower = hop.tonePower(hop.low);
        double highPower = hop.tonePower(hop.high);
        return Math.max(lowGreatest, lowPower) <= STEADY * Math.min(lowLeast, lowPower)
                && Math.max(highGreatest, highPower) <= STEADY * Math.min(highLeast, highPower);
    }

    private void begin(PairHop hop, long index) {
        running = true;
        run.clear(hop.low, hop.high);
        runCount = 1;
        runStart = startBefore(hop, index);
        runPeakEnergy = hop.energy;
        runPower = 0;
        runEnergy = 0;
        lowLeast = Double.POSITIVE_INFINITY;
        highLeast = Double.POSITIVE_INFINITY;
        lowGreatest = 0;
        highGreatest = 0;
    }

    /** The hop, and fraction, at which the amplitude passed half its final value on the way to this hop. */
    private static double startBefore(PairHop hop, long index) {
        double threshold = START_SHARE * hop.pairPower(hop.low, hop.high, 0);
        for (int ago = 1; ago <= LOOK_BACK_HOPS; ago++) {
            double before = hop.pairPower(hop.low, hop.high, ago);
            if (before < threshold) {
                return index - ago + Crossing.between(before, hop.pairPower(hop.low, hop.high, ago - 1), threshold);
            }
        }
        return index - LOOK_BACK_HOPS;
    }

    private void follow(PairHop hop, long index) {
        double lowPower = hop.tonePower(symbol.low);
        double highPower = hop.tonePower(symbol.high);
        double both = lowPower + highPower;
        if (hop.good && hop.low == symbol.low && hop.high == symbol.high) {
            reference = Math.max(reference, both);
            if (both >= FULL * reference) {
                symbol.addPower(hop);
            }
        }
        boolean present = both >= reference / 4
                && Math.min(lowPower, highPower) >= LEAST_WEAKER * reference
                && both >= hop.energy;
        if (present) {
            absent = 0;
            return;
        }
        if (absent++ == 0) {
            double before = hop.pairPower(symbol.low, symbol.high, 1);
            end = index - 1 + Crossing.between(before, both, reference / 4);
        }
        if (absent >= releaseHops) {
            sink.ended(symbol, start, end, index);
            on = false;
            running = false;
        }
    }
}
