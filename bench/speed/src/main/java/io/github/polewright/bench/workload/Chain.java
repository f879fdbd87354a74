package io.github.polewright.bench.workload;

import io.github.polewright.live.Form;
import java.util.Objects;

/**
 * A described chain: a comb of notches inside a callback.
 *
 * @param sampleRateHz hertz
 * @param channels samples a frame
 * @param frames frames a block
 * @param sections notches in series
 * @param form how a steady section is computed
 */
public record Chain(double sampleRateHz, int channels, int frames, int sections, Form form) {

    private static final double LEAST_RATE_HZ = 1_000;
    private static final double MOST_RATE_HZ = 10_000_000;
    private static final int MOST_FRAMES = 1 << 20;
    private static final int MOST_COUNT = 1024;

    /**
     * Checks the ranges.
     *
     * @throws IllegalArgumentException if the rate is not from 1 kHz to 10 MHz, frames not from 1 to 2^20, or channels
     *     or sections not from 1 to 1024
     */
    public Chain {
        Objects.requireNonNull(form, "form");
        if (!(sampleRateHz >= LEAST_RATE_HZ && sampleRateHz <= MOST_RATE_HZ)) {
            throw new IllegalArgumentException(
                    "sample rate is " + sampleRateHz + "; it must be from " + LEAST_RATE_HZ + " to " + MOST_RATE_HZ);
        }
        inRange("channels", channels, MOST_COUNT);
        inRange("frames", frames, MOST_FRAMES);
        inRange("sections", sections, MOST_COUNT);
    }

    private static void inRange(String name, int value, int most) {
        if (value < 1 || value > most) {
            throw new IllegalArgumentException(name + " is " + value + "; it must be from 1 to " + most);
        }
    }

    /**
     * The time between two callbacks.
     *
     * @return nanoseconds
     */
    public double periodNanos() {
        return frames * 1e9 / sampleRateHz;
    }

    /**
     * Samples of a block.
     *
     * @return frames times channels
     */
    public int samples() {
        return frames * channels;
    }

    /**
     * The work of a block: how often a section meets a sample.
     *
     * @return samples times sections
     */
    public long work() {
        return (long) samples() * sections;
    }

    /**
     * The same chain with other blocks.
     *
     * @param count frames a block
     * @return the chain
     */
    public Chain withFrames(int count) {
        return new Chain(sampleRateHz, channels, count, sections, form);
    }

    /**
     * The same chain, longer or shorter.
     *
     * @param count sections in series
     * @return the chain
     */
    public Chain withSections(int count) {
        return new Chain(sampleRateHz, channels, frames, count, form);
    }

    /**
     * The same chain, wider or narrower.
     *
     * @param count channels
     * @return the chain
     */
    public Chain withChannels(int count) {
        return new Chain(sampleRateHz, count, frames, sections, form);
    }

    /**
     * The same filter in another form.
     *
     * @param choice the form
     * @return the chain
     */
    public Chain withForm(Form choice) {
        return new Chain(sampleRateHz, channels, frames, sections, choice);
    }
}
