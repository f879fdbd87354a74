package io.github.polewright.samples.survey;

import io.github.polewright.samples.files.Recording;
import java.util.List;

/** Hum and DC as they are at the beginning of a recording, with their phases, so that they can be extended. */
public final class OpeningHum {

    private final double sampleRateHz;
    private final double fundamentalHz;
    private final double centreSeconds;
    private final List<Double> dcOffset;
    private final int[] harmonics;
    private final double[][] real;
    private final double[][] imaginary;

    private OpeningHum(Recording recording, Survey survey, double centreSeconds, double fundamentalHz) {
        this.sampleRateHz = recording.sampleRateHz();
        this.fundamentalHz = fundamentalHz;
        this.centreSeconds = centreSeconds;
        this.dcOffset = survey.dcOffset();
        harmonics = survey.lines().stream().mapToInt(HumLine::harmonic).toArray();
        real = new double[recording.channels()][harmonics.length];
        imaginary = new double[recording.channels()][harmonics.length];
    }

    public static OpeningHum of(Recording recording, Survey survey) {
        if (!survey.humFound()) {
            return new OpeningHum(recording, survey, 0, 0);
        }
        int highest = survey.lines().get(survey.lines().size() - 1).harmonic();
        Piece piece = Pieces.opening(recording, (highest + 0.5) * survey.fundamentalHz());
        double nowHz = survey.fundamentalHz(piece.centreSeconds());
        OpeningHum opening = new OpeningHum(recording, survey, piece.centreSeconds(), nowHz);
        HumFit fit = new HumFit(piece, recording.channels(), highest, nowHz);
        for (int c = 0; c < recording.channels(); c++) {
            for (int i = 0; i < opening.harmonics.length; i++) {
                double[] line = fit.line(c, opening.harmonics[i], 0);
                opening.real[c][i] = line[0];
                opening.imaginary[c][i] = line[1];
            }
        }
        return opening;
    }

    /** Writes interleaved frames; frame 0 is the recording's first. */
    public void extend(long fromFrame, int frames, double[] destination) {
        int channels = dcOffset.size();
        for (int n = 0; n < frames; n++) {
            double seconds = (fromFrame + n) / sampleRateHz - centreSeconds;
            for (int c = 0; c < channels; c++) {
                destination[n * channels + c] = dcOffset.get(c);
            }
            for (int i = 0; i < harmonics.length; i++) {
                double angle = 2 * Math.PI * harmonics[i] * fundamentalHz * seconds;
                double cos = Math.cos(angle);
                double sin = Math.sin(angle);
                for (int c = 0; c < channels; c++) {
                    destination[n * channels + c] += real[c][i] * cos - imaginary[c][i] * sin;
                }
            }
        }
    }
}
