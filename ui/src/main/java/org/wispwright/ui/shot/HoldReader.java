package org.wispwright.ui.shot;

import java.nio.file.Files;
import java.util.List;
import java.util.Optional;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.warp.matte.Matte;

/** Reads holds: a note's own, and those of the whole shot in {@value #FILE} (format: docs/shot-folder.md). */
final class HoldReader {
    /** The shot's own holds. */
    static final String FILE = "holds.json";
    private static final int MOST_HOLDS = 100;
    private static final int MOST_SPANS = 100;

    private HoldReader() {
    }

    /** The holds of a note; none if the key is not there. @throws ShotException if one is not as it must be */
    static List<Hold> ofNote(JsonPlace top, int noteFrame) {
        SolveProblem.Span own = new SolveProblem.Span(noteFrame, noteFrame);
        return top.ask("holds").map(list -> list.items(0, MOST_HOLDS).stream().map(place -> hold(place, own)).toList()).orElse(List.of());
    }

    /**
     * The shot's own holds; none without the file, or without a range of frames to hold.
     *
     * @throws ShotException if the file is there and is not as it must be
     */
    static List<Hold> ofShot(ShotFolder folder, MattePictures mattes, Optional<FrameRange> frames) {
        if (!Files.exists(folder.inside(FILE))) {
            return List.of();
        }
        JsonPlace top = JsonDoor.read(folder, FILE, NoteReader.MOST_BYTES).with(mattes);
        top.version(SetupReader.FORMAT).only("wispwright", "holds");
        SolveProblem.Span all = frames.map(f -> new SolveProblem.Span(f.first(), f.last())).orElse(new SolveProblem.Span(0, 0));
        return top.need("holds").items(1, MOST_HOLDS).stream().map(place -> {
            place.need("view");
            return hold(place, all);
        }).toList();
    }

    private static Hold hold(JsonPlace place, SolveProblem.Span usual) {
        place.only("region", "view", "frames", "held", "weight");
        Optional<Matte> region = place.ask("region").map(MatteReader::matte);
        Optional<String> view = place.ask("view").map(p -> p.text(100));
        List<SolveProblem.Span> spans = place.ask("frames").map(HoldReader::spans).orElse(List.of(usual));
        SolveProblem.Held held = place.ask("held").map(p -> p.choice(SolveProblem.Held.class)).orElse(SolveProblem.Held.PICTURE);
        double weight = place.ask("weight").map(p -> p.positive(1000)).orElse(1.0);
        return place.make(() -> new Hold(region, view, spans, held, weight));
    }

    /** First and last frame, or a list of such pairs. */
    private static List<SolveProblem.Span> spans(JsonPlace place) {
        boolean several = place.isList() && place.items(1, MOST_SPANS).get(0).isList();
        return (several ? place.items(1, MOST_SPANS) : List.of(place)).stream().map(pair -> {
            int[] ends = SetupReader.span(pair);
            return new SolveProblem.Span(ends[0], ends[1]);
        }).toList();
    }
}
