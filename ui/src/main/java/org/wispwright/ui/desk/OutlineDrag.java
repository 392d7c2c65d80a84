package org.wispwright.ui.desk;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Retoucher;

/**
 * A point of the smoke's outline under the hand. A worker draws the live picture after it, on a small raster and without the operations
 * that come after; at rest all is drawn as the note's wish is. When it ends, the open note has the warp. A place where the point cannot go
 * (upon another) is passed over.
 */
public final class OutlineDrag extends Gesture {
    private final Retouching session;
    private final int at;
    private final int drag;
    private final OutlineWarp start;
    private OutlineWarp warp;
    private boolean there;
    private boolean over;

    OutlineDrag(Retouching session, int at, OutlineWarp warp, int drag) {
        this.session = session;
        this.at = at;
        this.drag = drag;
        start = warp;
        this.warp = warp;
    }

    @Override
    void ready() {
        there = true;
        if (warp != start) {
            draft();
        }
    }

    /** Drags the point to a place. */
    public void to(Point place) {
        if (over) {
            return;
        }
        List<Handle> drags = new ArrayList<>(warp.drags());
        drags.set(drag, new Handle(drags.get(drag).from(), place));
        try {
            warp = new OutlineWarp(warp.level(), drags, warp.reach(), warp.inside(), warp.within());
        } catch (IllegalArgumentException cannotGoThere) {
            return;
        }
        if (there) {
            draft();
        }
    }

    private void draft() {
        List<Operation> operations = Retouching.with(session.operations().subList(0, at), at, warp);
        Picture original = session.originals().small();
        session.outlining().ask(() -> Retoucher.wanted(new Retouch(operations), original), picture -> {
            if (!over) {
                session.show(picture);
            }
        });
        session.fold(Optional.of(warp));
    }

    /** The warp as it is now. */
    public OutlineWarp warp() {
        return warp;
    }

    /** The operation's number. */
    public int at() {
        return at;
    }

    /** The drag's number in the warp. */
    public int drag() {
        return drag;
    }

    /** Ends the drag: the note has it. A point that was there and did not move changes nothing. */
    public void end() {
        if (over) {
            return;
        }
        if (warp == start) {
            session.cancel();
            return;
        }
        over = true;
        session.ended(this, Retouching.Edit.DRAG_OUTLINE, at, warp, false);
    }

    @Override
    void dropped() {
        over = true;
    }
}
