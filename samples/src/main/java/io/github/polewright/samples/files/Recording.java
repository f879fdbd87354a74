package io.github.polewright.samples.files;

import io.github.polewright.pcm.PcmFormat;
import java.io.IOException;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.Path;
import javax.sound.sampled.AudioFileFormat;
import javax.sound.sampled.AudioFormat;
import javax.sound.sampled.AudioInputStream;
import javax.sound.sampled.AudioSystem;
import javax.sound.sampled.UnsupportedAudioFileException;

/** A WAV file of PCM samples that was looked at and can be read. */
public record Recording(Path path, AudioFormat format, PcmFormat pcm, long frames) {

    private static final double LEAST_RATE_HZ = 2000;
    private static final double MOST_RATE_HZ = 768_000;

    public int channels() {
        return format.getChannels();
    }

    public double sampleRateHz() {
        return format.getSampleRate();
    }

    public double seconds() {
        return frames / sampleRateHz();
    }

    /** Looks at a file's header; fails if it is not a WAV file of PCM samples, or holds none. */
    public static Recording open(Path path) {
        if (!Files.exists(path)) {
            throw new Failure(path + " does not exist");
        }
        if (!Files.isRegularFile(path)) {
            throw new Failure(path + " is not a file");
        }
        try {
            if (Files.size(path) == 0) {
                throw new Failure(path + " is empty");
            }
            AudioFileFormat file = AudioSystem.getAudioFileFormat(path.toFile());
            if (!file.getType().equals(AudioFileFormat.Type.WAVE)) {
                throw new Failure(path + " is a file of type " + file.getType() + ", not WAV");
            }
            return checked(path, file.getFormat(), file.getFrameLength());
        } catch (UnsupportedAudioFileException e) {
            throw new Failure(path + " is not a whole WAV file of uncompressed samples", e);
        } catch (IOException e) {
            throw new Failure("cannot read " + path + ": " + WholeFile.reason(e), e);
        }
    }

    private static Recording checked(Path path, AudioFormat format, long frames) throws IOException {
        PcmFormat pcm = pcm(path, format);
        if (format.getFrameSize() != pcm.bytesPerSample() * format.getChannels()) {
            throw new Failure(path + " keeps its " + format.getSampleSizeInBits() + "-bit samples in "
                    + format.getFrameSize() + "-byte frames, which is not supported");
        }
        double rate = format.getSampleRate();
        if (!(rate >= LEAST_RATE_HZ && rate <= MOST_RATE_HZ)) {
            throw new Failure(path + " has a sample rate of " + rate + " Hz; it must be " + LEAST_RATE_HZ + " to "
                    + MOST_RATE_HZ);
        }
        if (frames == 0) {
            throw new Failure(path + " holds no samples");
        }
        if (frames < 0 || frames * format.getFrameSize() > Files.size(path)) {
            throw new Failure(path + " is truncated: its header tells of more samples than it holds");
        }
        return new Recording(path, format, pcm, frames);
    }

    private static PcmFormat pcm(Path path, AudioFormat format) {
        int bits = format.getSampleSizeInBits();
        ByteOrder order = format.isBigEndian() ? ByteOrder.BIG_ENDIAN : ByteOrder.LITTLE_ENDIAN;
        AudioFormat.Encoding encoding = format.getEncoding();
        boolean floatingPoint = encoding.equals(AudioFormat.Encoding.PCM_FLOAT);
        boolean signed = encoding.equals(AudioFormat.Encoding.PCM_SIGNED);
        if (!floatingPoint && !signed && !encoding.equals(AudioFormat.Encoding.PCM_UNSIGNED)) {
            throw new Failure(path + " is compressed (" + encoding + "); only PCM samples are read");
        }
        try {
            return floatingPoint ? PcmFormat.floatingPoint(bits, order) : PcmFormat.integer(bits, order);
        } catch (IllegalArgumentException e) {
            throw new Failure(path + " has " + bits + "-bit samples, which are not supported", e);
        }
    }

    /** Starts to read at the first frame. */
    public Frames read() {
        try {
            AudioInputStream stream = AudioSystem.getAudioInputStream(path.toFile());
            return new Frames(this, stream);
        } catch (UnsupportedAudioFileException e) {
            throw new Failure(path + " is not a WAV file any more", e);
        } catch (IOException e) {
            throw new Failure("cannot read " + path + ": " + WholeFile.reason(e), e);
        }
    }

    /** Such as "48000 Hz, 2 channels, 24-bit integer". */
    public String describe() {
        String kind = pcm.isFloatingPoint() ? "floating point" : "integer";
        return String.format(
                java.util.Locale.ROOT,
                "%.0f Hz, %d %s, %d-bit %s",
                sampleRateHz(),
                channels(),
                channels() == 1 ? "channel" : "channels",
                pcm.bits(),
                kind);
    }
}
