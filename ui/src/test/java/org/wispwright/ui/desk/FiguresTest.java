package org.wispwright.ui.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.CopyOnWriteArrayList;
import java.util.function.BiFunction;
import java.util.stream.IntStream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.CompareWork;
import org.wispwright.ui.job.Comparison;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.shot.Note;

/** Met, change and small pictures beside the desk, on a shot with two takes. */
class FiguresTest {
    @TempDir
    private static Path folder;
    private static Path shot;

    @BeforeAll
    static void solved() {
        shot = SolvedShot.in(folder.resolve("yard"));
    }

    private static double met(WindowlessDesk d, String id, int take) {
        Note note = d.shot().note(id).orElseThrow().note();
        d.desk.met().want("test", d.shot(), take, () -> { });
        d.until("met of " + id, () -> d.desk.met().of(d.shot(), note, take).isPresent());
        return d.desk.met().of(d.shot(), note, take).orElseThrow().share().orElse(Double.NaN);
    }

    /** Source: what compare measures; the views have fewer rows than the watch draws at most, so it is the same number. */
    @Test
    void metIsWhatCompareMeasures() {
        try (WindowlessDesk d = WindowlessDesk.with(shot); Lanes lanes = new Lanes(1)) {
            Comparison comparison = CompareWork.compare(d.shot().folder(), d.shot().asItIs(), 0, 1, lanes, Progress.SILENT, new Cancel());
            for (Comparison.OfNote of : comparison.notes()) {
                assertEquals(of.met(), met(d, of.note().id(), 1), 1e-12);
                assertTrue(of.met() > 0.05, "a solve meets something: " + of.met());
            }
        }
    }

    /** Ours, by hand: the original is 0 of the way; a note whose retouch is gone wants nothing; and met follows the retouch. */
    @Test
    void metFollowsTheNoteAsItIs() {
        try (WindowlessDesk d = WindowlessDesk.with(shot)) {
            assertEquals(0, met(d, "lean", 0));
            double before = met(d, "open", 1);
            d.desk.edit(NoteEdit.retouch("Delete stroke", "open", operations -> operations.subList(0, 1)));
            assertTrue(Math.abs(met(d, "open", 1) - before) > 1e-3);
            d.desk.edit(NoteEdit.retouch("Delete stroke", "open", operations -> List.of()));
            assertEquals(Double.NaN, met(d, "open", 1));
            d.desk.undo();
            d.desk.undo();
            d.until("written", () -> d.desk.state().saving().isDone());
        }
    }

    /** Ours, by hand: on the first frame no force has acted, so both takes are the same; later they differ. The original: nothing to do. */
    @Test
    void changeGrowsFromNothingOnTheFirstFrame() {
        try (WindowlessDesk d = WindowlessDesk.with(shot)) {
            d.desk.change().want("test", d.shot(), 1, "front", () -> { });
            d.until("all frames", () -> IntStream.rangeClosed(1001, 1006)
                    .allMatch(f -> d.desk.change().of(d.shot(), 1, "front", f).isPresent()));
            assertEquals(0, d.desk.change().of(d.shot(), 1, "front", 1001).orElseThrow());
            assertTrue(d.desk.change().of(d.shot(), 1, "front", 1006).orElseThrow() > 1e-4);
            assertTrue(d.desk.change().of(d.shot(), 0, "front", 1006).isEmpty());
        }
    }

    /** By hand: 20 frames in strides of 8, 4, 2, 1; and never more than the limit. */
    @Test
    void framesComeCoarselyFirst() {
        assertEquals(List.of(1, 9, 17, 5, 13, 3, 7, 11, 15, 19, 2, 4, 6, 8, 10, 12, 14, 16, 18, 20),
                ChangeWatch.frames(new FrameRange(1, 20, 24)));
        assertEquals(200, ChangeWatch.frames(new FrameRange(1, 10_000, 24)).size());
    }

    /** Source: sRGB (IEC 61966-2-1) of the background alone: 0.1 codes to 89, 0.14 to 105, 0.2 to 124. */
    @Test
    void aThumbnailShowsTheBackgroundThroughNothing() {
        try (WindowlessDesk d = WindowlessDesk.with(shot)) {
            Thumbnail empty = Thumbnail.of(new Picture(2, 1), d.shot().setup().background());
            assertEquals(89 << 16 | 105 << 8 | 124, empty.rgb()[1]);
            List<Pictures.Ask> asks = List.of(Thumbnails.ask(d.shot(), Source.ORIGINAL, "front", 1006, 32),
                    Thumbnails.ask(d.shot(), new Source.Take(7), "front", 1006, 32),
                    Thumbnails.ask(d.shot(), new Source.Wanted("lean"), "front", 1004, 4000));
            d.desk.thumbnails().want("test", d.shot(), asks, () -> { });
            d.until("the last", () -> d.desk.thumbnails().get(d.shot(), asks.get(2)).isPresent());
            assertTrue(d.desk.thumbnails().get(d.shot(), asks.get(1)).isEmpty(), "there is no take 7");
            assertEquals(32, d.desk.thumbnails().get(d.shot(), asks.get(0)).orElseThrow().height());
            assertEquals(64, d.desk.thumbnails().get(d.shot(), asks.get(2)).orElseThrow().height());
        }
    }

    /** Asking anew drops what has not come; the same again asks nothing. Ours. */
    @Test
    void whoAsksAnewDropsWhatWasAskedBefore() {
        try (WindowlessDesk d = WindowlessDesk.with(shot)) {
            Gathering<Integer, String> gathering = new Gathering<>(d.workers, d.workers.lane("test"), 3);
            List<Integer> worked = new CopyOnWriteArrayList<>();
            BiFunction<Integer, Cancel, String> work = (key, cancel) -> {
                worked.add(key);
                return "v" + key;
            };
            gathering.want("a", List.of(1, 2, 3), work, () -> { });
            gathering.want("a", List.of(7, 1), work, () -> { });
            d.until("both", () -> gathering.get(7).isPresent() && gathering.get(1).isPresent());
            assertTrue(!worked.contains(2) && !worked.contains(3), worked.toString());
            gathering.want("a", List.of(8, 9, 10, 11), work, () -> { });
            d.until("the last", () -> gathering.get(11).isPresent());
            assertTrue(gathering.get(8).isEmpty() && gathering.get(9).isPresent(), "three are kept");
        }
    }
}
