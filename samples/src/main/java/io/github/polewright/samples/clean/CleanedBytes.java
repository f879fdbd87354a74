package io.github.polewright.samples.clean;

import io.github.polewright.samples.files.Frames;
import io.github.polewright.samples.files.Recording;
import java.io.InputStream;
import java.util.function.LongConsumer;

/** The bytes of the cleaned recording, made a block at a time when they are asked for. */
final class CleanedBytes extends InputStream {

    private final Recording recording;
    private final Frames frames;
    private final FrameFilter filter;
    private final LongConsumer progress;
    private final double[] block;
    private final byte[] bytes;
    private int at;
    private int end;
    private long clippedSamples;
    private long framesDone;

    CleanedBytes(Recording recording, Frames frames, FrameFilter filter, LongConsumer progress) {
        this.recording = recording;
        this.frames = frames;
        this.filter = filter;
        this.progress = progress;
        this.block = new double[CleaningStream.BLOCK_FRAMES * recording.channels()];
        this.bytes = new byte[CleaningStream.BLOCK_FRAMES * recording.format().getFrameSize()];
    }

    long clippedSamples() {
        return clippedSamples;
    }

    @Override
    public int read() {
        byte[] one = new byte[1];
        return read(one, 0, 1) < 0 ? -1 : one[0] & 0xff;
    }

    @Override
    public int read(byte[] destination, int offset, int count) {
        if (at == end && !fill()) {
            return -1;
        }
        int given = Math.min(count, end - at);
        System.arraycopy(bytes, at, destination, offset, given);
        at += given;
        return given;
    }

    private boolean fill() {
        int got = frames.read(block, CleaningStream.BLOCK_FRAMES);
        if (got == 0) {
            return false;
        }
        filter.process(block, got);
        int samples = got * recording.channels();
        clippedSamples += recording.pcm().encode(block, 0, bytes, 0, samples);
        at = 0;
        end = samples * recording.pcm().bytesPerSample();
        framesDone += got;
        progress.accept(framesDone);
        return true;
    }
}
