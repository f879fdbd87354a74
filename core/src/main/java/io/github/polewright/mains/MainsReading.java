package io.github.polewright.mains;

/**
 * What the follower knew at one moment, all of it from the same moment.
 *
 * <p><b>Units</b> hertz; decibels relative to a sine of amplitude 1. <b>Threads</b> immutable. <b>Numbers</b> what is not
 * known is NaN; the level of a line that is not there is negative infinity.
 */
public final class MainsReading {

    private final MainsState state;
    private final double frequencyHz;
    private final double uncertaintyHz;
    private final int lines;
    private final double[] levels;

    MainsReading(MainsState state, double frequencyHz, double uncertaintyHz, int lines, double[] levels) {
        this.state = state;
        this.frequencyHz = frequencyHz;
        this.uncertaintyHz = uncertaintyHz;
        this.lines = lines;
        this.levels = levels;
    }

    /**
     * How far the search has come.
     *
     * @return the state
     */
    public MainsState state() {
        return state;
    }

    /**
     * The mains frequency. While {@link MainsState#PROVING} it is a guess that may belong to the programme.
     *
     * @return hertz; NaN while searching
     */
    public double frequencyHz() {
        return frequencyHz;
    }

    /**
     * The standard deviation the follower expects of its frequency.
     *
     * @return hertz; NaN while searching
     */
    public double uncertaintyHz() {
        return uncertaintyHz;
    }

    /**
     * How many lines are followed.
     *
     * @return the highest harmonic {@link #levelDb} can be asked for
     */
    public int lines() {
        return lines;
    }

    /**
     * How many channels are followed.
     *
     * @return at least 1
     */
    public int channels() {
        return levels.length / lines;
    }

    /**
     * The level of one line in one channel, as it stands in the input.
     *
     * @param harmonic 1 is the fundamental
     * @param channel from 0
     * @return decibels relative to a sine of amplitude 1; negative infinity if the line is not there
     * @throws IndexOutOfBoundsException if {@code harmonic < 1 || harmonic > lines()} or
     *     {@code channel < 0 || channel >= channels()}
     */
    public double levelDb(int harmonic, int channel) {
        if (harmonic < 1 || harmonic > lines) {
            throw new IndexOutOfBoundsException("harmonic is " + harmonic + "; it must be from 1 to " + lines);
        }
        if (channel < 0 || channel >= channels()) {
            throw new IndexOutOfBoundsException("channel is " + channel + "; it must be from 0 to " + (channels() - 1));
        }
        double level = levels[channel * lines + harmonic - 1];
        return level > 0 ? 20 * Math.log10(level) : Double.NEGATIVE_INFINITY;
    }

    /** State, frequency and uncertainty in one line. */
    @Override
    public String toString() {
        return Double.isNaN(frequencyHz)
                ? state.toString()
                : state + " " + frequencyHz + " Hz +- " + uncertaintyHz + " Hz";
    }
}
