package io.github.polewright.live;

/**
 * A factor that moves along a smoothstep, 3u^2 - 2u^3, from wherever it is: the gain behind the sections, and how much
 * of them is heard. The audio thread's own.
 */
final class Fader {

    private final int glideFrames;
    private final double scale;
    private double from = 1;
    private double target = 1;
    private int passed;

    /** Rests at 1. */
    Fader(int glideFrames) {
        this.glideFrames = glideFrames;
        this.scale = 1.0 / glideFrames;
        this.passed = glideFrames;
    }

    void moveTo(double factor) {
        if (factor != target) {
            from = at(passed);
            target = factor;
            passed = 0;
        }
    }

    int framesLeft() {
        return glideFrames - passed;
    }

    /** Whether it rests at 1, so that it changes nothing. */
    boolean isIdle() {
        return target == 1 && passed == glideFrames;
    }

    /** Multiplies one channel's frames; {@link #advance} follows once for all channels. */
    void apply(double[] samples, int first, int frames) {
        if (passed == glideFrames) {
            for (int i = first; target != 1 && i < first + frames; i++) {
                samples[i] *= target;
            }
            return;
        }
        for (int i = 0; i < frames; i++) {
            samples[first + i] *= at(Math.min(glideFrames, passed + 1 + i));
        }
    }

    /** Mixes one channel's frames with the same frames of before: at 0 those, at 1 the samples; exactly at both ends. */
    void blend(double[] before, double[] samples, int first, int frames) {
        for (int i = 0; i < frames; i++) {
            double share = at(Math.min(glideFrames, passed + 1 + i));
            double dry = before[first + i];
            samples[first + i] =
                    share == 0 ? dry : share == 1 ? samples[first + i] : dry + share * (samples[first + i] - dry);
        }
    }

    void advance(int frames) {
        passed = Math.min(glideFrames, passed + frames);
    }

    private double at(int frame) {
        if (frame == glideFrames) {
            return target;
        }
        double u = frame * scale;
        return from + (target - from) * (u * u * (3 - 2 * u));
    }
}
