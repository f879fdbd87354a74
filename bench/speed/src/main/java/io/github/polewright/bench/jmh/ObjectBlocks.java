package io.github.polewright.bench.jmh;

import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.ObjectRig;
import io.github.polewright.bench.workload.Rig;
import io.github.polewright.bench.workload.Tape;

/** The textbook cascade, an object a section. */
public class ObjectBlocks extends BlockBenchmark {

    @Override
    Rig rig(Chain chain, Tape tape) {
        return new ObjectRig(chain, tape);
    }
}
