package org.wispwright.ui.desk;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.concurrent.ExecutorService;
import java.util.function.Function;
import java.util.function.Supplier;
import java.util.function.UnaryOperator;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.desk.Pictures.Ask;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.outline.Outlines;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Canvas;
import org.wispwright.warp.retouch.Folds;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.Stroke;

/**
 * The open note's retouch under a hand: a live picture that strokes, mesh drags and outline drags change, and the edits that come of them.
 * <p>It works while the easel is at the open note and a hand is taken up that changes pictures. The picture is made on a worker from the
 * original and the note's operations, and again when they change by anything but a stroke just drawn, which it shows already. What a hand
 * begins before that picture is there waits for it and is not lost; what changes the note's operations from elsewhere, such as undo, drops
 * what the hand has begun.
 * <p>Desk's thread. Knows no screen; names of edits come from outside.
 */
public final class Retouching {
    /** What is done to a note here; each is an edit with a name. */
    public enum Edit {
        /** A stroke was drawn. */ ADD_STROKE,
        /** A handle was set on a mesh. */ SET_HANDLE,
        /** A handle was pulled. */ PULL_HANDLE,
        /** A handle was taken off. */ REMOVE_HANDLE,
        /** A mesh follows in another way. */ CHANGE_MESH,
        /** A point of the outline was dragged. */ DRAG_OUTLINE,
        /** A drag was taken off the outline. */ REMOVE_DRAG,
        /** An operation was removed. */ REMOVE_STEP,
        /** An operation came earlier or later. */ MOVE_STEP,
        /** A hold was added. */ ADD_HOLD,
        /** A hold was removed. */ REMOVE_HOLD,
        /** A hold lasts for other frames. */ HOLD_FRAMES
    }

    /** Told of what happens to the live picture, on the desk's thread. */
    public interface Follower {
        /** Another picture is live now, or none; any raster of the view's aspect. */
        void live(Optional<Picture> picture);

        /** Pixels of the live picture changed. */
        void changed(Window pixels);

        /** Something beside the picture changed: the operations it shows, folds, outlines, the chosen hold. */
        void rested();
    }

    /** What is retouched. */
    private record Subject(ShotFolder folder, String note, String view, int frame) {
    }

    /** What a worker made: the originals, and a canvas with the operations on it. */
    private record Laid(Subject subject, Originals originals, List<Operation> operations, Canvas canvas) {
    }

    private final Desk desk;
    private final Function<Edit, String> names;
    private final Replacing building;
    private final LiveWarps warps;
    private final Following outlining;
    private final Beside beside;
    private final List<Follower> followers = new ArrayList<>();
    private Optional<Subject> subject = Optional.empty();
    private List<Operation> asked;
    private Laid laid;
    private Gesture gesture;
    private Pulling ending;
    private boolean own;
    private Picture live;
    private OptionalInt chosenHold = OptionalInt.empty();

    /** Follows a desk for as long as that lives. @param names what each kind of edit is called in undo and redo */
    public Retouching(Desk desk, Function<Edit, String> names) {
        this.desk = desk;
        this.names = names;
        ExecutorService lane = desk.workers().lane("retouch");
        building = new Replacing(desk.workers(), lane);
        ExecutorService other = desk.workers().lane("retouch-beside");
        warps = new LiveWarps(desk.workers(), lane);
        outlining = new Following(desk.workers(), other);
        beside = new Beside(desk.workers(), other, this::tellRested);
        desk.listen(this::follow);
    }

    /** Tells of all that happens from now on. @return ends it */
    public Runnable listen(Follower follower) {
        followers.add(follower);
        return () -> followers.remove(follower);
    }

    private void follow(DeskState state) {
        Optional<Subject> now = state.isAtOpenNote() ? Optional.of(subject(state)) : Optional.empty();
        if (!now.equals(subject)) {
            drop();
            subject = now;
            show(null);
        }
        if (now.isEmpty() || asked == null && state.hand() instanceof Hand.Looking) {
            return;
        }
        Note note = note().orElseThrow();
        if (chosenHold.isPresent() && chosenHold.getAsInt() >= note.holds().size()) {
            choose(OptionalInt.empty());
        }
        if (!note.retouch().operations().equals(asked)) {
            build(note.retouch().operations());
        }
    }

    private static Subject subject(DeskState state) {
        Note note = state.openNote().map(Listed::note).orElseThrow();
        return new Subject(state.shot().orElseThrow().folder(), note.id(), note.view(), note.frame());
    }

    private void drop() {
        dropAll();
        building.drop();
        warps.drop();
        outlining.drop();
        beside.drop();
        asked = null;
        laid = null;
        chosenHold = OptionalInt.empty();
    }

    private void build(List<Operation> operations) {
        if (!own) {
            dropAll();
        }
        asked = operations;
        Subject of = subject.orElseThrow();
        OpenShot shot = desk.state().shot().orElseThrow();
        Optional<Originals> there = Optional.ofNullable(laid).map(Laid::originals);
        building.replace(cancel -> {
            Originals originals = there.orElseGet(() -> Originals.of(
                    desk.pictures().draw(shot, new Ask(Source.ORIGINAL, of.view(), of.frame(), 0), cancel)));
            return new Laid(of, originals, operations, canvas(originals.full(), operations, cancel));
        }, this::arrived, thrown -> desk.say(Message.Kind.FAULT, Desk.words(thrown)));
    }

    private static Canvas canvas(Picture original, List<Operation> operations, Cancel cancel) {
        Canvas canvas = new Canvas(original);
        for (Operation operation : operations) {
            cancel.stopIfWished();
            canvas.apply(operation);
        }
        // The first stroke on a canvas makes its copies; better here than under the hand.
        canvas.begin(new Stroke(Brush.REMOVE, 0.01, 0.5, 1, List.of(new Point(-1, -1)), Optional.empty())).cancel();
        return canvas;
    }

    private void arrived(Laid made) {
        laid = made;
        show(made.canvas().picture());
        if (gesture != null) {
            gesture.ready();
        }
        tellRested();
    }

    /** The live picture; empty until it is there. */
    public Optional<Picture> live() {
        return Optional.ofNullable(live);
    }

    /** True if the live picture shows the note's operations as they are and nothing half done. */
    public boolean isAtRest() {
        return isLaid() && gesture == null && live == laid.canvas().picture();
    }

    /** True if the canvas shows the note's operations as they are. */
    boolean isLaid() {
        return laid != null && laid.operations().equals(asked);
    }

    /** The open note, if the easel is at it. */
    public Optional<Note> note() {
        return desk.state().isAtOpenNote() ? desk.state().openNote().map(Listed::note) : Optional.empty();
    }

    /** The open note's operations in their order; none if the easel is not at it. */
    public List<Operation> operations() {
        return note().map(note -> note.retouch().operations()).orElse(List.of());
    }

    /**
     * Begins a stroke.
     *
     * @param start its brush and first points
     * @return empty if the easel is not at the open note
     */
    public Optional<Drawing> draw(Stroke start) {
        return begin(() -> new Drawing(this, start));
    }

    /**
     * Begins to pull a handle of a mesh. A warp that is new is added even if its handle is not moved.
     *
     * @param at     number of the operation that the warp is in the place of; as many as there are for a new one behind them
     * @param warp   as it is before
     * @param handle which
     * @return empty if the easel is not at the open note
     */
    public Optional<Pulling> pull(int at, MeshWarp warp, int handle) {
        return begin(() -> new Pulling(this, at, warp, handle));
    }

    /**
     * Begins to pull a handle that is new at a place; the picture there stays as it is until it is pulled.
     *
     * @param place as shown, after the warp
     */
    public Optional<Pulling> pullNew(int at, MeshWarp warp, Point place) {
        return begin(() -> new Pulling(this, at, warp, place));
    }

    /**
     * Begins to drag a point of the outline.
     *
     * @param at   number of the operation that the warp is in the place of; as many as there are for a new one behind them
     * @param warp as it is before
     * @param drag which of its drags
     * @return empty if the easel is not at the open note
     */
    public Optional<OutlineDrag> drag(int at, OutlineWarp warp, int drag) {
        return begin(() -> new OutlineDrag(this, at, warp, drag));
    }

    private <G extends Gesture> Optional<G> begin(Supplier<G> making) {
        cancel();                                                              // of a mesh that is ended and waits, see there
        if (subject.isEmpty() || asked == null) {
            return Optional.empty();
        }
        G made = making.get();
        gesture = made;
        if (isLaid()) {
            made.ready();
        }
        return Optional.of(made);
    }

    /** Drops what a hand has begun and not ended. A new handle that was set and waits for its mesh is ended, and comes. */
    public void cancel() {
        if (gesture instanceof Pulling pulling && pulling.isEnded()) {
            ending = pulling;
            gesture = null;
        } else if (gesture != null) {
            Gesture dropped = gesture;
            gesture = null;
            dropped.dropped();
            outlining.drop();
            rest();
        }
    }

    private void dropAll() {
        cancel();
        if (ending != null) {
            ending.dropped();
            ending = null;
        }
    }

    /** True while a new handle that was set waits for its mesh; the next one would not know of it yet. */
    public boolean isWaiting() {
        return ending != null || gesture instanceof Pulling pulling && pulling.isEnded();
    }

    private void rest() {
        if (isLaid() && live != laid.canvas().picture()) {
            show(laid.canvas().picture());
        }
    }

    /** Makes a mesh warp of the open note ready to be pulled at once. @param at its number among the operations */
    public void prepare(int at) {
        if (laid != null && gesture == null && operations().get(at) instanceof MeshWarp warp) {
            warps.prepare(laid.originals().middle(), operations().subList(0, at), warp);
        }
    }

    /** Another retouch for the open note. A change that no note can have is said and not made. */
    public void edit(Edit kind, UnaryOperator<List<Operation>> change) {
        note().ifPresent(note -> attempt(NoteEdit.retouch(names.apply(kind), note.id(), change)));
    }

    /** Other holds for the open note. */
    public void holds(Edit kind, UnaryOperator<List<Hold>> change) {
        note().ifPresent(note -> attempt(NoteEdit.holds(names.apply(kind), note.id(), change)));
    }

    private boolean attempt(NoteEdit edit) {
        try {
            desk.edit(edit);
            return true;
        } catch (IllegalArgumentException refused) {
            desk.say(Message.Kind.FAULT, refused.getMessage());
            return false;
        }
    }

    /** An operation at a place of a list, or behind it. */
    static List<Operation> with(List<Operation> operations, int at, Operation operation) {
        List<Operation> changed = new ArrayList<>(operations);
        if (at < changed.size()) {
            changed.set(at, operation);
        } else {
            changed.add(operation);
        }
        return changed;
    }

    /** Has the original's outlines at a level traced; followers are told when they are there. */
    public void trace(double level) {
        if (laid != null) {
            beside.trace(laid.originals().full(), level);
        }
    }

    /** The outlines traced last. */
    public Optional<Outlines> outlines() {
        return beside.outlines();
    }

    /** Has the folds of an operation found, on a small raster; followers are told when they are there. */
    public void fold(Optional<Operation> operation) {
        if (laid != null) {
            beside.fold(laid.originals().small(), operation);
        }
    }

    /** The folds found last. */
    public Folds folds() {
        return beside.folds();
    }

    /** The hold that is chosen, as a number in the note's list. */
    public OptionalInt chosenHold() {
        return chosenHold;
    }

    /** Chooses a hold of the open note, or none. */
    public void choose(OptionalInt hold) {
        chosenHold = hold;
        tellRested();
    }

    /** The original at a small raster, for outlines of mattes that depend on it; empty until it is there. */
    public Optional<Picture> smallOriginal() {
        return Optional.ofNullable(laid).map(made -> made.originals().small());
    }

    // What gestures need.

    Canvas canvas() {
        return laid.canvas();
    }

    Originals originals() {
        return laid.originals();
    }

    LiveWarps warps() {
        return warps;
    }

    Following outlining() {
        return outlining;
    }

    void show(Picture picture) {
        live = picture;
        followers().forEach(follower -> follower.live(live()));
    }

    void changed(Window pixels) {
        followers().forEach(follower -> follower.changed(pixels));
    }

    /** What the hand began cannot be: it is dropped, and why is said. */
    void refused(RuntimeException thrown) {
        dropAll();
        desk.say(Message.Kind.FAULT, thrown instanceof IllegalArgumentException ? thrown.getMessage() : Desk.words(thrown));
    }

    /** A gesture is done; its edit is made. @param shown whether the canvas shows it already */
    void ended(Gesture done, Edit kind, int at, Operation operation, boolean shown) {
        gesture = gesture == done ? null : gesture;
        ending = ending == done ? null : ending;
        List<Operation> before = asked;
        if (shown) {
            asked = List.copyOf(with(before, at, operation));
            laid = new Laid(laid.subject(), laid.originals(), asked, laid.canvas());
        }
        own = true;
        boolean made = note().map(note -> attempt(NoteEdit.retouch(names.apply(kind), note.id(), ops -> with(ops, at, operation))))
                .orElse(false);
        own = false;
        if (!made) {
            build(before);
        }
        if (!shown && gesture == null) {
            rest();
        }
        tellRested();
    }

    private void tellRested() {
        followers().forEach(Follower::rested);
    }

    private List<Follower> followers() {
        return List.copyOf(followers);
    }
}
