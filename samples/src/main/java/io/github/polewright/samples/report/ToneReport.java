package io.github.polewright.samples.report;

import com.google.gson.GsonBuilder;
import com.google.gson.JsonObject;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.tones.HeardTone;
import io.github.polewright.samples.tones.ReadPair;
import java.util.ArrayList;
import java.util.List;

/** Tones as comma-separated lines, and as JSON with all that is known of them, not rounded. */
public final class ToneReport {

    private static final String HEADER = "start_s,end_s,symbol";

    private ToneReport() {}

    public static List<String> pairLines(List<ReadPair> pairs) {
        List<String> lines = new ArrayList<>(List.of(HEADER));
        for (ReadPair pair : pairs) {
            lines.add(line(pair.startSeconds(), pair.endSeconds(), pair.symbol()));
        }
        return lines;
    }

    /** A named tone's symbol is its frequency. */
    public static List<String> toneLines(List<HeardTone> tones) {
        List<String> lines = new ArrayList<>(List.of(HEADER));
        for (HeardTone tone : tones) {
            lines.add(line(tone.startSeconds(), tone.endSeconds(), Numbers.plain(tone.frequencyHz())));
        }
        return lines;
    }

    private static String line(double start, double end, String symbol) {
        return Numbers.format("%.3f,%.3f,%s", start, end, symbol);
    }

    public static String pairJson(Recording recording, int channel, List<ReadPair> pairs) {
        return json(recording, channel, "pairs", pairs);
    }

    public static String toneJson(Recording recording, int channel, List<HeardTone> tones) {
        return json(recording, channel, "tones", tones);
    }

    private static String json(Recording recording, int channel, String name, List<? extends Record> found) {
        JsonObject root = new JsonObject();
        root.addProperty("recording", recording.path().toString());
        root.addProperty("sampleRateHz", recording.sampleRateHz());
        root.addProperty("channels", recording.channels());
        root.addProperty("seconds", recording.seconds());
        root.addProperty("channel", channel);
        root.add(name, new GsonBuilder().create().toJsonTree(found));
        return new GsonBuilder()
                        .setPrettyPrinting()
                        .disableHtmlEscaping()
                        .create()
                        .toJson(root)
                + System.lineSeparator();
    }
}
