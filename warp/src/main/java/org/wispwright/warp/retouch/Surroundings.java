package org.wispwright.warp.retouch;

import org.wispwright.render.picture.Picture;

/** What a stroke's brush needs to know of the picture around a place, as it was before the stroke; made a tile at a time and kept. */
final class Surroundings {
    private final ColourNearby colour;
    private final Gaussian gaussian;
    private final int channels;
    private final Spare spare;
    private final float[][] colours;
    private final float[][] blurs;

    Surroundings(Stroke stroke, Picture before, Blocks blocks, int tiles, Spare spare) {
        this.spare = spare;
        double radius = stroke.radius() * before.height();
        boolean contrast = stroke.brush() == Brush.EVEN || stroke.brush() == Brush.LIFT;
        colour = contrast || stroke.brush() == Brush.ADD ? new ColourNearby(blocks, before, Brushwork.COLOUR_SIGMA * radius) : null;
        channels = contrast ? 1 : 4;
        double sigma = (contrast ? LocalContrast.MEAN_SIGMA : Brushwork.SOFTEN_SIGMA) * radius;
        gaussian = contrast || stroke.brush() == Brush.SOFTEN
                ? new Gaussian(blocks, before.rgba(), before.width(), before.height(), channels, sigma) : null;
        colours = colour == null ? null : new float[tiles][];
        blurs = gaussian == null ? null : new float[tiles][];
    }

    /** Colour of the smoke near, three a pixel of the tile. */
    float[] colour(int tx, int ty, int tile) {
        if (colours[tile] == null) {
            colours[tile] = spare.floats(3);
            colour.tile(tx, ty, colours[tile]);
        }
        return colours[tile];
    }

    /** The brush's blur: RGBA for {@link Brush#SOFTEN}, else opacity. */
    float[] blurred(int tx, int ty, int tile) {
        if (blurs[tile] == null) {
            blurs[tile] = spare.floats(channels);
            gaussian.tile(tx, ty, blurs[tile]);
        }
        return blurs[tile];
    }

    /** A tile will not be asked for soon: its arrays go back. */
    void done(int tile) {
        done(colours, tile);
        done(blurs, tile);
    }

    /** All arrays go back. */
    void over() {
        for (int tile = 0; colours != null && tile < colours.length; tile++) {
            done(colours, tile);
        }
        for (int tile = 0; blurs != null && tile < blurs.length; tile++) {
            done(blurs, tile);
        }
    }

    private void done(float[][] arrays, int tile) {
        if (arrays != null) {
            spare.back(arrays[tile]);
            arrays[tile] = null;
        }
    }
}
