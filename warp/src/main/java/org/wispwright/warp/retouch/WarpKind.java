package org.wispwright.warp.retouch;

/**
 * How the places between the handles of a warp follow. Every kind carries each handle's start exactly to its end. All but the last are
 * fitted backwards, from ends to starts, so that each pixel has one source.
 */
public enum WarpKind {
    /** The thin-plate spline through the handles: bends least (Bookstein 1989). */
    SPLINE(3),
    /** Moving least squares, at each place the best affine map for weights 1 / distance^2 (Schaefer, McPhail and Warren 2006). */
    AFFINE(3),
    /** Moving least squares with a turn and one scale. */
    SIMILARITY(1),
    /** Moving least squares with a turn alone: keeps sizes. */
    RIGID(1),
    /** A mesh of cells that lowers {@code sum |(p'_i - p'_j) - R_i (p_i - p_j)|^2} over its sides (Sorkine and Alexa 2007). */
    AS_RIGID_AS_POSSIBLE(1);

    private final int fewest;

    WarpKind(int fewest) {
        this.fewest = fewest;
    }

    /** The fewest handles it needs; where that is 3 they may not lie on one line. */
    public int fewestHandles() {
        return fewest;
    }
}
