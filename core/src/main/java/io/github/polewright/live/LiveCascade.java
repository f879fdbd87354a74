package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.slab.Ranges;
import io.github.polewright.slab.Slab;
import java.nio.FloatBuffer;
import java.util.Objects;
import java.util.concurrent.atomic.AtomicLong;
import java.util.concurrent.atomic.AtomicReference;

/**
 * A cascade that runs: filters blocks of samples on the audio thread and takes a new cascade from any other thread
 * without a click. The only mutable object of the library that a stream needs.
 *
 * <p>Arithmetic and states are {@code double}, whatever the samples are. There is no latency. Any way of cutting a
 * stream into blocks gives the same output bit for bit, interleaved or planar, and channels do not touch each other.
 *
 * <p><b>Units</b> offsets in samples, lengths in frames (one sample of each channel), full scale is 1. <b>Threads</b>
 * {@code process} and {@link #reset()} belong to one audio thread; {@link #retune} and all questions may be asked from
 * any thread at any time. <b>Allocation</b> none in {@code process}, which takes no lock and ends after a number of
 * steps that other threads cannot change. <b>Errors</b> arguments are checked before a sample or state is touched; no
 * sample's value ever throws. <b>Numbers</b> a non-finite input sample counts as silence; {@code double} input below
 * 1e-30 counts as zero; a channel whose state overflows restarts from silence; both are counted. States that fall below
 * 1e-30 become exactly zero, so a decaying tail never costs more than music.
 *
 * <p>A filter with gain makes loud output. Keep a limiter behind it where someone listens.
 */
public final class LiveCascade {

    private final double sampleRateHz;
    private final int channels;
    private final int mostSections;
    private final int rampFrames;
    private final Engine engine;
    private final Slab slab;
    private final AtomicReference<Path> slot;
    private final AtomicLong framesLeft = new AtomicLong();
    private final AtomicLong adopted = new AtomicLong();
    private final AtomicLong replacedInputs = new AtomicLong();
    private final AtomicLong replacedOutputs = new AtomicLong();
    private final AtomicLong restarts = new AtomicLong();

    LiveCascade(Cascade cascade, int channels, Form form, int mostSections, int rampFrames) {
        this.sampleRateHz = cascade.sampleRateHz();
        this.channels = channels;
        this.mostSections = mostSections;
        this.rampFrames = rampFrames;
        Path initial = new Path(0, new int[] {1}, new double[][] {coefficients(cascade)});
        this.engine = new Engine(form, channels, mostSections, initial);
        this.slab = engine.slab();
        this.slot = new AtomicReference<>(initial);
    }

    /**
     * A live cascade in direct form I with room for as many sections as the cascade has.
     *
     * @param cascade what it does until it is retuned
     * @param channels at least 1
     * @return the live cascade, silent and settled
     * @throws IllegalArgumentException if {@code channels < 1} or the cascade is unstable
     */
    public static LiveCascade of(Cascade cascade, int channels) {
        return builder(cascade).channels(channels).build();
    }

    /**
     * A live cascade with more to choose.
     *
     * @param cascade what it does until it is retuned
     * @return a builder with its defaults
     */
    public static LiveCascadeBuilder builder(Cascade cascade) {
        return new LiveCascadeBuilder(cascade);
    }

    /**
     * Filters interleaved frames. Source and destination may be the same range. Audio thread, wait-free.
     *
     * @param source interleaved samples
     * @param sourceOffset of the first sample read
     * @param destination interleaved samples
     * @param destinationOffset of the first sample written
     * @param frames how many; 0 does nothing
     * @throws IllegalArgumentException if {@code frames < 0} or the two ranges overlap in part
     * @throws IndexOutOfBoundsException if a range does not lie in its array
     */
    public void process(float[] source, int sourceOffset, float[] destination, int destinationOffset, int frames) {
        Ranges.interleaved("source", source.length, sourceOffset, frames, channels);
        Ranges.interleaved("destination", destination.length, destinationOffset, frames, channels);
        Ranges.apart(source == destination, sourceOffset, destinationOffset, frames, channels);
        begin();
        for (int done = 0; done < frames; ) {
            int piece = engine.pieceFrames(frames - done);
            slab.load(source, sourceOffset + done * channels, piece);
            engine.run(piece);
            slab.store(destination, destinationOffset + done * channels, piece);
            done += piece;
        }
        end();
    }

    /**
     * Filters interleaved frames. Source and destination may be the same range. Audio thread, wait-free.
     *
     * @param source interleaved samples
     * @param sourceOffset of the first sample read
     * @param destination interleaved samples
     * @param destinationOffset of the first sample written
     * @param frames how many; 0 does nothing
     * @throws IllegalArgumentException if {@code frames < 0} or the two ranges overlap in part
     * @throws IndexOutOfBoundsException if a range does not lie in its array
     */
    public void process(double[] source, int sourceOffset, double[] destination, int destinationOffset, int frames) {
        Ranges.interleaved("source", source.length, sourceOffset, frames, channels);
        Ranges.interleaved("destination", destination.length, destinationOffset, frames, channels);
        Ranges.apart(source == destination, sourceOffset, destinationOffset, frames, channels);
        begin();
        for (int done = 0; done < frames; ) {
            int piece = engine.pieceFrames(frames - done);
            slab.load(source, sourceOffset + done * channels, piece);
            engine.run(piece);
            slab.store(destination, destinationOffset + done * channels, piece);
            done += piece;
        }
        end();
    }

    /**
     * Filters planar frames, one array a channel, as plug-in hosts hand them. A plane may be its own destination.
     * Audio thread, wait-free.
     *
     * @param source one array a channel
     * @param destination one array a channel
     * @param offset of the first frame in every array
     * @param frames how many; 0 does nothing
     * @throws IllegalArgumentException if {@code frames < 0}, a count of planes is not {@link #channels()}, or one
     *     plane serves two channels
     * @throws IndexOutOfBoundsException if the range does not lie in every array
     */
    public void process(float[][] source, float[][] destination, int offset, int frames) {
        Ranges.planar(source, destination, offset, frames, channels);
        begin();
        for (int done = 0; done < frames; ) {
            int piece = engine.pieceFrames(frames - done);
            slab.load(source, offset + done, piece);
            engine.run(piece);
            slab.store(destination, offset + done, piece);
            done += piece;
        }
        end();
    }

    /**
     * Filters interleaved frames in direct buffers, from each buffer's position on; positions and limits stay as they
     * are. The buffers may be the same; that two different ones share memory cannot be told and is the caller's care.
     * Audio thread, wait-free.
     *
     * @param source direct, in native order
     * @param destination direct, in native order, writable
     * @param frames how many; 0 does nothing
     * @throws IllegalArgumentException if {@code frames < 0}, or a buffer is not direct, not in native order, or
     *     read-only where it would be written
     * @throws IndexOutOfBoundsException if a buffer has fewer samples left than the frames need
     */
    public void process(FloatBuffer source, FloatBuffer destination, int frames) {
        Ranges.direct("source", source, false, frames, channels);
        Ranges.direct("destination", destination, true, frames, channels);
        begin();
        int sourceOffset = source.position();
        int destinationOffset = destination.position();
        for (int done = 0; done < frames; ) {
            int piece = engine.pieceFrames(frames - done);
            slab.load(source, sourceOffset + done * channels, piece);
            engine.run(piece);
            slab.store(destination, destinationOffset + done * channels, piece);
            done += piece;
        }
        end();
    }

    /**
     * Silences all states, as at the start of a stream. Coefficients, and a glide under way, stay as they are. Audio
     * thread, or any thread while no audio runs.
     */
    public void reset() {
        engine.reset();
    }

    /**
     * Makes this cascade become another, in a ramp from wherever its coefficients are when the next block begins. Any
     * thread, at any time; returns at once. The latest call wins; sections that the target lacks pass through.
     *
     * @param target the cascade to become
     * @throws IllegalArgumentException if its sample rate differs, it has more sections than
     *     {@link #mostSections()}, or it is unstable
     */
    public void retune(Cascade target) {
        checkRate(target);
        checkFits(target, mostSections);
        int[] frames = {rampFrames};
        double[][] knots = {coefficients(target)};
        slot.updateAndGet(before -> new Path(before.number() + 1, frames, knots));
    }

    /**
     * Whether the coefficients stand still on the latest target, as of the last block. Any thread.
     *
     * @return false while a target waits for the next block or a glide is under way
     */
    public boolean isSettled() {
        return slot.getAcquire().number() == adopted.getAcquire() && framesLeft.getAcquire() == 0;
    }

    /**
     * The channels of every frame.
     *
     * @return at least 1
     */
    public int channels() {
        return channels;
    }

    /**
     * The sample rate of the cascade and of every target.
     *
     * @return hertz
     */
    public double sampleRateHz() {
        return sampleRateHz;
    }

    /**
     * The most sections a target may have.
     *
     * @return at least 1
     */
    public int mostSections() {
        return mostSections;
    }

    /**
     * Input samples that were not finite and were taken for silence, as of the last block. Any thread.
     *
     * @return a count that only grows
     */
    public long replacedInputSamples() {
        return replacedInputs.getAcquire();
    }

    /**
     * Output samples that were not finite in the destination's format and were written as silence, as of the last
     * block. Any thread.
     *
     * @return a count that only grows
     */
    public long replacedOutputSamples() {
        return replacedOutputs.getAcquire();
    }

    /**
     * How often a channel restarted from silence because its state was no longer finite, as of the last block. Any
     * thread.
     *
     * @return a count that only grows
     */
    public long channelRestarts() {
        return restarts.getAcquire();
    }

    private void begin() {
        Path latest = slot.getAcquire();
        if (latest != engine.course().path()) {
            engine.course().adopt(latest);
        }
    }

    private void end() {
        framesLeft.setRelease(engine.course().framesLeft());
        adopted.setRelease(engine.course().path().number());
        replacedInputs.setRelease(slab.replacedInputs());
        replacedOutputs.setRelease(slab.replacedOutputs());
        restarts.setRelease(engine.restarts());
    }

    private void checkRate(Cascade target) {
        if (target.sampleRateHz() != sampleRateHz) {
            throw new IllegalArgumentException(
                    "target's sampleRateHz is " + target.sampleRateHz() + "; it must be " + sampleRateHz);
        }
    }

    static void checkFits(Cascade cascade, int mostSections) {
        Objects.requireNonNull(cascade, "cascade");
        if (cascade.sectionCount() > mostSections) {
            throw new IllegalArgumentException(
                    "the cascade has " + cascade.sectionCount() + " sections; it must have 1 to " + mostSections);
        }
        for (int i = 0; i < cascade.sectionCount(); i++) {
            if (!cascade.section(i).isStable()) {
                throw new IllegalArgumentException("section " + i + " is " + cascade.section(i)
                        + "; it must be stable (|a2| < 1 and |a1| < 1 + a2)");
            }
        }
    }

    private double[] coefficients(Cascade cascade) {
        double[] coefficients = new double[5 * mostSections];
        for (int i = 0; i < mostSections; i++) {
            Section section = i < cascade.sectionCount() ? cascade.section(i) : Section.PASS_THROUGH;
            coefficients[5 * i] = section.b0();
            coefficients[5 * i + 1] = section.b1();
            coefficients[5 * i + 2] = section.b2();
            coefficients[5 * i + 3] = section.a1();
            coefficients[5 * i + 4] = section.a2();
        }
        return coefficients;
    }
}
