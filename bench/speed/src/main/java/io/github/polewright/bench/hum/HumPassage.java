package io.github.polewright.bench.hum;

import io.github.polewright.bench.measure.LeastTimes;
import io.github.polewright.bench.workload.HumTape;
import io.github.polewright.mains.HumRemover;
import io.github.polewright.mains.MainsState;
import io.github.polewright.mains.Removal;

/**
 * Plays one passage again and again through a hum remover that starts anew each time: it searches, proves, follows and
 * removes 20 lines, block for block the same work in the same places.
 *
 * @param sampleRateHz hertz
 * @param channels samples a frame
 * @param frames frames a block
 * @param repeats how often the passage is played
 */
record HumPassage(int sampleRateHz, int channels, int frames, int repeats) {

    LeastTimes play(Removal removal) {
        float[] tape = HumTape.of(sampleRateHz, channels, frames);
        float[] destination = new float[frames * channels];
        int blocks = tape.length / channels / frames;
        LeastTimes times = new LeastTimes(blocks);
        HumRemover remover =
                HumRemover.builder(sampleRateHz, channels).by(removal).build();
        for (int repeat = 0; repeat < repeats; repeat++) {
            remover.reset();
            for (int block = 0; block < blocks; block++) {
                long start = System.nanoTime();
                remover.process(tape, block * frames * channels, destination, 0, frames);
                times.record(block, System.nanoTime() - start);
            }
            if (remover.reading().state() != MainsState.FOLLOWING) {
                throw new IllegalStateException("the hum on the tape was not found: " + remover.reading());
            }
        }
        return times;
    }
}
