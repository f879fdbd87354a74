package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.retune.Pace;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.FloatBuffer;
import java.util.Collections;

/**
 * Runs every path of the audio thread once, when the first live cascade is built: a class that is first needed in an
 * audio callback would be loaded there, which allocates, locks, reads files and takes milliseconds.
 */
final class Rehearsal {

    static {
        for (Form form : Form.values()) {
            perform(form, 1, 7);
            perform(form, 2, 1);
            perform(form, 32, 8);
        }
    }

    private Rehearsal() {}

    /** Returns when the rehearsal is over, at once from the second call on. */
    static void held() {
        // Calling a static method is what sets up the class.
    }

    private static void perform(Form form, int channels, int sections) {
        Cascade cascade = Cascade.of(1, Collections.nCopies(sections, Section.PASS_THROUGH));
        LiveCascade live = new LiveCascade(cascade, channels, form, sections, Pace.FOLLOWING);
        // One sample that is replaced, and one that makes the channel restart.
        double[] doubles = new double[3 * channels];
        doubles[0] = Double.NaN;
        doubles[channels] = Double.MAX_VALUE;
        float[] floats = new float[3 * channels];
        float[][] planes = new float[channels][3];
        FloatBuffer buffer = ByteBuffer.allocateDirect(3 * channels * Float.BYTES)
                .order(ByteOrder.nativeOrder())
                .asFloatBuffer();
        live.process(doubles, 0, doubles, 0, 3);
        live.process(floats, 0, floats, 0, 3);
        live.process(planes, planes, 0, 3);
        live.process(buffer, buffer, 3);
        live.retune(cascade.scaledBy(2));
        live.process(doubles, 0, doubles, 0, 3);
        if (sections > 1) {
            retunes(live, doubles);
        }
        live.reset();
    }

    /** Complex poles and real ones, a glide inside another, a notch that is exchanged, births, deaths, gain. */
    private static void retunes(LiveCascade live, double[] block) {
        Section resonant = Section.of(0.1, 0, 0, -0.5, 0.5);
        Section twoReal = Section.of(0.1, 0, 0, -0.9, 0.2);
        Section lowNotch = Section.of(1, -1.8, 1, -1.7, 0.9);
        Section highNotch = Section.of(1, 1.8, 1, 1.7, 0.9);
        live.outputGain(-6);
        live.retune(Cascade.of(1, resonant, lowNotch));
        live.process(block, 0, block, 0, 3);
        live.retune(Cascade.of(1, twoReal, highNotch));
        live.process(block, 0, block, 0, 3);
        live.bypass(true);
        live.process(block, 0, block, 0, 3);
        live.bypass(false);
        while (!live.isSettled()) {
            live.process(block, 0, block, 0, 3);
        }
        live.retuneStatus();
    }
}
