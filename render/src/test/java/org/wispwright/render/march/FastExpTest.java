package org.wispwright.render.march;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;

/** The quick exponential against the library's. */
class FastExpTest {

    /** Reference: {@code StrictMath.expm1} (fdlibm, below 1 unit in the last place). */
    @Test
    void agreesWithTheLibraryToFourUnitsInTheLastPlace() {
        Random random = new Random(42);
        double worst = 0;
        for (int n = 0; n < 400_000; n++) {
            double tau = n < 200_000 ? 41 * random.nextDouble() : Math.pow(10, -17 * random.nextDouble());
            double exact = StrictMath.expm1(-tau);
            worst = Math.max(worst, Math.abs(FastExp.minusOpacity(tau) - exact) / Math.ulp(exact));
        }
        assertTrue(worst <= 4, "worst " + worst + " units in the last place");
    }

    @Test
    void edgesOfTheRange() {
        assertEquals(0, FastExp.minusOpacity(0));
        assertEquals(-1, FastExp.minusOpacity(40));
        assertEquals(-1, FastExp.minusOpacity(Double.POSITIVE_INFINITY));
        assertEquals(StrictMath.expm1(0.3), FastExp.minusOpacity(-0.3));
        assertEquals(StrictMath.expm1(-Math.nextDown(40.0)), FastExp.minusOpacity(Math.nextDown(40.0)), 2e-16);
        assertTrue(Double.isNaN(FastExp.minusOpacity(Double.NaN)));
    }
}
