package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Section;
import org.junit.jupiter.api.Test;

/** What a live cascade may not be built from. */
class BuilderBadInputTest {

    private final LiveCascadeBuilder builder = LiveCascade.builder(Designs.mixed(1, 3));

    @Test
    void namesTheValueAndTheRange() {
        refuses(() -> builder.channels(0), "channels", "0", "1");
        refuses(() -> builder.channels(-7), "channels", "-7");
        refuses(() -> builder.channels(1_025), "channels", "1025", "1024");
        refuses(() -> LiveCascade.of(Designs.mixed(1, 3), 0), "channels", "0", "1");
        refuses(() -> builder.mostSections(2), "mostSections", "2", "3");
        refuses(() -> builder.mostSections(1_025), "mostSections", "1025", "1024");
    }

    @Test
    void refusesAnUnstableCascade() {
        var unstable = Designs.cascade(Section.PASS_THROUGH, Section.of(1, 0, 0, 0, -1.5));
        refuses(() -> LiveCascade.of(unstable, 1), "section 1", "-1.5", "stable");
        refuses(() -> LiveCascade.builder(unstable).build(), "section 1", "-1.5", "stable");
    }

    @Test
    void refusesNull() {
        refusesNull("cascade", () -> LiveCascade.of(null, 1));
        refusesNull("cascade", () -> LiveCascade.builder(null));
        refusesNull("form", () -> builder.form(null));
        refusesNull("pace", () -> builder.pace(null));
    }

    private static void refusesNull(String name, Runnable call) {
        assertEquals(name, assertThrows(NullPointerException.class, call::run).getMessage());
    }

    @Test
    void aRefusedWishLeavesTheBuilderAsItWas() {
        builder.channels(2).mostSections(4);
        refuses(() -> builder.channels(0), "channels");
        refuses(() -> builder.mostSections(0), "mostSections");
        assertEquals(2, builder.build().channels());
        assertEquals(4, builder.build().mostSections());
    }

    private static void refuses(Runnable call, String... words) {
        String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
        for (String word : words) {
            assertTrue(message.contains(word), "\"" + word + "\" in: " + message);
        }
    }
}
