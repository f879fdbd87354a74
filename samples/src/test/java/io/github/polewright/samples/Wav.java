package io.github.polewright.samples;

import io.github.polewright.pcm.PcmFormat;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.files.WavFile;
import java.io.ByteArrayInputStream;
import java.nio.ByteOrder;
import java.nio.file.Path;
import javax.sound.sampled.AudioFormat;

/** Recordings for tests: numbers to files and back. */
public final class Wav {

    private Wav() {}

    public static Path write(
            Path path, double sampleRateHz, int channels, int bits, boolean floating, double[] frames) {
        AudioFormat.Encoding encoding = floating
                ? AudioFormat.Encoding.PCM_FLOAT
                : bits == 8 ? AudioFormat.Encoding.PCM_UNSIGNED : AudioFormat.Encoding.PCM_SIGNED;
        float rate = (float) sampleRateHz;
        AudioFormat format = new AudioFormat(encoding, rate, bits, channels, channels * bits / 8, rate, false);
        PcmFormat pcm = floating
                ? PcmFormat.floatingPoint(bits, ByteOrder.LITTLE_ENDIAN)
                : PcmFormat.integer(bits, ByteOrder.LITTLE_ENDIAN);
        byte[] bytes = new byte[frames.length * bits / 8];
        pcm.encode(frames, 0, bytes, 0, frames.length);
        WavFile.write(path, format, frames.length / channels, new ByteArrayInputStream(bytes));
        return path;
    }

    public static double[] read(Path path) {
        Recording recording = Recording.open(path);
        double[] frames = new double[(int) recording.frames() * recording.channels()];
        try (var reader = recording.read()) {
            reader.read(frames, (int) recording.frames());
        }
        return frames;
    }
}
