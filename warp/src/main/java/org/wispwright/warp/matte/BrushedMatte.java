package org.wispwright.warp.matte;

import java.util.List;
import java.util.function.UnaryOperator;
import org.wispwright.render.picture.Picture;

/**
 * A matte painted by hand: sweeps in their order, each on what the one before left, from 0 everywhere.
 *
 * @param dabs 1 to {@value #MOST_DABS}
 */
public record BrushedMatte(List<Dab> dabs) implements Matte {
    /** The most sweeps a matte may have. */
    public static final int MOST_DABS = 1_000;

    /** What a sweep of coverage c does to the matte m. */
    public enum Way {
        /** {@code max(m, c)}. */ ADD,
        /** {@code m (1 - c)}. */ TAKE
    }

    /** One sweep of the brush. */
    public record Dab(Way way, Sweep sweep) {
        /**
         * Checks that all is there.
         *
         * @throws IllegalArgumentException if a part is missing
         */
        public Dab {
            Needs.present("brushed matte", "way", way);
            Needs.present("brushed matte", "sweep", sweep);
        }
    }

    /**
     * Checks and copies.
     *
     * @throws IllegalArgumentException if there are no sweeps or too many, or the first takes away (there is nothing yet)
     */
    public BrushedMatte {
        Needs.present("brushed matte", "dabs", dabs);
        if (dabs.isEmpty() || dabs.size() > MOST_DABS) {
            throw new IllegalArgumentException("brushed matte: got " + dabs.size() + " sweeps, needs 1 to " + MOST_DABS);
        }
        dabs = List.copyOf(dabs);
        if (dabs.get(0).way() == Way.TAKE) {
            throw new IllegalArgumentException("brushed matte: its first sweep takes away, and there is nothing yet; begin with one "
                    + "that adds");
        }
    }

    @Override
    public BrushedMatte moved(UnaryOperator<Point> map) {
        return new BrushedMatte(dabs.stream().map(dab -> new Dab(dab.way(), dab.sweep().moved(map))).toList());
    }

    @Override
    public float[] values(Picture original, Window window) {
        float[] values = new float[window.pixels()];
        for (Dab dab : dabs) {
            float[] coverage = dab.sweep().coverage(window, original.height());
            for (int p = 0; p < values.length; p++) {
                values[p] = dab.way() == Way.ADD ? Math.max(values[p], coverage[p]) : values[p] * (1 - coverage[p]);
            }
        }
        return values;
    }
}
