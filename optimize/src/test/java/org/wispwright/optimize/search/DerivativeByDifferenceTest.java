package org.wispwright.optimize.search;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

/**
 * Two ways of checking a derivative, and how far each can be trusted. Nothing of the program runs here: these are proofs about the
 * method.
 */
class DerivativeByDifferenceTest {

    /**
     * O72: Squire and Trapp (1998), SIAM Review 40, 110-112: the imaginary part of f(x + ih) over h has no cancellation, so h may be as
     * small as one likes. x^4.5 and e^x/(sin^3 x + cos^3 x) at 1.5.
     */
    @Test
    void o72_complexStep() {
        for (double h : new double[] {1e-20, 1e-100}) {
            Complex z = new Complex(1.5, h);
            assertEquals(18.6008127342597587, z.power(4.5).im / h, 1e-15 * 18.6, "h " + h);
            Complex sine = z.sin();
            Complex cosine = z.cos();
            Complex below = sine.times(sine).times(sine).plus(cosine.times(cosine).times(cosine));
            assertEquals(3.62203370071632604, z.exp().over(below).im / h, 1e-15 * 3.62, "h " + h);
        }
    }

    /**
     * O73: central differences of x^4.5 at 1.5 for contrast. Down to h = 1e-4 the error is truncation's, f''' h^2 / 6; below 1e-6 it is
     * rounding's, eps f / h. The least lies near h = eps^(1/3) = 6e-6.
     */
    @Test
    void o73_centralDifferencesMakeAV() {
        assertEquals(1.2e-3, error(1e-2), .05e-3);
        assertEquals(1.2e-7, error(1e-4), .05e-7);
        assertEquals(1.5e-9, error(1e-6), .1e-9);
        assertEquals(1.1e-7, error(1e-8), .1e-7);
        assertEquals(1.6e-3, error(1e-12), .5e-3);                             // one unit in f's last place makes 4.4e-4 here
        int best = -1;
        for (int decade = -13; decade < -1; decade++) {
            best = error(Math.pow(10, decade)) < error(Math.pow(10, best)) ? decade : best;
        }
        assertTrue(best == -5 || best == -6, "the least is at 1e" + best);
    }

    private static double error(double h) {
        return Math.abs((StrictMath.pow(1.5 + h, 4.5) - StrictMath.pow(1.5 - h, 4.5)) / (2 * h) - 18.6008127342597587);
    }

    /** As much of complex arithmetic as O72 takes. */
    private record Complex(double re, double im) {
        Complex plus(Complex b) {
            return new Complex(re + b.re, im + b.im);
        }

        Complex times(Complex b) {
            return new Complex(re * b.re - im * b.im, re * b.im + im * b.re);
        }

        Complex over(Complex b) {
            double square = b.re * b.re + b.im * b.im;
            return new Complex((re * b.re + im * b.im) / square, (im * b.re - re * b.im) / square);
        }

        Complex exp() {
            return new Complex(Math.exp(re) * Math.cos(im), Math.exp(re) * Math.sin(im));
        }

        Complex sin() {
            return new Complex(Math.sin(re) * Math.cosh(im), Math.cos(re) * Math.sinh(im));
        }

        Complex cos() {
            return new Complex(Math.cos(re) * Math.cosh(im), -Math.sin(re) * Math.sinh(im));
        }

        Complex power(double p) {
            double radius = Math.pow(Math.hypot(re, im), p);
            double angle = p * Math.atan2(im, re);
            return new Complex(radius * Math.cos(angle), radius * Math.sin(angle));
        }
    }
}
