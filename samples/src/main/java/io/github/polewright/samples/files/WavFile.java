package io.github.polewright.samples.files;

import java.io.IOException;
import java.io.InputStream;
import java.io.RandomAccessFile;
import java.nio.file.Path;
import javax.sound.sampled.AudioFileFormat;
import javax.sound.sampled.AudioFormat;
import javax.sound.sampled.AudioInputStream;
import javax.sound.sampled.AudioSystem;

/** Writes WAV files; Java Sound makes the header. */
public final class WavFile {

    // The header counts bytes in 32 bits, and Java Sound keeps them in an int.
    private static final long MOST_BYTES = Integer.MAX_VALUE - 64L;

    private WavFile() {}

    /** Writes as many frames as told, drawn from the stream of their bytes. */
    public static void write(Path target, AudioFormat format, long frames, InputStream bytes) {
        long dataBytes = frames * format.getFrameSize();
        if (dataBytes > MOST_BYTES) {
            throw new Failure(target + " would hold " + dataBytes + " bytes of samples; a WAV file is written up to "
                    + MOST_BYTES);
        }
        WholeFile.write(target, beside -> {
            AudioInputStream audio = new AudioInputStream(bytes, format, frames);
            AudioSystem.write(audio, AudioFileFormat.Type.WAVE, beside.toFile());
            if (dataBytes % 2 != 0) {
                padToEven(beside);
            }
        });
    }

    /** A RIFF chunk of odd length is followed by a zero byte, which Java Sound leaves out. */
    private static void padToEven(Path wav) throws IOException {
        try (RandomAccessFile file = new RandomAccessFile(wav.toFile(), "rw")) {
            long length = file.length();
            file.seek(length);
            file.write(0);
            file.seek(4);
            file.writeInt(Integer.reverseBytes((int) (length + 1 - 8)));
        }
    }
}
