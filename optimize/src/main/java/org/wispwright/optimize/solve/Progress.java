package org.wispwright.optimize.solve;

import java.util.List;
import java.util.function.Supplier;
import org.wispwright.render.picture.Picture;

/**
 * One accepted iteration of a running solve.
 *
 * @param rung        1 for the coarsest
 * @param rungs       how many there are
 * @param band        1 for the first
 * @param bands       how many there are
 * @param iteration   in all, 1 for the first
 * @param gradients   gradients computed so far
 * @param loss        total loss as a share of the original's
 * @param met         met of each note at the solve's raster, in the problem's order
 * @param seconds     since the solve began
 * @param secondsLeft an estimate: the iterations that bands usually take, times this solve's own seconds an iteration
 */
public record Progress(int rung, int rungs, int band, int bands, int iteration, int gradients, double loss, List<Double> met,
                       double seconds, double secondsLeft) {
    /** Told of each accepted iteration, on the thread that solves. Time spent in it is a pause: it counts as nobody's. */
    @FunctionalInterface
    public interface Listener {
        /** One more iteration. */
        void iteration(Progress progress);

        /**
         * Offers what the notes' frames look like now.
         *
         * @param got draws nothing, only copies: a picture a note, in the problem's order, at the solve's raster; to be asked before
         *     this returns, or not at all
         */
        default void pictures(Supplier<List<Picture>> got) {
        }

        /** Asked once the iteration is recorded: true ends the solve here, with what it has, as if its rule were reached. May wait. */
        default boolean enough() {
            return false;
        }
    }
}
