package org.wispwright.ui.window.easel;

import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Window;

/** The easel as a {@link Tool} needs it. */
interface Surface {
    /** Shows a picture that the tool keeps changing, in place of the wish; any raster of the view's aspect. Null ends it. */
    void showLive(Picture live);

    /** Pixels of the live picture changed. */
    void changed(Window pixels);

    /** What the tool draws over the picture changed within this box of the easel's pixels. */
    void overlayChanged(int x, int y, int width, int height);

    /** All that the tool draws changed. */
    void overlayChanged();

    /** Where the picture lies now. */
    Placement placement();
}
