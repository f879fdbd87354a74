package io.github.polewright.bench.workload;

import io.github.polewright.bench.contender.ObjectCascade;

/** The textbook cascade of objects on a tape. Its coefficients stand still. */
public final class ObjectRig extends Rig {

    private final ObjectCascade cascade;

    /**
     * Silent until excited.
     *
     * @param chain what is run
     * @param tape the samples
     */
    public ObjectRig(Chain chain, Tape tape) {
        super(chain, tape);
        this.cascade = new ObjectCascade(Combs.comb(chain), chain.channels(), chain.form());
    }

    @Override
    public void excite() {
        for (int i = 0; i < Tape.BURST_BLOCKS; i++) {
            if (tape().format() == Samples.FLOAT) {
                cascade.process(tape().floatBurst(), tape().floatDestination(), chain().frames());
            } else {
                cascade.process(tape().doubleBurst(), tape().doubleDestination(), chain().frames());
            }
        }
    }

    @Override
    public void block() {
        if (tape().format() == Samples.FLOAT) {
            cascade.process(tape().floatSource(), tape().floatDestination(), chain().frames());
        } else {
            cascade.process(tape().doubleSource(), tape().doubleDestination(), chain().frames());
        }
    }
}
