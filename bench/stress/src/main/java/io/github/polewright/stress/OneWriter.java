package io.github.polewright.stress;

import org.openjdk.jcstress.annotations.Actor;
import org.openjdk.jcstress.annotations.Arbiter;
import org.openjdk.jcstress.annotations.Expect;
import org.openjdk.jcstress.annotations.JCStressTest;
import org.openjdk.jcstress.annotations.Outcome;
import org.openjdk.jcstress.annotations.State;
import org.openjdk.jcstress.infra.results.III_Result;

/** Two retunes of one thread, two blocks meanwhile, and the block when all has settled. */
@JCStressTest
@Outcome(id = "8, 8, 125", expect = Expect.ACCEPTABLE, desc = "adopted after both blocks")
@Outcome(
        id = {"8, 27, 125", "8, 125, 125"},
        expect = Expect.ACCEPTABLE,
        desc = "adopted between the blocks")
@Outcome(
        id = {"27, 27, 125", "27, 125, 125", "125, 125, 125"},
        expect = Expect.ACCEPTABLE,
        desc = "adopted before")
@Outcome(id = ".*, .*, 8", expect = Expect.FORBIDDEN, desc = "both retunes lost")
@Outcome(id = ".*, .*, 27", expect = Expect.FORBIDDEN, desc = "the last retune lost")
@Outcome(expect = Expect.FORBIDDEN, desc = "a torn set, or an older one after a newer one")
@State
public class OneWriter extends Gains {

    /** Control thread. */
    @Actor
    public void control() {
        three();
        five();
    }

    /** Audio thread. */
    @Actor
    public void audio(III_Result result) {
        result.r1 = block();
        result.r2 = block();
    }

    /** When both are done. */
    @Arbiter
    public void end(III_Result result) {
        result.r3 = settled();
    }
}
