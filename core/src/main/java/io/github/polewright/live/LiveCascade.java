package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.retune.Glide;
import io.github.polewright.retune.Pace;
import io.github.polewright.slab.Ranges;
import io.github.polewright.slab.Slab;
import java.nio.FloatBuffer;
import java.util.Objects;
import java.util.concurrent.atomic.AtomicLong;

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

    private static final double GAIN_SECONDS = 0.05;
    private static final double MOST_GAIN_DB = 120;
    private static final double MOST_WARM_UP_SECONDS = 600;

    private final double sampleRateHz;
    private final int channels;
    private final int mostSections;
    private final Pace pace;
    private final Form form;
    private final Engine engine;
    private final Slab slab;
    private final Orders orders;
    private final StatusBoard board = new StatusBoard();
    private final AtomicLong replacedInputs = new AtomicLong();
    private final AtomicLong replacedOutputs = new AtomicLong();
    private final AtomicLong restarts = new AtomicLong();
    private Order order;
    private long adopted;

    LiveCascade(Cascade cascade, int channels, Form form, int mostSections, Pace pace) {
        this.sampleRateHz = cascade.sampleRateHz();
        this.channels = channels;
        this.mostSections = mostSections;
        this.pace = pace;
        this.form = form;
        Cascade slots = Fit.inSlots(cascade, mostSections);
        this.orders = new Orders(slots);
        this.order = orders.latestAcquire();
        this.engine = new Engine(form, channels, slots, (int) Math.max(1, Math.round(GAIN_SECONDS * sampleRateHz)));
        this.slab = engine.slab();
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
        Ranges.interleaved("source", source, sourceOffset, frames, channels);
        Ranges.interleaved("destination", destination, destinationOffset, frames, channels);
        Ranges.apart(source == destination, sourceOffset, destinationOffset, frames, channels);
        begin();
        for (int done = 0; done < frames; ) {
            int piece = engine.nextPiece(frames - done);
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
        Ranges.interleaved("source", source, sourceOffset, frames, channels);
        Ranges.interleaved("destination", destination, destinationOffset, frames, channels);
        Ranges.apart(source == destination, sourceOffset, destinationOffset, frames, channels);
        begin();
        for (int done = 0; done < frames; ) {
            int piece = engine.nextPiece(frames - done);
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
            int piece = engine.nextPiece(frames - done);
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
            int piece = engine.nextPiece(frames - done);
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
     * Lets the JVM compile the loops before the stream starts: runs a twin of this cascade on scratch samples until the
     * cost of a block no longer falls. This cascade's states, coefficients and counters stay as they are. Without it the
     * first blocks are some fifty times slower, and the JVM itself allocates a few hundred bytes on the audio thread
     * when it takes up a method for compiling. Control thread; takes a core for as long as it lasts, typically half a
     * second.
     *
     * @param mostSeconds when to stop in any case, above 0 to 600
     * @return how the cost fell
     * @throws IllegalArgumentException if {@code mostSeconds} is out of range
     */
    public WarmUp warmUp(double mostSeconds) {
        if (!(mostSeconds > 0 && mostSeconds <= MOST_WARM_UP_SECONDS)) {
            throw new IllegalArgumentException(
                    "mostSeconds is " + mostSeconds + "; it must be above 0 and at most " + MOST_WARM_UP_SECONDS);
        }
        return new Warming(twin(), System::nanoTime).run(mostSeconds);
    }

    /** A silent one of the same shape that passes everything through. */
    LiveCascade twin() {
        return new LiveCascade(Cascade.of(sampleRateHz, Section.PASS_THROUGH), channels, form, mostSections, pace);
    }

    /**
     * Makes this cascade become another in the default glide: {@link Glide#sweeping} at the pace this was built with,
     * {@link Pace#SINGLE} unless said. Any thread, at any time; lock-free. The latest call wins, and the next block
     * begins it from wherever the coefficients are; sections that the target lacks pass through.
     *
     * @param target the cascade to become
     * @return the glide that was handed over, with its certificates
     * @throws IllegalArgumentException if its sample rate differs, it has more sections than
     *     {@link #mostSections()}, or it is unstable or too near to it for a glide that ends
     */
    public Glide retune(Cascade target) {
        return retune(target, pace);
    }

    /**
     * Makes this cascade become another at a pace of its own; never faster than is certified. Otherwise as
     * {@link #retune(Cascade)}.
     *
     * @param target the cascade to become
     * @param pace how long and how evenly
     * @return the glide that was handed over
     * @throws IllegalArgumentException as {@link #retune(Cascade)}
     */
    public Glide retune(Cascade target, Pace pace) {
        Objects.requireNonNull(pace, "pace");
        Fit.checkRate(target, sampleRateHz);
        Fit.check(target, mostSections);
        return orders.retune(target, pace);
    }

    /**
     * Hands over a glide prepared elsewhere. Its sections take the slots of the running ones nearest to where it begins.
     * Otherwise as {@link #retune(Cascade)}.
     *
     * @param glide the glide
     * @return the glide as handed over, its sections in this cascade's slots
     * @throws IllegalArgumentException if its sample rate differs or it needs more sections than
     *     {@link #mostSections()}
     */
    public Glide retune(Glide glide) {
        return orders.retune(Objects.requireNonNull(glide, "glide"));
    }

    /**
     * Fades from the sections to the input, or back, within 50 ms. The sections go on running, so that they are heard
     * again as if they had never been away; retunes meanwhile are walked unheard. The output gain holds for both. Any
     * thread, at any time; lock-free.
     *
     * @param on whether the input is heard instead of the sections
     */
    public void bypass(boolean on) {
        orders.bypass(on);
    }

    /**
     * Moves a gain behind the sections, which is 0 dB at first, within 50 ms. Any thread, at any time; lock-free.
     *
     * @param gainDb decibels, at most 120; negative infinity is silence
     * @throws IllegalArgumentException if {@code gainDb} is NaN or above 120
     */
    public void outputGainDb(double gainDb) {
        if (!(gainDb <= MOST_GAIN_DB)) {
            throw new IllegalArgumentException("gainDb is " + gainDb + "; it must be at most " + MOST_GAIN_DB);
        }
        orders.gain(Math.pow(10, gainDb / 20));
    }

    /**
     * Whether the coefficients and the output gain stand still on the latest target, as of the last block. Any thread.
     *
     * @return false while a target waits for the next block or a glide is under way
     */
    public boolean isSettled() {
        return board.isSettledAcquire(orders.latestAcquire());
    }

    /**
     * How far retunes have got, as of the last block. Any thread; allocates its answer.
     *
     * @return the figures
     */
    public RetuneStatus retuneStatus() {
        return board.readAcquire(orders.latestAcquire());
    }

    /**
     * The cascade that the latest retune asked for, whether it has been reached or not. Any thread.
     *
     * @return one section for each of {@link #mostSections()}; free ones pass through
     */
    public Cascade target() {
        return orders.latestAcquire().heading();
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

    /** Form, channels, sample rate and sections in one line. Any thread; reads nothing that the audio thread writes. */
    @Override
    public String toString() {
        return form + " at " + sampleRateHz + " Hz, channels: " + channels + ", sections at most: " + mostSections;
    }

    private void begin() {
        Order latest = orders.latestAcquire();
        if (latest.number() != order.number()) {
            if (latest.glideNumber() != order.glideNumber()) {
                engine.walk().adopt(latest.glide());
            }
            engine.gain().moveTo(latest.gain());
            engine.presence().moveTo(latest.bypassed() ? 0 : 1);
            order = latest;
            adopted++;
            orders.adoptedRelease(latest);
        }
    }

    private void end() {
        int fading = Math.max(engine.gain().framesLeft(), engine.presence().framesLeft());
        board.writeRelease(engine.walk(), fading, adopted, order.number());
        replacedInputs.setRelease(slab.replacedInputs());
        replacedOutputs.setRelease(slab.replacedOutputs());
        restarts.setRelease(engine.restarts());
    }
}
