package io.github.polewright.samples.report;

import io.github.polewright.samples.files.WholeFile;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.image.BufferedImage;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import javax.imageio.ImageIO;
import org.jtransforms.fft.DoubleFFT_1D;

/** Pictures of sounds: time to the right, frequency upwards, level as brightness; one below the other. */
public final class Spectrogram {

    private static final int WINDOW = 1024;
    private static final int WIDTH = 900;
    private static final int HEIGHT = 230;
    private static final int MARGIN = 56;
    private static final int TITLE = 26;
    private static final double FLOOR_DB = -110;
    private static final double MOST_HZ = 12_000;
    private static final double AXIS_STEP_HZ = 4_000;
    private static final Color INK = new Color(0x22, 0x2b, 0x38);

    private Spectrogram() {}

    /** Writes a PNG with a panel for each sound. */
    public static void write(Path target, double sampleRateHz, List<String> titles, List<double[]> sounds) {
        int panel = HEIGHT + TITLE + 8;
        BufferedImage image =
                new BufferedImage(WIDTH + MARGIN + 12, panel * sounds.size() + 24, BufferedImage.TYPE_INT_RGB);
        Graphics2D pen = image.createGraphics();
        pen.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        pen.setColor(Color.WHITE);
        pen.fillRect(0, 0, image.getWidth(), image.getHeight());
        pen.setColor(INK);
        for (int i = 0; i < sounds.size(); i++) {
            int top = i * panel + TITLE;
            pen.drawString(titles.get(i), MARGIN, top - 8);
            draw(image, top, sampleRateHz, sounds.get(i));
            for (double hz = 0; hz <= MOST_HZ; hz += AXIS_STEP_HZ) {
                int y = top + HEIGHT - (int) (HEIGHT * hz / MOST_HZ);
                pen.drawString(String.format(Locale.ROOT, "%.0f kHz", hz / 1000), 6, y + 4);
            }
        }
        double seconds = sounds.get(0).length / sampleRateHz;
        for (double at = 0; at < seconds; at += 0.5) {
            pen.drawString(
                    String.format(Locale.ROOT, "%.1f s", at),
                    MARGIN + (int) (WIDTH * at / seconds),
                    image.getHeight() - 8);
        }
        pen.dispose();
        WholeFile.write(target, beside -> ImageIO.write(image, "png", beside.toFile()));
    }

    private static void draw(BufferedImage image, int top, double sampleRateHz, double[] sound) {
        DoubleFFT_1D transform = new DoubleFFT_1D(WINDOW);
        for (int column = 0; column < WIDTH; column++) {
            int first = (int) ((long) column * (sound.length - WINDOW) / (WIDTH - 1));
            double[] bins = new double[WINDOW];
            for (int n = 0; n < WINDOW; n++) {
                bins[n] = sound[first + n] * window((double) n / WINDOW);
            }
            transform.realForward(bins);
            for (int row = 0; row < HEIGHT; row++) {
                double hz = MOST_HZ * (HEIGHT - 1 - row) / HEIGHT;
                int bin = (int) Math.max(1, Math.round(hz * WINDOW / sampleRateHz));
                double size = Math.hypot(bins[2 * bin], bins[2 * bin + 1]) * 4 / WINDOW;
                image.setRGB(MARGIN + column, top + row, colour(20 * Math.log10(size + 1e-12)));
            }
        }
    }

    /** Blackman-Harris, four terms: side lobes below -92 dB. */
    private static double window(double u) {
        double turn = 2 * Math.PI * u;
        return 0.35875 - 0.48829 * Math.cos(turn) + 0.14128 * Math.cos(2 * turn) - 0.01168 * Math.cos(3 * turn);
    }

    private static int colour(double db) {
        float share = (float) Math.max(0, Math.min(1, 1 - db / FLOOR_DB));
        return Color.HSBtoRGB(0.72f - 0.6f * share, 1 - 0.6f * share * share, share);
    }
}
