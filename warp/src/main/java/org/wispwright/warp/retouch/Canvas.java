package org.wispwright.warp.retouch;

import java.util.Arrays;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Window;

/**
 * A picture being retouched: operations change it one after the other, and a stroke may be drawn on it point by point
 * ({@link LiveStroke}). What brushes must know of the picture's wide surroundings is kept beside it; it is made anew only where the picture
 * changed, and only when a brush asks for it. Not for several threads at once.
 * <p>Holds two copies of the picture once a stroke was begun, one before: 16 bytes a pixel each, 5 more for the surroundings, 4 for
 * coverage; and up to 16 MB of arrays that strokes have done with.
 */
public final class Canvas {
    private final Picture original;
    private Picture picture;
    private final Blocks blocks;
    private Picture before;
    private float[] coverage;
    private LiveStroke live;
    private Brushwork work;
    private final Spare spare = new Spare();

    /** The picture as it is before any operation. @param original read; never changed */
    public Canvas(Picture original) {
        this.original = original;
        picture = original.copy();
        blocks = new Blocks(picture);
    }

    /** The picture as the operations so far leave it; this canvas keeps changing it. */
    public Picture picture() {
        return picture;
    }

    /**
     * Applies an operation to what those before left.
     *
     * @throws IllegalStateException if a stroke is being drawn
     */
    public void apply(Operation operation) {
        requireNoLive();
        if (operation.changesNothing()) {
            return;
        }
        if (operation instanceof Stroke stroke) {
            stroke(stroke);
        } else if (operation instanceof MeshWarp warp) {
            swap(Bend.of(warp, original).applied(picture));
        } else if (operation instanceof OutlineWarp warp) {
            swap(Bend.of(warp, original).applied(picture));
        } else if (operation instanceof Repaint repaint) {
            swap(repaint.applied(picture));
        }
    }

    private void swap(Picture changed) {
        picture = changed;
        blocks.from(picture);
        blocks.forget();
        before = null;
    }

    private void stroke(Stroke stroke) {
        Window window = Brushwork.reached(stroke.line(), stroke.radius(), picture.width(), picture.height());
        if (window == null) {
            return;
        }
        Brushwork laid = new Brushwork(stroke, original, picture, blocks, window, spare.window(window.pixels()), spare);
        for (int n = 0; n < stroke.line().size(); n++) {
            laid.extend(stroke.line().get(n), stroke.sweep().pressure().at(n));
        }
        laid.refresh(window, picture);
        laid.over();
        for (Window part : laid.worked()) {
            blocks.changed(part);
            if (before != null) {
                copy(picture, before, part);
            }
        }
    }

    /**
     * Begins to draw a stroke, with the points that it has so far. The first stroke on a canvas copies the picture.
     *
     * @throws IllegalStateException if another is being drawn
     */
    public LiveStroke begin(Stroke start) {
        requireNoLive();
        if (before == null) {
            before = picture.copy();
        }
        if (coverage == null) {
            coverage = new float[picture.width() * picture.height()];
        }
        blocks.from(before);
        work = new Brushwork(start, original, before, blocks, Window.all(picture.width(), picture.height()), coverage, spare);
        live = new LiveStroke(this, start, work);
        return live;
    }

    private void requireNoLive() {
        if (live != null) {
            throw new IllegalStateException("canvas: a stroke is being drawn; end or cancel it first");
        }
    }

    /** The stroke being drawn is over. */
    void over(boolean kept) {
        live = null;
        work.over();
        for (Window part : work.worked()) {
            copy(kept ? picture : before, kept ? before : picture, part);
            for (int y = part.top(); y < part.top() + part.height(); y++) {
                int at = part.left() + picture.width() * y;
                Arrays.fill(coverage, at, at + part.width(), 0f);
            }
            if (kept) {
                blocks.changed(part);
            }
        }
        work = null;
        blocks.from(picture);
    }

    private static void copy(Picture from, Picture to, Window window) {
        for (int y = window.top(); y < window.top() + window.height(); y++) {
            int at = 4 * (window.left() + from.width() * y);
            System.arraycopy(from.rgba(), at, to.rgba(), at, 4 * window.width());
        }
    }
}
