package io.github.polewright.pcm;

import java.nio.ByteOrder;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * How one PCM sample lies in bytes, with the conversion to and from {@code float[]} and {@code double[]}. Frames are
 * interleaved on both sides, so channels need no mention: counts and offsets are samples in the arrays of numbers, and
 * bytes in the arrays of bytes.
 *
 * <p><b>Units</b> full scale is 1: an integer of n bits is its value divided by 2^(n−1), so the range is −1 to
 * 1 − 2^(1−n). 8-bit integers are unsigned with 128 as zero, as WAV files have them; wider ones are two's complement.
 *
 * <p><b>Numbers</b> decoding to {@code double[]} is exact for every format, to {@code float[]} for integers of at most
 * 24 bits and for 32-bit floating point; the rest rounds to nearest. Encoding multiplies by 2^(n−1), rounds to nearest
 * with halves to even, and saturates. It returns how many samples it could not keep: those whose rounded value lay
 * outside the range, which +1 already does, and NaN, which becomes 0. Nothing is dithered. Floating-point formats take
 * NaN and infinities as they are; a finite {@code double} beyond the range of a 32-bit {@code float} saturates to the
 * largest and is counted.
 *
 * <p><b>Threads</b> immutable. <b>Allocation</b> none in {@code decode} and {@code encode}. <b>Errors</b> ranges are
 * checked before anything is written.
 */
public final class PcmFormat {

    private final boolean floatingPoint;
    private final int bits;
    private final ByteOrder byteOrder;
    private final double fullScale;

    private PcmFormat(boolean floatingPoint, int bits, ByteOrder byteOrder) {
        this.floatingPoint = floatingPoint;
        this.bits = bits;
        this.byteOrder = Objects.requireNonNull(byteOrder, "byteOrder");
        this.fullScale = floatingPoint ? 1 : (double) (1L << (bits - 1));
    }

    /**
     * Integer samples.
     *
     * @param bits 8 (unsigned), 16, 24 or 32 (two's complement)
     * @param byteOrder without meaning for 8 bits
     * @return the format
     * @throws IllegalArgumentException if {@code bits} is none of these
     */
    public static PcmFormat integer(int bits, ByteOrder byteOrder) {
        if (bits != 8 && bits != 16 && bits != 24 && bits != 32) {
            throw new IllegalArgumentException("bits is " + bits + "; it must be 8, 16, 24 or 32");
        }
        return new PcmFormat(false, bits, byteOrder);
    }

    /**
     * IEEE 754 floating-point samples.
     *
     * @param bits 32 or 64
     * @param byteOrder which byte comes first
     * @return the format
     * @throws IllegalArgumentException if {@code bits} is neither
     */
    public static PcmFormat floatingPoint(int bits, ByteOrder byteOrder) {
        if (bits != 32 && bits != 64) {
            throw new IllegalArgumentException("bits is " + bits + "; it must be 32 or 64");
        }
        return new PcmFormat(true, bits, byteOrder);
    }

    /**
     * Whether samples are floating point.
     *
     * @return false for integers
     */
    public boolean isFloatingPoint() {
        return floatingPoint;
    }

    /**
     * The size of a sample.
     *
     * @return bits
     */
    public int bits() {
        return bits;
    }

    /**
     * The size of a sample.
     *
     * @return bytes
     */
    public int bytesPerSample() {
        return bits / 8;
    }

    /**
     * Which byte of a sample comes first.
     *
     * @return the byte order
     */
    public ByteOrder byteOrder() {
        return byteOrder;
    }

    /**
     * Turns bytes into samples.
     *
     * @param source the bytes
     * @param sourceOffset bytes before the first sample
     * @param destination receives the samples; the rest of it is not touched
     * @param destinationOffset samples before the first one
     * @param samples how many; frames times channels
     * @throws NullPointerException if an array is null
     * @throws IndexOutOfBoundsException if a range does not lie inside its array
     */
    public void decode(byte[] source, int sourceOffset, float[] destination, int destinationOffset, int samples) {
        requireArrays(source, destination);
        checkRange("source", source.length, sourceOffset, samples, bytesPerSample());
        checkRange("destination", destination.length, destinationOffset, samples, 1);
        int step = bytesPerSample();
        for (int i = 0; i < samples; i++) {
            destination[destinationOffset + i] = (float) read(source, sourceOffset + i * step);
        }
    }

    /**
     * Turns bytes into samples.
     *
     * @param source the bytes
     * @param sourceOffset bytes before the first sample
     * @param destination receives the samples; the rest of it is not touched
     * @param destinationOffset samples before the first one
     * @param samples how many; frames times channels
     * @throws NullPointerException if an array is null
     * @throws IndexOutOfBoundsException if a range does not lie inside its array
     */
    public void decode(byte[] source, int sourceOffset, double[] destination, int destinationOffset, int samples) {
        requireArrays(source, destination);
        checkRange("source", source.length, sourceOffset, samples, bytesPerSample());
        checkRange("destination", destination.length, destinationOffset, samples, 1);
        int step = bytesPerSample();
        for (int i = 0; i < samples; i++) {
            destination[destinationOffset + i] = read(source, sourceOffset + i * step);
        }
    }

    /**
     * Turns samples into bytes.
     *
     * @param source the samples
     * @param sourceOffset samples before the first one
     * @param destination receives the bytes; the rest of it is not touched
     * @param destinationOffset bytes before the first sample
     * @param samples how many; frames times channels
     * @return how many samples were clipped, or were NaN where the format has none
     * @throws NullPointerException if an array is null
     * @throws IndexOutOfBoundsException if a range does not lie inside its array
     */
    public int encode(float[] source, int sourceOffset, byte[] destination, int destinationOffset, int samples) {
        requireArrays(source, destination);
        checkRange("source", source.length, sourceOffset, samples, 1);
        checkRange("destination", destination.length, destinationOffset, samples, bytesPerSample());
        int step = bytesPerSample();
        int clipped = 0;
        for (int i = 0; i < samples; i++) {
            clipped += write(source[sourceOffset + i], destination, destinationOffset + i * step);
        }
        return clipped;
    }

    /**
     * Turns samples into bytes.
     *
     * @param source the samples
     * @param sourceOffset samples before the first one
     * @param destination receives the bytes; the rest of it is not touched
     * @param destinationOffset bytes before the first sample
     * @param samples how many; frames times channels
     * @return how many samples were clipped, or were NaN where the format has none
     * @throws NullPointerException if an array is null
     * @throws IndexOutOfBoundsException if a range does not lie inside its array
     */
    public int encode(double[] source, int sourceOffset, byte[] destination, int destinationOffset, int samples) {
        requireArrays(source, destination);
        checkRange("source", source.length, sourceOffset, samples, 1);
        checkRange("destination", destination.length, destinationOffset, samples, bytesPerSample());
        int step = bytesPerSample();
        int clipped = 0;
        for (int i = 0; i < samples; i++) {
            clipped += write(source[sourceOffset + i], destination, destinationOffset + i * step);
        }
        return clipped;
    }

    private static void requireArrays(Object source, Object destination) {
        Objects.requireNonNull(source, "source");
        Objects.requireNonNull(destination, "destination");
    }

    private static void checkRange(String name, int length, int offset, int samples, int unitsPerSample) {
        if (samples < 0) {
            throw new IndexOutOfBoundsException("samples is " + samples + "; it must be 0 or more");
        }
        long needed = (long) samples * unitsPerSample;
        if (offset < 0 || needed > (long) length - offset) {
            throw new IndexOutOfBoundsException(name + "Offset is " + offset + " and " + needed + " are needed; both"
                    + " must be 0 or more and their sum at most " + length + ", the length of " + name);
        }
    }

    private double read(byte[] bytes, int at) {
        if (floatingPoint) {
            long word = readWord(bytes, at);
            return bits == 32 ? Float.intBitsToFloat((int) word) : Double.longBitsToDouble(word);
        }
        if (bits == 8) {
            return ((bytes[at] & 0xff) - 128) / fullScale;
        }
        int unused = 64 - bits;
        return (readWord(bytes, at) << unused >> unused) / fullScale;
    }

    private int write(double sample, byte[] bytes, int at) {
        if (floatingPoint) {
            return writeFloatingPoint(sample, bytes, at);
        }
        double rounded = Math.rint(sample * fullScale);
        boolean kept = rounded >= -fullScale && rounded < fullScale;
        // The conversion to long turns NaN into 0.
        long word = (long) Math.max(-fullScale, Math.min(fullScale - 1, rounded));
        writeWord(bits == 8 ? word + 128 : word, bytes, at);
        return kept ? 0 : 1;
    }

    private int writeFloatingPoint(double sample, byte[] bytes, int at) {
        if (bits == 64) {
            writeWord(Double.doubleToRawLongBits(sample), bytes, at);
            return 0;
        }
        float narrowed = (float) sample;
        boolean kept = !Float.isInfinite(narrowed) || Double.isInfinite(sample);
        float held = kept ? narrowed : Math.copySign(Float.MAX_VALUE, narrowed);
        writeWord(Float.floatToRawIntBits(held), bytes, at);
        return kept ? 0 : 1;
    }

    private long readWord(byte[] bytes, int at) {
        int count = bytesPerSample();
        boolean big = byteOrder == ByteOrder.BIG_ENDIAN;
        long word = 0;
        for (int i = 0; i < count; i++) {
            word = (word << 8) | (bytes[big ? at + i : at + count - 1 - i] & 0xff);
        }
        return word;
    }

    private void writeWord(long word, byte[] bytes, int at) {
        int count = bytesPerSample();
        boolean big = byteOrder == ByteOrder.BIG_ENDIAN;
        for (int i = 0; i < count; i++) {
            bytes[big ? at + count - 1 - i : at + i] = (byte) (word >> (8 * i));
        }
    }

    @Override
    public boolean equals(@Nullable Object other) {
        return other instanceof PcmFormat that
                && floatingPoint == that.floatingPoint
                && bits == that.bits
                && byteOrder == that.byteOrder;
    }

    @Override
    public int hashCode() {
        return Objects.hash(floatingPoint, bits, byteOrder);
    }

    /** Such as "24-bit integer, LITTLE_ENDIAN". */
    @Override
    public String toString() {
        return bits + "-bit " + (floatingPoint ? "floating point" : "integer") + ", " + byteOrder;
    }
}
