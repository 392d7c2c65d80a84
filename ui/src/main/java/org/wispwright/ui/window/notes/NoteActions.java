package org.wispwright.ui.window.notes;

import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;
import java.util.function.Supplier;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Message;
import org.wispwright.ui.desk.NewNotes;
import org.wispwright.ui.desk.NoteEdit;
import org.wispwright.ui.desk.OpenShot;
import org.wispwright.ui.desk.Places;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.window.DeskAction;
import org.wispwright.ui.window.Words;

/** What can be done with notes. */
final class NoteActions {
    private final Desk desk;
    private final DeskAction make;
    private final List<DeskAction> withNote;
    private final List<DeskAction> others;

    /** @param panel what shows the boxes and the words */
    NoteActions(Desk desk, NotesPanel panel) {
        this.desk = desk;
        Predicate<DeskState> open = s -> s.openNote().isPresent();
        Predicate<DeskState> several = s -> s.shot().map(shot -> shot.notes().size() > 1).orElse(false);
        make = DeskAction.withShot("note.new", "N", this::makeHere);
        withNote = List.of(
                DeskAction.of("note.words", "W", open, () -> panel.editWords(openId())),
                DeskAction.of("note.toggle", "O", open, this::toggle),
                DeskAction.of("note.duplicate", "ctrl D", open, this::duplicate),
                DeskAction.of("note.carry", null, open, () -> panel.box(boxes -> boxes.carry(openId()))),
                DeskAction.of("note.between", null, s -> open.test(s) && several.test(s),
                        () -> panel.box(boxes -> boxes.between(openId()))),
                DeskAction.of("note.delete", "shift DELETE", open, this::delete));
        others = List.of(
                DeskAction.of("note.next", "shift DOWN", s -> Places.beside(s, 1).isPresent(), () -> go(1)),
                DeskAction.of("note.previous", "shift UP", s -> Places.beside(s, -1).isPresent(), () -> go(-1)),
                DeskAction.withShot("note.paint-over", null, () -> panel.box(NoteBoxes::paintOver)));
    }

    /** Makes a note where the easel is. */
    DeskAction make() {
        return make;
    }

    /** What can be done with the open note. */
    List<DeskAction> withNote() {
        return withNote;
    }

    /** All that has to do with none in particular, but to make one. */
    List<DeskAction> others() {
        return others;
    }

    private String openId() {
        return desk.state().note().orElseThrow();
    }

    private void makeNote(Supplier<NewNotes.Made> making) {
        try {
            NewNotes.Made made = making.get();
            desk.edit(made.edit());
            desk.look(s -> s.withNote(Optional.of(made.ids().get(0))));
        } catch (ShotException refused) {
            desk.say(Message.Kind.FAULT, Desk.words(refused));
        }
    }

    private void makeHere() {
        OpenShot shot = desk.state().shot().orElseThrow();
        Showing showing = desk.state().showing().orElseThrow();
        makeNote(() -> NewNotes.make(Words.of("notes.edit.new"), shot, showing.view(), showing.frame(), Words.of("notes.new.words")));
    }

    private void duplicate() {
        OpenShot shot = desk.state().shot().orElseThrow();
        makeNote(() -> NewNotes.duplicate(Words.of("notes.edit.duplicate"), shot, openId()));
    }

    private void toggle() {
        boolean on = !desk.state().openNote().orElseThrow().on();
        desk.edit(NoteEdit.on(Words.of(on ? "notes.edit.on" : "notes.edit.off"), openId(), on));
    }

    /** The note beside it is open then, so that a person can go on. */
    private void delete() {
        String id = openId();
        Optional<String> beside = Places.beside(desk.state(), 1).filter(other -> !other.equals(id));
        desk.edit(NoteEdit.delete(Words.of("notes.edit.delete"), id));
        desk.look(s -> s.withNote(beside));
    }

    private void go(int by) {
        Places.beside(desk.state(), by).ifPresent(id -> desk.look(s -> Places.at(s, id)));
    }
}
