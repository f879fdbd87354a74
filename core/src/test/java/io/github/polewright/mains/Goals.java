package io.github.polewright.mains;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Random;

/**
 * The goals as measurements. {@link GoalsTableTest} prints the table; it takes the speech of the folder that the system
 * property {@code polewright.recordings} names as well, if it is set.
 */
final class Goals {

    /** One measured figure against its goal: {@code figure <= limit} is kept. */
    record Figure(String goal, double figure, double limit, String unit) {
        boolean isKept() {
            return figure <= limit;
        }

        @Override
        public String toString() {
            String word = isKept() ? "kept  " : "MISSED";
            return String.format(Locale.ROOT, "%s %-66s %9.2f (at most %8.2f) %s", word, goal, figure, limit, unit);
        }
    }

    /** A clean programme at its rate. */
    record Clean(String name, double sampleRateHz, double[] samples) {}

    private Goals() {}

    static Clean speech(int seed, double seconds) {
        return new Clean("speech-like " + seed, 16000, Programme.speech(16000, seconds, seed));
    }

    /** Removal against the best comb that knows the true phase, and the frequency error on the way. */
    static List<Figure> removal(
            Clean clean, double meanHz, double sigmaHz, double levelDb, double[] amplitudes, int seed) {
        double rate = clean.sampleRateHz();
        double seconds = clean.samples().length / rate;
        Hum hum = Hum.of(rate, Hum.wander(rate, seconds, meanHz, sigmaHz, 60, seed), amplitudes, seed)
                .scaledTo(clean.samples(), levelDb);
        double[] input = Measure.add(clean.samples(), hum.samples);
        Trace notches = Trace.of(input, rate, Removal.NOTCHES);
        Trace subtraction = Trace.of(input, rate, Removal.SUBTRACTION);
        double following = subtraction.followingAfter(0);
        // Removal is measured from 2 s on, or once it has begun where the proof takes longer.
        int from = (int) ((following > 2 ? following + 0.5 : 2) * rate);
        double best = Double.NEGATIVE_INFINITY;
        for (double width : OracleComb.WIDTHS_HZ) {
            double[] output = OracleComb.remove(input, hum, width);
            best = Math.max(best, Measure.siSdr(clean.samples(), output, from, output.length));
        }
        double a = Measure.siSdr(clean.samples(), notches.output, from, input.length);
        double b = Measure.siSdr(clean.samples(), subtraction.output, from, input.length);
        String name = String.format(
                Locale.ROOT, "%s, %.1f Hz s %.0f mHz %+.0f dB", clean.name(), meanHz, 1000 * sigmaHz, levelDb);
        boolean generator = sigmaHz > 0.2;
        List<Figure> figures = new ArrayList<>();
        double found = subtraction.foundAfter(0, hum.frequencyHz);
        boolean note = TemperedNotes.centsAway(hum.frequencyHz[(int) rate]) < 15;
        figures.add(new Figure(name + ": found at", found, levelDb < -6 ? 2 : 1.5, "s"));
        figures.add(new Figure(name + ": following at", following, note || levelDb < -6 ? 4 : 2, "s"));
        figures.add(new Figure(name + ": notches under best known phase", best - a, generator ? 5 : 2, "dB"));
        figures.add(new Figure(name + ": subtraction under best known phase", best - b, -3, "dB"));
        double early = 1000 * subtraction.worstError(found + 1, found + 1.2, hum.frequencyHz);
        double late = 1000 * subtraction.rmsError(found + 5, seconds, hum.frequencyHz);
        double ease = levelDb < 0 || generator ? 2 : 1;
        figures.add(new Figure(name + ": error 1 s after found", early, 20 * ease, "mHz"));
        figures.add(new Figure(name + ": rms error from 5 s", late, 10 * ease, "mHz"));
        return figures;
    }

    /** Hum drawn at random: offsets to 0.8 Hz, wander of 20 to 250 mHz, 12 to 20 lines, -10 to +10 dB. */
    static List<Figure> drawn(Clean clean, int seed) {
        Random random = new Random(1000L * seed);
        double meanHz = (random.nextBoolean() ? 50 : 60) + random.nextDouble() * 1.6 - 0.8;
        double sigmaHz = new double[] {0.02, 0.03, 0.05, 0.1, 0.25}[random.nextInt(5)];
        int lines = 12 + random.nextInt(9);
        double levelDb = new double[] {-10, -6, 0, 6, 10}[random.nextInt(5)];
        double[] amplitudes = random.nextInt(3) == 0 ? Hum.flat(lines) : Hum.mixed(lines, seed);
        return removal(clean, meanHz, sigmaHz, levelDb, amplitudes, seed);
    }

    static List<Figure> ramp(Clean clean, double hertzPerSecond, double length, double mostLag, int seed) {
        double rate = clean.sampleRateHz();
        double seconds = clean.samples().length / rate;
        double[] track = Hum.ramp(rate, seconds, 50.1, 50.1 + hertzPerSecond * length, 8, 8 + length);
        Hum hum = Hum.of(rate, track, Hum.mixed(12, seed), seed).scaledTo(clean.samples(), 0);
        Trace trace = Trace.of(Measure.add(clean.samples(), hum.samples), rate, Removal.SUBTRACTION);
        String name = String.format(Locale.ROOT, "%s, ramp %.2f Hz/s: ", clean.name(), hertzPerSecond);
        double lag = 1000 * trace.worstError(8.2, 8 + length, track);
        double after = 1000 * trace.rmsError(9 + length, seconds, track);
        return List.of(
                new Figure(name + "largest error", lag, mostLag, "mHz"),
                new Figure(name + "rms error from 1 s after", after, 10, "mHz"));
    }

    /** The European split of 8 January 2021: 50.03 to 49.74 Hz in 15 s. */
    static List<Figure> split(Clean clean, int seed) {
        double rate = clean.sampleRateHz();
        double[] track = Hum.ramp(rate, clean.samples().length / rate, 50.03, 49.74, 8, 23);
        Hum hum = Hum.of(rate, track, Hum.mixed(12, seed), seed).scaledTo(clean.samples(), 0);
        Trace trace = Trace.of(Measure.add(clean.samples(), hum.samples), rate, Removal.SUBTRACTION);
        return List.of(new Figure(
                clean.name() + ", European split: largest error", 1000 * trace.worstError(8, 25, track), 80, "mHz"));
    }

    /** The hum's level changes by a factor at 9 s; 0 is a stop. */
    static List<Figure> step(Clean clean, double factor, Removal way, int seed) {
        double rate = clean.sampleRateHz();
        double seconds = clean.samples().length / rate;
        double at = 9.2;
        Hum hum = Hum.of(rate, Hum.wander(rate, seconds, 50.02, 0.02, 60, seed), Hum.mixed(12, seed), seed)
                .scaledTo(clean.samples(), 0);
        double before = Measure.power(hum.samples, 0, (int) (at * rate));
        for (int n = (int) (at * rate); n < hum.samples.length; n++) {
            hum.samples[n] *= factor;
        }
        Trace trace = Trace.of(Measure.add(clean.samples(), hum.samples), rate, way);
        int from = trace.sample(at);
        int half = trace.sample(at + 0.5);
        double first = Measure.db(Measure.differencePower(trace.output, clean.samples(), from, half) / before);
        double later = Measure.db(
                Measure.differencePower(trace.output, clean.samples(), trace.sample(at + 1.5), trace.sample(seconds))
                        / before);
        double added = Measure.db(Measure.power(trace.output, from, half) / Measure.power(clean.samples(), from, half));
        String name = String.format(Locale.ROOT, "%s, hum times %.1f, %s: ", clean.name(), factor, way);
        List<Figure> figures = new ArrayList<>();
        figures.add(new Figure(name + "residue over hum before, first 0.5 s", first, -2, "dB"));
        figures.add(new Figure(name + "residue over hum before, from 1.5 s", later, -15, "dB"));
        if (factor == 0) {
            figures.add(new Figure(name + "output over clean, first 0.5 s", added, 2, "dB"));
            double gone = Double.POSITIVE_INFINITY;
            for (int r = trace.readings.length - 1; r >= 0 && !Trace.isProven(trace.readings[r]); r--) {
                gone = r * Trace.STEP_SECONDS - at;
            }
            figures.add(new Figure(name + "let go after", gone, 4, "s"));
        }
        return figures;
    }

    /** Five seconds of digital silence from 9 s on. */
    static List<Figure> silence(Clean clean, int seed) {
        double rate = clean.sampleRateHz();
        double seconds = clean.samples().length / rate;
        double[] programme = clean.samples().clone();
        Hum hum = Hum.of(rate, Hum.wander(rate, seconds, 60.01, 0.02, 60, seed), Hum.mixed(12, seed), seed)
                .scaledTo(programme, 0);
        double[] input = Measure.add(programme, hum.samples);
        for (int n = (int) (9 * rate); n < 14 * rate; n++) {
            input[n] = 0;
            programme[n] = 0;
        }
        Trace trace = Trace.of(input, rate, Removal.SUBTRACTION);
        double left = Measure.power(trace.output, trace.sample(9.08), trace.sample(14));
        String name = clean.name() + ", 5 s of silence: ";
        return List.of(
                new Figure(name + "output power from 80 ms on", left, 0, ""),
                new Figure(
                        name + "error when sound is back",
                        1000 * trace.worstError(14.01, 14.1, hum.frequencyHz),
                        30,
                        "mHz"),
                new Figure(
                        name + "rms error from 1 s later",
                        1000 * trace.rmsError(15, seconds, hum.frequencyHz),
                        10,
                        "mHz"));
    }

    static List<Figure> change(Clean clean, double fromHz, double toHz, int seed) {
        double rate = clean.sampleRateHz();
        double[] track = Hum.ramp(rate, clean.samples().length / rate, fromHz, toHz, 9, 9.0001);
        Hum hum = Hum.of(rate, track, Hum.mixed(12, seed), seed).scaledTo(clean.samples(), 0);
        Trace trace = Trace.of(Measure.add(clean.samples(), hum.samples), rate, Removal.SUBTRACTION);
        double at = Double.POSITIVE_INFINITY;
        for (int r = trace.readings.length - 1; r > 900; r--) {
            if (Trace.isProven(trace.readings[r]) && Math.abs(trace.error(r, track)) < 0.3) {
                at = r * Trace.STEP_SECONDS - 9;
            } else {
                break;
            }
        }
        return List.of(new Figure(
                String.format(Locale.ROOT, "%s, %.0f to %.0f Hz: following after", clean.name(), fromHz, toHz),
                at,
                4,
                "s"));
    }

    static List<Figure> lateBegin(Clean clean, int seed) {
        double rate = clean.sampleRateHz();
        double[] track = Hum.wander(rate, clean.samples().length / rate, 50.02, 0.02, 60, seed);
        Hum hum = Hum.of(rate, track, Hum.mixed(12, seed), seed).scaledTo(clean.samples(), 0);
        java.util.Arrays.fill(hum.samples, 0, (int) (6 * rate), 0);
        Trace trace = Trace.of(Measure.add(clean.samples(), hum.samples), rate, Removal.SUBTRACTION);
        return List.of(new Figure(
                clean.name() + ", hum begins at 6 s: following after", trace.followingAfter(0) - 6, 12, "s"));
    }

    /** Faint hum must never make things worse. */
    static List<Figure> faint(Clean clean, double levelDb, int seed) {
        double rate = clean.sampleRateHz();
        double[] track = Hum.wander(rate, clean.samples().length / rate, 50.02, 0.02, 60, seed);
        Hum hum = Hum.of(rate, track, Hum.mixed(12, seed), seed).scaledTo(clean.samples(), levelDb);
        double[] input = Measure.add(clean.samples(), hum.samples);
        int from = (int) (2 * rate);
        List<Figure> figures = new ArrayList<>();
        for (Removal way : Removal.values()) {
            Trace trace = Trace.of(input, rate, way);
            double lost = Measure.siSdr(clean.samples(), input, from, input.length)
                    - Measure.siSdr(clean.samples(), trace.output, from, input.length);
            figures.add(new Figure(clean.name() + ", faint " + levelDb + " dB, " + way + ": lost", lost, 0.1, "dB"));
        }
        return figures;
    }

    private static List<Figure> all(List<Clean> shortOnes, List<Clean> longOnes) {
        List<Figure> figures = new ArrayList<>();
        int seed = 40;
        for (Clean clean : shortOnes) {
            seed++;
            figures.addAll(removal(clean, 50.02, 0.02, 0, Hum.mixed(12, seed), seed));
            figures.addAll(removal(clean, 60.0, 0.03, 6, Hum.mixed(20, seed), seed));
            figures.addAll(removal(clean, 50.8, 0.05, -6, Hum.flat(20), seed));
            figures.addAll(removal(clean, 50.3, 0.03, -10, Hum.mixed(12, seed + 50), seed));
            figures.addAll(removal(clean, 60.7, 0.25, 0, Hum.flat(12), seed));
        }
        for (Clean clean : longOnes) {
            seed++;
            figures.addAll(ramp(clean, 0.01, 15, 20, seed));
            figures.addAll(ramp(clean, 0.1, 5, 80, seed));
            figures.addAll(ramp(clean, 1, 1.5, 350, seed));
            figures.addAll(ramp(clean, 2.5, 1, 1000, seed));
            figures.addAll(split(clean, seed));
            for (Removal way : Removal.values()) {
                figures.addAll(step(clean, 0, way, seed));
                figures.addAll(step(clean, 2, way, seed));
                figures.addAll(step(clean, 0.5, way, seed));
            }
            figures.addAll(silence(clean, seed));
            figures.addAll(change(clean, 50, 60, seed));
            figures.addAll(change(clean, 60, 50, seed));
            figures.addAll(lateBegin(clean, seed));
            figures.addAll(faint(clean, -20, seed));
            figures.addAll(faint(clean, -30, seed));
        }
        return figures;
    }

    /** The whole table: on speech-like programme and on the recordings of the folder, if it is named. */
    static List<Figure> table() {
        List<Clean> shortOnes = new ArrayList<>(List.of(speech(301, 16), speech(302, 16)));
        List<Clean> longOnes = new ArrayList<>(List.of(speech(303, 26), speech(304, 26)));
        List<Clean> drawnOnes = new ArrayList<>(List.of(speech(305, 16), speech(306, 16)));
        List<Recordings.Recording> recordings = Recordings.all();
        int count = recordings.size();
        for (int r = 0; r < Math.min(3, count); r++) {
            longOnes.addAll(r == 0 ? List.of(recorded(recordings, count - 1, 26)) : List.of());
            shortOnes.add(recorded(recordings, count - 1 - 3 * r, 16));
        }
        for (int r = 0; r < Math.min(1, count) * 24; r++) {
            drawnOnes.add(recorded(recordings, 7 * r, 16));
        }
        List<Figure> figures = new ArrayList<>(all(shortOnes, longOnes));
        for (int r = 0; r < drawnOnes.size(); r++) {
            figures.addAll(drawn(drawnOnes.get(r), 2000 + r));
        }
        return figures;
    }

    private static Clean recorded(List<Recordings.Recording> recordings, int start, double seconds) {
        Recordings.Recording one = recordings.get(start % recordings.size());
        return new Clean(one.name(), one.sampleRateHz(), Recordings.chain(recordings, start, seconds));
    }

    /** Prints the table of goals. */
    public static void main(String[] arguments) {
        int kept = 0;
        List<Figure> figures = table();
        for (Figure figure : figures) {
            System.out.println(figure);
            kept += figure.isKept() ? 1 : 0;
        }
        System.out.println(kept + " of " + figures.size() + " kept");
    }
}
