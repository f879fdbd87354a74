package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.retune.Glide;
import io.github.polewright.retune.Pace;
import io.github.polewright.slab.Slab;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.FloatBuffer;
import java.util.Collections;
import java.util.Random;
import java.util.function.DoubleSupplier;
import java.util.function.LongSupplier;

/**
 * Runs a twin of a live cascade until the JVM has compiled all that an audio thread can reach: both motions, all sample
 * formats, cut blocks, samples that are not finite, states that overflow, tails that die. Control thread.
 */
final class Warming {

    private static final int BLOCKS_A_ROUND = 64;

    /** The JVM's optimizing compiler takes a method up after some 5,000 calls. */
    private static final int LEAST_ROUNDS = 6_000 / BLOCKS_A_ROUND;

    /** It compiles in the background, so some time has to pass as well. */
    private static final double LEAST_SECONDS = 0.3;

    private static final double LEVEL = 0.95;
    private static final double NANOS_PER_SECOND = 1e9;
    private static final double NANOS_PER_MICRO = 1e3;
    private static final Section ONE = Section.of(0.9, -0.5, 0.2, -1.2, 0.6);
    private static final Section OTHER = Section.of(0.8, -0.4, 0.2, -1.1, 0.5);

    private final LiveCascade twin;
    private final Glide[] glides;
    private final LongSupplier nanoClock;
    private final Tape[] tapes;
    private final Tape out;
    private int blocks;
    private long firstNanos;

    Warming(LiveCascade twin, LongSupplier nanoClock) {
        this.twin = twin;
        this.nanoClock = nanoClock;
        Cascade one = filled(twin, ONE), other = filled(twin, OTHER);
        this.glides = new Glide[] {Glide.between(one, other, Pace.SINGLE), Glide.between(other, one, Pace.SINGLE)};
        int channels = twin.channels();
        Random random = new Random(1);
        this.out = new Tape(channels, () -> 0);
        Tape noise = new Tape(channels, () -> 0.2 * random.nextDouble() - 0.1);
        Tape silence = new Tape(channels, () -> 0);
        Tape dust = new Tape(channels, () -> 1e-310 * random.nextDouble());
        // Samples that are replaced, and some that make a channel restart.
        Tape rubble = new Tape(channels, () -> random.nextBoolean() ? Double.NaN : Double.MAX_VALUE);
        this.tapes = new Tape[] {noise, noise, noise, noise, noise, silence, dust, rubble};
    }

    private static Cascade filled(LiveCascade live, Section section) {
        return Cascade.of(live.sampleRateHz(), Collections.nCopies(live.mostSections(), section));
    }

    WarmUp run(double mostSeconds) {
        long start = nanoClock.getAsLong();
        double best = Double.POSITIVE_INFINITY;
        double bestAt = 0;
        double seconds = 0;
        boolean levelled = false;
        for (int round = 0; !levelled && seconds < mostSeconds; round++) {
            double nanos = (double) round(round) / (4 * BLOCKS_A_ROUND);
            seconds = (nanoClock.getAsLong() - start) / NANOS_PER_SECOND;
            if (nanos < LEVEL * best) {
                bestAt = seconds;
            }
            best = Math.min(best, nanos);
            // Nothing gained in the last half of the time: compiled, as far as it goes.
            levelled = round >= LEAST_ROUNDS && seconds >= LEAST_SECONDS && bestAt < seconds / 2;
        }
        return new WarmUp(blocks, seconds, firstNanos / NANOS_PER_MICRO, best / NANOS_PER_MICRO, levelled);
    }

    /** Nanoseconds of filtering in a round. */
    private long round(int round) {
        long sum = 0;
        for (int i = 0; i < BLOCKS_A_ROUND; i++) {
            Tape in = tapes[i & 7];
            if ((round & 1) == 0 && (i & 3) == 0) {
                order(i >> 2);
            }
            int cut = i == BLOCKS_A_ROUND - 1 ? 1 + round % (Slab.FRAMES - 1) : Slab.FRAMES;
            long from = nanoClock.getAsLong();
            twin.process(in.doubles, 0, out.doubles, 0, cut);
            if (blocks == 0) {
                firstNanos = nanoClock.getAsLong() - from;
            }
            twin.process(in.floats, 0, out.floats, 0, cut);
            twin.process(in.planes, out.planes, 0, cut);
            twin.process(in.buffer, out.buffer, cut);
            blocks += 4;
            sum += nanoClock.getAsLong() - from;
        }
        return sum;
    }

    /** Often enough that the way an order is taken up is compiled as well. */
    private void order(int number) {
        switch (number & 7) {
            case 5 -> twin.outputGain(-number);
            case 6 -> twin.bypass(true);
            case 7 -> twin.bypass(false);
            default -> twin.retune(glides[number & 1]);
        }
    }

    /** A block in every format. */
    private static final class Tape {
        final double[] doubles;
        final float[] floats;
        final float[][] planes;
        final FloatBuffer buffer;

        Tape(int channels, DoubleSupplier values) {
            int samples = Slab.FRAMES * channels;
            doubles = new double[samples];
            floats = new float[samples];
            planes = new float[channels][Slab.FRAMES];
            buffer = ByteBuffer.allocateDirect(samples * Float.BYTES)
                    .order(ByteOrder.nativeOrder())
                    .asFloatBuffer();
            for (int i = 0; i < samples; i++) {
                double value = values.getAsDouble();
                doubles[i] = value;
                floats[i] = (float) value;
                planes[i / Slab.FRAMES][i % Slab.FRAMES] = (float) value;
                buffer.put(i, (float) value);
            }
        }
    }
}
