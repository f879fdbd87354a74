package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;

/** That multiply-add is what it says, and that the second run of these tests really runs without the instruction. */
class ArithmeticTest {

    @Test
    void multiplyAddRoundsOnceOrTwiceAsDeclared() {
        SplittableRandom random = new SplittableRandom(1);
        for (int i = 0; i < 1_000; i++) {
            double a = random.nextDouble(), b = random.nextDouble(), c = -random.nextDouble();
            double expected = Arithmetic.FUSED ? Math.fma(a, b, c) : a * b + c;
            assertEquals(expected, Arithmetic.mulAdd(a, b, c));
        }
    }

    @Test
    @EnabledIfSystemProperty(named = "polewright.test.unfused", matches = "true")
    void isUnfusedWhereTheJvmHasNoInstructionForIt() {
        assertFalse(Arithmetic.FUSED);
    }
}
