package org.wispwright.ui.desk;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.ExecutorService;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.desk.Pictures.Ask;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.CompareWork;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.ShotFolder;

/**
 * How far a take meets each note as the note is now; its retouch may have changed since the take was solved. Worked out beside the desk
 * from pictures of at most {@link #MOST_ROWS} rows, and kept for a note and a take.
 */
public final class MetWatch {
    /** Rows of the pictures, at most. */
    static final int MOST_ROWS = 240;
    private static final int MOST = 4000;

    private final Pictures pictures;
    private final Gathering<Key, Met> gathering;

    /**
     * What came out.
     *
     * @param share 1 when the wish is there, 0 at the original; empty if the note changes nothing that can be seen
     */
    public record Met(OptionalDouble share) {
    }

    private record Key(ShotFolder folder, Note note, int take) {
        /** Words and weight change nothing. */
        private static Key of(OpenShot now, Note n, int take) {
            return new Key(now.folder(), new Note(n.id(), "", n.frame(), n.view(), 1, n.weighBy(), n.retouch(), n.holds(), n.loss()), take);
        }
    }

    MetWatch(Workers workers, ExecutorService lane, Pictures pictures) {
        this.pictures = pictures;
        gathering = new Gathering<>(workers, lane, MOST);
    }

    /** How far a take meets a note, if it has been worked out. */
    public Optional<Met> of(OpenShot now, Note note, int take) {
        return gathering.get(Key.of(now, note, take));
    }

    /**
     * Has it worked out for every note, in place of what was asked under that name before.
     *
     * @param who  who asks
     * @param now  the shot with its notes as they are
     * @param take that is there and of this set-up, as the original must be
     * @param came on the desk's thread, after each
     */
    public void want(String who, OpenShot now, int take, Runnable came) {
        List<Key> keys = now.notes().stream().map(Listed::note).map(note -> Key.of(now, note, take)).toList();
        gathering.want(who, keys, (key, cancel) -> met(now, key, cancel), came);
    }

    private Met met(OpenShot now, Key key, Cancel cancel) {
        Note note = key.note();
        Ask ask = Thumbnails.ask(now, Source.ORIGINAL, note.view(), note.frame(), MOST_ROWS);
        Picture original = pictures.draw(now, ask, cancel);
        cancel.stopIfWished();
        Picture got = pictures.draw(now, new Ask(new Source.Take(key.take()), ask.view(), ask.frame(), ask.rows()), cancel);
        cancel.stopIfWished();
        return new Met(CompareWork.met(note, original, got));
    }
}
