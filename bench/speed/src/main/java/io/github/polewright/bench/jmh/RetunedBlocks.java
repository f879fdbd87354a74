package io.github.polewright.bench.jmh;

import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.LiveRig;
import io.github.polewright.bench.workload.Motion;
import io.github.polewright.bench.workload.Rig;
import io.github.polewright.bench.workload.Tape;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Setup;

/**
 * A live cascade that finds a new target at every block's start. Preparing the target is the control thread's work and
 * is not timed; the clock is read around every block, so blocks should take a microsecond or more.
 */
public class RetunedBlocks extends BlockBenchmark {

    @Override
    Rig rig(Chain chain, Tape tape) {
        return new LiveRig(chain, tape, Motion.RETUNED);
    }

    /** The control thread's work. */
    @Setup(Level.Invocation)
    public void retune() {
        current().betweenBlocks();
    }
}
