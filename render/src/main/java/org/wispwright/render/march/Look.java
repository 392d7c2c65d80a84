package org.wispwright.render.march;

import java.util.Optional;
import org.wispwright.render.picture.Rgb;

/**
 * How density becomes a picture; Max (1995), IEEE TVCG 1(2), 99-108. A point of the smoke glows with
 * {@code albedo * (ambient + radiance * transmittance towards the light)} and absorbs {@code extinction * density} a metre.
 *
 * @param extinction 1/m for a density of 1, finite and above 0
 * @param albedo share of light scattered on, each channel 0..1
 * @param ambient light from everywhere, linear
 * @param light one directional light, or none
 */
public record Look(double extinction, Rgb albedo, Rgb ambient, Optional<Light> light) {

    /** Checks the numbers. @throws IllegalArgumentException naming the one that is off */
    public Look {
        if (!(extinction > 0) || Double.isInfinite(extinction)) {
            throw new IllegalArgumentException("look: got an extinction of " + extinction + " 1/m, needs a finite number above 0");
        }
        if (albedo.r() > 1 || albedo.g() > 1 || albedo.b() > 1) {
            throw new IllegalArgumentException("look: got an albedo of (" + albedo.r() + ", " + albedo.g() + ", " + albedo.b()
                    + "), needs 0 to 1 in each channel; put brightness into ambient or the light");
        }
    }
}
