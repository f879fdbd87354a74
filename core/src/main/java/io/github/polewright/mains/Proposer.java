package io.github.polewright.mains;

/**
 * Proposes fundamentals from the spectrum of the last second. It never decides: bass notes score as high as hum.
 *
 * <p>One slice of work a proposal sample: transforms of two channels at a time, floors, score, refinement.
 */
final class Proposer {

    private static final int QUICK_PACE = 125;
    private static final int SLOW_PACE = 250;
    private static final double QUICK_KEEP = 0.9;
    private static final double SLOW_KEEP = 0.81;
    private static final double THRESHOLD = 5;
    private static final double SAME_HZ = 0.15;

    private static final int LOAD_SLICES = 4;
    private static final int TRANSFORM_SLICES = LOAD_SLICES + Transform.STAGES;
    private static final int CHANNEL_SLICES = 1 + LineScore.FLOOR_SLICES;
    private static final int PAIR_SLICES = TRANSFORM_SLICES + 2 * CHANNEL_SLICES;

    private final Recent recent;
    private final Transform transform = new Transform();
    private final LineScore score;
    private final Refinement refinement;
    private final int pairs;
    private int length;
    private int slice = -1;
    private int wait;
    private boolean refining;
    private double lastHz;
    private double candidateHz = Double.NaN;
    private double strength;

    Proposer(Rates rates, Recent recent) {
        this.recent = recent;
        score = new LineScore(rates.proposalHz);
        refinement = new Refinement(rates.proposalHz, recent.channels);
        pairs = (recent.channels + 1) / 2;
    }

    void reset() {
        score.clear();
        slice = -1;
        wait = 0;
        refining = false;
        lastHz = 0;
        candidateHz = Double.NaN;
    }

    /** Does one slice; true if a candidate has just been found. */
    boolean advance(boolean searching) {
        wait++;
        if (refining) {
            refining = !refinement.advance();
            candidateHz = refinement.frequencyHz();
            return !refining;
        }
        if (slice < 0) {
            if (wait >= (searching ? QUICK_PACE : SLOW_PACE) && recent.filled() >= Recent.LENGTH / 2) {
                begin();
            }
            return false;
        }
        work(searching);
        return false;
    }

    double candidateHz() {
        return candidateHz;
    }

    double strength() {
        return strength;
    }

    private void begin() {
        wait = 0;
        slice = 0;
        length = recent.filled();
        score.begin(length);
    }

    private void work(boolean searching) {
        int pair = slice / PAIR_SLICES;
        int within = slice % PAIR_SLICES;
        int last = slice - pairs * PAIR_SLICES;
        slice++;
        if (last < 0) {
            pairSlice(pair, within);
        } else if (last < LineScore.GRID_SLICES) {
            score.grid(last);
        } else if (last == LineScore.GRID_SLICES) {
            score.accumulate(searching ? QUICK_KEEP : SLOW_KEEP);
        } else {
            slice = -1;
            strength = score.judge();
            double hz = score.peakHz();
            boolean again = strength > THRESHOLD && Math.abs(hz - lastHz) < SAME_HZ;
            lastHz = strength > THRESHOLD ? hz : 0;
            if (again && recent.filled() == Recent.LENGTH) {
                refinement.begin(hz, recent);
                refining = true;
            }
        }
    }

    private void pairSlice(int pair, int within) {
        if (within < LOAD_SLICES) {
            load(2 * pair, within);
        } else if (within < TRANSFORM_SLICES) {
            transform.stage(within - LOAD_SLICES);
        } else {
            int rest = within - TRANSFORM_SLICES;
            boolean second = rest >= CHANNEL_SLICES;
            int part = rest % CHANNEL_SLICES;
            if (second && 2 * pair + 1 >= recent.channels) {
                return;
            }
            if (part == 0) {
                score.unpack(transform, second);
            } else {
                score.floor(part - 1);
            }
        }
    }

    /** The ring runs on between the slices: a slice reads as far back as its first one did. */
    private void load(int channel, int part) {
        boolean two = channel + 1 < recent.channels;
        int from = part * Transform.POINTS / LOAD_SLICES;
        int to = from + Transform.POINTS / LOAD_SLICES;
        double turnReal = Math.cos(2 * Math.PI / length);
        double turnImaginary = Math.sin(2 * Math.PI / length);
        double re = Math.cos(2 * Math.PI * (from + 0.5) / length);
        double im = Math.sin(2 * Math.PI * (from + 0.5) / length);
        for (int i = from; i < to; i++) {
            int place = transform.place(i);
            double hann = i < length ? 0.5 - 0.5 * re : 0;
            int back = length + part;
            transform.real[place] = i < length ? hann * recent.at(channel, i, back) : 0;
            transform.imaginary[place] = i < length && two ? hann * recent.at(channel + 1, i, back) : 0;
            double turned = re * turnReal - im * turnImaginary;
            im = re * turnImaginary + im * turnReal;
            re = turned;
        }
    }
}
