package org.wispwright.ui.window.easel;

import java.awt.Graphics2D;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.Message;
import org.wispwright.ui.desk.Pulling;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.ui.desk.Retouching.Edit;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.retouch.Cells;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.WarpKind;

/**
 * * Pulls a mesh. A click sets a handle, a drag pulls the one it begins at, or a new one; a click with Ctrl or Alt takes one off. New
 * handles go to the note's last operation, if that is a mesh warp, else a new one begins; a kind that needs three handles waits for them.
 * Dots are what stays, arrows what is pulled, crossed squares where the picture is turned over.
 */
final class PullTool extends RetouchTool {
    private static final double STILL = 3;

    /** A handle of one of the note's warps. */
    private record Grip(int operation, int handle) {
    }

    private final List<Point> waiting = new ArrayList<>();
    private Optional<Grip> hover = Optional.empty();
    private Optional<Grip> grip = Optional.empty();
    private Pointer start;
    private Pointer at;
    private Optional<Pulling> pulling = Optional.empty();
    /** What the pointer did while a handle that was set waits for its mesh. */
    private final Deque<Runnable> later = new ArrayDeque<>();

    PullTool(Desk desk, Retouching retouching, Surface surface) {
        super(desk, retouching, surface);
        rest();
    }

    @Override
    public void rested() {
        if (pulling.isEmpty()) {
            rest();
        }
        while (!later.isEmpty() && !retouching.isWaiting()) {
            later.remove().run();
        }
        super.rested();
    }

    /** True if that waits, with all that waits already. */
    private boolean waits(Runnable event) {
        boolean waits = !later.isEmpty() || retouching.isWaiting();
        if (waits) {
            later.add(event);
        }
        return waits;
    }

    private void rest() {
        List<Operation> operations = retouching.operations();
        if (retouching.isAtRest() && !operations.isEmpty() && operations.get(operations.size() - 1) instanceof MeshWarp warp) {
            retouching.prepare(operations.size() - 1);
            retouching.fold(Optional.of(warp));
        } else if (retouching.isAtRest()) {
            retouching.fold(Optional.empty());
        }
    }

    @Override
    public void live(Optional<org.wispwright.render.picture.Picture> picture) {
        super.live(picture);
        if (picture.isEmpty()) {
            waiting.clear();
        }
        hover = Optional.empty();
    }

    private Optional<MeshWarp> warp(int operation) {
        if (pulling.isPresent() && pulling.get().at() == operation) {
            return pulling.map(Pulling::warp);
        }
        List<Operation> operations = retouching.operations();
        return operation < operations.size() && operations.get(operation) instanceof MeshWarp warp ? Optional.of(warp) : Optional.empty();
    }

    /** The handle under the pointer, those of later operations first. */
    private Optional<Grip> near(Pointer pointer) {
        Grip best = null;
        double least = Marks.GRASP * pointer.heights();
        for (int n = retouching.operations().size() - 1; n >= 0 && best == null; n--) {
            List<Handle> handles = warp(n).map(MeshWarp::handles).orElse(List.of());
            for (int h = 0; h < handles.size(); h++) {
                double distance = handles.get(h).to().distanceTo(pointer.place());
                if (distance < least) {
                    best = new Grip(n, h);
                    least = distance;
                }
            }
        }
        return Optional.ofNullable(best);
    }

    @Override
    public void moved(Pointer pointer) {
        Optional<Grip> found = near(pointer);
        if (!found.equals(hover)) {
            hover = found;
            surface.overlayChanged();
        }
    }

    @Override
    public void pressed(Pointer pointer) {
        if (!waits(() -> press(pointer))) {
            press(pointer);
        }
    }

    private void press(Pointer pointer) {
        moved(pointer);
        start = pointer;
        at = pointer;
        grip = hover;
        if (retouching.note().isEmpty()) {
            start = null;
            at = null;
        } else if (pointer.ctrl() || pointer.alt()) {
            start = null;
            at = null;
            grip.ifPresent(this::remove);
        } else if (grip.isPresent()) {
            pulling = warp(grip.get().operation())
                    .flatMap(warp -> retouching.pull(grip.get().operation(), warp, grip.get().handle()));
        } else {
            begin(pointer.place());
        }
    }

    private void begin(Point place) {
        List<Operation> operations = retouching.operations();
        int last = operations.size() - 1;
        if (last >= 0 && operations.get(last) instanceof MeshWarp warp) {
            pulling = retouching.pullNew(last, warp, place);
            return;
        }
        WarpKind kind = desk.state().hand() instanceof Hand.Pulling hand ? hand.kind() : WarpKind.AS_RIGID_AS_POSSIBLE;
        waiting.add(place);
        if (waiting.size() < kind.fewestHandles()) {
            surface.overlayChanged();
            return;
        }
        try {
            MeshWarp warp = new MeshWarp(kind, waiting.stream().map(Handle::pin).toList(), Cells.USUAL, Optional.empty());
            waiting.clear();
            pulling = retouching.pull(operations.size(), warp, warp.handles().size() - 1);
        } catch (IllegalArgumentException refused) {
            waiting.remove(waiting.size() - 1);
            desk.say(Message.Kind.NOTICE, refused.getMessage());
        }
        surface.overlayChanged();
    }

    private void remove(Grip off) {
        MeshWarp warp = warp(off.operation()).orElseThrow();
        if (warp.handles().size() > 1 && warp.handles().size() <= warp.kind().fewestHandles()) {
            desk.say(Message.Kind.NOTICE, Words.of("hand.pull.fewest", warp.kind().fewestHandles()));
            return;
        }
        retouching.edit(Edit.REMOVE_HANDLE, operations -> {
            List<Operation> changed = new ArrayList<>(operations);
            List<Handle> handles = new ArrayList<>(warp.handles());
            handles.remove(off.handle());
            if (handles.isEmpty()) {
                changed.remove(off.operation());
            } else {
                changed.set(off.operation(), new MeshWarp(warp.kind(), handles, warp.cells(), warp.within()));
            }
            return changed;
        });
        hover = Optional.empty();
    }

    @Override
    public void dragged(Pointer pointer) {
        if (!waits(() -> drag(pointer))) {
            drag(pointer);
        }
    }

    private void drag(Pointer pointer) {
        if (start != null && Math.hypot(pointer.x() - start.x(), pointer.y() - start.y()) >= STILL || at != start) {
            at = pointer;
            soon();
        }
    }

    @Override
    void follow() {
        pulling.ifPresent(pull -> pull.to(at.place()));
        surface.overlayChanged();
    }

    @Override
    public void released(Pointer pointer) {
        if (!waits(() -> release(pointer))) {
            release(pointer);
        }
    }

    private void release(Pointer pointer) {
        now();
        Optional<Pulling> ended = pulling;
        pulling = Optional.empty();
        start = null;
        at = null;
        grip = Optional.empty();
        ended.ifPresent(Pulling::end);
        moved(pointer);
        surface.overlayChanged();
    }

    @Override
    public void exited() {
        hover = Optional.empty();
        surface.overlayChanged();
    }

    @Override
    public void cancel() {
        pulling = Optional.empty();
        start = null;
        at = null;
        grip = Optional.empty();
        waiting.clear();
        later.clear();
        super.cancel();
    }

    @Override
    public void paint(Graphics2D g, Placement placement) {
        if (retouching.note().isEmpty()) {
            return;
        }
        Marks.folds(g, retouching.folds(), placement);
        int count = Math.max(retouching.operations().size(), pulling.map(pull -> pull.at() + 1).orElse(0));
        for (int n = 0; n < count; n++) {
            warp(n).ifPresent(warp -> warp.handles().forEach(handle -> Marks.handle(g, handle, placement)));
        }
        waiting.forEach(place -> Marks.line(g, Marks.circle(placement.toScreen(place).getX(), placement.toScreen(place).getY(), 4),
                Palette.HELD.colour(), 1.5f));
        Optional<Grip> ring = pulling.map(pull -> new Grip(pull.at(), pull.handle())).or(() -> hover);
        ring.ifPresent(r -> warp(r.operation()).filter(warp -> r.handle() < warp.handles().size())
                .ifPresent(warp -> Marks.hover(g, placement.toScreen(warp.handles().get(r.handle()).to()))));
    }
}
