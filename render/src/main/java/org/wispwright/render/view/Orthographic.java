package org.wispwright.render.view;

/**
 * A projection along parallel rays: the field is a rectangle around the view's axis, the same at every depth.
 *
 * @param widthMetres width of the field in metres, finite and above 0
 * @param heightMetres height of the field in metres, finite and above 0
 */
public record Orthographic(double widthMetres, double heightMetres) implements Lens {

    /** Checks the lengths. @throws IllegalArgumentException if one is off */
    public Orthographic {
        if (!(widthMetres > 0 && heightMetres > 0) || Double.isInfinite(widthMetres) || Double.isInfinite(heightMetres)) {
            throw new IllegalArgumentException("orthographic lens: got a field of " + widthMetres + " x " + heightMetres
                    + " m, needs finite lengths above 0");
        }
    }

    @Override
    public double aspect() {
        return widthMetres / heightMetres;
    }
}
