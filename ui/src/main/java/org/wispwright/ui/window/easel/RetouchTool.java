package org.wispwright.ui.window.easel;

import java.util.Optional;
import javax.swing.SwingUtilities;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.warp.matte.Window;

/**
 * What all hands that change pictures have in common: the surface shows the session's live picture, and points of the pointer that wait in
 * the event queue together are worked off together, so that a slow segment is followed by one longer one, not by a queue of them.
 */
abstract class RetouchTool implements Tool, Retouching.Follower {
    final Desk desk;
    final Retouching retouching;
    final Surface surface;
    private final Runnable unlisten;
    private final Runnable undesk;
    private Hand hand;
    private boolean waiting;

    RetouchTool(Desk desk, Retouching retouching, Surface surface) {
        this.desk = desk;
        this.retouching = retouching;
        this.surface = surface;
        unlisten = retouching.listen(this);
        surface.showLive(retouching.live().orElse(null));
        hand = desk.state().hand();
        undesk = desk.listen(this::settings);
    }

    private void settings(DeskState state) {
        if (!state.hand().equals(hand)) {
            hand = state.hand();
            handChanged();
            surface.overlayChanged();
        }
    }

    /** The hand has other settings now. */
    void handChanged() {
    }

    @Override
    public void live(Optional<Picture> picture) {
        surface.showLive(picture.orElse(null));
    }

    @Override
    public void changed(Window pixels) {
        surface.changed(pixels);
    }

    @Override
    public void rested() {
        surface.overlayChanged();
    }

    /** Works off what the pointer did, behind the events that wait now. */
    final void soon() {
        if (!waiting) {
            waiting = true;
            SwingUtilities.invokeLater(this::now);
        }
    }

    /** Works off what the pointer did, if anything waits. */
    final void now() {
        if (waiting) {
            waiting = false;
            follow();
        }
    }

    /** Forgets what waits. */
    final void never() {
        waiting = false;
    }

    /** Follows the pointer to where it is by now. */
    abstract void follow();

    @Override
    public void cancel() {
        never();
        retouching.cancel();
        surface.overlayChanged();
    }

    @Override
    public void leave() {
        cancel();
        unlisten.run();
        undesk.run();
        surface.showLive(null);
    }
}
