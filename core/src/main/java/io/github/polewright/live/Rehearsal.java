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

    private static final int SECTIONS = 7;

    static {
        for (Form form : Form.values()) {
            perform(form);
        }
    }

    private Rehearsal() {}

    /** Returns when the rehearsal is over, at once from the second call on. */
    static void held() {
        // Calling a static method is what sets up the class.
    }

    private static void perform(Form form) {
        Cascade cascade = Cascade.of(1, Collections.nCopies(SECTIONS, Section.PASS_THROUGH));
        LiveCascade live = new LiveCascade(cascade, 1, form, SECTIONS, Pace.FOLLOWING);
        // One sample that is replaced, and one that makes the channel restart.
        double[] doubles = {Double.NaN, Double.MAX_VALUE, 0};
        float[] floats = new float[3];
        float[][] planes = {floats};
        FloatBuffer buffer = ByteBuffer.allocateDirect(3 * Float.BYTES)
                .order(ByteOrder.nativeOrder())
                .asFloatBuffer();
        live.process(doubles, 0, doubles, 0, 3);
        live.process(floats, 0, floats, 0, 3);
        live.process(planes, planes, 0, 3);
        live.process(buffer, buffer, 3);
        retunes(live, doubles);
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
        live.process(block, 0, block, 0, block.length);
        live.retune(Cascade.of(1, twoReal, highNotch));
        live.process(block, 0, block, 0, block.length);
        live.bypass(true);
        live.process(block, 0, block, 0, block.length);
        live.bypass(false);
        while (!live.isSettled()) {
            live.process(block, 0, block, 0, block.length);
        }
        live.retuneStatus();
    }
}
