package io.github.polewright.samples.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Cascade;
import io.github.polewright.design.HumNotch;
import io.github.polewright.samples.survey.MainsMoment;
import io.github.polewright.samples.survey.Survey;
import java.awt.Graphics2D;
import java.awt.image.BufferedImage;
import java.util.List;
import java.util.function.IntPredicate;
import org.junit.jupiter.api.Test;
import org.knowm.xchart.XYChart;

/** Seen in the picture: no axis reaches below 0, where there is no frequency and no time. */
final class ChartsTest {

    private static final int WIDTH = 1200;
    private static final int HEIGHT = 560;

    private static BufferedImage paint(XYChart chart) {
        BufferedImage image = new BufferedImage(WIDTH, HEIGHT, BufferedImage.TYPE_INT_RGB);
        Graphics2D graphics = image.createGraphics();
        chart.paint(graphics, WIDTH, HEIGHT);
        graphics.dispose();
        return image;
    }

    /** The first column, from the left or the right, of which so many pixels are like that. */
    private static int column(BufferedImage image, boolean fromLeft, int count, IntPredicate like) {
        for (int i = 0; i < WIDTH; i++) {
            int x = fromLeft ? i : WIDTH - 1 - i;
            int found = 0;
            for (int y = 0; y < HEIGHT; y++) {
                found += like.test(image.getRGB(x, y) & 0xffffff) ? 1 : 0;
            }
            if (found >= count) {
                return x;
            }
        }
        return -1;
    }

    private static boolean isLine(int rgb) {
        return (rgb & 0xff) - (rgb >> 16) > 40;
    }

    @Test
    void theResponseFillsTheAxisFromZeroToTheTop() {
        Survey none = new Survey(List.of(0.0), false, false, 0, 0, List.of(), List.of(), 0);
        Cascade cascade = Cascade.of(8000, HumNotch.byWidth(8000, 50, 5));
        BufferedImage image = paint(Charts.response(cascade, none, 1, 1000));
        int frame = column(image, true, HEIGHT / 2, rgb -> rgb != 0xffffff);
        int line = column(image, true, 1, ChartsTest::isLine);
        assertTrue(frame > 0 && line >= frame, "frame at " + frame + ", line from " + line);
        assertEquals(frame, line, 8);
        int end = column(image, false, HEIGHT / 2, rgb -> rgb != 0xffffff);
        assertEquals(end, column(image, false, 1, ChartsTest::isLine), 8);
    }

    /** The line begins at a quarter of the time, so at a quarter of the width. */
    @Test
    void theTrackBeginsAtTimeZero() {
        BufferedImage image = paint(Charts.track(List.of(new MainsMoment(1000, 50), new MainsMoment(4000, 50.05))));
        int frame = column(image, true, HEIGHT / 2, rgb -> rgb != 0xffffff);
        int end = column(image, false, HEIGHT / 2, rgb -> rgb != 0xffffff);
        int line = column(image, true, 1, ChartsTest::isLine);
        assertEquals(0.25, (double) (line - frame) / (end - frame), 0.01);
    }
}
