package io.github.polewright.inspect;

import io.github.polewright.Cascade;
import java.util.Arrays;
import java.util.TreeSet;

/** The largest gain to any section's output: a grid that is dense around each pole, then a search in each hump. */
final class PeakSearch {

    private static final int GRID = 512;
    private static final double LOWEST = 1e-6;
    private static final double GOLDEN = (Math.sqrt(5) - 1) / 2;
    private static final int NARROWINGS = 60;

    private final Response response;
    private final Cascade cascade;
    private final double[] gridHz;

    PeakSearch(Response response, Cascade cascade) {
        this.response = response;
        this.cascade = cascade;
        gridHz = grid();
    }

    double largestDb() {
        double largest = Double.NEGATIVE_INFINITY;
        for (int sections = 1; sections <= cascade.sectionCount(); sections++) {
            largest = Math.max(largest, largestDb(sections));
        }
        return largest;
    }

    private double largestDb(int sections) {
        double[] db = new double[gridHz.length];
        double largest = Double.NEGATIVE_INFINITY;
        for (int i = 0; i < db.length; i++) {
            db[i] = response.dbOfFirst(sections, gridHz[i]);
            largest = Math.max(largest, db[i]);
        }
        // A hump that the grid sees more than 3 dB lower cannot win: around a pole the grid is finer than that.
        double worthwhile = largest - 3;
        for (int i = 0; i < db.length; i++) {
            int before = Math.max(i - 1, 0);
            int after = Math.min(i + 1, db.length - 1);
            if (db[i] >= worthwhile && db[i] >= db[before] && db[i] >= db[after]) {
                largest = Math.max(largest, summitDb(sections, gridHz[before], gridHz[after]));
            }
        }
        return largest;
    }

    /** Golden-section search in a hump. */
    private double summitDb(int sections, double fromHz, double toHz) {
        double low = fromHz;
        double high = toHz;
        double inner = high - GOLDEN * (high - low);
        double outer = low + GOLDEN * (high - low);
        double innerDb = response.dbOfFirst(sections, inner);
        double outerDb = response.dbOfFirst(sections, outer);
        for (int i = 0; i < NARROWINGS; i++) {
            if (innerDb > outerDb) {
                high = outer;
                outer = inner;
                outerDb = innerDb;
                inner = high - GOLDEN * (high - low);
                innerDb = response.dbOfFirst(sections, inner);
            } else {
                low = inner;
                inner = outer;
                innerDb = outerDb;
                outer = low + GOLDEN * (high - low);
                outerDb = response.dbOfFirst(sections, outer);
            }
        }
        return Math.max(innerDb, outerDb);
    }

    private double[] grid() {
        double nyquistHz = cascade.sampleRateHz() / 2;
        TreeSet<Double> points = new TreeSet<>();
        points.add(0.0);
        points.add(nyquistHz);
        for (int i = 1; i < GRID; i++) {
            double share = (double) i / GRID;
            points.add(nyquistHz * share);
            points.add(nyquistHz * Math.pow(LOWEST, share));
            points.add(nyquistHz * (1 - Math.pow(LOWEST, share)));
        }
        for (Complex pole : response.poles()) {
            double centreHz = Math.abs(pole.argument()) / Math.PI * nyquistHz;
            double spreadHz = Math.max(Math.abs(1 - pole.magnitude()), Math.ulp(1.0)) / Math.PI * nyquistHz;
            points.add(centreHz);
            for (double offset = 0.25 * spreadHz; offset < nyquistHz; offset *= 1.5) {
                points.add(centreHz - offset);
                points.add(centreHz + offset);
            }
        }
        double[] within = points.subSet(0.0, true, nyquistHz, true).stream()
                .mapToDouble(Double::doubleValue)
                .toArray();
        Arrays.sort(within);
        return within;
    }
}
