package org.wispwright.ui.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Set;
import java.util.SortedMap;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.command.SmallShot;

/** What is written out of the desk. Expectations: ours, and those of the commands that write the same. */
class WritingOutTest {
    @TempDir
    private Path place;

    @Test
    void picturesFilesAndASheetGoIntoNewFoldersAndNothingIsWrittenOver() throws IOException {
        Path out = Files.createDirectory(place.resolve("out"));
        try (DeskBench desk = new DeskBench().open(SmallShot.in(place.resolve("yard")).folder())) {
            desk.act(d -> d.solving().start());
            desk.await("the take is there", s -> s.takes().size() == 2 && s.work().running().isEmpty());
            write(desk, d -> d.writingOut().pictures(out, true));
            assertEquals(6, SmallShot.listing(out.resolve("yard-take-001-front")).size() - 1);
            assertEquals(48, ImageIO.read(out.resolve("yard-take-001-front/yard-take-001-front.1004.png").toFile()).getWidth());
            write(desk, d -> d.writingOut().pictures(out, false));
            assertEquals(Set.of("", "yard-take-001-front.1004.png"), SmallShot.listing(out.resolve("yard-take-001-front-2")).keySet());
            write(desk, d -> d.writingOut().files(out));
            assertEquals(SmallShot.listing(place.resolve("yard/takes/001")), SmallShot.listing(out.resolve("yard-take-001")));
            write(desk, d -> d.writingOut().sheet(out));
            assertTrue(SmallShot.listing(out.resolve("yard-take-001-sheet")).keySet()
                    .containsAll(Set.of("sheet.png", "compare.json", "measures.csv", "lean.got.png", "open.difference.png")));
        }
    }

    @Test
    void aPlaceThatRefusesIsASentenceAndLeavesNothing() throws IOException {
        Path file = Files.write(place.resolve("file"), new byte[0]);
        Path out = Files.createDirectory(place.resolve("out"));
        try (DeskBench desk = new DeskBench().open(SmallShot.in(place.resolve("yard")).folder())) {
            write(desk, d -> d.writingOut().files(file));
            assertEquals(Message.Kind.FAULT, desk.state().message().orElseThrow().kind());
            assertTrue(desk.said().contains("choose a folder"), desk.said());
            SortedMap<String, String> before = SmallShot.listing(out);
            Files.write(place.resolve("yard/takes/000/density.1003.npy"), new byte[] {1, 2, 3});
            write(desk, d -> d.writingOut().pictures(out, true));
            assertTrue(desk.said().contains("density.1003.npy"), desk.said());
            assertEquals(before, SmallShot.listing(out));
            desk.act(d -> {
                d.writingOut().files(out);
                d.writingOut().stop();
            });
            desk.await("it is stopped", s -> s.work().writing().isEmpty());
        }
        assertTrue(SmallShot.listing(out).keySet().stream().noneMatch(name -> name.startsWith(".")));
    }

    private static void write(DeskBench desk, java.util.function.Consumer<Desk> what) {
        desk.act(what);
        desk.await("it is written", s -> s.work().writing().isEmpty());
    }
}
