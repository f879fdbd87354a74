package io.github.polewright.samples.report;

import com.google.gson.GsonBuilder;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.survey.Survey;

/** A survey as JSON: the same numbers as in the table, not rounded. */
public final class SurveyJson {

    private SurveyJson() {}

    public static String of(Recording recording, Survey survey) {
        JsonObject root = new JsonObject();
        root.addProperty("recording", recording.path().toString());
        root.addProperty("sampleRateHz", recording.sampleRateHz());
        root.addProperty("channels", recording.channels());
        root.addProperty("bits", recording.pcm().bits());
        root.addProperty("floatingPoint", recording.pcm().isFloatingPoint());
        root.addProperty("frames", recording.frames());
        root.addProperty("seconds", recording.seconds());
        JsonElement found = new GsonBuilder().create().toJsonTree(survey);
        found.getAsJsonObject().entrySet().forEach(entry -> root.add(entry.getKey(), entry.getValue()));
        return new GsonBuilder()
                        .setPrettyPrinting()
                        .disableHtmlEscaping()
                        .create()
                        .toJson(root)
                + System.lineSeparator();
    }
}
