package io.github.polewright.samples.report;

import io.github.polewright.Cascade;
import io.github.polewright.samples.clean.CleanWish;
import io.github.polewright.samples.clean.Cleaning;
import io.github.polewright.samples.clean.HumCascade;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.files.WholeFile;
import io.github.polewright.samples.survey.AverageSpectrum;
import io.github.polewright.samples.survey.HumLine;
import io.github.polewright.samples.survey.MainsMoment;
import io.github.polewright.samples.survey.MainsTrack;
import io.github.polewright.samples.survey.Survey;
import java.nio.file.Path;
import java.util.List;

/** A folder with charts of a cleaning and a page that shows them. */
public final class Report {

    private static final double CHART_TOP_HZ = 1000;
    private static final double LOWEST_HZ = 10;

    private static final String TRACK = """
            <h2>The mains</h2>
            <p>Their frequency, where the follower was sure of it.</p>
            """;
    private static final String CASCADE = """
            <h2>The cascade</h2>
            <p>Its response; the notches reach down without end, the chart stops at -60 dB.</p>
            """;

    private Report() {}

    public static void write(Path folder, Recording in, Recording out, Cleaning cleaning, CleanWish wish) {
        WholeFile.makeFolder(folder);
        Survey survey = cleaning.before();
        double topHz = Math.min(topHz(survey), in.sampleRateHz() / 2);
        double wholeHz = Math.min(20_000, in.sampleRateHz() / 2);
        AverageSpectrum before = AverageSpectrum.of(in, wholeHz);
        AverageSpectrum after = AverageSpectrum.of(out, wholeHz);
        Charts.write(Charts.spectra("Where the lines are", before, after, 0, topHz), folder, "spectra-low");
        Charts.write(Charts.spectra("All of it", before, after, LOWEST_HZ, wholeHz), folder, "spectra-whole");
        if (!cleaning.followed()) {
            Cascade cascade = new HumCascade(in.sampleRateHz(), survey, wish).at(survey.fundamentalHz());
            Charts.write(Charts.response(cascade, survey, wish.widthHz(), topHz), folder, "response");
        }
        List<MainsMoment> track = MainsTrack.of(in);
        if (!track.isEmpty()) {
            Charts.write(Charts.track(track), folder, "track");
        }
        HumSpectrogram.write(in, out, topHz, folder, "spectrogram");
        List<String> text = CleaningText.of(in, out.path(), cleaning, wish.removeDc());
        WholeFile.writeText(folder.resolve("index.html"), page(in, text, !cleaning.followed(), !track.isEmpty()));
    }

    private static double topHz(Survey survey) {
        double highest =
                survey.lines().stream().mapToDouble(HumLine::frequencyHz).max().orElse(0);
        return Math.max(CHART_TOP_HZ, 100 * Math.ceil(highest / 100 + 0.5));
    }

    private static String page(Recording in, List<String> text, boolean cascade, boolean track) {
        return """
                <!DOCTYPE html>
                <html lang="en">
                <head>
                <meta charset="utf-8">
                <meta name="viewport" content="width=device-width, initial-scale=1">
                <title>Cleaning of %s</title>
                <style>
                body { font: 16px/1.5 system-ui, sans-serif; max-width: 1240px; margin: 2em auto; padding: 0 1em; }
                pre { background: #f4f4f2; padding: 1em; overflow-x: auto; }
                img { width: 100%%; height: auto; }
                </style>
                </head>
                <body>
                <h1>Cleaning of %s</h1>
                <pre>%s</pre>
                <h2>Spectra before and after</h2>
                <p>Mean power over the recording and its channels, in windows of 4 seconds.</p>
                %s
                %s
                <h2>Over time</h2>
                <p>Level over time and frequency, before above and after below.</p>
                <p><img src="spectrogram.png" alt="Spectrograms of the recording before and after"></p>
                %s
                %s
                </body>
                </html>
                """.formatted(
                        escaped(name(in)),
                        escaped(name(in)),
                        escaped(String.join("\n", text)),
                        image("spectra-low", "Level over frequency where the hum lines are, before and after"),
                        image("spectra-whole", "Level over frequency, before and after"),
                        track ? TRACK + image("track", "Mains frequency over time") : "",
                        cascade ? CASCADE + image("response", "Gain of the cascade over frequency") : "");
    }

    private static String name(Recording recording) {
        return String.valueOf(recording.path().getFileName());
    }

    private static String image(String name, String words) {
        return "<p><img src=\"" + name + ".svg\" alt=\"" + words + "\"> <a href=\"" + name + ".png\">as PNG</a></p>";
    }

    private static String escaped(String text) {
        return text.replace("&", "&amp;")
                .replace("<", "&lt;")
                .replace(">", "&gt;")
                .replace("\"", "&quot;");
    }
}
