package io.github.polewright.bench.workload;

/** Copies the block and does nothing else: the price of touching the samples at all. */
public final class CopyRig extends Rig {

    /**
     * A rig without state.
     *
     * @param chain tells the size
     * @param tape the samples
     */
    public CopyRig(Chain chain, Tape tape) {
        super(chain, tape);
    }

    @Override
    public void excite() {}

    @Override
    public void block() {
        if (tape().format() == Samples.FLOAT) {
            System.arraycopy(tape().floatSource(), 0, tape().floatDestination(), 0, chain().samples());
        } else {
            System.arraycopy(tape().doubleSource(), 0, tape().doubleDestination(), 0, chain().samples());
        }
    }
}
