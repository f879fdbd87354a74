package io.github.polewright.bench.workload;

/** Something that filters one block after another, ready to be timed. One thread. */
public abstract class Rig {

    private final Chain chain;
    private final Tape tape;

    Rig(Chain chain, Tape tape) {
        this.chain = chain;
        this.tape = tape;
    }

    /** Brings the states up with a burst of noise, so that a decay has something to decay from. */
    public abstract void excite();

    /** Puts whatever must happen between two blocks there, on the control thread's behalf. Not to be timed. */
    public void betweenBlocks() {}

    /** Filters one block: what is timed. */
    public abstract void block();

    /**
     * What is run.
     *
     * @return the chain
     */
    public final Chain chain() {
        return chain;
    }

    /**
     * The samples that go in and come out.
     *
     * @return the tape
     */
    public final Tape tape() {
        return tape;
    }
}
