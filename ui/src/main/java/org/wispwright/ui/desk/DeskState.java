package org.wispwright.ui.desk;

import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.wispwright.ui.shot.NoteEdits.Listed;

/**
 * All that the desk is at one moment. Immutable; the window draws from it and nothing else.
 *
 * @param shot    the shot on the desk; empty at the beginning
 * @param showing what the easel shows; empty without a shot
 * @param note    id of the note that is open; what is done to pictures belongs to it
 * @param hand    what the pointer does on the easel
 * @param takes   what is there, lowest number first
 * @param history what can be undone and redone
 * @param saving  how far edits are on disk
 * @param message the latest sentence for the person, until it is put away
 * @param work    on takes: the solve that runs, what one would take
 */
public record DeskState(Optional<OpenShot> shot, Optional<Showing> showing, Optional<String> note, Hand hand, List<TakeEntry> takes,
                        History history, Saving saving, Optional<Message> message, TakeWork work) {
    /** An empty desk. */
    public static final DeskState EMPTY = new DeskState(Optional.empty(), Optional.empty(), Optional.empty(), Hand.LOOK, List.of(),
            History.NONE, Saving.DONE, Optional.empty(), TakeWork.NONE);

    /** Keeps a copy. */
    public DeskState {
        takes = List.copyOf(takes);
    }

    /** The open note as it is now. */
    public Optional<Listed> openNote() {
        return shot.flatMap(s -> note.flatMap(s::note));
    }

    /** True if the easel shows the frame and view of the open note, where it can be retouched. */
    public boolean isAtOpenNote() {
        return openNote().map(Listed::note)
                .map(n -> showing.map(s -> s.frame() == n.frame() && s.view().equals(n.view())).orElse(false)).orElse(false);
    }

    /** What is seen of a source now: a note's wish away from its frame and view, or of a note that is gone, is the original. */
    public Source seen(Source source) {
        if (source instanceof Source.Wanted wanted) {
            Showing at = showing.orElseThrow();
            boolean here = shot.flatMap(s -> s.note(wanted.note())).map(Listed::note)
                    .map(n -> n.frame() == at.frame() && n.view().equals(at.view())).orElse(false);
            return here ? source : Source.ORIGINAL;
        }
        return source;
    }

    /**
     * What follows of a look: a hand that changes pictures shows the open note's wish, for that is what it works on; and whoever chooses to
     * see something else puts such a hand down.
     *
     * @param before the state before
     */
    DeskState settled(DeskState before) {
        if (showing.isEmpty() || !isAtOpenNote() || !hand.retouches()) {
            return this;
        }
        Source wanted = new Source.Wanted(note.orElseThrow());
        if (showing.get().near().equals(wanted)) {
            return this;
        }
        boolean chose = before.isAtOpenNote() && before.note().equals(note) && before.hand().equals(hand)
                && before.showing().map(s -> s.near().equals(wanted)).orElse(false);
        return chose ? withHand(Hand.LOOK) : withShowing(showing.get().withNear(wanted));
    }

    /** Another shot. */
    public DeskState withShot(OpenShot other) {
        return new DeskState(Optional.of(other), showing, note, hand, takes, history, saving, message, work);
    }

    /** Something else on the easel. */
    public DeskState withShowing(Showing other) {
        return new DeskState(shot, Optional.of(other), note, hand, takes, history, saving, message, work);
    }

    /** Another note open, or none. */
    public DeskState withNote(Optional<String> other) {
        return new DeskState(shot, showing, other, hand, takes, history, saving, message, work);
    }

    /** Another hand. */
    public DeskState withHand(Hand other) {
        return new DeskState(shot, showing, note, other, takes, history, saving, message, work);
    }

    /** Other takes. */
    public DeskState withTakes(List<TakeEntry> others) {
        return new DeskState(shot, showing, note, hand, others, history, saving, message, work);
    }

    /** Another history. */
    DeskState withHistory(History other) {
        return new DeskState(shot, showing, note, hand, takes, other, saving, message, work);
    }

    /** Another state of the disk. */
    DeskState withSaving(Saving other) {
        return new DeskState(shot, showing, note, hand, takes, history, other, message, work);
    }

    /** Another message, or none. */
    public DeskState withMessage(Optional<Message> other) {
        return new DeskState(shot, showing, note, hand, takes, history, saving, other, work);
    }

    /** Other work on takes. */
    DeskState withWork(UnaryOperator<TakeWork> change) {
        return new DeskState(shot, showing, note, hand, takes, history, saving, message, change.apply(work));
    }

    /** True if there is an original that belongs to the shot as it is. */
    public boolean hasOriginal() {
        return takes.stream().anyMatch(take -> take.number() == 0 && take.current());
    }

    /** The take that is shown, if it is one and belongs to the shot as it is. */
    public Optional<TakeEntry> takeShown() {
        return showing.flatMap(s -> takes.stream().filter(t -> t.current() && s.near().equals(new Source.Take(t.number()))).findFirst());
    }
}
