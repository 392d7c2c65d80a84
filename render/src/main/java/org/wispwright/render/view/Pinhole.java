package org.wispwright.render.view;

/**
 * A rectilinear lens focused at infinity. Angle of view = {@code 2 atan(gate / 2 focal)}; pinhole geometry as in Hartley
 * and Zisserman (2004), Multiple View Geometry, ch. 6, with the axis through the gate's centre.
 *
 * @param focalMm focal length in millimetres, finite and above 0
 * @param gateWidthMm width of the film gate in millimetres, finite and above 0
 * @param gateHeightMm height of the film gate in millimetres, finite and above 0
 */
public record Pinhole(double focalMm, double gateWidthMm, double gateHeightMm) implements Lens {

    /** Checks the lengths. @throws IllegalArgumentException naming the one that is off */
    public Pinhole {
        require("focal length", focalMm);
        require("gate width", gateWidthMm);
        require("gate height", gateHeightMm);
    }

    @Override
    public double aspect() {
        return gateWidthMm / gateHeightMm;
    }

    /** Horizontal angle of view, degrees. */
    public double horizontalDegrees() {
        return angleDegrees(gateWidthMm);
    }

    /** Vertical angle of view, degrees. */
    public double verticalDegrees() {
        return angleDegrees(gateHeightMm);
    }

    /** Angle of view from corner to corner, degrees. */
    public double diagonalDegrees() {
        return angleDegrees(Math.hypot(gateWidthMm, gateHeightMm));
    }

    private double angleDegrees(double acrossMm) {
        return Math.toDegrees(2 * Math.atan(acrossMm / (2 * focalMm)));
    }

    private static void require(String what, double mm) {
        if (!(mm > 0) || Double.isInfinite(mm)) {
            throw new IllegalArgumentException("pinhole lens: got a " + what + " of " + mm + " mm, needs a finite length above 0");
        }
    }
}
