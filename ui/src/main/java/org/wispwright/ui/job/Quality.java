package org.wispwright.ui.job;

import java.util.List;
import org.wispwright.optimize.solve.Solve;
import org.wispwright.render.volume.GridShape;

/** How far a solve climbs. The take's volumes always have the shot's own grid; only the search ends lower. */
public enum Quality {
    /** The lowest rung alone: a first look at which way a note goes. */
    PREVIEW,
    /** Up to the rung below the shot's own grid. */
    REVIEW,
    /** All rungs. */
    FINAL;

    /** The rungs that are climbed for a shot of this grid; one at the least. */
    public List<GridShape> rungs(GridShape grid) {
        List<GridShape> all = Solve.rungs(grid);
        int count = switch (this) {
            case PREVIEW -> 1;
            case REVIEW -> Math.max(1, all.size() - 1);
            case FINAL -> all.size();
        };
        return all.subList(0, count);
    }
}
