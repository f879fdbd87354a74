package io.github.polewright.samples.survey;

import io.github.polewright.samples.files.Recording;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** Surveys recordings: DC offset, hum or none, its fundamental and its lines. */
public final class Surveyor {

    public static final int DEFAULT_HARMONICS = 40;

    // Mains of 50 and 60 Hz keep within 1 % but for rare disturbances; a little less than that on each side leaves out
    // the low notes of an instrument tuned to 440 Hz, the nearest of which are G at 49.00 and B at 61.74 Hz.
    /** How far from the frequency named hum is looked for, in hertz. */
    public static final double REACH_HZ = 0.95;

    private static final double[] NOMINAL_HZ = {50, 60};
    private static final double SHORTEST_SECONDS = 1;
    private static final double SEARCH_HZ = 0.12;
    private static final double CLOSER_HZ = 0.025;
    private static final double SEARCH_STEP_HZ = 0.002;

    // Speech and music scatter the pieces more than noise would.
    private static final double STEADY_SCATTER = 9;

    private final Recording recording;
    private final int channels;
    private final int harmonics;

    /** One candidate with all its fits. */
    private record Hypothesis(List<HumFit> fits, Verdict verdict) {
        double meanHz() {
            return fits.stream().mapToDouble(HumFit::fundamentalHz).average().orElseThrow();
        }
    }

    private Surveyor(Recording recording, int harmonics) {
        this.recording = recording;
        this.channels = recording.channels();
        this.harmonics = harmonics;
    }

    /**
     * Surveys a recording.
     *
     * @param mainsHz where to look, or 0 for the surroundings of 50 and of 60 Hz
     * @param harmonics the highest harmonic to look for
     */
    public static Survey survey(Recording recording, double mainsHz, int harmonics) {
        return new Surveyor(recording, harmonics).survey(mainsHz);
    }

    /** The lines of a survey and the DC offset, measured in a recording that was filtered since. */
    public record Measured(List<HumLine> lines, List<Double> dcOffset) {}

    /** Measures the lines of a survey in a filtered recording, at the same places and times. */
    public static Measured measure(Recording recording, Survey survey) {
        int highest = survey.lines().stream().mapToInt(HumLine::harmonic).max().orElse(1);
        Surveyor surveyor = new Surveyor(recording, highest);
        Pieces pieces = Pieces.of(recording, surveyor.topHz(survey.fundamentalHz()));
        List<Double> dcOffset = surveyor.means(pieces);
        if (!survey.humFound()) {
            return new Measured(List.of(), dcOffset);
        }
        List<HumFit> fits = new ArrayList<>();
        for (Piece piece : pieces.all()) {
            fits.add(new HumFit(piece, recording.channels(), highest, survey.fundamentalHz(piece.centreSeconds())));
        }
        Verdict verdict = new Verdict(fits, recording.channels());
        List<HumLine> lines = survey.lines().stream()
                .map(line -> surveyor.line(line.harmonic(), survey.fundamentalHz(), fits, verdict))
                .toList();
        return new Measured(lines, dcOffset);
    }

    private List<Double> means(Pieces pieces) {
        List<Double> means = new ArrayList<>();
        for (int c = 0; c < channels; c++) {
            means.add(pieces.mean(c));
        }
        return means;
    }

    private double topHz(double fundamentalHz) {
        return Math.min(0.95 * recording.sampleRateHz() / 2, (harmonics + 0.5) * fundamentalHz);
    }

    private Survey survey(double mainsHz) {
        double[] nominal = mainsHz > 0 ? new double[] {mainsHz} : NOMINAL_HZ;
        double highestHz = nominal[nominal.length - 1] + REACH_HZ;
        Pieces pieces = Pieces.of(recording, topHz(highestHz));
        List<Double> dcOffset = means(pieces);
        boolean tooShort = recording.seconds() < SHORTEST_SECONDS;
        Hypothesis best = tooShort ? null : best(pieces, nominal);
        if (best == null) {
            return new Survey(dcOffset, false, tooShort, 0, 0, List.of(), List.of(), pieces.nonFiniteSamples());
        }
        return found(best, dcOffset, pieces.nonFiniteSamples());
    }

    private @Nullable Hypothesis best(Pieces pieces, double[] nominal) {
        Hypothesis best = null;
        for (double nominalHz : nominal) {
            double topHz = topHz(nominalHz + REACH_HZ);
            for (double candidateHz : Candidates.around(pieces.all(), channels, nominalHz, REACH_HZ, topHz)) {
                Hypothesis hypothesis = fitted(pieces.all(), candidateHz);
                if (hypothesis.verdict.isHum()
                        && Math.abs(hypothesis.meanHz() - nominalHz) <= REACH_HZ
                        && (best == null || hypothesis.verdict.score() > best.verdict.score())) {
                    best = hypothesis;
                }
            }
        }
        return best;
    }

    private Hypothesis fitted(List<Piece> pieces, double candidateHz) {
        int highest = (int) Math.min(harmonics, topHz(candidateHz) / (candidateHz + SEARCH_HZ));
        List<HumFit> fits = new ArrayList<>();
        for (Piece piece : pieces) {
            HumFit fit = new HumFit(piece, channels, highest, candidateHz);
            fit.searchByAllLines(SEARCH_HZ, SEARCH_STEP_HZ);
            fit.searchByLines(fit.likelyLines(), CLOSER_HZ, SEARCH_STEP_HZ / 4);
            fits.add(fit);
        }
        // A loud note near a high line can mislead the first search; the lines that hold lead back, and more hold then.
        for (double reachHz : new double[] {2 * CLOSER_HZ, CLOSER_HZ, CLOSER_HZ / 4}) {
            Verdict verdict = new Verdict(fits, channels);
            for (HumFit fit : fits) {
                fit.searchByLines(verdict.there(), reachHz, reachHz / 60);
            }
        }
        return new Hypothesis(fits, new Verdict(fits, channels));
    }

    private Survey found(Hypothesis hypothesis, List<Double> dcOffset, long nonFiniteSamples) {
        boolean[] there = hypothesis.verdict.there();
        List<MainsMoment> track = new ArrayList<>();
        double sum = 0;
        double weights = 0;
        double lowest = Double.POSITIVE_INFINITY;
        double highest = 0;
        for (HumFit fit : hypothesis.fits) {
            double weight = weight(fit, there);
            if (weight > 0) {
                track.add(new MainsMoment(fit.piece().centreSeconds(), fit.fundamentalHz()));
                sum += weight * fit.fundamentalHz();
                weights += weight;
                lowest = Math.min(lowest, fit.fundamentalHz());
                highest = Math.max(highest, fit.fundamentalHz());
            }
        }
        double fundamentalHz = sum / weights;
        if (isSteady(hypothesis.fits, there, fundamentalHz)) {
            track = List.of();
            highest = lowest;
        }
        List<HumLine> lines = new ArrayList<>();
        for (int k = 1; k < there.length; k++) {
            if (there[k]) {
                lines.add(line(k, fundamentalHz, hypothesis.fits, hypothesis.verdict));
            }
        }
        return new Survey(dcOffset, true, false, fundamentalHz, highest - lowest, lines, track, nonFiniteSamples);
    }

    /** One over the variance of a piece's fundamental, but for a factor; 0 if the piece tells nothing. */
    private double weight(HumFit fit, boolean[] there) {
        double evidence = 0;
        double weight = 0;
        for (int k = 1; k < there.length; k++) {
            if (there[k]) {
                double more = Math.max(0, fit.evidence(k) - channels);
                evidence += more;
                weight += (double) k * k * more;
            }
        }
        return evidence > 25 ? weight : 0;
    }

    /**
     * Whether the pieces' fundamentals scatter no more than their least variance lets expect: for a line of evidence E
     * through T seconds that is 6 / E / (2 pi T)^2.
     */
    private boolean isSteady(List<HumFit> fits, boolean[] there, double meanHz) {
        double scatter = 0;
        int count = 0;
        for (HumFit fit : fits) {
            double weight = weight(fit, there);
            if (weight > 0) {
                double seconds = recording.seconds() / fits.size();
                double leastVariance = 6 / weight / Math.pow(2 * Math.PI * seconds, 2);
                scatter += Math.pow(fit.fundamentalHz() - meanHz, 2) / leastVariance;
                count++;
            }
        }
        return count < 2 || scatter < STEADY_SCATTER * (count - 1);
    }

    private HumLine line(int harmonic, double fundamentalHz, List<HumFit> fits, Verdict verdict) {
        double power = 0;
        double floor = 0;
        for (HumFit fit : fits) {
            for (int c = 0; c < channels; c++) {
                double[] line = fit.line(c, harmonic, 0);
                power += (line[0] * line[0] + line[1] * line[1]) / channels / fits.size();
            }
            floor += fit.floorPower(harmonic) / fits.size();
        }
        return new HumLine(
                harmonic,
                harmonic * fundamentalHz,
                10 * Math.log10(Math.max(power, 1e-30)),
                10 * Math.log10(Math.max(power, 1e-30) / 2 / floor),
                verdict.steadyShare(harmonic));
    }
}
