package io.github.polewright.samples.survey;

import io.github.polewright.samples.files.Frames;
import io.github.polewright.samples.files.Recording;
import java.util.ArrayList;
import java.util.List;
import org.jtransforms.fft.DoubleFFT_1D;

/**
 * One pass over a recording: the mean of each channel, and pieces of it as spectra. Short recordings are looked at
 * whole; of long ones, as many pieces as memory bears, spread evenly.
 */
final class Pieces {

    private static final double PIECE_SECONDS = 6;
    private static final int MOST_PIECES = 90;
    private static final int READ_FRAMES = 8192;

    private final Recording recording;
    private final double topHz;
    private final int windowFrames;
    private final int hopFrames;
    private final DoubleFFT_1D transform;
    private final double[] sums;
    private final List<Piece> pieces = new ArrayList<>();
    private long nonFiniteSamples;

    private Pieces(Recording recording, double topHz) {
        this.recording = recording;
        this.topHz = topHz;
        double seconds = Math.max(0.25, Math.min(1, recording.seconds() / 5));
        windowFrames = 2 * (int) Math.round(seconds * recording.sampleRateHz() / 2);
        hopFrames = windowFrames / 2;
        transform = new DoubleFFT_1D(windowFrames);
        sums = new double[recording.channels()];
    }

    static Pieces of(Recording recording, double topHz) {
        Pieces pieces = new Pieces(recording, topHz);
        pieces.readAll();
        return pieces;
    }

    /** Only the first piece. */
    static Piece opening(Recording recording, double topHz) {
        Pieces pieces = new Pieces(recording, topHz);
        try (Frames frames = recording.read()) {
            pieces.readPiece(frames, 0, recording.frames() / pieces.count());
        }
        return pieces.pieces.get(0);
    }

    private int count() {
        return (int) Math.max(1, Math.round(recording.seconds() / PIECE_SECONDS));
    }

    List<Piece> all() {
        return pieces;
    }

    double mean(int channel) {
        return sums[channel] / recording.frames();
    }

    long nonFiniteSamples() {
        return nonFiniteSamples;
    }

    private void readAll() {
        int count = count();
        long pieceFrames = recording.frames() / count;
        int kept = Math.min(count, MOST_PIECES);
        try (Frames frames = recording.read()) {
            long at = 0;
            for (int i = 0; i < kept; i++) {
                // The first and the last piece are always among those kept.
                long number = kept == 1 ? 0 : (long) i * (count - 1) / (kept - 1);
                at = skip(frames, at, number * pieceFrames);
                at = readPiece(frames, at, pieceFrames);
            }
            skip(frames, at, recording.frames());
        }
    }

    private long skip(Frames frames, long at, long to) {
        double[] block = new double[READ_FRAMES * sums.length];
        long place = at;
        while (place < to) {
            place += readCounted(frames, block, (int) Math.min(READ_FRAMES, to - place));
        }
        return place;
    }

    private long readPiece(Frames frames, long at, long pieceFrames) {
        double rate = recording.sampleRateHz();
        Piece piece = new Piece((at + pieceFrames / 2.0) / rate);
        int channels = sums.length;
        double[] window = new double[windowFrames * channels];
        double[] block = new double[hopFrames * channels];
        int filled = 0;
        long place = at;
        while (place + hopFrames <= at + pieceFrames) {
            place += readCounted(frames, block, hopFrames);
            System.arraycopy(window, block.length, window, 0, window.length - block.length);
            System.arraycopy(block, 0, window, window.length - block.length, block.length);
            filled++;
            if (filled >= 2) {
                piece.add((place - windowFrames / 2.0) / rate, snapshots(window));
            }
        }
        pieces.add(piece);
        return place;
    }

    private int readCounted(Frames frames, double[] block, int wanted) {
        int got = frames.read(block, wanted);
        int channels = sums.length;
        for (int i = 0; i < got * channels; i++) {
            if (!Double.isFinite(block[i])) {
                block[i] = 0;
                nonFiniteSamples++;
            }
            sums[i % channels] += block[i];
        }
        return got;
    }

    private Snapshot[] snapshots(double[] window) {
        int channels = sums.length;
        Snapshot[] snapshots = new Snapshot[channels];
        double[] samples = new double[windowFrames];
        for (int c = 0; c < channels; c++) {
            for (int n = 0; n < windowFrames; n++) {
                samples[n] = window[n * channels + c];
            }
            snapshots[c] = new Snapshot(samples, transform, recording.sampleRateHz(), topHz);
        }
        return snapshots;
    }
}
