package org.wispwright.ui.desk;

import java.util.Optional;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.retouch.LiveWarp;
import org.wispwright.warp.retouch.MeshWarp;

/**
 * * A handle of a mesh under the hand. The live picture follows it as a draft, on a raster small enough to keep up, without the operations
 * that come after the warp; at rest all is drawn as the note's wish is. When it ends, the open note has the warp. A place where the handle
 * cannot go (upon another, or with all on one line) is passed over.
 */
public final class Pulling extends Gesture {
    private final Retouching session;
    private final int at;
    private final Optional<Point> fresh;
    private MeshWarp warp;
    private int handle;
    private boolean making;
    private LiveWarp live;
    private Point wanted;
    private boolean moved;
    private boolean ended;
    private boolean over;

    Pulling(Retouching session, int at, MeshWarp warp, int handle) {
        this.session = session;
        this.at = at;
        this.warp = warp.with(handle, warp.handles().get(handle).to());         // refuses a handle that is not there
        this.handle = handle;
        fresh = Optional.empty();
    }

    Pulling(Retouching session, int at, MeshWarp warp, Point place) {
        this.session = session;
        this.at = at;
        this.warp = warp;
        handle = warp.handles().size();
        fresh = Optional.of(place);
    }

    @Override
    void ready() {
        if (making) {
            return;
        }
        making = true;
        session.warps().take(session.originals().middle(), session.operations().subList(0, at), warp, fresh, this::prepared,
                session::refused);
    }

    private void prepared(LiveWarp made) {
        if (over) {
            return;
        }
        live = made;
        warp = made.warp();
        if (!ended) {
            session.show(made.shown());
        }
        if (wanted != null) {
            drag();
        }
        if (ended) {
            finish();
        }
    }

    /** Pulls the handle to a place. */
    public void to(Point place) {
        if (over || ended) {
            return;
        }
        wanted = place;
        if (live != null) {
            drag();
        }
    }

    private void drag() {
        try {
            live.drag(handle, wanted).ifPresent(session::changed);
        } catch (IllegalArgumentException cannotGoThere) {
            return;
        }
        moved = true;
        warp = live.warp();
        session.fold(Optional.of(warp));
    }

    /** The warp as it is now; without a new handle until that could be set. */
    public MeshWarp warp() {
        return warp;
    }

    /** The operation's number. */
    public int at() {
        return at;
    }

    /** The handle's number in the warp. */
    public int handle() {
        return handle;
    }

    /**
     * Ends the pull: the note has it, if the handle is new as soon as its mesh is set up. A handle that was there and did not move changes
     * nothing.
     */
    public void end() {
        if (over || ended) {
            return;
        }
        ended = true;
        if (live == null && fresh.isEmpty() && wanted != null) {
            try {
                warp = warp.with(handle, wanted);
                moved = true;
            } catch (IllegalArgumentException cannotGoThere) {
                moved = false;
            }
        }
        if (live != null || fresh.isEmpty()) {
            finish();
        }
    }

    /** True if it was ended and waits for its mesh. */
    boolean isEnded() {
        return ended && !over;
    }

    private void finish() {
        boolean isNew = fresh.isPresent() || at >= session.operations().size();
        over = true;
        if (!moved && !isNew) {
            session.cancel();
            return;
        }
        session.ended(this, moved ? Retouching.Edit.PULL_HANDLE : Retouching.Edit.SET_HANDLE, at, warp, false);
    }

    @Override
    void dropped() {
        over = true;
    }
}
