package io.github.polewright.slab;

import java.nio.ByteOrder;
import java.nio.FloatBuffer;
import java.util.Objects;

/** The checks of a block's arguments and of indices, made before any sample or state is touched. */
public final class Ranges {

    private Ranges() {}

    /**
     * Checks an index.
     *
     * @param name of the argument, for the message
     * @param index to be 0 to {@code count - 1}
     * @param count how many there are
     * @throws IndexOutOfBoundsException if {@code index < 0 || index >= count}
     */
    public static void index(String name, int index, int count) {
        if (index < 0 || index >= count) {
            throw new IndexOutOfBoundsException(name + " is " + index + "; it must be 0 to " + (count - 1));
        }
    }

    /**
     * Checks an array of interleaved samples and a range of it.
     *
     * @param name of the argument, for the message
     * @param samples interleaved
     * @param offset of the first sample
     * @param frames in the block
     * @param channels samples a frame
     * @throws NullPointerException if {@code samples} is null
     * @throws IllegalArgumentException if {@code frames < 0}
     * @throws IndexOutOfBoundsException if {@code offset < 0} or the range ends beyond the array
     */
    public static void interleaved(String name, float[] samples, int offset, int frames, int channels) {
        interleaved(name, Objects.requireNonNull(samples, name).length, offset, frames, channels);
    }

    /**
     * Checks an array of interleaved samples and a range of it.
     *
     * @param name of the argument, for the message
     * @param samples interleaved
     * @param offset of the first sample
     * @param frames in the block
     * @param channels samples a frame
     * @throws NullPointerException if {@code samples} is null
     * @throws IllegalArgumentException if {@code frames < 0}
     * @throws IndexOutOfBoundsException if {@code offset < 0} or the range ends beyond the array
     */
    public static void interleaved(String name, double[] samples, int offset, int frames, int channels) {
        interleaved(name, Objects.requireNonNull(samples, name).length, offset, frames, channels);
    }

    /**
     * Checks a range of interleaved samples.
     *
     * @param name of the argument, for the message
     * @param length of the array
     * @param offset of the first sample
     * @param frames in the block
     * @param channels samples a frame
     * @throws IllegalArgumentException if {@code frames < 0}
     * @throws IndexOutOfBoundsException if {@code offset < 0} or {@code frames * channels > length - offset}
     */
    public static void interleaved(String name, int length, int offset, int frames, int channels) {
        frames(frames);
        long samples = (long) frames * channels;
        if (offset < 0 || samples > (long) length - offset) {
            throw new IndexOutOfBoundsException(
                    name + " holds " + length + " samples; " + samples + " from offset " + offset + " do not fit in");
        }
    }

    /**
     * Checks that two ranges of samples are apart or the same.
     *
     * @param same whether both lie in the same array
     * @param sourceOffset of the first sample read
     * @param destinationOffset of the first sample written
     * @param frames in the block
     * @param channels samples a frame
     * @throws IllegalArgumentException if the ranges overlap in part
     */
    public static void apart(boolean same, int sourceOffset, int destinationOffset, int frames, int channels) {
        long distance = Math.abs((long) sourceOffset - destinationOffset);
        if (same && distance != 0 && distance < (long) frames * channels) {
            throw new IllegalArgumentException("destination offset " + destinationOffset + " overlaps source offset "
                    + sourceOffset + "; they must be equal or " + (long) frames * channels + " samples apart");
        }
    }

    /**
     * Checks planar frames.
     *
     * @param source one array a channel
     * @param destination one array a channel
     * @param offset of the first frame in every array
     * @param frames in the block
     * @param channels planes expected
     * @throws NullPointerException if an argument or a plane is null
     * @throws IllegalArgumentException if {@code frames < 0}, a count of planes is not {@code channels}, or a plane is
     *     both read for one channel and written for another
     * @throws IndexOutOfBoundsException if {@code offset < 0} or a plane is too short
     */
    public static void planar(float[][] source, float[][] destination, int offset, int frames, int channels) {
        frames(frames);
        planes("source", source, offset, frames, channels);
        planes("destination", destination, offset, frames, channels);
        for (int to = 0; to < channels; to++) {
            for (int other = 0; other < channels; other++) {
                if (other != to && (destination[to] == source[other] || destination[to] == destination[other])) {
                    throw new IllegalArgumentException("destination plane " + to + " is also plane " + other
                            + "; a plane must serve one channel only");
                }
            }
        }
    }

    private static void planes(String name, float[][] planes, int offset, int frames, int channels) {
        if (Objects.requireNonNull(planes, name).length != channels) {
            throw new IllegalArgumentException(
                    name + " has " + planes.length + " planes; it must have " + channels + ", one a channel");
        }
        for (int channel = 0; channel < channels; channel++) {
            if (planes[channel] == null) {
                throw new NullPointerException(name + " plane " + channel);
            }
            int length = planes[channel].length;
            if (offset < 0 || frames > (long) length - offset) {
                throw new IndexOutOfBoundsException(name + " plane " + channel + " holds " + length + " samples; "
                        + frames + " from offset " + offset + " do not fit in");
            }
        }
    }

    /**
     * Checks a direct buffer of interleaved samples from its position on.
     *
     * @param name of the argument, for the message
     * @param buffer direct, in native byte order
     * @param written whether it will be written
     * @param frames in the block
     * @param channels samples a frame
     * @throws NullPointerException if {@code buffer} is null
     * @throws IllegalArgumentException if {@code frames < 0}, or the buffer is not direct, not in native order, or
     *     read-only though it would be written
     * @throws IndexOutOfBoundsException if fewer than {@code frames * channels} samples remain
     */
    public static void direct(String name, FloatBuffer buffer, boolean written, int frames, int channels) {
        frames(frames);
        if (!Objects.requireNonNull(buffer, name).isDirect()) {
            throw new IllegalArgumentException(name + " is a heap buffer; it must be direct (pass arrays otherwise)");
        }
        if (buffer.order() != ByteOrder.nativeOrder()) {
            throw new IllegalArgumentException(
                    name + " is " + buffer.order() + "; it must be in native order, " + ByteOrder.nativeOrder());
        }
        if (written && buffer.isReadOnly()) {
            throw new IllegalArgumentException(name + " is read-only; it must be writable");
        }
        long samples = (long) frames * channels;
        if (samples > buffer.remaining()) {
            throw new IndexOutOfBoundsException(
                    name + " has " + buffer.remaining() + " samples left; it must have " + samples);
        }
    }

    private static void frames(int frames) {
        if (frames < 0) {
            throw new IllegalArgumentException("frames is " + frames + "; it must be at least 0");
        }
    }
}
