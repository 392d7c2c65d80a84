package org.wispwright.warp.matte;

/**
 * Coverage along a straight piece of a line whose pressure changes, as one pixel sees it. With t the way along the piece, d(t) the pixel's
 * distance to that place, p(t) the pressure there and c = most(p) s^2 (3 - 2 s) ({@link Tip}),
 * <pre>
 * c' = 6 most s (1 - s) s' + most' s^2 (3 - 2 s),   s' = (middle q' - d') / wide - (middle q - d) wide' / wide^2,   wide = max(fade q, finest).
 * </pre>
 * Coverage has one peak, which lies between the nearest place and the end that was pressed harder: at an end if c' says so there, else
 * where c' changes its sign, found by halving to within {@value #SEARCH_SHARE} of the edge's width.
 */
final class PressedPiece {
    private static final double SEARCH_SHARE = 0.02;

    private final Tip tip;
    private final double pressure;
    private final double length;
    private final double slope;
    private final double harder;
    private final boolean onRadius;
    private final boolean onStrength;
    private final double narrow;
    private final double perWide;
    /** Coverage at the place last looked at; where there is none, a number of 0 or less that falls with the distance. */
    private double here;
    /** A number of the sign of c' there. */
    private double rises;

    /** A piece from {@code pressure} to {@code pressureEnd}, which differ; length in pixels, above 0. */
    PressedPiece(Tip tip, double pressure, double pressureEnd, double length) {
        this.tip = tip;
        this.pressure = pressure;
        this.length = length;
        slope = (pressureEnd - pressure) / length;
        harder = Math.max(pressure, pressureEnd);
        onRadius = tip.onRadius();
        onStrength = tip.onStrength();
        narrow = SEARCH_SHARE * Math.max(tip.fade(), tip.finest());
        perWide = 1 / Math.max(tip.fade(), tip.finest());
    }

    /**
     * The most along the piece.
     *
     * @param along   where the pixel is along it, from its start; may be off its ends
     * @param beside2 square of how far the pixel is beside it
     * @param enough  the search may end where the peak is found to be no more than this
     */
    double peak(double along, double beside2, double enough) {
        double near = Math.min(length, Math.max(0, along));
        double far = slope > 0 ? length : 0;
        look(along, beside2, near);
        double best = here;
        double sign = Math.signum(far - near);
        // No place gives more than the nearest would, pressed as hard as the harder end.
        if (near == far || sign * rises < 0 || tip.value(beside2 + (along - near) * (along - near), harder) <= enough) {
            return best;
        }
        look(along, beside2, far);
        best = Math.max(best, here);
        if (sign * rises > 0) {
            return best;
        }
        double a = near;
        double b = far;
        while (Math.abs(b - a) > narrow) {
            double middle = (a + b) / 2;
            look(along, beside2, middle);
            best = Math.max(best, here);
            if (sign * rises > 0) {
                a = middle;
            } else {
                b = middle;
            }
        }
        look(along, beside2, (a + b) / 2);
        return Math.max(best, here);
    }

    private void look(double along, double beside2, double t) {
        double away = t - along;
        double d = Math.sqrt(beside2 + away * away);
        double p = pressure + slope * t;
        double s;
        double rise;
        // Both times d, so that nothing is divided by it.
        if (onRadius) {
            double wide = tip.fade() * p;
            double per = 1 / Math.max(wide, tip.finest());
            double inside = (tip.middle() * p - d) * per;
            s = tip.centre() + inside;
            rise = (tip.middle() * slope * d - away - (wide > tip.finest() ? inside * tip.fade() * slope * d : 0)) * per;
        } else {
            s = tip.centre() + (tip.middle() - d) * perWide;
            rise = -away * perWide;
        }
        if (s <= 0) {
            here = s;
            rises = rise;
            return;
        }
        double most = tip.most(p);
        double grows = grows(p);
        here = s >= 1 ? most : most * s * s * (3 - 2 * s);
        rises = s >= 1 ? grows : 6 * most * (1 - s) * rise + grows * s * (3 - 2 * s) * d;
    }

    /** The slope of {@link Tip#most} along the piece. */
    private double grows(double p) {
        double share = onRadius ? Math.min(1, 2 * tip.radius() * p) : 1;
        double shareGrows = onRadius && share < 1 ? 2 * tip.radius() * slope : 0;
        return tip.strength() * (onStrength ? slope * share + p * shareGrows : shareGrows);
    }
}
