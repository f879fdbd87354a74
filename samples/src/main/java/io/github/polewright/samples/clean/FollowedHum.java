package io.github.polewright.samples.clean;

/**
 * What a remover that follows the mains took out of a recording.
 *
 * @param lines the most lines that were there at once; 0 if nothing was taken out
 * @param frequencyHz the last frequency of the mains
 * @param fromSeconds when it began
 * @param seconds how long it lasted, pauses left out
 */
public record FollowedHum(int lines, double frequencyHz, double fromSeconds, double seconds) {

    static final FollowedHum NONE = new FollowedHum(0, 0, 0, 0);
}
