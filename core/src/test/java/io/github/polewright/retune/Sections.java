package io.github.polewright.retune;

import io.github.polewright.Section;
import java.util.Random;

/** Sections made here for the tests alone, from t = (1 - a2)/(1 + a2) and cos(omega) = -a1/(1 + a2). */
final class Sections {

    static final double RATE_HZ = 48000;

    private Sections() {}

    static Section notch(double centreHz, double widthHz) {
        double t = Math.tan(Math.PI * widthHz / RATE_HZ);
        double cosine = Math.cos(2 * Math.PI * centreHz / RATE_HZ);
        return Section.normalized(1, -2 * cosine, 1, 1 + t, -2 * cosine, 1 - t);
    }

    static Section fromWidthAndAngle(double t, double omega) {
        double cosine = Math.cos(omega);
        return Section.normalized(t, 0, -t, 1 + t, -2 * cosine, 1 - t);
    }

    /** Second-order low-pass by the bilinear transform (R. Bristow-Johnson, Audio EQ Cookbook). */
    static Section lowPass(double cornerHz, double q) {
        double omega = 2 * Math.PI * cornerHz / RATE_HZ;
        double alpha = Math.sin(omega) / (2 * q);
        double b = (1 - Math.cos(omega)) / 2;
        return Section.normalized(b, 2 * b, b, 1 + alpha, -2 * Math.cos(omega), 1 - alpha);
    }

    /** Peak (R. Bristow-Johnson, Audio EQ Cookbook). */
    static Section peak(double centreHz, double q, double gainDb) {
        double omega = 2 * Math.PI * centreHz / RATE_HZ;
        double alpha = Math.sin(omega) / (2 * q);
        double a = Math.pow(10, gainDb / 40);
        double middle = -2 * Math.cos(omega);
        return Section.normalized(1 + alpha * a, middle, 1 - alpha * a, 1 + alpha / a, middle, 1 - alpha / a);
    }

    /** Low shelf of slope 1 (R. Bristow-Johnson, Audio EQ Cookbook). */
    static Section lowShelf(double cornerHz, double gainDb) {
        double omega = 2 * Math.PI * cornerHz / RATE_HZ;
        double a = Math.pow(10, gainDb / 40);
        double c = Math.cos(omega);
        double beta = 2 * Math.sqrt(a) * Math.sin(omega) * Math.sqrt(0.5);
        return Section.normalized(
                a * (a + 1 - (a - 1) * c + beta),
                2 * a * (a - 1 - (a + 1) * c),
                a * (a + 1 - (a - 1) * c - beta),
                a + 1 + (a - 1) * c + beta,
                -2 * (a - 1 + (a + 1) * c),
                a + 1 + (a - 1) * c - beta);
    }

    /** A denominator from two real poles. */
    static Section realPoles(double first, double second) {
        return Section.of(1, 0, 0, -(first + second), first * second);
    }

    static Section randomComplex(Random random) {
        double omega = 0.99 * Math.PI * Math.pow(10, -3.5 * random.nextDouble());
        double most = Math.min(0.8, 0.8 * Math.sin(omega));
        double t = most * Math.pow(10, -3 * random.nextDouble());
        return fromWidthAndAngle(t, omega);
    }

    /** Any stable section: complex, real, nearly real, first order, with a random numerator. */
    static Section random(Random random) {
        Section poles =
                switch (random.nextInt(5)) {
                    case 0 -> realPoles(randomPole(random), randomPole(random));
                    case 1 -> realPoles(randomPole(random), 0);
                    case 2 -> lowPass(20 * Math.pow(1000, random.nextDouble()), 0.5 + 0.05 * random.nextGaussian());
                    default -> randomComplex(random);
                };
        return Section.of(random.nextGaussian(), random.nextGaussian(), random.nextGaussian(), poles.a1(), poles.a2());
    }

    private static double randomPole(Random random) {
        double pole = 1 - Math.pow(10, -3.5 * random.nextDouble());
        return random.nextInt(4) == 0 ? -pole : pole;
    }
}
