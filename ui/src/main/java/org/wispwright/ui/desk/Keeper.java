package org.wispwright.ui.desk;

import java.util.ArrayDeque;
import java.util.Collections;
import java.util.Deque;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ExecutorService;
import java.util.function.Consumer;
import org.wispwright.ui.desk.History.Step;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.ShotException;

/**
 * Writes edits to the shot folder as they are made, in order, each as one change of its journal. What the disk refuses waits, with all that
 * came after it, until it is tried again; nothing is dropped.
 */
final class Keeper {
    /** Which way a step goes. */
    private enum Way { MAKE, BACK, FORTH, EARLIER_BACK, LATER_FORTH, OUTSIDE }

    /** One thing to write. @param outside what writes it, if it is no step; its fault is told and holds nothing up */
    private record Writing(Way way, Step step, Runnable then, Runnable outside, Consumer<Optional<Finding>> ended) {
        private Writing(Way way, Step step, Runnable then) {
            this(way, step, then, null, null);
        }
    }

    private final Workers workers;
    private final ExecutorService lane;
    private final NoteEdits edits;
    private final Consumer<Saving> told;
    private final Deque<Writing> waiting = new ArrayDeque<>();
    private final Set<Step> neverWritten = Collections.newSetFromMap(new IdentityHashMap<>());
    private boolean busy;
    /** Whether what was tried last got to the disk; the lane's own. */
    private boolean written;
    private Optional<Finding> refused = Optional.empty();

    /** @param told on the desk's thread of every change of how far it is */
    Keeper(Workers workers, ExecutorService lane, NoteEdits edits, Consumer<Saving> told) {
        this.workers = workers;
        this.lane = lane;
        this.edits = edits;
        this.told = told;
    }

    /** Writes an edit soon. Also tries again what was refused. Desk's thread, like all of these. */
    void make(Step step) {
        add(new Writing(Way.MAKE, step, () -> { }));
    }

    /** Takes an edit back; one that never got to the disk is forgotten. */
    void back(Step step) {
        Writing last = waiting.peekLast();
        if (last != null && last.step() == step && last.way() != Way.BACK && !(busy && waiting.size() == 1)) {
            waiting.removeLast();
            if (last.way() == Way.MAKE) {
                neverWritten.add(step);
            }
            again();
        } else {
            add(new Writing(Way.BACK, step, () -> { }));
        }
    }

    /** Makes an edit again that was taken back. */
    void forth(Step step) {
        add(new Writing(neverWritten.remove(step) ? Way.MAKE : Way.FORTH, step, () -> { }));
    }

    /** Takes back the journal's last change, of an earlier session. @param then once it is done */
    void earlierBack(Runnable then) {
        add(new Writing(Way.EARLIER_BACK, null, then));
    }

    /** Makes the journal's next change again, of an earlier session. @param then once it is done */
    void laterForth(Runnable then) {
        add(new Writing(Way.LATER_FORTH, null, then));
    }

    /** Writes something that is no step, behind all that waits. @param ended on the desk's thread, with what went wrong */
    void outside(Runnable write, Consumer<Optional<Finding>> ended) {
        add(new Writing(Way.OUTSIDE, null, () -> { }, write, ended));
    }

    private void add(Writing writing) {
        waiting.add(writing);
        again();
    }

    /** Tries again what was refused. Desk's thread. */
    void again() {
        refused = Optional.empty();
        next();
        tell();
    }

    /** Writes all that waits, on the lane and without the desk's thread: the desk ends. What is refused, and what comes after it, is not. */
    void last() {
        boolean behind = busy;
        List<Writing> rest = List.copyOf(waiting).subList(behind ? 1 : 0, waiting.size());
        lane.execute(() -> {
            boolean goesOn = !behind || written;
            for (int n = 0; n < rest.size() && goesOn; n++) {
                goesOn = attempt(rest.get(n)).isEmpty();
            }
        });
    }

    /** Names of the journal's next undo and redo, asked behind everything that waits. */
    void names(Consumer<List<Optional<String>>> then) {
        lane.execute(() -> {
            List<Optional<String>> names;
            try {
                names = List.of(edits.undoName(), edits.redoName());
            } catch (ShotException damaged) {
                names = List.of(Optional.empty(), Optional.empty());
            }
            List<Optional<String>> found = names;
            workers.onDesk(() -> then.accept(found));
        });
    }

    private void next() {
        if (busy || waiting.isEmpty() || refused.isPresent()) {
            return;
        }
        busy = true;
        Writing first = waiting.peek();
        lane.execute(() -> {
            Optional<Finding> fault = attempt(first);
            written = fault.isEmpty();
            workers.onDesk(() -> {
                busy = false;
                refused = first.way() == Way.OUTSIDE ? Optional.empty() : fault;
                if (refused.isEmpty()) {
                    waiting.remove().then().run();
                }
                if (first.way() == Way.OUTSIDE) {
                    first.ended().accept(fault);
                }
                next();
                tell();
            });
        });
    }

    private Optional<Finding> attempt(Writing writing) {
        try {
            switch (writing.way()) {
                case MAKE -> edits.change(writing.step().name(), writing.step().before(), writing.step().after(), writing.step().copied());
                case BACK, EARLIER_BACK -> edits.undo();
                case OUTSIDE -> writing.outside().run();
                default -> edits.redo();
            }
            return Optional.empty();
        } catch (ShotException fault) {
            return Optional.of(fault.finding());
        } catch (RuntimeException ours) {
            return Optional.of(new Finding("notes", "", "this edit could not be written (" + ours + "); undo it, or look at the shot with "
                    + "'check'."));
        }
    }

    private void tell() {
        told.accept(new Saving(waiting.size(), refused));
    }
}
