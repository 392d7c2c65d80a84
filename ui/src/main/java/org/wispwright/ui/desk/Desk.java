package org.wispwright.ui.desk;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.function.Consumer;
import java.util.function.UnaryOperator;
import org.wispwright.ui.desk.History.Step;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;

/**
 * An artist's session: one {@link DeskState} at a time, told to those who listen. Knows no screen. All methods belong to the desk's thread;
 * what takes long runs on {@link Workers} and comes back there.
 */
public final class Desk implements AutoCloseable {
    private final Workers workers;
    private final ExecutorService files;
    private final Replacing opening;
    private final List<Consumer<DeskState>> listeners = new ArrayList<>();
    private final Pictures pictures;
    private final Thumbnails thumbnails;
    private final MetWatch met;
    private final ChangeWatch change;
    private final Solving solving;
    private final WritingOut writingOut;
    private DeskState state = DeskState.EMPTY;
    private Keeper keeper;

    /** An empty desk. */
    public Desk(Workers workers) {
        this.workers = workers;
        files = workers.lane("files");
        opening = new Replacing(workers, files);
        pictures = new Pictures(workers);
        thumbnails = new Thumbnails(workers, pictures);
        ExecutorService figures = workers.lane("figures");
        met = new MetWatch(workers, figures, pictures);
        change = new ChangeWatch(workers, figures);
        solving = new Solving(this, workers, files);
        writingOut = new WritingOut(this, workers);
    }

    /** All as it is now. */
    public DeskState state() {
        return state;
    }

    /** Pictures of takes and wishes of the shot on the desk. */
    public Pictures pictures() {
        return pictures;
    }

    /** Small pictures of the same. */
    public Thumbnails thumbnails() {
        return thumbnails;
    }

    /** How far takes meet the notes. */
    public MetWatch met() {
        return met;
    }

    /** How far takes have left the original. */
    public ChangeWatch change() {
        return change;
    }

    /** The solve that runs, and what comes before one. */
    public Solving solving() {
        return solving;
    }

    /** What is written out for others. */
    public WritingOut writingOut() {
        return writingOut;
    }

    /** Where work runs. */
    public Workers workers() {
        return workers;
    }

    /** Tells of every later state, and once of this one. @return ends it */
    public Runnable listen(Consumer<DeskState> listener) {
        listeners.add(listener);
        listener.accept(state);
        return () -> listeners.remove(listener);
    }

    /** Tells nobody any more, as before another window takes the session over. */
    public void forgetListeners() {
        listeners.clear();
    }

    /** A look: changes what is shown and nothing of the shot. */
    public void look(UnaryOperator<DeskState> change) {
        DeskState next = change.apply(state).settled(state);
        if (next.equals(state)) {
            return;
        }
        state = next;
        List.copyOf(listeners).forEach(listener -> listener.accept(next));
        solving.follow(next);                                                  // whoever listens; it changes nothing before it returns
    }

    /** Shows other things on the easel; nothing without a shot. */
    public void show(UnaryOperator<Showing> change) {
        state.showing().ifPresent(showing -> look(s -> s.withShowing(change.apply(showing))));
    }

    /** Tells the person something. */
    public void say(Message.Kind kind, String words) {
        look(s -> s.withMessage(Optional.of(new Message(kind, words))));
    }

    /**
     * Opens a shot folder in place of the one on the desk. What cannot be opened is said, and the desk stays as it is.
     *
     * @param folder with shot.json
     */
    public void open(Path folder) {
        opening.replace(cancel -> Opening.read(folder), this::opened, thrown -> say(Message.Kind.FAULT, words(thrown)));
    }

    private void opened(Opening found) {
        keeper = new Keeper(workers, files, NoteEdits.of(found.shot().folder()), saving -> look(s -> s.withSaving(saving)));
        pictures.of(found.shot());
        look(s -> found.onto(s.hand(), s.work()));
        asksJournal();
    }

    private void asksJournal() {
        Keeper asked = keeper;
        asked.names(names -> {
            if (keeper == asked) {
                look(s -> s.withHistory(s.history().withJournal(names.get(0), names.get(1))));
            }
        });
    }

    /**
     * Changes the shot: at once here, soon on disk. It can be undone.
     *
     * @throws IllegalArgumentException if what comes out is no note; nothing has changed then
     */
    public void edit(NoteEdit edit) {
        OpenShot shot = state.shot().orElseThrow(() -> new IllegalStateException("no shot on the desk"));
        List<Listed> after = edit.change().apply(shot.notes());
        if (after.equals(shot.notes())) {
            return;
        }
        Step step = new Step(edit.name(), shot.notes(), after, edit.copied());
        keeper.make(step);
        look(s -> notes(s, after).withHistory(s.history().with(step)));
    }

    /** Takes the last edit back; goes on into earlier sessions. Nothing if there is none. */
    public void undo() {
        History history = state.history();
        if (history.made().isEmpty()) {
            if (history.earlier().isPresent()) {
                keeper.earlierBack(this::readsNotesAgain);
            }
            return;
        }
        Step step = history.made().get(history.made().size() - 1);
        keeper.back(step);
        look(s -> notes(s, step.before()).withHistory(history.back()));
    }

    /** Makes the edit again that was taken back last. Nothing if there is none. */
    public void redo() {
        History history = state.history();
        if (history.takenBack().isEmpty()) {
            if (history.later().isPresent()) {
                keeper.laterForth(this::readsNotesAgain);
            }
            return;
        }
        Step step = history.takenBack().get(history.takenBack().size() - 1);
        keeper.forth(step);
        look(s -> notes(s, step.after()).withHistory(history.forth()));
    }

    /** Tries to write again what the disk refused. */
    public void saveAgain() {
        if (keeper != null) {
            keeper.again();
        }
    }

    /** Looks for takes again, as after a solve. */
    public void lookForTakes() {
        state.shot().ifPresent(shot -> files.execute(() -> {
            List<TakeEntry> takes = Opening.takes(shot);
            workers.onDesk(() -> {
                if (state.shot().map(now -> now.folder() == shot.folder()).orElse(false)) {
                    look(s -> s.withTakes(takes));
                }
            });
        }));
    }

    /**
     * Writes to the shot folder behind all edits, as a change of its journal that is no {@link NoteEdit}, then reads the notes again. It can
     * be undone through the journal, and so can all edits before it. A fault is said, and nothing has changed then.
     *
     * @param write on a worker
     * @param then  on the desk's thread, with the notes as they have become
     */
    public void outside(Consumer<ShotFolder> write, Runnable then) {
        OpenShot shot = state.shot().orElseThrow(() -> new IllegalStateException("no shot on the desk"));
        keeper.outside(() -> write.accept(shot.folder()), fault -> fault.ifPresentOrElse(
                found -> say(Message.Kind.FAULT, found.inWords()), () -> readsNotesAgain(then)));
    }

    private void readsNotesAgain() {
        readsNotesAgain(() -> { });
    }

    private void readsNotesAgain(Runnable then) {
        OpenShot shot = state.shot().orElseThrow();
        Keeper asked = keeper;
        files.execute(() -> {
            try {
                List<Listed> notes = NoteEdits.of(shot.folder()).list();
                workers.onDesk(() -> {
                    if (keeper != asked) {
                        return;
                    }
                    if (!state.saving().isDone()) {                            // edited meanwhile: what was read is older than that
                        keeper.outside(() -> { }, fault -> readsNotesAgain(then));
                        return;
                    }
                    look(s -> notes(s, notes).withHistory(History.NONE));
                    asksJournal();
                    then.run();
                });
            } catch (ShotException fault) {
                workers.onDesk(() -> say(Message.Kind.FAULT, fault.finding().inWords()));
            }
        });
    }

    private static DeskState notes(DeskState s, List<Listed> notes) {
        OpenShot shot = s.shot().orElseThrow().with(notes);
        boolean there = s.note().flatMap(shot::note).isPresent();
        return s.withShot(shot).withNote(there ? s.note() : Optional.empty());
    }

    /** What to tell a person of something thrown. */
    public static String words(Throwable thrown) {
        return thrown instanceof ShotException fault ? fault.finding().inWords()
                : thrown instanceof OutOfMemoryError ? "the memory of " + Runtime.getRuntime().maxMemory() / (1 << 20)
                + " MiB is used up; close other shots, or start with more (java -Xmx4g -jar wispwright.jar)"
                : new Finding("desk", "", "this should not have happened: " + thrown + "; what was edited is on disk.").inWords();
    }

    /** Puts the session away: what waits to be written is written, unless the disk refuses it. */
    @Override
    public void close() {
        listeners.clear();
        if (keeper != null) {
            keeper.last();
            keeper = null;
        }
        solving.close();
        writingOut.stop();
        workers.close();
    }
}
