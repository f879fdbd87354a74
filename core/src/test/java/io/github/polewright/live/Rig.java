package io.github.polewright.live;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/** Builds live cascades and drives streams through them; the one place in the tests that knows the builder. */
final class Rig {

    /** Ten minutes at 48 kHz: longer than any glide of these tests. */
    private static final int PATIENCE_FRAMES = 28_800_000;

    private Rig() {}

    static LiveCascade live(Cascade cascade, int channels, Form form) {
        return live(cascade, channels, form, cascade.sectionCount());
    }

    static LiveCascade live(Cascade cascade, int channels, Form form, int mostSections) {
        return LiveCascade.builder(cascade)
                .channels(channels)
                .form(form)
                .mostSections(mostSections)
                .build();
    }

    /** Block lengths that add up to {@code frames}. */
    static int[] whole(int frames) {
        return new int[] {frames};
    }

    /** Random block lengths that add up to {@code frames}: empty ones, single frames, odd ones and long ones. */
    static int[] cuts(long seed, int frames) {
        SplittableRandom random = new SplittableRandom(seed);
        int[] most = {1, 2, 8, 65, 129, 512, 6000};
        List<Integer> lengths = new ArrayList<>();
        for (int left = frames; left > 0; ) {
            int length = Math.min(left, random.nextInt(most[random.nextInt(most.length)] + 1));
            lengths.add(length);
            left -= length;
        }
        return lengths.stream().mapToInt(Integer::intValue).toArray();
    }

    static double[][] run(LiveCascade live, SampleFormat format, double[][] in, int... blocks) {
        double[][] out = new double[in.length][in[0].length];
        int first = 0;
        for (int frames : blocks) {
            format.process(live, in, out, first, frames);
            first += frames;
        }
        return out;
    }

    static double[] runMono(LiveCascade live, double[] in) {
        double[] out = new double[in.length];
        live.process(in, 0, out, 0, in.length);
        return out;
    }

    /** A fresh live cascade of what another one was told to become, its sections in the same slots. */
    static LiveCascade twin(LiveCascade live, Form form) {
        return live(live.target(), live.channels(), form, live.mostSections());
    }

    /** Whether a live cascade was told to become a certain one: a retune may put its sections into other slots. */
    static boolean heads(LiveCascade live, Cascade wished) {
        return sorted(live.target()).equals(sorted(wished));
    }

    private static List<String> sorted(Cascade cascade) {
        return cascade.sections().stream()
                .filter(section -> !section.equals(Section.PASS_THROUGH))
                .map(Section::toString)
                .sorted()
                .toList();
    }

    /** Feeds silence until the cascade has settled. */
    static void settle(LiveCascade live) {
        double[] silence = new double[64 * live.channels()];
        for (int frames = 0; !live.isSettled(); frames += 64) {
            if (frames > PATIENCE_FRAMES) {
                throw new AssertionError("not settled after " + frames + " frames");
            }
            live.process(silence, 0, silence.clone(), 0, 64);
        }
    }

    /** The impulse response of one channel; the live cascade is reset first. */
    static double[] impulseResponse(LiveCascade live, int channel, int frames) {
        live.reset();
        double[] in = new double[frames * live.channels()];
        in[channel] = 1;
        double[] out = new double[in.length];
        live.process(in, 0, out, 0, frames);
        double[] response = new double[frames];
        for (int i = 0; i < frames; i++) {
            response[i] = out[i * live.channels() + channel];
        }
        return response;
    }
}
