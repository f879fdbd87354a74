package io.github.polewright.bench.workload;

import java.util.Arrays;
import java.util.SplittableRandom;

/** One block of samples going in, again and again, and the place where the filtered block goes. */
public final class Tape {

    /** Blocks of noise that excite a rig before a decay. */
    public static final int BURST_BLOCKS = 4;

    private static final long SEED = 20_260_101;
    private static final double AMPLITUDE = 0.5;
    private static final float SUBNORMAL_FLOAT = 1e-40f;
    private static final double SUBNORMAL_DOUBLE = 1e-310;

    private final Samples format;
    private final double[] source;
    private final double[] burst;
    private final double[] destination;
    private final float[] floatSource;
    private final float[] floatBurst;
    private final float[] floatDestination;

    /**
     * A tape.
     *
     * @param chain tells the size
     * @param format of the samples
     * @param signal what goes in
     */
    public Tape(Chain chain, Samples format, Signal signal) {
        this.format = format;
        this.burst = noise(chain.samples());
        this.source = new double[chain.samples()];
        this.destination = new double[chain.samples()];
        switch (signal) {
            case NOISE -> System.arraycopy(burst, 0, source, 0, source.length);
            case DECAY -> Arrays.fill(source, 0);
            case SUBNORMAL -> scale(burst, format == Samples.FLOAT ? SUBNORMAL_FLOAT : SUBNORMAL_DOUBLE, source);
        }
        this.floatSource = floats(source);
        this.floatBurst = floats(burst);
        this.floatDestination = floats(destination);
    }

    private static double[] noise(int count) {
        SplittableRandom random = new SplittableRandom(SEED);
        double[] noise = new double[count];
        for (int i = 0; i < count; i++) {
            noise[i] = (float) (AMPLITUDE * (2 * random.nextDouble() - 1));
        }
        return noise;
    }

    private static void scale(double[] from, double factor, double[] to) {
        for (int i = 0; i < from.length; i++) {
            to[i] = factor * from[i];
        }
    }

    private static float[] floats(double[] samples) {
        float[] narrow = new float[samples.length];
        for (int i = 0; i < narrow.length; i++) {
            narrow[i] = (float) samples[i];
        }
        return narrow;
    }

    /**
     * The format of the samples.
     *
     * @return which pair of arrays is in use
     */
    public Samples format() {
        return format;
    }

    float[] floatSource() {
        return floatSource;
    }

    float[] floatBurst() {
        return floatBurst;
    }

    float[] floatDestination() {
        return floatDestination;
    }

    double[] doubleSource() {
        return source;
    }

    double[] doubleBurst() {
        return burst;
    }

    double[] doubleDestination() {
        return destination;
    }

    /**
     * The block that goes in.
     *
     * @return a copy, at full width
     */
    public double[] input() {
        return format == Samples.FLOAT ? doubles(floatSource) : source.clone();
    }

    /**
     * The block of noise that {@link Rig#excite()} plays {@link #BURST_BLOCKS} times.
     *
     * @return a copy, at full width
     */
    public double[] burst() {
        return burst.clone();
    }

    /**
     * The block that came out last.
     *
     * @return a copy, at full width
     */
    public double[] output() {
        return format == Samples.FLOAT ? doubles(floatDestination) : destination.clone();
    }

    private static double[] doubles(float[] samples) {
        double[] wide = new double[samples.length];
        for (int i = 0; i < wide.length; i++) {
            wide[i] = samples[i];
        }
        return wide;
    }
}
