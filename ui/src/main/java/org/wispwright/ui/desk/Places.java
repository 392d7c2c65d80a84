package org.wispwright.ui.desk;

import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.TreeSet;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;

/** Where the notes lie along the range, and the ways from one to the next. */
public final class Places {
    private Places() {
    }

    /** All notes by frame; those of one frame by id. */
    public static List<Listed> inOrder(OpenShot shot) {
        return shot.notes().stream().sorted(Comparator.comparingInt((Listed l) -> l.note().frame()).thenComparing(l -> l.note().id()))
                .toList();
    }

    /** Opens a note and shows its frame and view. Nothing if there is no such note. */
    public static DeskState at(DeskState state, String id) {
        Optional<Note> note = state.shot().flatMap(s -> s.note(id)).map(Listed::note);
        return note.map(n -> state.withNote(Optional.of(id))
                .withShowing(state.showing().orElseThrow().withView(n.view()).withFrame(n.frame()))).orElse(state);
    }

    /** The note so many places behind the open one, round and round; the first or last if none is open. */
    public static Optional<String> beside(DeskState state, int by) {
        List<String> ids = state.shot().map(s -> inOrder(s).stream().map(l -> l.note().id()).toList()).orElse(List.of());
        if (ids.isEmpty()) {
            return Optional.empty();
        }
        int now = state.note().map(ids::indexOf).orElse(-1);
        int next = now < 0 ? (by > 0 ? 0 : ids.size() - 1) : Math.floorMod(now + by, ids.size());
        return Optional.of(ids.get(next));
    }

    /** The note on the nearest noted frame after the shown one, or before it. @param on true for after */
    public static Optional<String> nearest(DeskState state, boolean on) {
        if (state.shot().isEmpty()) {
            return Optional.empty();
        }
        int shown = state.showing().orElseThrow().frame();
        TreeSet<Integer> frames = new TreeSet<>();
        List<Listed> notes = inOrder(state.shot().get());
        notes.forEach(l -> frames.add(l.note().frame()));
        Integer frame = on ? frames.higher(shown) : frames.lower(shown);
        return notes.stream().map(Listed::note).filter(n -> frame != null && n.frame() == frame).map(Note::id).findFirst();
    }

    /** Another frame of the range. */
    public static DeskState onFrame(DeskState state, int frame) {
        return state.shot().map(shot -> {
            FrameRange range = shot.setup().flow().frames();
            return state.withShowing(state.showing().orElseThrow().withFrame(Math.max(range.first(), Math.min(range.last(), frame))));
        }).orElse(state);
    }

    /** The take to judge: the one that is shown, if a take is, or else the newest; none if there is no original to judge it by. */
    public static OptionalInt judged(DeskState state) {
        List<TakeEntry> there = state.takes().stream().filter(TakeEntry::current).toList();
        if (there.stream().noneMatch(take -> take.number() == 0)) {
            return OptionalInt.empty();
        }
        if (state.showing().map(Showing::near).orElse(null) instanceof Source.Take shown
                && there.stream().anyMatch(take -> take.number() == shown.number())) {
            return OptionalInt.of(shown.number());
        }
        return there.stream().mapToInt(TakeEntry::number).max();
    }
}
