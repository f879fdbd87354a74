package io.github.polewright.mains;

/**
 * Asks whether the lines were already there, as strong as now, in the first second of sound: hum is, a bass note seldom
 * (derived for this project). Half a line's second is one slice.
 */
final class FirstSecond {

    private static final int LINES = 6;
    private static final double START_SECONDS = 0.2;

    private final Recent recent;
    private final LineBank bank;
    private final Innovation innovation;
    private final Presence presence;
    private final double proposalHz;
    private final int startSamples;
    private final double[] sumRe;
    private final double[] sumIm;
    private final double[] startPower = new double[LINES];
    private final double[] wholePower = new double[LINES];
    private double frequencyHz;
    private int slice = -1;

    FirstSecond(Rates rates, Recent recent, LineBank bank, Innovation innovation, Presence presence) {
        this.recent = recent;
        this.bank = bank;
        this.innovation = innovation;
        this.presence = presence;
        proposalHz = rates.proposalHz;
        startSamples = (int) Math.round(START_SECONDS * proposalHz);
        sumRe = new double[recent.channels];
        sumIm = new double[recent.channels];
    }

    boolean isIdle() {
        return slice < 0;
    }

    void begin(double fromHz) {
        frequencyHz = fromHz;
        slice = 0;
    }

    void cancel() {
        slice = -1;
    }

    /** Does one slice; true when the answer is ready in {@link #matches}. */
    boolean advance() {
        int half = Recent.LENGTH / 2;
        int line = slice / 2;
        if (slice % 2 == 0) {
            clear();
            demodulate(line + 1, 0, startSamples);
            startPower[line] = power(startSamples);
            demodulate(line + 1, startSamples, half);
        } else {
            demodulate(line + 1, half, Recent.LENGTH);
            wholePower[line] = power(Recent.LENGTH);
        }
        slice++;
        if (slice == 2 * LINES) {
            slice = -1;
            return true;
        }
        return false;
    }

    private void clear() {
        for (int c = 0; c < sumRe.length; c++) {
            sumRe[c] = 0;
            sumIm[c] = 0;
        }
    }

    private double power(int samples) {
        double sum = 0;
        for (int c = 0; c < sumRe.length; c++) {
            sum += sumRe[c] * sumRe[c] + sumIm[c] * sumIm[c];
        }
        return sum * 4 / ((double) samples * samples);
    }

    private void demodulate(int harmonic, int from, int to) {
        double w = 2 * Math.PI * harmonic * frequencyHz / proposalHz;
        double turnRe = Math.cos(w);
        double turnIm = -Math.sin(w);
        for (int c = 0; c < sumRe.length; c++) {
            double re = Math.cos(w * from);
            double im = -Math.sin(w * from);
            double[] x = recent.first[c];
            for (int i = from; i < to; i++) {
                sumRe[c] += x[i] * re;
                sumIm[c] += x[i] * im;
                double turned = re * turnRe - im * turnIm;
                im = re * turnIm + im * turnRe;
                re = turned;
            }
        }
    }

    /** Whether two thirds of the clear low lines stood in the first second as they stand now. */
    boolean matches(double tickSeconds) {
        int seen = 0;
        int alike = 0;
        int sharp = 0;
        for (int k = 0; k < Math.min(LINES, bank.lines); k++) {
            if (!presence.clearLine(k)) {
                continue;
            }
            seen++;
            double now = 0;
            double noise = 0;
            for (int i = k; i < bank.size(); i += bank.lines) {
                now += bank.power(i);
                noise += innovation.noise[i];
            }
            double level = Math.sqrt(now);
            double perSecond = Math.sqrt(noise * tickSeconds / 2);
            double wholeSigma = perSecond / level;
            double startSigma = perSecond / Math.sqrt(START_SECONDS) / level;
            boolean whole = within(Math.sqrt(wholePower[k]) / level, 0.8, 1.25, wholeSigma);
            boolean start = within(Math.sqrt(startPower[k]) / level, 0.75, 1.33, startSigma);
            if (whole && start) {
                alike++;
                sharp += startSigma < 0.35 ? 1 : 0;
            }
        }
        return seen >= 2 && 3 * alike >= 2 * seen && sharp >= 2;
    }

    private static boolean within(double ratio, double low, double high, double sigma) {
        return ratio > low - 2 * sigma && ratio < high + 2 * sigma;
    }
}
