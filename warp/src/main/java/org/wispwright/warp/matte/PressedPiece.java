package org.wispwright.warp.matte;

/**
 * Coverage along a straight piece of a line whose pressure changes, as one pixel sees it. With t the way along the piece, d(t) the pixel's
 * distance to that place, p(t) the pressure there and c = most(p) s^2 (3 - 2 s) ({@link Tip}),
 * <pre>
 * c' = 6 most s (1 - s) s' + most' s^2 (3 - 2 s),
 * s' = (middle q' - d') / wide - (middle q - d) wide' / wide^2,   wide = max(fade q, finest).
 * </pre>
 * Coverage has one peak, between the nearest place and the end that was pressed harder: at the nearest place if c' falls there, which is
 * asked of a whole row; at the harder end if c' still rises there; else where c' changes its sign: Newton's steps for many pixels at once
 * ({@link PressedRow}), and where these do not find coverage to within {@value #ENOUGH}, halving until the place is known to within
 * {@value #SEARCH_SHARE} of the edge's width.
 */
final class PressedPiece {
    private static final double SEARCH_SHARE = 0.02;
    /** Coverage that is not searched for further. */
    private static final double ENOUGH = 0.0005;
    private static final int STEPS = 2;

    private final Tip tip;
    private final double startX;
    private final double startY;
    private final double vx;
    private final double vy;
    private final double pressure;
    private final double length;
    private final double slope;
    private final boolean rising;
    private final Tip.Touch hardest;
    private final boolean onRadius;
    private final boolean onStrength;
    private final double narrow;
    /** A row's pixels, and those of them whose peak is not at the nearest place. */
    private final PressedRow pixels;
    private final PressedRow searched;
    private final int[] columns;
    private final PressedRow.Shape shape;
    /** Whether what the shape has is even along the piece, so that many pixels can be looked at in one go. */
    private final boolean even;
    /** Coverage at the place last looked at; where there is none, a number of 0 or less that falls with the distance. */
    private double here;
    /** A number of the sign of its slope there. */
    private double rises;

    /**
     * A piece from a place in pixels along a direction of length 1; its pressures differ, its length is above 0.
     *
     * @param pixels   room for a row: overwritten
     * @param searched as much
     * @param columns  as much
     */
    PressedPiece(Tip tip, double startX, double startY, double vx, double vy, double length, double pressure, double pressureEnd,
            PressedRow pixels, PressedRow searched, int[] columns) {
        this.tip = tip;
        this.startX = startX;
        this.startY = startY;
        this.vx = vx;
        this.vy = vy;
        this.pressure = pressure;
        this.length = length;
        slope = (pressureEnd - pressure) / length;
        rising = slope > 0;
        hardest = tip.touch(Math.max(pressure, pressureEnd));
        onRadius = tip.onRadius();
        onStrength = tip.onStrength();
        narrow = SEARCH_SHARE * Math.max(tip.fade(), tip.finest());
        double qStart = onRadius ? pressure : 1;
        double qEnd = onRadius ? pressureEnd : 1;
        shape = new PressedRow.Shape((float) length, PressedRow.Even.between(tip.middle() * qStart, tip.middle() * qEnd, length),
                PressedRow.Even.between(Math.max(tip.fade() * qStart, tip.finest()), Math.max(tip.fade() * qEnd, tip.finest()), length),
                PressedRow.Even.between(tip.most(pressure), tip.most(pressureEnd), length), (float) tip.centre(), rising ? 1 : -1);
        double softer = onRadius ? Math.min(pressure, pressureEnd) : 1;
        even = !onRadius || 2 * tip.radius() * softer >= 1
                && (tip.fade() * softer >= tip.finest() || tip.fade() * Math.max(qStart, qEnd) <= tip.finest());
        this.pixels = pixels;
        this.searched = searched;
        this.columns = columns;
    }

    /** What a touch at the harder end gives; no place gives more. */
    Tip.Touch hardest() {
        return hardest;
    }

    /** Columns left to right of row j take the most along the piece; {@code at} is the index of the row's column 0. */
    void row(int j, int left, int right, float[] values, int at) {
        double dy = j - startY;
        if (!even) {
            for (int i = left; i <= right; i++) {
                values[at + i] = peak((i - startX) * vx + dy * vy, (i - startX) * vy - dy * vx, values[at + i]);
            }
            return;
        }
        int column = (int) Math.floor(startX);
        int count = right - left + 1;
        pixels.row(count, left - column, (float) (startX - column), (float) dy, (float) vx, (float) vy);
        pixels.nearest(count, shape);
        pixels.bound(count, hardest);
        int open = 0;
        for (int n = 0; n < count; n++) {
            float most = Math.max(values[at + left + n], pixels.value[n]);
            values[at + left + n] = most;
            if (pixels.rises[n] >= 0 && pixels.bound[n] > most) {
                columns[open] = left + n;
                searched.along[open] = pixels.along[n];
                searched.beside2[open++] = pixels.beside2[n];
            }
        }
        if (open > 0) {
            search(dy, open, values, at);
        }
    }

    /** The same for those columns whose peak is not at the nearest place. */
    private void search(double dy, int open, float[] values, int at) {
        searched.begin(open, shape, (float) hardest.core());
        for (int step = 0; step <= STEPS; step++) {
            for (int n = 0; n < open; n++) {
                int pixel = at + columns[n];
                values[pixel] = Math.max(values[pixel], searched.value[n]);
            }
            searched.newton(open, shape);
            if (step < STEPS) {
                searched.step(open, shape);
            }
        }
        float far = rising ? (float) length : 0;
        for (int n = 0; n < open; n++) {
            boolean atEnd = searched.place[n] == far && searched.rises[n] >= 0;
            if (!atEnd && !searched.found(n, (float) narrow, (float) ENOUGH)) {
                int i = columns[n];
                values[at + i] = peak((i - startX) * vx + dy * vy, (i - startX) * vy - dy * vx, values[at + i]);
            }
        }
    }

    /** The most along the piece for a pixel at a place beside it, searched by halves; {@code was} if that is more. */
    private float peak(double along, double beside, float was) {
        double near = Math.min(length, Math.max(0, along));
        double far = rising ? length : 0;
        double beside2 = beside * beside;
        // No place gives more than the nearest would, pressed as hard as the harder end.
        if (!(hardest.at(Math.sqrt(beside2 + (along - near) * (along - near))) > was)) {
            return was;
        }
        look(along, beside2, far);
        double best = Math.max(was, here);
        near = rises >= 0 ? far : near;
        look(along, beside2, near);
        best = Math.max(best, here);
        far = rises < 0 ? near : far;
        while (Math.abs(far - near) > narrow) {
            double middle = (near + far) / 2;
            look(along, beside2, middle);
            best = Math.max(best, here);
            near = rises >= 0 ? middle : near;
            far = rises < 0 ? middle : far;
        }
        return (float) best;
    }

    private void look(double along, double beside2, double t) {
        double away = t - along;
        double distance = Math.sqrt(beside2 + away * away);
        double p = pressure + slope * t;
        double q = onRadius ? p : 1;
        double qSlope = onRadius ? slope : 0;
        double wide = tip.fade() * q;
        double per = 1 / Math.max(wide, tip.finest());
        double inside = (tip.middle() * q - distance) * per;
        double s = Math.min(1, tip.centre() + inside);
        double ahead = rising ? 1 : -1;
        // Slopes times the distance, so that nothing is divided by it.
        double side = tip.middle() - (wide > tip.finest() ? inside * tip.fade() : 0);
        double sRises = ahead * (side * qSlope * distance - away) * per;
        double most = tip.most(p);
        here = s <= 0 ? s : most * s * s * (3 - 2 * s);
        rises = s <= 0 ? sRises : 6 * most * (1 - s) * sRises + ahead * mostSlope(p) * s * (3 - 2 * s) * distance;
    }

    /** The slope of what a touch gives at the most. */
    private double mostSlope(double p) {
        double share = onRadius ? Math.min(1, 2 * tip.radius() * p) : 1;
        double shareSlope = onRadius && share < 1 ? 2 * tip.radius() * slope : 0;
        return tip.strength() * (onStrength ? slope * share + p * shareSlope : shareSlope);
    }
}
