package io.github.polewright.samples.retune;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.design.Cookbook;
import io.github.polewright.live.LiveCascade;
import io.github.polewright.retune.Glide;
import java.util.function.Consumer;

/** A chord behind a low-pass that moves up and down, once swapped hard and once as glides. */
public final class Comparison {

    private static final double[] CHORD_HZ = {220, 277.18, 329.63};
    private static final double LOW_HZ = 200;
    private static final double HIGH_HZ = 5000;
    private static final double Q = 0.7071;
    private static final double HOLD_SECONDS = 0.5;
    private static final double LEVEL = 0.12;

    private final double sampleRateHz;
    private final double[] chord;
    private final int holdFrames;
    private final Section low;
    private final Section high;

    /** Of that many seconds. */
    public Comparison(double sampleRateHz, double seconds) {
        this.sampleRateHz = sampleRateHz;
        this.holdFrames = (int) (HOLD_SECONDS * sampleRateHz);
        this.low = Cookbook.lowPass(sampleRateHz, LOW_HZ, Q);
        this.high = Cookbook.lowPass(sampleRateHz, HIGH_HZ, Q);
        this.chord = new double[(int) (seconds * sampleRateHz)];
        for (int n = 0; n < chord.length; n++) {
            for (double hz : CHORD_HZ) {
                chord[n] += LEVEL * Math.sin(2 * Math.PI * hz * n / sampleRateHz);
            }
        }
    }

    /** Swapped hard every half second. */
    public double[] swapped() {
        double[] samples = chord.clone();
        HardSwap filter = new HardSwap();
        for (int from = 0; from < samples.length; from += holdFrames) {
            filter.run(at(from), samples, from, Math.min(samples.length, from + holdFrames));
        }
        return samples;
    }

    /** Glides begun every half second; the first is told to a listener. */
    public double[] glided(Consumer<Glide> listener) {
        double[] samples = chord.clone();
        LiveCascade live = LiveCascade.of(Cascade.of(sampleRateHz, high), 1);
        for (int from = 0; from < samples.length; from += holdFrames) {
            if (from > 0) {
                Glide glide = live.retune(Cascade.of(sampleRateHz, at(from)));
                if (from == holdFrames) {
                    listener.accept(glide);
                }
            }
            int frames = Math.min(holdFrames, samples.length - from);
            live.process(samples, from, samples, from, frames);
        }
        return samples;
    }

    private Section at(int frame) {
        return frame / holdFrames % 2 == 0 ? high : low;
    }
}
