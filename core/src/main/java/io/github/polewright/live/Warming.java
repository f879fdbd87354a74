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

    private static final double LEVEL = 0.98;
    private static final double NANOS_PER_SECOND = 1e9;
    private static final double NANOS_PER_MICRO = 1e3;
    private static final Section ONE = Section.of(0.9, -0.5, 0.2, -1.2, 0.6);
    private static final Section OTHER = Section.of(0.8, -0.4, 0.2, -1.1, 0.5);

    private final LiveCascade twin;
    private final Glide[] glides;
    private final LongSupplier nanoClock;
    private final int samples;
    private final double[] doubles;
    private final float[] floats;
    private final float[][] planes;
    private final FloatBuffer buffer;
    private int blocks;
    private long firstNanos;

    Warming(LiveCascade twin, LongSupplier nanoClock) {
        this.twin = twin;
        this.nanoClock = nanoClock;
        Cascade one = filled(twin, ONE), other = filled(twin, OTHER);
        this.glides = new Glide[] {Glide.between(one, other, Pace.SINGLE), Glide.between(other, one, Pace.SINGLE)};
        this.samples = Slab.FRAMES * twin.channels();
        this.doubles = new double[samples];
        this.floats = new float[samples];
        this.planes = new float[twin.channels()][Slab.FRAMES];
        this.buffer = ByteBuffer.allocateDirect(samples * Float.BYTES)
                .order(ByteOrder.nativeOrder())
                .asFloatBuffer();
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
            fill(i, round);
            if ((round & 1) == 0 && (i & 3) == 0) {
                order(i >> 2);
            }
            int cut = i == BLOCKS_A_ROUND - 1 ? 1 + round % (Slab.FRAMES - 1) : Slab.FRAMES;
            long from = nanoClock.getAsLong();
            twin.process(doubles, 0, doubles, 0, cut);
            if (blocks == 0) {
                firstNanos = nanoClock.getAsLong() - from;
            }
            twin.process(floats, 0, floats, 0, cut);
            twin.process(planes, planes, 0, cut);
            twin.process(buffer, buffer, cut);
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

    /** Noise in most blocks; silence, dust and rubble in the others. */
    private void fill(int block, int round) {
        Random random = new Random(31L * round + block);
        int kind = block & 15;
        double scale = kind == 13 ? 0 : kind == 14 ? 1e-310 : 0.1;
        for (int i = 0; i < samples; i++) {
            double value = scale * (2 * random.nextDouble() - 1);
            doubles[i] = value;
            floats[i] = (float) value;
            planes[i / Slab.FRAMES][i % Slab.FRAMES] = (float) value;
            buffer.put(i, (float) value);
        }
        if (kind == 15) {
            // One sample that is replaced, and one that makes the channel restart.
            doubles[0] = (round & 1) == 0 ? Double.NaN : Double.MAX_VALUE;
            floats[0] = Float.POSITIVE_INFINITY;
            planes[0][0] = Float.NaN;
            buffer.put(0, Float.NaN);
        }
    }
}
