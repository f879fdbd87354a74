package io.github.polewright.retune;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.Section;
import java.util.Random;
import org.junit.jupiter.api.Test;

class BucketTest {

    @Test
    void chargesHalfTheDistanceAndLosesHalfTheDecay() {
        Section notch = Sections.notch(50, 1);
        double leak = Bucket.leak(notch.a1(), notch.a2(), notch.a1(), notch.a2());
        assertEquals(-0.25 * Math.log(notch.a2()), leak, 1e-12);
        Bucket bucket = new Bucket(2, 1);
        bucket.leakAt(1, leak);
        bucket.charge(1, 0.4);
        assertEquals(0.2, bucket.level(1), 1e-15);
        bucket.pass(1000);
        assertEquals(0.2 - 1000 * leak, bucket.level(1), 1e-12);
        assertEquals(0, bucket.level(0));
        bucket.pass(1_000_000);
        assertEquals(0, bucket.level(1));
    }

    @Test
    void leakIsBelowTheExactLogarithm() {
        Random random = new Random(41);
        for (int i = 0; i < 2000; i++) {
            Section section = Sections.random(random);
            double decay = Poles.decay(section.a1(), section.a2());
            double leak = Bucket.leak(section.a1(), section.a2(), section.a1(), section.a2());
            assertTrue(leak <= -0.5 * Math.log1p(-decay) * (1 + 1e-12));
            assertTrue(leak >= -0.35 * Math.log1p(-decay));
        }
    }

    @Test
    void admitsUpToTheLimitAndAnythingWhenEmpty() {
        Bucket bucket = new Bucket(1, 1);
        bucket.leakAt(0, 1e-3);
        assertTrue(bucket.admits(0, 7));
        bucket.charge(0, 1);
        assertTrue(bucket.admits(0, 1));
        assertFalse(bucket.admits(0, 1.01));
        assertEquals(0, bucket.framesUntil(0, 1));
        assertEquals(100, bucket.framesUntil(0, 1.2), 1);
        assertEquals(500, bucket.framesUntil(0, 7), 1);
        int frames = bucket.framesUntil(0, 7);
        bucket.pass(frames - 2);
        assertFalse(bucket.admits(0, 7));
        bucket.pass(2);
        assertTrue(bucket.admits(0, 7));
    }

    @Test
    void cuttingTimeChangesNothing() {
        Bucket whole = new Bucket(1, 1);
        Bucket cut = new Bucket(1, 1);
        for (Bucket bucket : new Bucket[] {whole, cut}) {
            bucket.leakAt(0, 1.0 / 3e4);
            bucket.charge(0, 1.7);
        }
        whole.pass(1234);
        for (int i = 0; i < 1234; i++) {
            cut.pass(1);
        }
        assertEquals(whole.level(0), cut.level(0));
        cut.clear();
        assertEquals(0, cut.level(0));
    }

    @Test
    void badArgumentsAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> new Bucket(0, 1));
        assertThrows(IllegalArgumentException.class, () -> new Bucket(1, 0));
        assertThrows(IllegalArgumentException.class, () -> new Bucket(1, Double.NaN));
    }
}
