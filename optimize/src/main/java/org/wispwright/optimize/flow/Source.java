package org.wispwright.optimize.flow;

/**
 * A ball that gives off smoke. Inside {@code radius - edge} it adds {@code ratePerSecond} of density a second; the rate
 * falls smoothly ({@code 3t^2 - 2t^3}) to 0 at {@code radius}.
 *
 * @param name          for messages
 * @param centreX       world position of the centre, metres
 * @param centreY       as centreX
 * @param centreZ       as centreX; in the plane case only x and y count
 * @param radiusMetres  above 0
 * @param edgeMetres    width of the soft rim, 0 to radius
 * @param ratePerSecond density added a second at the core, 0 or more
 * @param firstFrame    first frame whose state it has already fed
 * @param lastFrame     last frame that it feeds, not before firstFrame
 */
public record Source(String name, double centreX, double centreY, double centreZ, double radiusMetres, double edgeMetres,
                     double ratePerSecond, int firstFrame, int lastFrame) {

    /** Checks the numbers. @throws IllegalArgumentException saying what is off */
    public Source {
        if (name == null || name.isBlank()) {
            throw new IllegalArgumentException("source: needs a name");
        }
        if (!Double.isFinite(centreX) || !Double.isFinite(centreY) || !Double.isFinite(centreZ)) {
            throw new IllegalArgumentException("source '" + name + "': got centre (" + centreX + ", " + centreY + ", " + centreZ
                    + ") m, needs finite numbers");
        }
        if (!(radiusMetres > 0) || Double.isInfinite(radiusMetres)) {
            throw new IllegalArgumentException("source '" + name + "': got a radius of " + radiusMetres + " m, needs a finite number above 0");
        }
        if (!(edgeMetres >= 0 && edgeMetres <= radiusMetres)) {
            throw new IllegalArgumentException("source '" + name + "': got an edge of " + edgeMetres + " m, needs 0 to the radius of "
                    + radiusMetres + " m");
        }
        if (!(ratePerSecond >= 0) || Double.isInfinite(ratePerSecond)) {
            throw new IllegalArgumentException("source '" + name + "': got a rate of " + ratePerSecond + " a second, needs a finite number from 0");
        }
        if (lastFrame < firstFrame) {
            throw new IllegalArgumentException("source '" + name + "': got frames " + firstFrame + " to " + lastFrame
                    + ", needs the last not before the first");
        }
    }

    /** The rate's share at a world position: 1 in the core, 0 outside. */
    public double shareAt(double x, double y, double z) {
        double distance = Math.sqrt((x - centreX) * (x - centreX) + (y - centreY) * (y - centreY) + (z - centreZ) * (z - centreZ));
        if (distance >= radiusMetres) {
            return 0;
        }
        if (distance <= radiusMetres - edgeMetres) {
            return 1;
        }
        double t = (radiusMetres - distance) / edgeMetres;
        return t * t * (3 - 2 * t);
    }

    /** True if the source feeds the step that ends at this frame. */
    public boolean feeds(int frame) {
        return frame >= firstFrame && frame <= lastFrame;
    }
}
