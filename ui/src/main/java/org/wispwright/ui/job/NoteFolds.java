package org.wispwright.ui.job;

import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.ui.shot.Note;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.retouch.Folds;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.Retouch;

/** Folds that follow from a note's geometry alone, before anything is simulated or drawn. */
public final class NoteFolds {
    private NoteFolds() {
    }

    /**
     * Folds of the note's mesh warps, at {@value Folds#ROWS} rows. Outlines, and mattes that depend on the smoke, need a picture: their
     * folds are found by a comparison.
     *
     * @param view the note's
     */
    public static Folds of(Note note, View view) {
        int rows = Folds.ROWS;
        Picture clear = new Picture(Math.max(1, (int) Math.round((double) rows * view.raster().width() / view.raster().height())), rows);
        return Folds.of(new Retouch(note.retouch().operations().stream().filter(NoteFolds::isGeometry).toList()), clear);
    }

    private static boolean isGeometry(Operation operation) {
        return operation instanceof MeshWarp && operation.within().map(matte -> matte instanceof Region).orElse(true);
    }
}
