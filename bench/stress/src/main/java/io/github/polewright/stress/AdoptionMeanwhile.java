package io.github.polewright.stress;

import org.openjdk.jcstress.annotations.Actor;
import org.openjdk.jcstress.annotations.Arbiter;
import org.openjdk.jcstress.annotations.Expect;
import org.openjdk.jcstress.annotations.JCStressTest;
import org.openjdk.jcstress.annotations.Outcome;
import org.openjdk.jcstress.annotations.State;
import org.openjdk.jcstress.infra.results.IIII_Result;

/** A thread retunes while the audio thread adopts what it has itself retuned: the latest wins and is never undone. */
@JCStressTest
@Outcome(
        id = {"8, 125, 125, 125", "8, 27, 27, 27", "27, 125, 125, 125", "8, 125, 27, 27"},
        expect = Expect.ACCEPTABLE,
        desc = "whole sets, each at most once, and the latest in the end")
@Outcome(id = ".*, .*, 8, .*", expect = Expect.FORBIDDEN, desc = "both retunes lost")
@Outcome(id = "27, 125, 27, .*", expect = Expect.FORBIDDEN, desc = "an older set after a newer one")
@Outcome(expect = Expect.FORBIDDEN, desc = "a torn set, an older one after a newer one, or the last retune lost")
@State
public class AdoptionMeanwhile extends Gains {

    /** Control thread. */
    @Actor
    public void control() {
        three();
    }

    /** Audio thread, with a retune between its blocks. */
    @Actor
    public void audio(IIII_Result result) {
        result.r1 = block();
        five();
        result.r2 = block();
    }

    /** When both are done. */
    @Arbiter
    public void end(IIII_Result result) {
        result.r3 = settled();
        result.r4 = wished();
    }
}
