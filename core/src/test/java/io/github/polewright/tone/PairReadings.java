package io.github.polewright.tone;

import java.util.ArrayList;
import java.util.List;

/** Runs a reader over a signal and compares what it read with what was sent. */
final class PairReadings {

    /** One event, kept. */
    record Kept(
            boolean isEnd,
            char symbol,
            long start,
            long end,
            long decision,
            double lowDb,
            double highDb,
            double lowErrorHz,
            double highErrorHz) {
        static Kept of(PairEvent e) {
            return new Kept(
                    e.isEnd(),
                    e.symbol(),
                    e.startFrame(),
                    e.endFrame(),
                    e.decisionFrame(),
                    e.lowLevelDbfs(),
                    e.highLevelDbfs(),
                    e.lowErrorHz(),
                    e.highErrorHz());
        }
    }

    int right;
    int wrong;
    int missed;
    double worstStartMs;
    double worstEndMs;
    double worstDecisionMs;

    static List<Kept> read(PairReader reader, float[] frames) {
        List<Kept> kept = new ArrayList<>();
        PairEvent event = new PairEvent();
        for (int at = 0; at < frames.length; at += 4096) {
            reader.process(frames, at, Math.min(4096, frames.length - at));
            while (reader.poll(event)) {
                kept.add(Kept.of(event));
            }
        }
        return kept;
    }

    static String symbols(List<Kept> events) {
        StringBuilder text = new StringBuilder();
        for (Kept event : events) {
            if (!event.isEnd()) {
                text.append(event.symbol());
            }
        }
        return text.toString();
    }

    /** Each sent symbol is right if exactly one beginning and its end fall to it; any other symbol is wrong. */
    static PairReadings compare(PairSignal signal, PairReader reader) {
        PairReadings result = new PairReadings();
        List<Kept> events = read(reader, signal.frames());
        double msPerFrame = 1000 / signal.rateHz;
        int next = 0;
        for (PairSignal.Sent sent : signal.sent) {
            int matches = 0;
            while (next < events.size() && events.get(next).start() < sent.endFrame() - 0.003 * signal.rateHz) {
                Kept event = events.get(next++);
                boolean fits =
                        event.symbol() == sent.symbol() && event.start() > sent.startFrame() - 0.010 * signal.rateHz;
                if (!fits) {
                    result.wrong++;
                    continue;
                }
                matches++;
                result.worstStartMs =
                        Math.max(result.worstStartMs, Math.abs(event.start() - sent.startFrame()) * msPerFrame);
                if (event.isEnd()) {
                    result.worstEndMs =
                            Math.max(result.worstEndMs, Math.abs(event.end() - sent.endFrame()) * msPerFrame);
                } else {
                    double decision = (event.decision() - sent.startFrame()) * msPerFrame;
                    result.worstDecisionMs = Math.max(result.worstDecisionMs, decision);
                }
            }
            if (matches == 2) {
                result.right++;
            } else if (matches == 0) {
                result.missed++;
            } else {
                result.wrong++;
            }
        }
        result.wrong += events.size() - next;
        return result;
    }

    void add(PairReadings other) {
        right += other.right;
        wrong += other.wrong;
        missed += other.missed;
        worstStartMs = Math.max(worstStartMs, other.worstStartMs);
        worstEndMs = Math.max(worstEndMs, other.worstEndMs);
        worstDecisionMs = Math.max(worstDecisionMs, other.worstDecisionMs);
    }

    @Override
    public String toString() {
        return String.format(
                "right %d, missed %d, wrong %d, start %.2f ms, end %.2f ms, decided %.1f ms",
                right, missed, wrong, worstStartMs, worstEndMs, worstDecisionMs);
    }
}
