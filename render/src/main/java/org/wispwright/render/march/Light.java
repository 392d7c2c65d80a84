package org.wispwright.render.march;

import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Vec3;

/**
 * A light far away: the same direction everywhere.
 *
 * @param towards from the smoke to the light, any length above 0
 * @param radiance what an unshadowed point scatters towards any eye, before the albedo; linear light
 */
public record Light(Vec3 towards, Rgb radiance) {

    /** Checks the direction. @throws IllegalArgumentException if it has no length */
    public Light {
        if (!(towards.length() > 0)) {
            throw new IllegalArgumentException("light: 'towards' is (0, 0, 0); give a direction from the smoke to the light");
        }
    }
}
