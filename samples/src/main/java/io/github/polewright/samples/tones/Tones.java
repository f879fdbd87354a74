package io.github.polewright.samples.tones;

import io.github.polewright.samples.files.Failure;
import io.github.polewright.samples.files.Frames;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.tone.PairEvent;
import io.github.polewright.tone.PairReader;
import io.github.polewright.tone.Tone;
import io.github.polewright.tone.ToneEvent;
import io.github.polewright.tone.ToneMeter;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.function.IntConsumer;
import java.util.function.LongConsumer;

/** Listens to one channel of a recording. */
public final class Tones {

    public static final double LEAST_RATE_HZ = 8000;
    public static final double MOST_RATE_HZ = 192_000;

    private static final int BLOCK_FRAMES = 4096;
    private static final double PAIR_TAIL_SECONDS = 0.2;
    private static final double TAIL_RESPONSES = 20;

    private final Recording recording;
    private final int channel;
    private final LongConsumer progress;
    private final double[] block;

    private Tones(Recording recording, int channel, LongConsumer progress) {
        this.recording = recording;
        this.channel = channel;
        this.progress = progress;
        block = new double[BLOCK_FRAMES * recording.channels()];
    }

    /** Fails if the recording has a sample rate at which no tones are read. */
    public static Tones of(Recording recording, int channel, LongConsumer progress) {
        double rate = recording.sampleRateHz();
        if (!(rate >= LEAST_RATE_HZ && rate <= MOST_RATE_HZ)) {
            throw new Failure(recording.path() + " has a sample rate of " + rate + " Hz; tones are read from "
                    + LEAST_RATE_HZ + " to " + MOST_RATE_HZ);
        }
        return new Tones(recording, channel, progress);
    }

    /** The tone pairs in order. */
    public List<ReadPair> pairs() {
        List<ReadPair> found = new ArrayList<>();
        PairReader reader = PairReader.builder(recording.sampleRateHz())
                .channel(channel, recording.channels())
                .build();
        PairEvent event = new PairEvent();
        listen(PAIR_TAIL_SECONDS, frames -> {
            reader.process(block, 0, frames);
            while (reader.poll(event)) {
                if (event.isEnd()) {
                    found.add(pair(event));
                }
            }
        });
        return found;
    }

    private ReadPair pair(PairEvent event) {
        return new ReadPair(
                seconds(event.startFrame()),
                seconds(event.endFrame()),
                String.valueOf(event.symbol()),
                event.lowLevelDbfs(),
                event.highLevelDbfs(),
                event.twistDb(),
                event.lowErrorHz(),
                event.highErrorHz(),
                100 * event.lowErrorHz() / event.lowNominalHz(),
                100 * event.highErrorHz() / event.highNominalHz());
    }

    /** The named tones in order of their starts. */
    public List<HeardTone> named(List<Tone> tones) {
        List<HeardTone> found = new ArrayList<>();
        ToneMeter.Builder wish = ToneMeter.builder(recording.sampleRateHz()).channel(channel, recording.channels());
        tones.forEach(wish::tone);
        ToneMeter meter = wish.build();
        ToneEvent event = new ToneEvent();
        double longest = tones.stream().mapToDouble(Tone::responseSeconds).max().orElse(0);
        listen(TAIL_RESPONSES * longest, frames -> {
            meter.process(block, 0, frames);
            while (meter.poll(event)) {
                if (event.isEnd()) {
                    found.add(new HeardTone(
                            seconds(event.startFrame()),
                            seconds(event.endFrame()),
                            tones.get(event.tone()).frequencyHz(),
                            event.levelDbfs()));
                }
            }
        });
        found.sort(Comparator.comparingDouble(HeardTone::startSeconds).thenComparingDouble(HeardTone::frequencyHz));
        return found;
    }

    /** What sounds at the last frame ends there. */
    private double seconds(long frame) {
        return Math.min(frame, recording.frames()) / recording.sampleRateHz();
    }

    /** Block after block, and some silence after the last, in which what still sounds comes to its end. */
    private void listen(double tailSeconds, IntConsumer heard) {
        long done = 0;
        try (Frames frames = recording.read()) {
            for (int count = frames.read(block, BLOCK_FRAMES); count > 0; count = frames.read(block, BLOCK_FRAMES)) {
                heard.accept(count);
                done += count;
                progress.accept(done);
            }
        }
        Arrays.fill(block, 0);
        for (long left = (long) Math.ceil(tailSeconds * recording.sampleRateHz()); left > 0; left -= BLOCK_FRAMES) {
            heard.accept((int) Math.min(left, BLOCK_FRAMES));
        }
    }
}
