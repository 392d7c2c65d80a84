package org.wispwright.ui.desk;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.warp.retouch.Retouch;

/** Edits that make notes: their ids are free, and their number has room. */
public final class NewNotes {
    private static final int LONGEST_ID = 64;

    private NewNotes() {
    }

    /**
     * New notes and the edit that makes them.
     *
     * @param edit for {@link Desk#edit}
     * @param ids  of the new notes
     */
    public record Made(NoteEdit edit, List<String> ids) {
    }

    /**
     * A note without a retouch.
     *
     * @param name  of the edit
     * @param words of the note
     * @throws ShotException on the first frame, or if there are too many notes
     */
    public static Made make(String name, OpenShot shot, String view, int frame, String words) {
        FrameRange range = shot.setup().flow().frames();
        if (frame == range.first()) {
            throw new ShotException(new Finding("note", "", "frame " + frame + " is the first, which no force can change; go to a later "
                    + "frame, up to " + range.last() + ", and make the note there."));
        }
        Note note = new Note(freeId(shot, "note"), words, frame, view, 1, Optional.empty(), new Retouch(List.of()), List.of(),
                Optional.empty());
        return all(name, shot, List.of(new Listed(note, true)), Map.of());
    }

    /** The same note once more. @throws ShotException if there are too many notes */
    public static Made duplicate(String name, OpenShot shot, String id) {
        Listed listed = shot.note(id).orElseThrow();
        Note n = listed.note();
        Note copy = new Note(freeId(shot, n.id()), n.words(), n.frame(), n.view(), n.weight(), n.weighBy(), n.retouch(), n.holds(),
                n.loss());
        return all(name, shot, List.of(new Listed(copy, listed.on())), Map.of(copy.id(), id));
    }

    /** Notes that were made from another, whose files they take. @throws ShotException if there are too many notes */
    static Made from(String name, OpenShot shot, String id, List<Note> notes, boolean on) {
        Map<String, String> copied = new HashMap<>();
        notes.forEach(note -> copied.put(note.id(), id));
        return all(name, shot, notes.stream().map(note -> new Listed(note, on)).toList(), copied);
    }

    private static Made all(String name, OpenShot shot, List<Listed> more, Map<String, String> copied) {
        int there = shot.notes().size();
        if (there + more.size() > NoteEdits.MOST_NOTES) {
            throw new ShotException(Finding.of("notes", "", there + " notes and " + more.size() + " to come", "at most "
                    + NoteEdits.MOST_NOTES, "make fewer, or delete some"));
        }
        return new Made(NoteEdit.add(name, more, copied), more.stream().map(l -> l.note().id()).toList());
    }

    /** {@code start-1}, {@code start-2} and so on: the first that no note has. */
    public static String freeId(OpenShot shot, String start) {
        for (int n = 1;; n++) {
            String id = shortened(start, ("-" + n).length()) + "-" + n;
            if (isFree(shot, id)) {
                return id;
            }
        }
    }

    /** What stands before {@code -FRAME} in new ids: the note's own, or with a number behind it, so that all of them are free. */
    static String freePrefix(OpenShot shot, String id, List<Integer> frames) {
        int longest = frames.stream().mapToInt(frame -> ("-" + frame).length()).max().orElse(0);
        for (int n = 1;; n++) {
            String tail = n == 1 ? "" : "-" + n;
            String prefix = shortened(id, longest + tail.length()) + tail;
            if (frames.stream().allMatch(frame -> isFree(shot, prefix + "-" + frame))) {
                return prefix;
            }
        }
    }

    private static String shortened(String id, int room) {
        return id.substring(0, Math.min(id.length(), LONGEST_ID - room));
    }

    /** Some disks take capital and small letters for the same. */
    private static boolean isFree(OpenShot shot, String id) {
        return shot.notes().stream().noneMatch(listed -> listed.note().id().equalsIgnoreCase(id));
    }
}
