package io.github.polewright.mains;

/** What a remover did with one mono stream: its output, and a reading every 10 ms. */
final class Trace {

    static final double STEP_SECONDS = 0.01;

    final double sampleRateHz;
    final double[] output;
    final MainsReading[] readings;

    private Trace(double[] input, double sampleRateHz, Removal way) {
        this.sampleRateHz = sampleRateHz;
        HumRemover remover = HumRemover.builder(sampleRateHz, 1).by(way).build();
        output = new double[input.length];
        int step = (int) Math.round(STEP_SECONDS * sampleRateHz);
        readings = new MainsReading[input.length / step];
        for (int r = 0; r < readings.length; r++) {
            remover.process(input, r * step, output, r * step, step);
            readings[r] = remover.reading();
        }
        int rest = readings.length * step;
        remover.process(input, rest, output, rest, input.length - rest);
    }

    static Trace of(double[] input, double sampleRateHz, Removal way) {
        return new Trace(input, sampleRateHz, way);
    }

    /** Seconds until following begins at or after a time; NaN if it never does. */
    double followingAfter(double seconds) {
        for (int r = (int) (seconds / STEP_SECONDS); r < readings.length; r++) {
            if (isProven(readings[r])) {
                return (r + 1) * STEP_SECONDS;
            }
        }
        return Double.NaN;
    }

    /** Seconds until a frequency within 0.3 Hz is known, proven or not, and stays known for a second. */
    double foundAfter(double seconds, double[] frequencyHz) {
        int run = 0;
        for (int r = (int) (seconds / STEP_SECONDS); r < readings.length; r++) {
            boolean near = Math.abs(error(r, frequencyHz)) < 0.3;
            run = near ? run + 1 : 0;
            if (run * STEP_SECONDS > 1) {
                return (r + 2 - run) * STEP_SECONDS;
            }
        }
        return Double.NaN;
    }

    double error(int r, double[] frequencyHz) {
        int n = Math.min(frequencyHz.length - 1, (int) ((r + 1) * STEP_SECONDS * sampleRateHz));
        return readings[r].frequencyHz() - frequencyHz[n];
    }

    /** Largest frequency error between two times, in hertz; infinite where nothing is known. */
    double worstError(double from, double to, double[] frequencyHz) {
        double worst = 0;
        for (int r = (int) (from / STEP_SECONDS); r < Math.min(readings.length, to / STEP_SECONDS); r++) {
            double error = Math.abs(error(r, frequencyHz));
            worst = Double.isNaN(error) ? Double.POSITIVE_INFINITY : Math.max(worst, error);
        }
        return worst;
    }

    double rmsError(double from, double to, double[] frequencyHz) {
        double sum = 0;
        int count = 0;
        for (int r = (int) (from / STEP_SECONDS); r < Math.min(readings.length, to / STEP_SECONDS); r++) {
            double error = error(r, frequencyHz);
            sum += Double.isNaN(error) ? 1 : error * error;
            count++;
        }
        return Math.sqrt(sum / count);
    }

    static boolean isProven(MainsReading reading) {
        return reading.state() == MainsState.FOLLOWING || reading.state() == MainsState.HOLDING;
    }

    int sample(double seconds) {
        return (int) Math.min(output.length, Math.round(seconds * sampleRateHz));
    }
}
