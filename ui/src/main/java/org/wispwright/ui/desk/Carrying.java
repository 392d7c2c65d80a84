package org.wispwright.ui.desk;

import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.IntStream;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.job.CarryWork;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.Takes;

/** Takes notes to other frames, each time as one edit. Following the smoke runs beside the desk. Desk's thread. */
public final class Carrying {
    private final Desk desk;
    private final Replacing following;

    /** For the notes of a desk. */
    public Carrying(Desk desk) {
        this.desk = desk;
        following = new Replacing(desk.workers(), desk.workers().lane("carry"));
    }

    /**
     * Makes notes like one on other frames.
     *
     * @param name   of the edit
     * @param frames where; the note's own is left out
     * @param follow whether all positions go along with the smoke of the original, which must be there
     * @param done   on the desk's thread, once they are made; of what could not be made the person is told
     */
    public void carry(String name, String id, List<Integer> frames, boolean follow, Runnable done) {
        OpenShot now = desk.state().shot().orElseThrow();
        Listed listed = now.note(id).orElseThrow();
        List<Integer> others = frames.stream().filter(frame -> frame != listed.note().frame()).toList();
        if (others.isEmpty()) {
            desk.say(Message.Kind.FAULT, Finding.of("frames", "", "no frame but the note's own", "other frames", "name some").inWords());
            return;
        }
        List<Note> copies = CarryWork.copies(listed.note(), NewNotes.freePrefix(now, id, others), others, OptionalDouble.empty());
        if (!follow) {
            add(name, now, listed, copies, done);
            return;
        }
        following.replace(cancel -> {
            Shot shot = now.asItIs();
            Takes takes = Takes.of(now.folder());
            takes.requireOf(0, shot.flow());
            try (Lanes lanes = new Lanes(1)) {
                return CarryWork.followed(shot, takes, 0, listed.note(), copies, lanes, cancel);
            }
        }, carried -> add(name, now, listed, carried, done), this::say);
    }

    private void add(String name, OpenShot asked, Listed from, List<Note> notes, Runnable done) {
        OpenShot now = desk.state().shot().orElseThrow();
        if (now.folder() != asked.folder()) {
            return;
        }
        boolean taken = notes.stream().anyMatch(note -> now.note(note.id()).isPresent()) || now.note(from.note().id()).isEmpty();
        if (taken) {
            desk.say(Message.Kind.FAULT, "The notes have changed meanwhile; carry it again.");
            return;
        }
        attempt(() -> desk.edit(NewNotes.from(name, now, from.note().id(), notes, from.on()).edit()), done);
    }

    /**
     * Makes the notes between two of one view.
     *
     * @param name  of the edit
     * @param every of the frames between, each such one from the first note's on
     * @param ease  start and end slowly
     * @param done  as for {@link #carry}
     */
    public void between(String name, String one, String other, int every, boolean ease, Runnable done) {
        OpenShot now = desk.state().shot().orElseThrow();
        Listed a = now.note(one).orElseThrow();
        Listed b = now.note(other).orElseThrow();
        Listed first = a.note().frame() <= b.note().frame() ? a : b;
        Listed second = first == a ? b : a;
        attempt(() -> {
            if (second.note().frame() - first.note().frame() <= every) {
                throw new ShotException(Finding.of("notes", "", "frames " + first.note().frame() + " and " + second.note().frame(),
                        "more than " + every + " frames from the one to the other", "choose a note farther away, or a smaller step"));
            }
            List<Integer> frames = IntStream.range(first.note().frame() + 1, second.note().frame()).boxed().toList();
            List<Note> notes = CarryWork.between(first.note(), second.note(), NewNotes.freePrefix(now, first.note().id(), frames), every,
                    ease, OptionalDouble.empty());
            desk.edit(NewNotes.from(name, now, first.note().id(), notes, a.on() && b.on()).edit());
        }, done);
    }

    private void attempt(Runnable task, Runnable done) {
        try {
            task.run();
        } catch (ShotException fault) {
            say(fault);
            return;
        }
        done.run();
    }

    private void say(RuntimeException thrown) {
        desk.say(Message.Kind.FAULT, Desk.words(thrown));
    }
}
