package io.github.polewright.samples.files;

import java.io.IOException;
import javax.sound.sampled.AudioInputStream;

/** Reads a recording from its first frame to its last. */
public final class Frames implements AutoCloseable {

    private final Recording recording;
    private final AudioInputStream stream;
    private byte[] bytes = new byte[0];
    private long left;

    Frames(Recording recording, AudioInputStream stream) {
        this.recording = recording;
        this.stream = stream;
        this.left = recording.frames();
    }

    /** Reads the next frames, as many as wanted unless the recording ends. */
    public int read(double[] destination, int frames) {
        int wanted = (int) Math.min(frames, left);
        int frameBytes = recording.format().getFrameSize();
        int wantedBytes = wanted * frameBytes;
        if (bytes.length < wantedBytes) {
            bytes = new byte[wantedBytes];
        }
        try {
            if (stream.readNBytes(bytes, 0, wantedBytes) < wantedBytes) {
                throw new Failure(recording.path() + " is truncated: its header tells of more samples than it holds");
            }
        } catch (IOException e) {
            throw new Failure("cannot read " + recording.path() + ": " + WholeFile.reason(e), e);
        }
        recording.pcm().decode(bytes, 0, destination, 0, wanted * recording.channels());
        left -= wanted;
        return wanted;
    }

    @Override
    public void close() {
        try {
            stream.close();
        } catch (IOException e) {
            throw new Failure("cannot close " + recording.path() + ": " + WholeFile.reason(e), e);
        }
    }
}
