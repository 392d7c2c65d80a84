package org.wispwright.warp.matte;

import java.util.List;
import java.util.function.UnaryOperator;
import org.wispwright.render.picture.Picture;

/**
 * Mattes made into one, pixel by pixel. For values of 0 and 1 these are the operations on sets; between, union and intersection are
 * Zadeh (1965), Information and Control 8(3), 338-353, so a matte joined with itself stays itself; to subtract multiplies, as a soft
 * brush that takes away does.
 *
 * @param way   how
 * @param parts as many as the way needs
 */
public record CombinedMatte(Way way, List<Matte> parts) implements Matte {
    /** The most mattes in one. */
    public static final int MOST_PARTS = 100;
    /** How many of these may stand inside one another. */
    public static final int DEEPEST = 8;

    /** How values a, b, ... are made into one. */
    public enum Way {
        /** {@code max(a, b, ...)}; 2 parts or more. */ UNION,
        /** {@code min(a, b, ...)}; 2 parts or more. */ INTERSECT,
        /** {@code a (1 - b) (1 - c) ...}; 2 parts or more. */ SUBTRACT,
        /** {@code 1 - a}; 1 part. */ INVERSE
    }

    /**
     * Checks and copies.
     *
     * @throws IllegalArgumentException if there are too few or too many parts, or they are nested too deep
     */
    public CombinedMatte {
        Needs.present("combined matte", "way", way);
        Needs.present("combined matte", "parts", parts);
        int fewest = way == Way.INVERSE ? 1 : 2;
        int most = way == Way.INVERSE ? 1 : MOST_PARTS;
        if (parts.size() < fewest || parts.size() > most) {
            throw new IllegalArgumentException("combined matte: got " + parts.size() + " mattes, needs " + fewest + " to " + most);
        }
        parts = List.copyOf(parts);
        int depth = 1 + parts.stream().mapToInt(CombinedMatte::depth).max().orElse(0);
        if (depth > DEEPEST) {
            throw new IllegalArgumentException("combined matte: mattes stand " + depth + " deep inside one another, needs at most "
                    + DEEPEST
                    + "; join those of one kind in one list");
        }
    }

    private static int depth(Matte matte) {
        return matte instanceof CombinedMatte combined ? 1 + combined.parts.stream().mapToInt(CombinedMatte::depth).max().orElse(0) : 0;
    }

    @Override
    public CombinedMatte moved(UnaryOperator<Point> map) {
        return new CombinedMatte(way, parts.stream().map(part -> part.moved(map)).toList());
    }

    @Override
    public float[] values(Picture original, Window window) {
        float[] values = parts.get(0).values(original, window);
        if (way == Way.INVERSE) {
            for (int p = 0; p < values.length; p++) {
                values[p] = 1 - values[p];
            }
        }
        for (Matte part : parts.subList(1, parts.size())) {
            float[] more = part.values(original, window);
            switch (way) {
                case UNION -> {
                    for (int p = 0; p < values.length; p++) {
                        values[p] = Math.max(values[p], more[p]);
                    }
                }
                case INTERSECT -> {
                    for (int p = 0; p < values.length; p++) {
                        values[p] = Math.min(values[p], more[p]);
                    }
                }
                default -> {
                    for (int p = 0; p < values.length; p++) {
                        values[p] *= 1 - more[p];
                    }
                }
            }
        }
        return values;
    }
}
