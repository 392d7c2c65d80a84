package org.wispwright.ui.job;

import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.RayMarcher;
import org.wispwright.render.picture.Compositing;
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
        return picture(shot, density, view, lanes, new Cancel());
    }

    /** The same. @throws Cancel.Cancelled soon after it is wished */
    public static Picture picture(Shot shot, ScalarGrid density, View view, Lanes lanes, Cancel cancel) {
        return picture(shot, density, view, STEP_CELLS, lanes, cancel);
    }

    /** The same with other samples. @param stepCells share of a cell that samples lie apart at most */
    public static Picture picture(Shot shot, ScalarGrid density, View view, double stepCells, Lanes lanes, Cancel cancel) {
        RayMarcher marcher = new RayMarcher(density.shape(), view, stepCells * density.shape().cellMetres(), lanes);
        Picture picture = view.raster().picture();
        marcher.picture(density, shot.look(), picture, cancel::wished);
        cancel.stopIfWished();
        return picture;
    }

    /** A new picture that lies over an opaque background. */
    public static Picture over(Picture picture, Rgb background) {
        Picture out = new Picture(picture.width(), picture.height());
        Compositing.overEven(picture, background, out);
        return out;
    }
}
