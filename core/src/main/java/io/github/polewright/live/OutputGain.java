package io.github.polewright.live;

/** A gain behind the sections that moves along a smoothstep, 3u^2 - 2u^3, from wherever it is. The audio thread's own. */
final class OutputGain {

    private final int glideFrames;
    private final double scale;
    private double from = 1;
    private double target = 1;
    private int passed;

    OutputGain(int glideFrames) {
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
