package org.wispwright.ui.work;

import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.RayMarcher;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.ScalarGrid;
import org.wispwright.ui.shot.Shot;

/** Pictures of takes. */
public final class PictureWork {
    /** Samples along a ray lie at most this share of a cell apart. */
    public static final double STEP_CELLS = 0.5;

    private PictureWork() {
    }

    /** The picture of a density through a view: linear, premultiplied, nothing behind it. */
    public static Picture picture(Shot shot, ScalarGrid density, View view, Lanes lanes) {
        RayMarcher marcher = new RayMarcher(density.shape(), view, STEP_CELLS * density.shape().cellMetres(), lanes);
        Picture picture = view.raster().picture();
        marcher.picture(density, shot.look(), picture);
        return picture;
    }

    /** A new picture that lies over an opaque background. */
    public static Picture over(Picture picture, Rgb background) {
        Picture out = picture.copy();
        float[] rgba = out.rgba();
        for (int n = 0; n < rgba.length; n += 4) {
            double through = 1 - rgba[n + 3];
            rgba[n] += (float) (through * background.r());
            rgba[n + 1] += (float) (through * background.g());
            rgba[n + 2] += (float) (through * background.b());
            rgba[n + 3] = 1;
        }
        return out;
    }
}
