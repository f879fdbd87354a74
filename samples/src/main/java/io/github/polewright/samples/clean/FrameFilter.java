package io.github.polewright.samples.clean;

/** Something that is led along a recording block by block. */
interface FrameFilter {

    /** Filters the next frames in place. */
    void process(double[] block, int frames);

    /** Samples that were no numbers so far; taken as silence. */
    long nonFiniteSamples();
}
