package io.github.polewright.tone;

/**
 * One row of a grid: sixteen symbols sent again and again alike. Errors as a share of nominal and in hertz, levels in dB
 * of each tone, durations in seconds; an infinite ratio is no noise.
 */
record PairCase(
        String name,
        boolean read,
        double lowShare,
        double lowHz,
        double highShare,
        double highHz,
        double lowDb,
        double highDb,
        double tone,
        double pause,
        double signalToNoiseDb) {

    static final double NO_NOISE = Double.POSITIVE_INFINITY;

    /** Nominal, at -10 dB, 60 ms on and 50 ms off, without noise. */
    static PairCase of(String name, boolean read) {
        return new PairCase(name, read, 0, 0, 0, 0, -10, -10, 0.06, 0.05, NO_NOISE);
    }

    PairCase low(double share, double hertz) {
        return new PairCase(name, read, share, hertz, highShare, highHz, lowDb, highDb, tone, pause, signalToNoiseDb);
    }

    PairCase high(double share, double hertz) {
        return new PairCase(name, read, lowShare, lowHz, share, hertz, lowDb, highDb, tone, pause, signalToNoiseDb);
    }

    /** At the edges of the band that must be read, or between: -1, 0 or 1 for each tone. */
    PairCase edges(double low, double high) {
        return low(0.015 * low, 2 * low).high(0.015 * high, 2 * high);
    }

    PairCase levels(double low, double high) {
        return new PairCase(name, read, lowShare, lowHz, highShare, highHz, low, high, tone, pause, signalToNoiseDb);
    }

    PairCase lasting(double toneSeconds, double pauseSeconds) {
        return new PairCase(
                name,
                read,
                lowShare,
                lowHz,
                highShare,
                highHz,
                lowDb,
                highDb,
                toneSeconds,
                pauseSeconds,
                signalToNoiseDb);
    }

    PairCase noise(double db) {
        return new PairCase(name, read, lowShare, lowHz, highShare, highHz, lowDb, highDb, tone, pause, db);
    }

    /** All sixteen symbols so many times, in an order that changes both tones, clipped at full scale. */
    PairReadings at(double rateHz, int rounds) {
        PairSignal signal = new PairSignal(rateHz, 7);
        signal.pause(0.1);
        for (int i = 0; i < 16 * rounds; i++) {
            int k = i * 7 % 16;
            signal.pair(
                    PairSignal.SYMBOLS.charAt(k),
                    PairSignal.LOW_HZ[k / 4] * (1 + lowShare) + lowHz,
                    PairSignal.HIGH_HZ[k % 4] * (1 + highShare) + highHz,
                    lowDb,
                    highDb,
                    tone);
            signal.pause(pause + signal.random(0, 0.003));
        }
        signal.pause(0.1);
        if (signalToNoiseDb < 100) {
            // The ratio counts both tones.
            double mean = 10 * Math.log10((Math.pow(10, lowDb / 10) + Math.pow(10, highDb / 10)) / 2);
            signal.noise(mean, signalToNoiseDb);
        }
        return PairReadings.compare(signal.clipped(), PairReader.of(rateHz));
    }

    @Override
    public String toString() {
        return String.format(
                "%s: errors %+.1f %% %+.0f Hz and %+.1f %% %+.0f Hz, %.0f and %.0f dB, %.0f on %.0f off ms, noise %.0f dB",
                name,
                100 * lowShare,
                lowHz,
                100 * highShare,
                highHz,
                lowDb,
                highDb,
                1000 * tone,
                1000 * pause,
                signalToNoiseDb);
    }
}
