package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.design.Cookbook;
import io.github.polewright.retune.Pace;
import java.util.SplittableRandom;
import java.util.function.DoubleFunction;
import org.junit.jupiter.api.Test;

/** Streams of retunes, each of which is adopted in the middle of the one before. */
class KnobTest {

    private static final double RATE_HZ = 48_000;
    private static final int EVENT_FRAMES = 816; // 17 ms
    private static final double[] TONES_HZ = {500, 700, 1000, 2000, 4000, 8000};

    /** A knob turned from 500 to 2000 Hz within a second; the worst of six tones beside themselves, in dB. */
    private static double turnDb(DoubleFunction<Section> filter) {
        double worst = Double.NEGATIVE_INFINITY;
        for (double hz : TONES_HZ) {
            int lead = Clicks.WINDOW / 2 - 24_000;
            double[] in = new double[2 * Clicks.WINDOW];
            for (int n = 0; n < in.length; n++) {
                in[n] = Math.sin(2 * Math.PI * hz * n / RATE_HZ);
            }
            double[] out = new double[in.length];
            LiveCascade live = LiveCascade.builder(Cascade.of(RATE_HZ, filter.apply(500)))
                    .pace(Pace.TURNING)
                    .build();
            live.process(in, 0, out, 0, lead);
            int done = lead;
            for (int event = 1; done < in.length; event++) {
                double share = Math.min(1, (double) event * EVENT_FRAMES / 48_000);
                live.retune(Cascade.of(RATE_HZ, filter.apply(500 * Math.pow(4, share))));
                int frames = Math.min(EVENT_FRAMES, in.length - done);
                live.process(in, done, out, done, frames);
                done += frames;
            }
            worst = Math.max(worst, Clicks.besideDb(out, Clicks.WINDOW / 2, hz, RATE_HZ));
        }
        return worst;
    }

    /** What was measured for a stream of 50 ms glides that take over from each other when that length was chosen, and 3 dB. */
    @Test
    void turnedKnobIsAsQuietAsItsLengthWasChosenToBe() {
        double gentle = turnDb(hz -> Cookbook.lowPass(RATE_HZ, hz, 0.7));
        double resonant = turnDb(hz -> Cookbook.lowPass(RATE_HZ, hz, 4));
        double peak = turnDb(hz -> Cookbook.peaking(RATE_HZ, hz, 1, 12));
        assertTrue(gentle <= -81 + 3, gentle + " dB");
        assertTrue(resonant <= -61 + 3, resonant + " dB");
        assertTrue(peak <= -65 + 3, peak + " dB");
    }

    /** A mains notch that follows 40 to 70 Hz within ten seconds, a step each 17 ms, is not heard on a tone. */
    @Test
    void sweptNotchIsNotHeard() {
        int frames = 480_000;
        double[] in = new double[frames + 2 * Clicks.WINDOW];
        for (int n = 0; n < in.length; n++) {
            in[n] = Math.sin(2 * Math.PI * 1000 * n / RATE_HZ);
        }
        double[] out = new double[in.length];
        LiveCascade live = LiveCascade.of(Cascade.of(RATE_HZ, Designs.notch(40, 1)), 1);
        for (int done = 0; done < in.length; done += EVENT_FRAMES) {
            double hz = 40 + 30.0 * Math.min(frames, done) / frames;
            live.retune(Cascade.of(RATE_HZ, Designs.notch(hz, 1)), Pace.FOLLOWING);
            int count = Math.min(EVENT_FRAMES, in.length - done);
            live.process(in, done, out, done, count);
        }
        for (int centre = 100_000; centre < frames; centre += 100_000) {
            double beside = Clicks.besideDb(out, centre, 1000, RATE_HZ);
            assertTrue(beside < -100, beside + " dB at " + centre);
        }
        Rig.settle(live);
        assertEquals(Designs.notch(70, 1), live.target().section(0));
    }

    /** Mains that jump between 50 and 60 Hz every 240 frames: the hops hold back, the state stays bounded. */
    @Test
    void jumpingMainsAreHeldBackAndStayBounded() {
        Section low = Designs.notch(50, 1);
        Section high = Designs.notch(60, 1);
        LiveCascade live = LiveCascade.builder(Cascade.of(RATE_HZ, low))
                .pace(Pace.FOLLOWING)
                .build();
        SplittableRandom random = new SplittableRandom(7);
        double[] block = new double[240];
        double most = 0;
        for (int i = 0; i < 20_000; i++) {
            live.retune(Cascade.of(RATE_HZ, i % 2 == 0 ? high : low));
            for (int n = 0; n < block.length; n++) {
                block[n] = Math.sin(2 * Math.PI * 55 * (240.0 * i + n) / RATE_HZ) + 0.1 * random.nextDouble();
            }
            live.process(block, 0, block, 0, block.length);
            most = Math.max(most, RoundingBound.peak(block));
            assertTrue(live.retuneStatus().stateBound() <= 2.2, "" + live.retuneStatus());
        }
        assertTrue(most < 8, "peak " + most);
        assertTrue(live.retuneStatus().framesHeld() > 0);
        assertEquals(20_000, live.retuneStatus().adopted());
    }

    /** Knobs thrown about at random: nothing but finite, bounded output, and the last target is reached exactly. */
    @Test
    void randomKnobsEndOnTheLastTarget() {
        SplittableRandom random = new SplittableRandom(8);
        LiveCascade live =
                LiveCascade.builder(Designs.mixed(1, 3)).mostSections(5).build();
        double[] block = new double[512];
        for (int i = 0; i < 4_000; i++) {
            int count = 1 + random.nextInt(5);
            live.retune(Designs.mixed(random.nextInt(50), count), random.nextBoolean() ? Pace.TURNING : Pace.FOLLOWING);
            int frames = 1 + random.nextInt(block.length);
            for (int n = 0; n < frames; n++) {
                block[n] = 2 * random.nextDouble() - 1;
            }
            live.process(block, 0, block, 0, frames);
            assertTrue(RoundingBound.peak(block) < 1e4, "peak " + RoundingBound.peak(block));
        }
        live.retune(Designs.mixed(7, 4));
        Rig.settle(live);
        assertTrue(Rig.heads(live, Designs.mixed(7, 4)));
        assertEquals(0, live.channelRestarts());
    }
}
