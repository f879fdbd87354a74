package io.github.polewright.bench.jmh;

import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.CopyRig;
import io.github.polewright.bench.workload.Rig;
import io.github.polewright.bench.workload.Tape;

/** The baseline: the block is copied. Sections, form and signal make no difference here. */
public class CopyBlocks extends BlockBenchmark {

    @Override
    Rig rig(Chain chain, Tape tape) {
        return new CopyRig(chain, tape);
    }
}
