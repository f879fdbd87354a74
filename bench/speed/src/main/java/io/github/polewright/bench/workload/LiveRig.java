package io.github.polewright.bench.workload;

import io.github.polewright.Cascade;
import io.github.polewright.live.LiveCascade;
import io.github.polewright.retune.Pace;

/** A live cascade on a tape. */
public final class LiveRig extends Rig {

    /** Long enough that a new ramp is begun less than once in ten thousand blocks of 64 frames. */
    private static final int LONG_RAMP_FRAMES = 1 << 20;

    private static final int RETUNED_RAMP_FRAMES = 4096;

    private final Motion motion;
    private final Cascade[] targets;
    private final LiveCascade live;
    private int retunes;

    /**
     * Silent until excited.
     *
     * @param chain what is run
     * @param tape the samples
     * @param motion what the coefficients do
     */
    public LiveRig(Chain chain, Tape tape, Motion motion) {
        super(chain, tape);
        this.motion = motion;
        this.targets = new Cascade[] {Combs.movedComb(chain), Combs.comb(chain)};
        int glideFrames = motion == Motion.RAMPING ? LONG_RAMP_FRAMES : RETUNED_RAMP_FRAMES;
        this.live = LiveCascade.builder(Combs.comb(chain))
                .channels(chain.channels())
                .form(chain.form())
                .pace(Pace.FOLLOWING.atLeastSeconds(glideFrames / chain.sampleRateHz()))
                .build();
        keepMoving();
    }

    /**
     * What is measured.
     *
     * @return the live cascade
     */
    public LiveCascade live() {
        return live;
    }

    @Override
    public void excite() {
        live.reset();
        for (int i = 0; i < Tape.BURST_BLOCKS; i++) {
            if (tape().format() == Samples.FLOAT) {
                process(tape().floatBurst());
            } else {
                process(tape().doubleBurst());
            }
        }
    }

    @Override
    public void betweenBlocks() {
        if (motion == Motion.RETUNED) {
            retune();
        }
    }

    @Override
    public void block() {
        if (tape().format() == Samples.FLOAT) {
            process(tape().floatSource());
        } else {
            process(tape().doubleSource());
        }
        keepMoving();
    }

    private void keepMoving() {
        if (motion == Motion.RAMPING && live.isSettled()) {
            retune();
        }
    }

    /** Hands over the next target, as a control thread does. */
    public void retune() {
        live.retune(targets[retunes++ & 1]);
    }

    private void process(float[] source) {
        live.process(source, 0, tape().floatDestination(), 0, chain().frames());
    }

    private void process(double[] source) {
        live.process(source, 0, tape().doubleDestination(), 0, chain().frames());
    }
}
