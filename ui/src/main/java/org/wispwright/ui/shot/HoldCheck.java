package org.wispwright.ui.shot;

import java.util.List;
import java.util.Optional;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.solve.SolveProblem;

/**
 * Whether holds fit the shot: views and frames that are there, pictures of the view's aspect, and nothing held that a note
 * wants changed.
 */
final class HoldCheck {
    private HoldCheck() {
    }

    /** The holds of a note, and the pictures that it names anywhere. */
    static void ofNote(Note note, MattePictures mattes, Shot shot, Findings findings) {
        String file = "notes/" + note.id() + ".json";
        for (int n = 0; n < note.holds().size(); n++) {
            Hold hold = note.holds().get(n);
            String pointer = "/holds/" + n;
            check(file, pointer, hold, note.view(), note.frame(), mattes, shot, findings);
            if (fights(hold, hold.view().orElse(note.view()), note)) {
                findings.add(fight(file, pointer, note));
            }
        }
        shot.view(note.view()).ifPresent(view -> mattes.requireAspect(file, place -> !inOtherView(place, note), view.view(), findings));
    }

    /** The shot's own holds. */
    static void ofShot(List<Hold> holds, List<Note> notes, MattePictures mattes, Shot shot, Findings findings) {
        for (int n = 0; n < holds.size(); n++) {
            Hold hold = holds.get(n);
            String pointer = "/holds/" + n;
            String view = hold.view().orElseThrow();
            check(HoldReader.FILE, pointer, hold, view, -1, mattes, shot, findings);
            notes.stream().filter(note -> fights(hold, view, note)).findFirst()
                    .ifPresent(note -> findings.add(fight(HoldReader.FILE, pointer, note)));
        }
    }

    private static void check(String file, String pointer, Hold hold, String noteView, int noteFrame, MattePictures mattes, Shot shot,
                              Findings findings) {
        FrameRange frames = shot.flow().frames();
        String view = hold.view().orElse(noteView);
        Optional<ShotView> there = shot.view(view);
        if (hold.view().isPresent() && there.isEmpty()) {
            List<String> names = shot.views().stream().map(v -> v.view().name()).toList();
            findings.add(Finding.of(file, pointer + "/view", "view '" + view + "', which the shot does not have", "one of "
                    + String.join(", ", names), NearestWord.to(view,
                            names).map(near -> "did you mean '" + near + "'").orElse("correct the name")));
        }
        if (hold.view().isPresent()) {
            there.ifPresent(v -> mattes.requireAspect(file, place -> place.startsWith(pointer + "/"), v.view(), findings));
        }
        for (SolveProblem.Span span : hold.spans()) {
            boolean ownFrame = span.first() == noteFrame && span.last() == noteFrame;
            if (!ownFrame && (!frames.contains(span.first()) || !frames.contains(span.last()))) {
                findings.add(Finding.of(file, pointer + "/frames", "frames " + span.first() + " to " + span.last(),
                        "frames of the shot, " + frames.first() + " to " + frames.last(), "correct the span"));
            }
        }
    }

    /** True if the whole picture is held that the note wants changed. */
    private static boolean fights(Hold hold, String view, Note note) {
        return hold.region().isEmpty() && hold.held() == SolveProblem.Held.PICTURE && view.equals(note.view()) && hold.holds(note.frame());
    }

    private static Finding fight(String file, String pointer, Note note) {
        return Finding.of(file, pointer, "a hold of the whole picture of view '" + note.view() + "' on frame " + note.frame()
                + ", which note '" + note.id() + "' wants changed", "a hold that leaves it room",
                "give it a region, other frames, or \"held\": \"silhouette\"");
    }

    private static boolean inOtherView(String place, Note note) {
        for (int n = 0; n < note.holds().size(); n++) {
            if (place.startsWith("/holds/" + n + "/") && note.holds().get(n).view().isPresent()) {
                return true;
            }
        }
        return false;
    }
}
