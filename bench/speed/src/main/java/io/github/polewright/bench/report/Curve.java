package io.github.polewright.bench.report;

import java.util.List;

/**
 * A distribution of block times: point i says how long the block took that only one block in {@code oneIn[i]} exceeded.
 *
 * @param name of the situation
 * @param blocks how many were timed
 * @param oneIn 1 for the fastest, growing
 * @param micros microseconds of process time
 */
public record Curve(String name, long blocks, List<Double> oneIn, List<Double> micros) {

    /** Copies the lists and checks that they are as long. */
    public Curve {
        if (oneIn.size() != micros.size()) {
            throw new IllegalArgumentException(
                    name + " has " + oneIn.size() + " points and " + micros.size() + " times; they must be as many");
        }
        oneIn = List.copyOf(oneIn);
        micros = List.copyOf(micros);
    }
}
