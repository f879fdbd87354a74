package io.github.polewright.mains;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.List;

/** Hands figures to a test: all must be kept. */
final class Cases {

    private Cases() {}

    static void assertKept(List<Goals.Figure> figures) {
        List<String> missed = new ArrayList<>();
        for (Goals.Figure figure : figures) {
            if (!figure.isKept()) {
                missed.add(figure.toString());
            }
        }
        assertEquals(List.of(), missed);
    }
}
