package io.github.polewright.mains;

/** Distance from the notes of equal temperament with A at 440 Hz (ISO 16). */
final class TemperedNotes {

    private TemperedNotes() {}

    /** Cents from the nearest note, 0 to 50. */
    static double centsAway(double frequencyHz) {
        double cents = 1200 * Math.log(frequencyHz / 440) / Math.log(2);
        return Math.abs(cents - 100 * Math.rint(cents / 100));
    }
}
