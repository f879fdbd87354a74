package io.github.polewright.bench.jmh;

import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.LiveRig;
import io.github.polewright.bench.workload.Motion;
import io.github.polewright.bench.workload.Rig;
import io.github.polewright.bench.workload.Tape;

/** A live cascade that glides all the time. */
public class RampingBlocks extends BlockBenchmark {

    @Override
    Rig rig(Chain chain, Tape tape) {
        return new LiveRig(chain, tape, Motion.RAMPING);
    }
}
