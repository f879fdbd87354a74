package io.github.polewright.samples.report;

import io.github.polewright.samples.files.Frames;
import io.github.polewright.samples.files.Recording;
import io.github.polewright.samples.files.WholeFile;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.file.Path;
import javax.imageio.ImageIO;
import org.jtransforms.fft.DoubleFFT_1D;

/** Level over time and frequency before and after, one above the other, as a picture. */
final class HumSpectrogram {

    private static final int COLUMNS = 1000;
    private static final int ROWS = 280;
    private static final int LEFT = 70;
    private static final int GAP = 46;
    private static final double WINDOW_SECONDS = 0.25;
    private static final double LOWEST_DB = -110;
    private static final double HIGHEST_DB = -30;

    private final double topHz;
    private final double seconds;
    private final double[][] levelsDb = new double[COLUMNS][ROWS];

    private HumSpectrogram(Recording recording, double topHz) {
        this.topHz = topHz;
        this.seconds = recording.seconds();
        int length = (int) Math.min(recording.frames(), Math.round(WINDOW_SECONDS * recording.sampleRateHz()));
        double[] block = new double[length * recording.channels()];
        double[] mono = new double[length];
        DoubleFFT_1D transform = new DoubleFFT_1D(length);
        int next = 0;
        try (Frames frames = recording.read()) {
            long done = 0;
            for (int got = frames.read(block, length); got > 0; got = frames.read(block, length)) {
                done += got;
                if (got == length) {
                    mix(block, mono, recording.channels());
                    transform.realForward(mono);
                }
                int end = (int) (done * COLUMNS / recording.frames());
                while (next < end) {
                    fill(levelsDb[next++], mono, recording.sampleRateHz());
                }
            }
        }
    }

    /** Writes NAME.png. */
    static void write(Recording before, Recording after, double topHz, Path folder, String name) {
        HumSpectrogram above = new HumSpectrogram(before, topHz);
        HumSpectrogram below = new HumSpectrogram(after, topHz);
        WholeFile.write(folder.resolve(name + ".png"), beside -> {
            BufferedImage image = new BufferedImage(LEFT + COLUMNS + 20, 2 * (ROWS + GAP), BufferedImage.TYPE_INT_RGB);
            Graphics2D graphics = image.createGraphics();
            graphics.setColor(Color.WHITE);
            graphics.fillRect(0, 0, image.getWidth(), image.getHeight());
            graphics.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
            above.paint(image, graphics, 20, "before");
            below.paint(image, graphics, 20 + ROWS + GAP, "after");
            graphics.dispose();
            if (!ImageIO.write(image, "png", beside.toFile())) {
                throw new IOException("this Java has no PNG writer");
            }
        });
    }

    private static void mix(double[] block, double[] mono, int channels) {
        for (int n = 0; n < mono.length; n++) {
            double sum = 0;
            for (int c = 0; c < channels; c++) {
                double value = block[n * channels + c];
                sum += Double.isFinite(value) ? value : 0;
            }
            mono[n] = sum / channels * (1 - Math.cos(2 * Math.PI * n / mono.length)) * 2 / mono.length;
        }
    }

    private void fill(double[] column, double[] spectrum, double rate) {
        double binHz = rate / spectrum.length;
        for (int row = 0; row < ROWS; row++) {
            int bin = (int) Math.round((row + 0.5) / ROWS * topHz / binHz);
            boolean there = 2 * bin + 1 < spectrum.length;
            double size = there ? Math.hypot(spectrum[2 * bin], spectrum[2 * bin + 1]) : 0;
            column[row] = 20 * Math.log10(Math.max(1e-10, size));
        }
    }

    private void paint(BufferedImage image, Graphics2D graphics, int top, String title) {
        for (int column = 0; column < COLUMNS; column++) {
            for (int row = 0; row < ROWS; row++) {
                image.setRGB(LEFT + column, top + ROWS - 1 - row, color(levelsDb[column][row]));
            }
        }
        graphics.setColor(Color.BLACK);
        graphics.drawString(title, LEFT, top - 6);
        for (int tick = 0; tick <= 4; tick++) {
            int y = top + ROWS - tick * ROWS / 4;
            graphics.drawString(Numbers.format("%.0f Hz", tick * topHz / 4), 8, Math.max(top + 10, y));
            int x = LEFT + tick * (COLUMNS - 40) / 4;
            graphics.drawString(
                    Numbers.format("%.1f s", tick * seconds / 4 * (COLUMNS - 40) / COLUMNS), x, top + ROWS + 16);
        }
    }

    /** Dark to bright, blue to yellow, so that it reads without colours as well. */
    private static int color(double levelDb) {
        double share = Math.max(0, Math.min(1, (levelDb - LOWEST_DB) / (HIGHEST_DB - LOWEST_DB)));
        int red = (int) (255 * Math.pow(share, 1.2));
        int green = (int) (235 * Math.pow(share, 1.5));
        int blue = (int) (60 + 90 * Math.sin(Math.PI * share));
        return red << 16 | green << 8 | blue;
    }
}
