package io.github.polewright.mains;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;

/** Speech recordings from a folder that is named by a system property; none are kept here. */
public final class Recordings {

    static final String PROPERTY = "polewright.recordings";

    public record Recording(String name, double sampleRateHz, double[] samples) {}

    private Recordings() {}

    /** All 16-bit mono WAV files of the folder, by name; empty if there is no folder. */
    public static List<Recording> all() {
        String folder = System.getProperty(PROPERTY, "");
        if (folder.isEmpty()) {
            return List.of();
        }
        List<Recording> found = new ArrayList<>();
        try (Stream<Path> files = Files.list(Path.of(folder))) {
            for (Path file :
                    files.filter(f -> f.toString().endsWith(".wav")).sorted().toList()) {
                found.add(read(file));
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return found;
    }

    private static Recording read(Path file) throws IOException {
        ByteBuffer bytes = ByteBuffer.wrap(Files.readAllBytes(file)).order(ByteOrder.LITTLE_ENDIAN);
        double rate = 0;
        int at = 12;
        while (at + 8 <= bytes.limit()) {
            int id = bytes.getInt(at);
            int size = bytes.getInt(at + 4);
            if (id == 0x20746d66) {
                rate = bytes.getInt(at + 12);
                if (bytes.getShort(at + 8) != 1 || bytes.getShort(at + 10) != 1 || bytes.getShort(at + 22) != 16) {
                    throw new IOException(file + " is not 16-bit mono PCM");
                }
            } else if (id == 0x61746164) {
                int count = Math.min(size, bytes.limit() - at - 8) / 2;
                double[] samples = new double[count];
                for (int n = 0; n < count; n++) {
                    samples[n] = bytes.getShort(at + 8 + 2 * n) / 32768.0;
                }
                return new Recording(file.getFileName().toString(), rate, samples);
            }
            at += 8 + size + (size & 1);
        }
        throw new IOException(file + " holds no samples");
    }

    /** The recordings of one sample rate one after the other, over and over, from the {@code start}-th. */
    static double[] chain(List<Recording> recordings, int start, double seconds) {
        double rate = recordings.get(start % recordings.size()).sampleRateHz();
        double[] out = new double[(int) Math.round(rate * seconds)];
        int at = 0;
        for (int r = start; at < out.length; r++) {
            Recording next = recordings.get(r % recordings.size());
            if (next.sampleRateHz() == rate) {
                int count = Math.min(next.samples().length, out.length - at);
                System.arraycopy(next.samples(), 0, out, at, count);
                at += count;
            }
        }
        return out;
    }
}
