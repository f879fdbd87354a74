package io.github.polewright.samples.report;

import io.github.polewright.Cascade;
import io.github.polewright.inspect.Response;
import io.github.polewright.samples.files.WholeFile;
import io.github.polewright.samples.survey.AverageSpectrum;
import io.github.polewright.samples.survey.HumLine;
import io.github.polewright.samples.survey.MainsMoment;
import io.github.polewright.samples.survey.Survey;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import javax.imageio.ImageIO;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.apache.batik.svggen.SVGGraphics2D;
import org.knowm.xchart.XYChart;
import org.knowm.xchart.XYChartBuilder;
import org.knowm.xchart.XYSeries;
import org.knowm.xchart.style.Styler;
import org.knowm.xchart.style.markers.SeriesMarkers;
import org.w3c.dom.Document;

/** Charts, each written as SVG and as PNG. */
final class Charts {

    private static final int WIDTH = 1200;
    private static final int HEIGHT = 560;
    private static final Color BEFORE = new Color(0xb8, 0x4a, 0x1f);
    private static final Color AFTER = new Color(0x1f, 0x5f, 0x8b);
    private static final int MOST_POINTS = 2400;
    private static final double[] BESIDE_WIDTHS = {0, 0.05, 0.15, 0.3, 0.5, 0.8, 1.5, 3, 6};

    private Charts() {}

    static XYChart spectra(String title, AverageSpectrum before, AverageSpectrum after, double fromHz, double toHz) {
        XYChart chart = chart(title, "level, dB (full-scale sine: 0)");
        chart.getStyler().setXAxisLogarithmic(fromHz > 0);
        add(chart, "before", before, fromHz, toHz, BEFORE);
        add(chart, "after", after, fromHz, toHz, AFTER);
        chart.getStyler().setXAxisTickMarkSpacingHint(90);
        chart.getStyler().setXAxisMin(fromHz);
        chart.getStyler().setXAxisMax(toHz);
        return chart;
    }

    static XYChart response(Cascade cascade, Survey survey, double widthHz, double toHz) {
        XYChart chart = chart("Response of the cascade", "gain, dB");
        TreeSet<Double> grid = new TreeSet<>();
        for (double hz = 0; hz <= toHz; hz += toHz / 1500) {
            grid.add(hz);
        }
        for (HumLine line : survey.lines()) {
            for (double beside : BESIDE_WIDTHS) {
                grid.add(line.frequencyHz() - beside * widthHz);
                grid.add(line.frequencyHz() + beside * widthHz);
            }
        }
        double[] hertz = grid.stream()
                .filter(hz -> hz >= 0 && hz <= toHz)
                .mapToDouble(hz -> hz)
                .toArray();
        Response response = Response.of(cascade);
        double[] gains = new double[hertz.length];
        for (int i = 0; i < hertz.length; i++) {
            gains[i] = Math.max(-60, response.db(hertz[i]));
        }
        style(chart.addSeries("gain", hertz, gains), AFTER);
        chart.getStyler().setXAxisMin(0.0);
        chart.getStyler().setXAxisMax(toHz);
        chart.getStyler().setYAxisMin(-62.0);
        chart.getStyler().setYAxisMax(3.0);
        chart.getStyler().setLegendVisible(false);
        return chart;
    }

    /** The mains frequency over time. */
    static XYChart track(List<MainsMoment> track) {
        XYChart chart = chart("The mains over time", "frequency, Hz");
        chart.setXAxisTitle("time, s");
        double[] seconds = track.stream().mapToDouble(MainsMoment::seconds).toArray();
        double[] hertz = track.stream().mapToDouble(MainsMoment::frequencyHz).toArray();
        style(chart.addSeries("mains", seconds, hertz), AFTER);
        chart.getStyler().setXAxisMin(0.0);
        chart.getStyler().setYAxisDecimalPattern("0.000");
        chart.getStyler().setLegendVisible(false);
        return chart;
    }

    private static XYChart chart(String title, String level) {
        XYChart chart = new XYChartBuilder()
                .width(WIDTH)
                .height(HEIGHT)
                .title(title)
                .xAxisTitle("frequency, Hz")
                .yAxisTitle(level)
                .build();
        chart.getStyler().setChartBackgroundColor(Color.WHITE);
        chart.getStyler().setLegendPosition(Styler.LegendPosition.InsideNE);
        chart.getStyler().setDecimalPattern("#");
        // No margin about what is drawn: it would show frequencies and times below 0.
        chart.getStyler().setPlotContentSize(1);
        return chart;
    }

    private static void add(
            XYChart chart, String name, AverageSpectrum spectrum, double fromHz, double toHz, Color color) {
        int first = (int) Math.max(0, Math.ceil(fromHz / spectrum.binHz()));
        int last = (int) Math.min(spectrum.bins() - 1, Math.floor(toHz / spectrum.binHz()));
        double ratio = Math.pow((double) last / first, 1.0 / MOST_POINTS);
        double step = (double) (last - first) / MOST_POINTS;
        List<Double> hertz = new ArrayList<>();
        List<Double> levels = new ArrayList<>();
        int from = first;
        while (from <= last) {
            // A point stands for all bins that fall on it, by the highest of them.
            double next = chart.getStyler().isXAxisLogarithmic() ? from * ratio : from + step;
            int to = (int) Math.min(last, Math.max(from, Math.ceil(next) - 1));
            int highest = from;
            for (int m = from; m <= to; m++) {
                highest = spectrum.levelDb(m) > spectrum.levelDb(highest) ? m : highest;
            }
            hertz.add(highest * spectrum.binHz());
            levels.add(spectrum.levelDb(highest));
            from = to + 1;
        }
        style(chart.addSeries(name, hertz, levels), color);
    }

    private static void style(XYSeries series, Color color) {
        series.setMarker(SeriesMarkers.NONE);
        series.setLineColor(color);
        series.setLineWidth(1.2f);
    }

    /** Writes NAME.svg and NAME.png. */
    static void write(XYChart chart, Path folder, String name) {
        WholeFile.write(folder.resolve(name + ".png"), beside -> {
            BufferedImage image = new BufferedImage(WIDTH, HEIGHT, BufferedImage.TYPE_INT_RGB);
            Graphics2D graphics = image.createGraphics();
            chart.paint(graphics, WIDTH, HEIGHT);
            graphics.dispose();
            if (!ImageIO.write(image, "png", beside.toFile())) {
                throw new IOException("this Java has no PNG writer");
            }
        });
        WholeFile.write(folder.resolve(name + ".svg"), beside -> {
            SVGGraphics2D graphics = new SVGGraphics2D(emptyDocument());
            graphics.setSVGCanvasSize(new java.awt.Dimension(WIDTH, HEIGHT));
            chart.paint(graphics, WIDTH, HEIGHT);
            try (var writer = Files.newBufferedWriter(beside, StandardCharsets.UTF_8)) {
                graphics.stream(writer, true);
            }
        });
    }

    private static Document emptyDocument() throws IOException {
        try {
            return DocumentBuilderFactory.newInstance()
                    .newDocumentBuilder()
                    .getDOMImplementation()
                    .createDocument("http://www.w3.org/2000/svg", "svg", null);
        } catch (ParserConfigurationException e) {
            throw new IOException("this Java has no XML document builder", e);
        }
    }
}
