package io.github.polewright.stress;

import org.openjdk.jcstress.annotations.Actor;
import org.openjdk.jcstress.annotations.Arbiter;
import org.openjdk.jcstress.annotations.Expect;
import org.openjdk.jcstress.annotations.JCStressTest;
import org.openjdk.jcstress.annotations.Outcome;
import org.openjdk.jcstress.annotations.State;
import org.openjdk.jcstress.infra.results.II_Result;

/** One thread retunes, one bypasses: neither may be lost, whichever came first. */
@JCStressTest
@Outcome(id = "1, 27", expect = Expect.ACCEPTABLE, desc = "dry, and the new target when the sections are back")
@Outcome(expect = Expect.FORBIDDEN, desc = "the bypass or the retune lost")
@State
public class RetuneAndBypass extends Gains {

    /** Control thread. */
    @Actor
    public void control() {
        three();
    }

    /** Another one. */
    @Actor
    public void otherControl() {
        bypass(true);
    }

    /** Audio thread, when both are done. */
    @Arbiter
    public void end(II_Result result) {
        result.r1 = settled();
        bypass(false);
        result.r2 = settled();
    }
}
