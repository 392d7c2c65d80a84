package org.wispwright.optimize.flow;

/**
 * How a frame is cut into substeps: into a stated number, or into as many as it takes for the air to move no farther than stated in one.
 *
 * @param substeps  solver steps from one frame to the next, 1 to {@value #MOST_SUBSTEPS}; 0 while they are still to be found from
 *                  {@code mostCells}
 * @param mostCells largest displacement, cells a substep: speed of a face times the substep over the cell's side; 0 if the number itself
 *                  was stated
 */
public record Pace(int substeps, double mostCells) {
    /** More than this, and the frames themselves are too far apart. */
    public static final int MOST_SUBSTEPS = 64;

    /** Checks the numbers. @throws IllegalArgumentException saying what is off */
    public Pace {
        if (!(mostCells >= 0) || Double.isInfinite(mostCells)) {
            throw new IllegalArgumentException("flow: got a largest displacement of " + mostCells
                    + " cells, needs a finite number above 0");
        }
        if (substeps < (mostCells > 0 ? 0 : 1) || substeps > MOST_SUBSTEPS) {
            throw new IllegalArgumentException("flow: got " + substeps + " substeps a frame, needs 1 to " + MOST_SUBSTEPS);
        }
    }

    /** A stated number. */
    public static Pace of(int substeps) {
        return new Pace(substeps, 0);
    }

    /** A largest displacement whose number of substeps is still to be found. */
    public static Pace within(double mostCells) {
        return new Pace(0, mostCells);
    }

    /** True while the number of substeps is still to be found. */
    public boolean isOpen() {
        return substeps == 0;
    }

    /** The same wish with its number found. */
    public Pace found(int number) {
        return new Pace(number, mostCells);
    }
}
