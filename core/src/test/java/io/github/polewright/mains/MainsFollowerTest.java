package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicReference;
import org.junit.jupiter.api.Test;

/** Following alone. */
class MainsFollowerTest {

    @Test
    void saysWhatTheRemoverSays() {
        double rate = 16000;
        double[] programme = Programme.speech(rate, 5, 31);
        Hum hum = Hum.of(rate, Hum.wander(rate, 5, 60.2, 0.02, 60, 9), Hum.mixed(12, 9), 9)
                .scaledTo(programme, 0);
        double[] input = Measure.add(programme, hum.samples);
        MainsFollower follower = MainsFollower.of(rate, 1);
        assertEquals(MainsState.SEARCHING, follower.reading().state());
        assertTrue(Double.isNaN(follower.reading().frequencyHz()));
        follower.follow(input, 0, input.length);
        HumRemover remover = HumRemover.of(rate, 1);
        remover.process(input, 0, new double[input.length], 0, input.length);
        assertEquals(remover.reading().frequencyHz(), follower.reading().frequencyHz());
        assertEquals(remover.reading().uncertaintyHz(), follower.reading().uncertaintyHz());
        follower.reset();
        assertEquals(MainsState.SEARCHING, follower.reading().state());
    }

    /**
     * Against the Cramer-Rao bound for harmonics in white noise, var(w) >= 24 s^2 / (N^3 sum k^2 A_k^2) (Kay, 1993, the
     * single-tone bound summed over lines), for one second. The loop's memory is of that order; it must come within a
     * factor 3 of the bound and, for a constant frequency, its own uncertainty must cover its error.
     */
    @Test
    void errorInNoiseIsNearTheBound() {
        double rate = 8000;
        double[] amplitudes = {0.1, 0.05, 0.03, 0.02, 0.01};
        double sigma = 0.05;
        double information = 0;
        for (int k = 0; k < amplitudes.length; k++) {
            information += Math.pow((k + 1) * amplitudes[k], 2);
        }
        double bound = rate / (2 * Math.PI) * Math.sqrt(24 * sigma * sigma / (Math.pow(rate, 3) * information));
        double[] track = Hum.wander(rate, 30, 50.2, 0, 60, 1);
        Hum hum = Hum.of(rate, track, amplitudes, 4);
        double[] input = Measure.add(Programme.noise(rate, 30, sigma, 8), hum.samples);
        Trace trace = Trace.of(input, rate, Removal.SUBTRACTION);
        double error = trace.rmsError(5, 30, track);
        assertTrue(error < 3 * bound, error + " Hz beside a bound of " + bound);
        double uncertainty = trace.readings[trace.readings.length - 1].uncertaintyHz();
        assertTrue(error < 2 * uncertainty, error + " Hz beside an uncertainty of " + uncertainty);
    }

    @Test
    void readingsFromAnotherThreadBelongTogether() throws InterruptedException {
        double rate = 8000;
        Hum hum = Hum.of(rate, Hum.ramp(rate, 12, 50, 52, 2, 12), new double[] {0.1, 0.1, 0.1, 0.1}, 4);
        double[] input = Measure.add(Programme.noise(rate, 12, 1e-3, 8), hum.samples);
        MainsFollower follower = MainsFollower.of(rate, 1);
        AtomicBoolean done = new AtomicBoolean();
        AtomicReference<String> torn = new AtomicReference<>("");
        Thread reader = new Thread(() -> {
            while (!done.get()) {
                MainsReading reading = follower.reading();
                boolean searching = reading.state() == MainsState.SEARCHING;
                if (searching != Double.isNaN(reading.frequencyHz())
                        || searching != Double.isNaN(reading.uncertaintyHz())) {
                    torn.set(reading.toString());
                }
            }
        });
        reader.start();
        for (int round = 0; round < 20; round++) {
            follower.follow(input, 0, input.length);
            follower.reset();
        }
        done.set(true);
        reader.join();
        assertEquals("", torn.get());
    }
}
