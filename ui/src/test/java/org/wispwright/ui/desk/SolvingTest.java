package org.wispwright.ui.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.SortedMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.desk.SolveNow.Phase;
import org.wispwright.ui.job.Quality;

/** Solves from the desk, without a window. Expected values are ours: those of a solve that nothing disturbed. */
class SolvingTest {
    @TempDir
    private Path place;

    @Test
    void aShotWithoutAnOriginalGetsOneAndIsToldWhatASolveWouldTake() {
        try (DeskBench desk = new DeskBench().open(SmallShot.in(place.resolve("yard")).folder())) {
            assertTrue(Files.isRegularFile(place.resolve("yard/takes/000/density.1006.npy")));
            DeskState told = desk.await("the estimate is there", s -> !s.work().foretold().estimates().isEmpty());
            assertEquals(Quality.values().length, told.work().foretold().estimates().size());
            // Of the note 'open' the smoke is brushed away: less by depth than the original shows, so a force alone cannot do it.
            desk.await("the note that wants less smoke is told", s -> s.work().asked().stream()
                    .anyMatch(asked -> asked.note().id().equals("open") && asked.depth() < 1));
            desk.act(d -> d.edit(NoteEdit.delete("delete note", "open")));
            desk.await("the estimate is made again", s -> s.work().foretold().measuring());
            desk.await("for the note that is left", s -> !s.work().foretold().measuring() && !s.work().foretold().estimates().isEmpty()
                    && s.work().asked().stream().noneMatch(asked -> asked.note().id().equals("open")));
        }
    }

    @Test
    void aSolveTellsHowItGoesAndItsTakeIsShown() {
        try (DeskBench desk = new DeskBench().open(SmallShot.in(place.resolve("yard")).folder())) {
            desk.act(d -> d.solving().start());
            desk.act(d -> d.solving().pause(true));
            SolveNow now = paused(desk);
            assertEquals(1, now.at().orElseThrow().iteration());
            assertEquals(2, now.at().get().met().size());
            assertEquals(1, now.curve().size());
            assertEquals(java.util.Set.of("lean", "open"), now.got().keySet());
            assertTrue(now.got().get("lean").width() > 4);
            DeskBench.pause(300);
            assertEquals(now, paused(desk));
            desk.act(d -> d.solving().pause(false));
            DeskState ended = desk.await("the take is there", s -> s.work().running().isEmpty());
            assertEquals(new Source.Take(1), ended.showing().orElseThrow().near());
            assertTrue(desk.said().matches("Take 1 is ready: lean -?\\d+ %, open -?\\d+ %"), desk.said());
            assertEquals(2, ended.takes().size());
            assertEquals("preview", ended.takes().get(1).quality().orElseThrow());
            assertFalse(Files.exists(place.resolve("yard/takes/.solving")));
        }
    }

    @Test
    void stoppedItCanBeGoneOnWithToTheSameBits() {
        SmallShot calm = SmallShot.in(place.resolve("calm"));
        try (DeskBench desk = new DeskBench().open(calm.folder())) {
            desk.act(d -> d.solving().start());
            desk.await("the take is there", s -> s.takes().size() == 2);
        }
        SmallShot yard = SmallShot.in(place.resolve("yard"));
        try (DeskBench desk = new DeskBench().open(yard.folder())) {
            stoppedAfterOne(desk);
            assertTrue(desk.said().contains("after iteration 1"), desk.said());
            assertFalse(Solving.canStart(desk.state()));
        }
        try (DeskBench desk = new DeskBench().open(yard.folder())) {
            DeskState s = desk.await("the records are found", now -> now.work().unfinished().isPresent());
            assertEquals(Unfinished.State.READY, s.work().unfinished().orElseThrow().state());
            desk.act(d -> d.solving().resume());
            desk.await("the take is there", now -> now.takes().size() == 2);
        }
        assertEquals(SmallShot.listing(calm.folder().resolve("takes")), SmallShot.listing(yard.folder().resolve("takes")));
    }

    @Test
    void whatWasCutOffWaitsForItsVeryNotesAndCanBeDropped() throws IOException {
        SmallShot yard = SmallShot.in(place.resolve("yard"));
        try (DeskBench desk = new DeskBench().open(yard.folder())) {
            stoppedAfterOne(desk);
            desk.act(d -> d.edit(NoteEdit.delete("delete note", "open")));
            desk.await("it belongs to other notes", s -> state(s) == Unfinished.State.OTHER_SHOT);
            assertFalse(Solving.canResume(desk.state()));
            desk.act(Desk::undo);
            desk.await("it is ready again", s -> state(s) == Unfinished.State.READY);
            Path record = yard.folder().resolve("takes/.solving/record-1.bin");
            Files.write(record, new byte[] {1, 2, 3});
        }
        try (DeskBench desk = new DeskBench().open(yard.folder())) {
            desk.await("the damage is seen", s -> state(s) == Unfinished.State.DAMAGED);
            desk.act(d -> d.solving().resume());
            assertTrue(desk.state().work().running().isEmpty());
            desk.act(d -> d.solving().dropUnfinished());
            desk.await("it is dropped", s -> s.work().unfinished().isEmpty());
            assertTrue(Solving.canStart(desk.state()));
            assertFalse(Files.exists(yard.folder().resolve("takes/.solving")));
        }
    }

    /** 24 x 48 x 24 cells: two rungs; what is kept on the lower is a take on the shot's own grid, and the solve goes on from it. */
    @Test
    void keptOnALowerRungItIsAWholeTakeAndIsGoneOnFrom() throws IOException {
        SmallShot yard = SmallShot.in(place.resolve("yard"));
        yard.swap("shot.json", "\"cells\": [8, 16, 8], \"cellMetres\": 0.25", "\"cells\": [24, 48, 24], \"cellMetres\": 0.0834");
        yard.swap("shot.json", "\"velocityInterpolation\": \"cubic\",", "");
        try (DeskBench desk = new DeskBench().open(yard.folder())) {
            desk.act(d -> d.solving().choose(c -> c.with(Quality.FINAL)));
            startedAndPaused(desk);
            desk.act(d -> d.edit(NoteEdit.delete("delete note", "open")));
            assertTrue(paused(desk).isOfOtherNotesThan(desk.state().shot().orElseThrow()));
            desk.act(Desk::undo);
            assertFalse(paused(desk).isOfOtherNotesThan(desk.state().shot().orElseThrow()));
            desk.act(d -> d.solving().keep());
            DeskState kept = desk.await("the take is there", s -> s.takes().size() == 2);
            assertEquals(-1, Files.mismatch(yard.folder().resolve("takes/000/density.1001.npy"), yard.folder().resolve(
                    "takes/001/density.1001.npy")));
            assertTrue(Files.readString(yard.folder().resolve("takes/001/take.json")).contains("a person found it enough"));
            assertEquals(Files.size(yard.folder().resolve("takes/000/density.1006.npy")),
                    Files.size(yard.folder().resolve("takes/001/density.1006.npy")));
            assertEquals(2, kept.takes().get(1).met().size());
            desk.await("all is over", s -> s.work().running().isEmpty());
            desk.act(d -> d.solving().choose(c -> c.with(Quality.PREVIEW).withOnwards(true)));
            desk.act(d -> d.solving().start());
            DeskState on = desk.await("it went on", s -> s.takes().size() == 3);
            assertEquals(1, on.takes().get(2).parent().orElse(-1));
            desk.await("all is over", s -> s.work().running().isEmpty());
            desk.act(d -> d.edit(NoteEdit.delete("delete note", "open")));
            desk.act(d -> d.solving().start());
            desk.await("refused", s -> s.work().running().isEmpty());
            assertTrue(desk.said().contains("other notes or settings"), desk.said());
        }
    }

    @Test
    void whatTheDiskRefusesIsASentenceAndTheRecordsStay() throws IOException {
        SmallShot yard = SmallShot.in(place.resolve("yard"));
        try (DeskBench desk = new DeskBench().open(yard.folder())) {
            startedAndPaused(desk);
            Path takes = yard.folder().resolve("takes");
            Files.move(takes, place.resolve("away"));
            Files.write(takes, new byte[0]);
            desk.act(d -> d.solving().keep());
            DeskState s = desk.await("it failed", now -> now.work().running().isEmpty());
            assertEquals(Message.Kind.FAULT, s.message().orElseThrow().kind());
            assertTrue(desk.said().contains("takes") && desk.said().contains("room on the disk"), desk.said());
            Files.delete(takes);
            Files.move(place.resolve("away"), takes);
        }
        try (DeskBench desk = new DeskBench().open(yard.folder())) {
            DeskState s = desk.await("the records are found", now -> now.work().unfinished().isPresent());
            assertEquals(1, s.work().unfinished().orElseThrow().iterations());
            desk.act(d -> d.solving().resume());
            desk.await("the take is there", now -> now.takes().size() == 2);
        }
    }

    @Test
    void aSecondSolverIsSaidAndNothingChanges() throws IOException {
        SmallShot yard = SmallShot.in(place.resolve("yard"));
        try (DeskBench desk = new DeskBench().open(yard.folder())) {
            SortedMap<String, String> before = SmallShot.listing(yard.folder());
            Files.write(yard.folder().resolve("takes/.solving"), new byte[0]);
            desk.act(d -> d.solving().start());
            desk.await("refused", s -> s.work().running().isEmpty());
            assertTrue(desk.said().contains("takes/.solving"), desk.said());
            Files.delete(yard.folder().resolve("takes/.solving"));
            assertEquals(before, SmallShot.listing(yard.folder()));
        }
    }

    private static void stoppedAfterOne(DeskBench desk) {
        startedAndPaused(desk);
        desk.act(d -> d.solving().stop());
        desk.await("it has stopped", s -> s.work().running().isEmpty());
    }

    private static void startedAndPaused(DeskBench desk) {
        desk.act(d -> d.solving().start());
        desk.act(d -> d.solving().pause(true));
        paused(desk);
    }

    private static SolveNow paused(DeskBench desk) {
        return desk.await("it is paused", s -> s.work().running().map(now -> now.phase() == Phase.PAUSED).orElse(false)).work().running()
                .orElseThrow();
    }

    private static Unfinished.State state(DeskState s) {
        return s.work().unfinished().map(Unfinished::state).orElse(null);
    }
}
