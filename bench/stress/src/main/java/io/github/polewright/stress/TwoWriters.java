package io.github.polewright.stress;

import org.openjdk.jcstress.annotations.Actor;
import org.openjdk.jcstress.annotations.Arbiter;
import org.openjdk.jcstress.annotations.Expect;
import org.openjdk.jcstress.annotations.JCStressTest;
import org.openjdk.jcstress.annotations.Outcome;
import org.openjdk.jcstress.annotations.State;
import org.openjdk.jcstress.infra.results.II_Result;

/** Two threads retune at once: the block when all has settled, and the latest wish. */
@JCStressTest
@Outcome(
        id = {"27, 27", "125, 125"},
        expect = Expect.ACCEPTABLE,
        desc = "the latest retune, whichever that was")
@Outcome(id = "8, .*", expect = Expect.FORBIDDEN, desc = "both retunes lost")
@Outcome(expect = Expect.FORBIDDEN, desc = "a torn set, or the last retune lost")
@State
public class TwoWriters extends Gains {

    /** Control thread. */
    @Actor
    public void control() {
        three();
    }

    /** Another one. */
    @Actor
    public void otherControl() {
        five();
    }

    /** Audio thread, when both are done. */
    @Arbiter
    public void end(II_Result result) {
        result.r1 = settled();
        result.r2 = wished();
    }
}
