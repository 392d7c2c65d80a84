package org.wispwright.ui.desk;

import java.util.List;
import java.util.Optional;
import org.wispwright.ui.desk.Pictures.Ask;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.warp.retouch.Retouch;

/** Small pictures of takes and wishes, drawn beside the desk on a lane of their own, so that the easel never waits for them. */
public final class Thumbnails {
    private static final int MOST = 1500;

    private final Pictures pictures;
    private final Gathering<Key, Thumbnail> gathering;

    /** Two wishes are the same if their retouches are. @param retouch of a wish; null for other sources */
    private record Key(ShotFolder folder, Ask ask, Retouch retouch) {
    }

    Thumbnails(Workers workers, Pictures pictures) {
        this.pictures = pictures;
        gathering = new Gathering<>(workers, workers.lane("thumbnails"), MOST);
    }

    /** What to ask for: the view's own rows if they are fewer. */
    public static Ask ask(OpenShot now, Source source, String view, int frame, int rows) {
        return new Ask(source, view, frame, Math.min(rows, now.setup().view(view).orElseThrow().view().raster().height()));
    }

    /** The small picture, if it has come. */
    public Optional<Thumbnail> get(OpenShot now, Ask ask) {
        return gathering.get(key(now, ask));
    }

    /**
     * Has pictures drawn, in this order, in place of what was asked under that name before and has not come.
     *
     * @param who  who asks
     * @param now  the shot with its notes as they are
     * @param came on the desk's thread, after each
     */
    public void want(String who, OpenShot now, List<Ask> asks, Runnable came) {
        gathering.want(who, asks.stream().map(ask -> key(now, ask)).toList(),
                (key, cancel) -> Thumbnail.of(pictures.draw(now, key.ask(), cancel), now.setup().background()), came);
    }

    private static Key key(OpenShot now, Ask ask) {
        Retouch retouch = ask.source() instanceof Source.Wanted wanted
                ? now.note(wanted.note()).map(Listed::note).map(Note::retouch).orElse(null) : null;
        return new Key(now.folder(), ask, retouch);
    }
}
