package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
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
        LiveCascade live = new LiveCascade(cascade, 1, form, SECTIONS, 1);
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
        live.retune(cascade.scaledBy(2));
        live.process(doubles, 0, doubles, 0, 3);
        live.retune(cascade);
        live.process(doubles, 0, doubles, 0, 3);
        live.reset();
    }
}
