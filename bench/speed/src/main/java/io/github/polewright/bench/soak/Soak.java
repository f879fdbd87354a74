package io.github.polewright.bench.soak;

import io.github.polewright.bench.workload.Chain;
import io.github.polewright.bench.workload.LiveRig;
import io.github.polewright.bench.workload.Motion;
import io.github.polewright.bench.workload.Samples;
import io.github.polewright.bench.workload.Signal;
import io.github.polewright.bench.workload.Tape;
import io.github.polewright.live.LiveCascade;
import java.lang.management.GarbageCollectorMXBean;
import java.lang.management.ManagementFactory;
import java.time.Duration;

/** One soak: warm up, play while disturbed, play on undisturbed until the last glide has ended. */
final class Soak {

    private static final double CALM_SECONDS = 1;

    private Soak() {}

    static SoakResult play(Chain chain, double seconds, int allocators, Duration warmUp) throws InterruptedException {
        LiveRig rig = rig(chain);
        if (!warmUp.isZero()) {
            rig.live().warmUp(warmUp.toMillis() / 1e3);
        }
        long collections = collections();
        long collectionMillis = collectionMillis();
        long disturbedNanos = Math.round(seconds * 1e9);
        long start = System.nanoTime();
        AudioThread audio = new AudioThread(rig, rig(chain), start + disturbedNanos + Math.round(CALM_SECONDS * 1e9));
        Disturbance disturbance = new Disturbance(rig, allocators);
        audio.start();
        Thread.sleep(Duration.ofNanos(disturbedNanos).toMillis());
        disturbance.end();
        audio.join();
        LiveCascade live = rig.live();
        return new SoakResult(
                audio.blocks(),
                audio.lateness(),
                audio.allocatedBytes(),
                new SoakResult.Surroundings(
                        disturbance.retunes(),
                        disturbance.allocatedBytes(),
                        collections() - collections,
                        collectionMillis() - collectionMillis),
                new SoakResult.Counters(
                        live.replacedInputSamples(), live.replacedOutputSamples(), live.channelRestarts()),
                live.isSettled());
    }

    private static LiveRig rig(Chain chain) {
        return new LiveRig(chain, new Tape(chain, Samples.FLOAT, Signal.NOISE), Motion.STEADY);
    }

    private static long collections() {
        return ManagementFactory.getGarbageCollectorMXBeans().stream()
                .mapToLong(GarbageCollectorMXBean::getCollectionCount)
                .sum();
    }

    private static long collectionMillis() {
        return ManagementFactory.getGarbageCollectorMXBeans().stream()
                .mapToLong(GarbageCollectorMXBean::getCollectionTime)
                .sum();
    }
}
