package io.github.polewright.mains;

import java.util.Arrays;

/**
 * Which lines are there. A line is clear where its smoothed amplitude stands over its spread, held while programme
 * merely masks it, and gone where it would be seen if it were there (derived for this project).
 */
final class Presence {

    private static final double SMOOTH_SECONDS = 0.5;
    private static final double REMEMBER_SECONDS = 1;
    private static final double GONE_SECONDS = 0.4;
    private static final double VARIANCE_MARGIN = 1.5;
    private static final double SEEN = 12;
    private static final double UNSEEN = 4;
    private static final double KNOWN = 4;
    private static final double LEAST_SHARE = 0.12;

    /** Lines weaker than this beside a channel's strongest one, in power, are left alone. */
    private static final double LEAST_RELATIVE = 1e-6;
    /** Lines weaker than this prove nothing: a pure tone leaks as much into the others while the frequency is off. */
    private static final double LEAST_PROOF = 1e-3;

    /** Smoothed squared spread of the amplitude a tick: the programme. */
    final double[] spread;

    final double[] remembered;
    /** Stands over the programme now. */
    final boolean[] open;
    /** Open, or known well from the programme's gaps. */
    final boolean[] clear;

    final boolean[] held;
    private final LineBank bank;
    private final Amplitudes amplitudes;
    private final double[] re;
    private final double[] im;
    private final double[] goneSeconds;
    private final double[] cosine;
    private final double[] sine;
    private final double[] least;
    private int ticks;

    Presence(LineBank bank, Amplitudes amplitudes) {
        this.amplitudes = amplitudes;
        this.bank = bank;
        int size = bank.size();
        spread = new double[size];
        remembered = new double[size];
        open = new boolean[size];
        clear = new boolean[size];
        held = new boolean[size];
        re = new double[size];
        im = new double[size];
        goneSeconds = new double[size];
        least = new double[bank.channels];
        cosine = new double[bank.lines];
        sine = new double[bank.lines];
    }

    void reset() {
        for (int i = 0; i < re.length; i++) {
            re[i] = 0;
            im[i] = 0;
            spread[i] = 0;
            remembered[i] = 0;
            goneSeconds[i] = 0;
        }
        Arrays.fill(open, false);
        Arrays.fill(clear, false);
        Arrays.fill(held, false);
        ticks = 0;
    }

    /** Takes a tick; {@code radians} is by how much the phase was moved. */
    void update(double radians, double seconds) {
        ticks++;
        double keep = Math.max(1.0 / ticks, Math.min(1, seconds / SMOOTH_SECONDS));
        double effective = Math.min(ticks, 2 * SMOOTH_SECONDS / seconds);
        Powers.of(-radians, cosine, sine);
        for (int c = 0; c < bank.channels; c++) {
            least[c] = LEAST_RELATIVE * bank.strongest(c);
        }
        for (int k = 0; k < bank.lines; k++) {
            for (int i = k; i < bank.size(); i += bank.lines) {
                smooth(i, keep);
                judge(i, VARIANCE_MARGIN * spread[i] / effective, seconds);
                double turned = re[i] * cosine[k] - im[i] * sine[k];
                im[i] = re[i] * sine[k] + im[i] * cosine[k];
                re[i] = turned;
            }
        }
    }

    private void smooth(int i, double keep) {
        double stepRe = bank.re[i] + bank.newRe[i] - re[i];
        double stepIm = bank.im[i] + bank.newIm[i] - im[i];
        re[i] += keep * stepRe;
        im[i] += keep * stepIm;
        if (ticks > 1) {
            spread[i] +=
                    Math.max(1.0 / (ticks - 1), Math.min(keep, 1)) * (stepRe * stepRe + stepIm * stepIm - spread[i]);
        }
    }

    private void judge(int i, double variance, double seconds) {
        double power = power(i);
        double known = bank.power(i);
        boolean missing = power < UNSEEN * variance || power < LEAST_SHARE * remembered[i];
        boolean wouldShow = UNSEEN * variance < remembered[i] / 4;
        goneSeconds[i] = missing && wouldShow ? goneSeconds[i] + seconds : 0;
        boolean counts = ticks > 4 && known > least[i / bank.lines];
        open[i] = counts && power > SEEN * variance && power > 0;
        boolean learnt = counts && goneSeconds[i] == 0 && known > KNOWN * amplitudes.variance(i);
        clear[i] = open[i] || learnt;
        if (clear[i]) {
            double keep = remembered[i] > 0 ? Math.min(1, seconds / REMEMBER_SECONDS) : 1;
            remembered[i] += keep * (known - remembered[i]);
            held[i] = true;
        }
        if (goneSeconds[i] >= GONE_SECONDS) {
            held[i] = false;
        }
    }

    /** Squared smoothed amplitude. */
    double power(int i) {
        return re[i] * re[i] + im[i] * im[i];
    }

    /** Lines that are clear in at least one channel. */
    int clearLines() {
        int count = 0;
        for (int k = 0; k < bank.lines; k++) {
            if (clearLine(k)) {
                count++;
            }
        }
        return count;
    }

    /** Whether any line stands over the programme now. */
    boolean anyOpen() {
        boolean any = false;
        for (boolean one : open) {
            any |= one;
        }
        return any;
    }

    boolean clearLine(int line) {
        boolean any = false;
        for (int i = line; i < bank.size(); i += bank.lines) {
            any |= clear[i] && bank.power(i) > LEAST_PROOF / LEAST_RELATIVE * least[i / bank.lines];
        }
        return any;
    }

    /** Squared amplitude of all clear lines. */
    double clearPower() {
        double sum = 0;
        for (int i = 0; i < re.length; i++) {
            sum += clear[i] ? bank.power(i) : 0;
        }
        return sum;
    }

    /** The share of the remembered power whose lines are gone. */
    double goneShare() {
        double all = 0;
        double gone = 0;
        for (int i = 0; i < re.length; i++) {
            all += remembered[i];
            gone += held[i] ? 0 : remembered[i];
        }
        return all > 0 ? gone / all : 0;
    }
}
