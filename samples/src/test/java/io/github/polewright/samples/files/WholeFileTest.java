package io.github.polewright.samples.files;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.samples.Wav;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import javax.sound.sampled.AudioFormat;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

final class WholeFileTest {

    @TempDir
    private Path folder;

    private List<Path> listing() throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.toList();
        }
    }

    @Test
    void nothingIsLeftOfAFileThatCouldNotBeFinished() throws IOException {
        Path target = folder.resolve("a.txt");
        WholeFile.Writing halfway = beside -> {
            Files.writeString(beside, "half");
            throw new IOException("no space\nleft");
        };
        Failure failure = assertThrows(Failure.class, () -> WholeFile.write(target, halfway));
        assertTrue(failure.getMessage().endsWith("no space left"), failure.getMessage());
        assertEquals(List.of(), listing());
        WholeFile.writeText(target, "old");
        assertThrows(Failure.class, () -> WholeFile.write(target, halfway));
        assertEquals("old", Files.readString(target));
        assertEquals(List.of(target), listing());
        WholeFile.writeText(target, "new");
        assertEquals("new", Files.readString(target));
    }

    @Test
    void aRecordingWhoseSamplesFailHalfwayIsNotThere() throws IOException {
        InputStream failing = new InputStream() {
            private int left = 100_000;

            @Override
            public int read() {
                if (left-- == 0) {
                    throw new Failure("in.wav is truncated");
                }
                return 1;
            }
        };
        AudioFormat format = new AudioFormat(8000, 16, 1, true, false);
        Path out = folder.resolve("out.wav");
        assertThrows(Failure.class, () -> WavFile.write(out, format, 80_000, failing));
        assertEquals(List.of(), listing());
    }

    @Test
    void dataOfOddLengthIsPadded() throws IOException {
        Path out = Wav.write(folder.resolve("odd.wav"), 8000, 1, 24, false, new double[] {0.5, -0.5, 0.25});
        byte[] bytes = Files.readAllBytes(out);
        // RIFF, Multimedia Programming Interface and Data Specifications 1.0, 1991: chunks are padded to even sizes.
        assertEquals(44 + 9 + 1, bytes.length);
        assertEquals(bytes.length - 8, bytes[4]);
        assertEquals(9, bytes[40]);
        assertEquals(0.25, Wav.read(out)[2]);
    }
}
