package io.github.polewright.samples.scene;

import java.util.Random;

/** Mains hum whose frequency drifts: a straight slope with a slow sway, and harmonics that fall off unevenly. */
public final class MainsHum {

    private static final double SWAY_SECONDS = 23;

    private final double startHz;
    private final double slopeHzPerSecond;
    private final double swayHz;
    private final double[] sizes;
    private final double[] phases;

    public MainsHum(double startHz, double slopeHzPerSecond, double swayHz, int harmonics, long seed) {
        this.startHz = startHz;
        this.slopeHzPerSecond = slopeHzPerSecond;
        this.swayHz = swayHz;
        Random random = new Random(seed);
        sizes = new double[harmonics + 1];
        phases = new double[harmonics + 1];
        for (int k = 1; k <= harmonics; k++) {
            sizes[k] = (0.5 + random.nextDouble()) / k;
            phases[k] = 2 * Math.PI * random.nextDouble();
        }
    }

    public double frequencyHz(double seconds) {
        return startHz + slopeHzPerSecond * seconds + swayHz * Math.sin(2 * Math.PI * seconds / SWAY_SECONDS);
    }

    /** Cycles of the fundamental since the start. */
    private double cycles(double seconds) {
        double sway = swayHz * SWAY_SECONDS / (2 * Math.PI);
        return startHz * seconds
                + slopeHzPerSecond * seconds * seconds / 2
                + sway * (1 - Math.cos(2 * Math.PI * seconds / SWAY_SECONDS));
    }

    /** One value of it, with harmonic sizes of about 1 / k. */
    public double at(double seconds) {
        double cycles = cycles(seconds);
        double sum = 0;
        for (int k = 1; k < sizes.length; k++) {
            sum += sizes[k] * Math.sin(2 * Math.PI * k * cycles + phases[k]);
        }
        return sum;
    }
}
