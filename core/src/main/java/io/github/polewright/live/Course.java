package io.github.polewright.live;

import static io.github.polewright.live.Arithmetic.mulAdd;

/** The coefficients as they are now, and where they are on the way to the next knot. The audio thread's own. */
final class Course {

    private final double[] now;
    private final double[] start;
    private final double[] step;
    private Path path;
    private int knot;
    private int passed;
    private boolean gliding;

    Course(Path initial, int coefficients) {
        now = new double[coefficients];
        start = new double[coefficients];
        step = new double[coefficients];
        path = initial;
        System.arraycopy(initial.knot(initial.knotCount() - 1), 0, now, 0, coefficients);
    }

    /** The path that is walked, or was walked last. */
    Path path() {
        return path;
    }

    boolean gliding() {
        return gliding;
    }

    /** The coefficients in force, five a section; while gliding, those of the segment's start. */
    double[] coefficients() {
        return gliding ? start : now;
    }

    /** What every coefficient moves by in a frame of this segment. */
    double[] step() {
        return step;
    }

    /** Frames of this segment that are behind us. */
    int passed() {
        return passed;
    }

    /** Frames to the next knot, or as many as anyone may ask for when nothing moves. */
    int framesToKnot() {
        return gliding ? path.frames(knot) - passed : Integer.MAX_VALUE;
    }

    /** Frames to the end of the path; 0 when nothing moves. */
    long framesLeft() {
        if (!gliding) {
            return 0;
        }
        long left = -passed;
        for (int i = knot; i < path.knotCount(); i++) {
            left += path.frames(i);
        }
        return left;
    }

    /** Sets out on another path from wherever the coefficients are. */
    void adopt(Path next) {
        if (gliding && passed > 0) {
            for (int i = 0; i < now.length; i++) {
                now[i] = mulAdd(passed, step[i], start[i]);
            }
        }
        path = next;
        knot = 0;
        gliding = true;
        head();
    }

    /** Moves on; true where that reached the end of the path, from which the target's own coefficients are in force. */
    boolean advance(int frames) {
        passed += frames;
        if (passed < path.frames(knot)) {
            return false;
        }
        System.arraycopy(path.knot(knot), 0, now, 0, now.length);
        knot++;
        if (knot < path.knotCount()) {
            head();
            return false;
        }
        gliding = false;
        return true;
    }

    /** Takes the next knot for a goal. */
    private void head() {
        double[] goal = path.knot(knot);
        double scale = 1.0 / path.frames(knot);
        for (int i = 0; i < now.length; i++) {
            start[i] = now[i];
            step[i] = (goal[i] - now[i]) * scale;
        }
        passed = 0;
    }
}
