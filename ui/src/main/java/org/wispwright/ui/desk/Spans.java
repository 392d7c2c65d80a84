package org.wispwright.ui.desk;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.NoteEdits.Listed;

/** On which frames something is held. */
public final class Spans {
    private Spans() {
    }

    /**
     * Frames one after the other on which something is held.
     *
     * @param first the first
     * @param last  the last
     * @param holds how many holds there are on some of them
     */
    public record Held(int first, int last, int holds) {
    }

    /** Spans of all holds of the shot and of notes that are on, within the range, joined where they meet or overlap; in order. */
    public static List<Held> of(OpenShot shot) {
        FrameRange range = shot.setup().flow().frames();
        List<Hold> holds = Stream.concat(shot.setup().holds().stream(),
                shot.notes().stream().filter(Listed::on).flatMap(l -> l.note().holds().stream())).toList();
        List<Held> found = new ArrayList<>();
        int first = 0;
        boolean open = false;
        for (int frame = range.first(); frame <= range.last() + 1; frame++) {
            int at = frame;
            boolean held = frame <= range.last() && holds.stream().anyMatch(hold -> hold.holds(at));
            if (held && !open) {
                first = frame;
            } else if (!held && open) {
                int from = first;
                int to = frame - 1;
                found.add(new Held(from, to, (int) holds.stream()
                        .filter(hold -> hold.spans().stream().anyMatch(s -> s.first() <= to && s.last() >= from)).count()));
            }
            open = held;
        }
        return found;
    }
}
