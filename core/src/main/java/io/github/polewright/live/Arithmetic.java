package io.github.polewright.live;

/** Decides once whether multiply-add is fused, and does it. */
final class Arithmetic {

    /** Emulated fused multiply-add takes 5 µs and more, the instruction 30 ns even when interpreted. */
    private static final long EMULATED_NANOS = 2_000;

    /** Whether the processor and the JVM fuse multiply and add in one instruction. */
    static final boolean FUSED = probe();

    private Arithmetic() {}

    /** {@code a * b + c}, rounded once where the hardware can, twice where it would have to be emulated. */
    static double mulAdd(double a, double b, double c) {
        return FUSED ? Math.fma(a, b, c) : a * b + c;
    }

    private static boolean probe() {
        double value = 1 / 3.0;
        long least = Long.MAX_VALUE;
        for (int i = 0; i < 3; i++) {
            long start = System.nanoTime();
            value = Math.fma(value, 0.7, 0.1);
            least = Math.min(least, System.nanoTime() - start);
        }
        // The second test is always true; it keeps the three calls from being optimized away.
        return least < EMULATED_NANOS && value > 0;
    }
}
