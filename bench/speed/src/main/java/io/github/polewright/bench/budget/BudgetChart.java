package io.github.polewright.bench.budget;

import io.github.polewright.bench.command.ChainOptions;
import io.github.polewright.bench.report.Curve;
import io.github.polewright.bench.report.WholeFile;
import io.github.polewright.bench.workload.Chain;
import java.awt.Color;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.knowm.xchart.BitmapEncoder;
import org.knowm.xchart.XYChart;
import org.knowm.xchart.XYChartBuilder;
import org.knowm.xchart.XYSeries;
import org.knowm.xchart.style.Styler;
import org.knowm.xchart.style.XYStyler;
import org.knowm.xchart.style.lines.SeriesLines;
import org.knowm.xchart.style.markers.SeriesMarkers;

/** Draws how long the rarest blocks take, against the period and the share of it that is allowed. */
final class BudgetChart {

    private static final Color[] COLOURS = {new Color(0x0072B2), new Color(0xD55E00), new Color(0x009E73)};
    private static final double NANOS_PER_MICRO = 1000;

    private BudgetChart() {}

    static void write(Chain chain, double sharePercent, List<Curve> curves, String jvm, Path file) throws IOException {
        XYChart chart = new XYChartBuilder()
                .width(1000)
                .height(600)
                .title(ChainOptions.line(chain) + "\n" + jvm)
                .xAxisTitle("one block in … takes longer")
                .yAxisTitle("time in process, us")
                .build();
        style(chart.getStyler());
        double rarest = 10;
        for (int i = 0; i < curves.size(); i++) {
            Curve curve = curves.get(i);
            rarest = Math.max(rarest, curve.oneIn().get(curve.oneIn().size() - 1));
            XYSeries series = chart.addSeries(curve.name(), curve.oneIn(), curve.micros());
            series.setMarker(SeriesMarkers.NONE).setLineColor(COLOURS[i % COLOURS.length]);
        }
        double periodMicros = chain.periodNanos() / NANOS_PER_MICRO;
        line(chart, "the period", rarest, periodMicros, Color.BLACK);
        line(chart, "allowed: " + sharePercent + " %", rarest, periodMicros * sharePercent / 100, Color.GRAY);
        ByteArrayOutputStream png = new ByteArrayOutputStream();
        BitmapEncoder.saveBitmap(chart, png, BitmapEncoder.BitmapFormat.PNG);
        WholeFile.write(file, png.toByteArray());
    }

    private static void style(XYStyler styler) {
        styler.setXAxisLogarithmic(true);
        styler.setYAxisLogarithmic(true);
        styler.setLegendPosition(Styler.LegendPosition.OutsideS);
        styler.setLegendLayout(Styler.LegendLayout.Horizontal);
        styler.setChartBackgroundColor(Color.WHITE);
        styler.setPlotGridLinesColor(new Color(0xDDDDDD));
    }

    private static void line(XYChart chart, String name, double rarest, double micros, Color colour) {
        XYSeries series = chart.addSeries(name, new double[] {1, rarest}, new double[] {micros, micros});
        series.setMarker(SeriesMarkers.NONE).setLineColor(colour).setLineStyle(SeriesLines.DASH_DASH);
    }
}
