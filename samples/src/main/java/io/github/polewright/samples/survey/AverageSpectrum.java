package io.github.polewright.samples.survey;

import io.github.polewright.samples.files.Frames;
import io.github.polewright.samples.files.Recording;
import org.jtransforms.fft.DoubleFFT_1D;

/**
 * The mean power spectrum of a recording, over windows of at most 4 seconds and over its channels, in decibels; a sine
 * of full scale reads 0 dB.
 */
public final class AverageSpectrum {

    private static final double WINDOW_SECONDS = 4;
    private static final int MOST_WINDOWS = 60;

    private final double binHz;
    private final double[] levelsDb;

    private AverageSpectrum(double binHz, double[] levelsDb) {
        this.binHz = binHz;
        this.levelsDb = levelsDb;
    }

    /** From one value to the next; the first is at 0 Hz. */
    public double binHz() {
        return binHz;
    }

    public int bins() {
        return levelsDb.length;
    }

    public double levelDb(int bin) {
        return levelsDb[bin];
    }

    public static AverageSpectrum of(Recording recording, double topHz) {
        double rate = recording.sampleRateHz();
        int length = (int) Math.min(recording.frames(), Math.round(WINDOW_SECONDS * rate));
        int half = length / 2;
        int bins = (int) Math.min(half, Math.ceil(topHz / rate * length)) + 1;
        double[] power = new double[bins];
        DoubleFFT_1D transform = new DoubleFFT_1D(length);
        int channels = recording.channels();
        int windows = (int) Math.min(MOST_WINDOWS, recording.frames() / length);
        long stride = recording.frames() / windows;
        double[] block = new double[length * channels];
        double[] skipped = new double[8192 * channels];
        try (Frames frames = recording.read()) {
            for (int i = 0; i < windows; i++) {
                frames.read(block, length);
                for (int c = 0; c < channels; c++) {
                    addPower(block, c, channels, transform, power, length);
                }
                for (long left = stride - length; left > 0; left -= 8192) {
                    frames.read(skipped, (int) Math.min(8192, left));
                }
            }
        }
        double[] levelsDb = new double[bins];
        for (int m = 0; m < bins; m++) {
            levelsDb[m] = 10 * Math.log10(Math.max(1e-20, power[m] / windows / channels));
        }
        return new AverageSpectrum(rate / length, levelsDb);
    }

    private static void addPower(
            double[] block, int channel, int channels, DoubleFFT_1D transform, double[] power, int length) {
        double[] samples = new double[length];
        for (int n = 0; n < length; n++) {
            double value = block[n * channels + channel];
            samples[n] = (Double.isFinite(value) ? value : 0) * (0.5 - 0.5 * Math.cos(2 * Math.PI * n / length));
        }
        transform.realForward(samples);
        double scale = 4.0 / length;
        // A constant is all in bin 0, and a sine is halved between two bins.
        power[0] += Math.pow(samples[0] * scale / 2, 2);
        for (int m = 1; m < Math.min(power.length, (length - 1) / 2); m++) {
            double real = samples[2 * m] * scale;
            double imaginary = samples[2 * m + 1] * scale;
            power[m] += real * real + imaginary * imaginary;
        }
    }
}
