package io.github.polewright.tone;

/**
 * One tone to be measured: a frequency, and how wide the ear for it is. A narrow ear tells neighbours apart and hears
 * less noise; a wide one answers sooner: width times response is 0.733, whichever is given.
 *
 * <p><b>Units</b> hertz, seconds. <b>Threads</b> immutable.
 */
public final class Tone {

    private static final double RESPONSE_WIDTH = Math.log(10) / Math.PI;

    private final double frequencyHz;
    private final double widthHz;

    private Tone(double frequencyHz, double widthHz) {
        this.frequencyHz = frequencyHz;
        this.widthHz = widthHz;
    }

    /**
     * A tone by the width of its ear.
     *
     * @param frequencyHz 20 Hz and more
     * @param widthHz distance of the two frequencies at which the level reads 3 dB too low, 0.1 to 1000 Hz
     * @return the tone
     * @throws IllegalArgumentException if a value is outside its range
     */
    public static Tone byWidth(double frequencyHz, double widthHz) {
        check("frequencyHz", frequencyHz, 20, 96000);
        check("widthHz", widthHz, 0.1, 1000);
        return new Tone(frequencyHz, widthHz);
    }

    /**
     * A tone by how soon its level is right.
     *
     * @param frequencyHz 20 Hz and more
     * @param responseSeconds time after which the reading has 90 % of the amplitude (is 0.9 dB too low), 0.001 to 5 s
     * @return the tone
     * @throws IllegalArgumentException if a value is outside its range
     */
    public static Tone byResponse(double frequencyHz, double responseSeconds) {
        check("frequencyHz", frequencyHz, 20, 96000);
        check("responseSeconds", responseSeconds, 0.001, 5);
        return new Tone(frequencyHz, RESPONSE_WIDTH / responseSeconds);
    }

    static void check(String name, double value, double least, double most) {
        if (!(value >= least && value <= most)) {
            throw new IllegalArgumentException(name + " is " + value + "; it must be " + least + " to " + most);
        }
    }

    /**
     * The frequency.
     *
     * @return hertz
     */
    public double frequencyHz() {
        return frequencyHz;
    }

    /**
     * The distance of the −3 dB points.
     *
     * @return hertz
     */
    public double widthHz() {
        return widthHz;
    }

    /**
     * The time to 90 % of the amplitude.
     *
     * @return seconds
     */
    public double responseSeconds() {
        return RESPONSE_WIDTH / widthHz;
    }

    /** Time constant of the amplitude. */
    double decaySeconds() {
        return 1 / (Math.PI * widthHz);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Tone that && frequencyHz == that.frequencyHz && widthHz == that.widthHz;
    }

    @Override
    public int hashCode() {
        return 31 * Double.hashCode(frequencyHz) + Double.hashCode(widthHz);
    }

    @Override
    public String toString() {
        return frequencyHz + " Hz, " + widthHz + " Hz wide";
    }
}
