package org.wispwright.ui.desk;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wispwright.ui.shot.NoteEdits.Listed;

/**
 * Edits that can be taken back and made again, the newest last. Immutable. Edits of earlier sessions are in the shot's journal alone; of
 * those only the next name is known here.
 *
 * @param made      those that can be taken back
 * @param takenBack those that were, and can be made again, the next one last
 * @param earlier   name of the journal's last change from before this session, if there is one
 * @param later     name of the journal's next change to be made again from before this session, if there is one
 */
public record History(List<Step> made, List<Step> takenBack, Optional<String> earlier, Optional<String> later) {
    /** Nothing. */
    public static final History NONE = new History(List.of(), List.of(), Optional.empty(), Optional.empty());

    /**
     * One edit.
     *
     * @param name   its name
     * @param before all notes before
     * @param after  all notes after
     * @param copied new id to the note that it was copied from
     */
    public record Step(String name, List<Listed> before, List<Listed> after, Map<String, String> copied) {
    }

    /** Keeps copies. */
    public History {
        made = List.copyOf(made);
        takenBack = List.copyOf(takenBack);
    }

    /** One more edit; what was taken back is gone. */
    History with(Step step) {
        return new History(plus(made, step), List.of(), earlier, Optional.empty());
    }

    /** The last edit taken back. */
    History back() {
        return new History(minus(made), plus(takenBack, made.get(made.size() - 1)), earlier, later);
    }

    /** The last edit that was taken back, made again. */
    History forth() {
        return new History(plus(made, takenBack.get(takenBack.size() - 1)), minus(takenBack), earlier, later);
    }

    /** What undo would take back. */
    public Optional<String> undoName() {
        return made.isEmpty() ? earlier : Optional.of(made.get(made.size() - 1).name());
    }

    /** What redo would make again. */
    public Optional<String> redoName() {
        return takenBack.isEmpty() ? later : Optional.of(takenBack.get(takenBack.size() - 1).name());
    }

    /** Names of the journal's changes from before this session. */
    History withJournal(Optional<String> undo, Optional<String> redo) {
        return new History(made, takenBack, undo, redo);
    }

    private static List<Step> plus(List<Step> steps, Step step) {
        List<Step> longer = new ArrayList<>(steps);
        longer.add(step);
        return longer;
    }

    private static List<Step> minus(List<Step> steps) {
        return steps.subList(0, steps.size() - 1);
    }
}
