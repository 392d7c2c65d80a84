package org.wispwright.ui.desk;

import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.WarpKind;

/**
 * What the pointer does on the easel, with the few settings that it has then. Lengths are fractions of the picture's height, as in a
 * retouch.
 */
public sealed interface Hand {
    /** Looks: pans and picks, changes nothing. */
    Hand LOOK = new Looking();

    /** True if it changes the open note's wish. */
    default boolean retouches() {
        return !(this instanceof Looking || this instanceof Holding);
    }

    /** Pans the picture and reads it. */
    record Looking() implements Hand {
    }

    /**
     * Brushes on the open note.
     *
     * @param brush    what it does
     * @param radius   fraction of the height, above 0 and at most 1
     * @param strength 0 to 1
     * @param softEdge share of the radius, 0 to 1
     * @param pressure whether a tablet's pressure counts
     */
    record Brushing(Brush brush, double radius, double strength, double softEdge, boolean pressure) implements Hand {
        /** Checks. @throws IllegalArgumentException if a number is out of its range */
        public Brushing {
            if (!(radius > 0 && radius <= 1) || !(strength >= 0 && strength <= 1) || !(softEdge >= 0 && softEdge <= 1)) {
                throw new IllegalArgumentException("brush: got radius " + radius + ", strength " + strength + ", soft edge " + softEdge
                        + "; needs a radius above 0 and at most 1, the others in 0..1");
            }
        }

        /** As it lies ready at the beginning. */
        public static Brushing usual(Brush brush) {
            return new Brushing(brush, 0.06, 0.6, 0.8, true);
        }

        /** Another radius, kept in its range. */
        public Brushing withRadius(double other) {
            return new Brushing(brush, Math.max(0.002, Math.min(1, other)), strength, softEdge, pressure);
        }

        /** Another strength, kept in its range. */
        public Brushing withStrength(double other) {
            return new Brushing(brush, radius, Math.max(0, Math.min(1, other)), softEdge, pressure);
        }

        /** Another soft edge, kept in its range. */
        public Brushing withSoftEdge(double other) {
            return new Brushing(brush, radius, strength, Math.max(0, Math.min(1, other)), pressure);
        }

        /** Another brush, same size. */
        public Brushing with(Brush other) {
            return new Brushing(other, radius, strength, softEdge, pressure);
        }
    }

    /**
     * Pulls a mesh: sets handles and drags them.
     *
     * @param kind how the places between the handles follow
     */
    record Pulling(WarpKind kind) implements Hand {
    }

    /**
     * Drags the smoke's outline by its points.
     *
     * @param level opacity on the outline, above 0 and below 1
     * @param reach how far a drag bends it, heights
     */
    record Outlining(double level, double reach) implements Hand {
    }

    /**
     * Draws a region that must stay, for the open note.
     *
     * @param form   its form
     * @param feather soft edge, fraction of the height, 0 to 1
     */
    record Holding(Form form, double feather) implements Hand {
    }

    /** Forms of a region. */
    enum Form {
        /** Corner to corner. */ RECTANGLE,
        /** Corner to corner of its box. */ ELLIPSE,
        /** By hand. */ FREEHAND
    }
}
