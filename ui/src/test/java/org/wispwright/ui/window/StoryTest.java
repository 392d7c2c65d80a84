package org.wispwright.ui.window;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Component;
import java.awt.Dimension;
import java.awt.Point;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import javax.swing.JTextField;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.desk.Against;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Stroke;

/**
 * The whole first story, worked with real events: open, brush, pull a mesh, hold, solve a preview, watch it, compare, undo and redo, close,
 * open again. Once by pointer, while the event thread is watched; once by keys alone. Expectations: ours.
 */
class StoryTest {
    /** An event may keep the event thread for so long: what issue and design ask of the desk. */
    private static final long MOST_MILLIS = 50;

    @TempDir
    private Path folder;

    private static Note open(DeskState state) {
        return state.openNote().map(Listed::note).orElseThrow();
    }

    @Test
    void byPointer() throws Exception {
        Path shot = SampleCopy.quickYard(folder);
        DeskState before;
        try (DeskDriver driver = new DeskDriver(new Dimension(1440, 900)); EventWatch watch = new EventWatch(MOST_MILLIS)) {
            // The first time through, classes are loaded and compiled; it is the same work, and is not counted.
            story(driver, shot);
            driver.doOnSwing(() -> {
                while (driver.desk().state().history().undoName().isPresent() && !driver.desk().state().history().made().isEmpty()) {
                    driver.desk().undo();
                }
            });
            watch.start();
            before = story(driver, shot);
            System.out.println("the story: " + watch.inWords());
            assertEquals(List.of(), watch.thrown());
            assertEquals(List.of(), watch.slow());
        }
        assertEquals(List.of(), ShotCheck.of(shot, Long.MAX_VALUE).findings());
        try (DeskDriver driver = new DeskDriver(new Dimension(1440, 900)).open(shot)) {
            DeskState after = driver.state();
            assertEquals(before.shot().orElseThrow().notes(), after.shot().orElseThrow().notes());
            assertEquals(before.takes(), after.takes());
            driver.await("undo goes on into the earlier session", s -> s.history().undoName().isPresent());
        }
    }

    private static DeskState story(DeskDriver driver, Path shot) {
        driver.open(shot);
        driver.await("the original is there", s -> s.takes().stream().anyMatch(t -> t.number() == 0) && s.work().original().isEmpty());
        driver.click("note-lean-the-head");
        driver.await("its note is open", s -> s.note().filter("lean-the-head"::equals).isPresent() && s.isAtOpenNote());
        Component picture = driver.find("easel-picture", Component.class);
        int operations = open(driver.state()).retouch().operations().size();

        driver.click("hand-remove");
        driver.await("the wish is shown", s -> s.showing().orElseThrow().near().equals(new Source.Wanted("lean-the-head")));
        driver.drag(List.of(driver.onScreen(picture, 0.45, 0.2), driver.onScreen(picture, 0.47, 0.25), driver.onScreen(picture, 0.49, 0.3)));
        driver.await("a stroke was added", s -> open(s).retouch().operations().size() == operations + 1);
        assertTrue(open(driver.state()).retouch().operations().get(operations) instanceof Stroke);

        driver.click("hand-pull");
        driver.await("the hand pulls", s -> s.hand() instanceof Hand.Pulling);
        MeshWarp mesh = (MeshWarp) open(driver.state()).retouch().operations().get(0);
        driver.awaitTrue("the mesh can be pulled", driver::hasLivePicture);
        driver.pause(300);
        Point handle = driver.placeOnEasel(mesh.handles().get(0).to());
        driver.moveTo(handle);
        driver.drag(List.of(handle, new Point(handle.x - 4, handle.y + 3), new Point(handle.x - 9, handle.y + 6)));
        driver.await("the handle was pulled", s -> !open(s).retouch().operations().get(0).equals(mesh));

        driver.click("hand-hold");
        driver.await("the hand holds", s -> s.hand() instanceof Hand.Holding);
        int holds = open(driver.state()).holds().size();
        driver.drag(List.of(driver.onScreen(picture, 0.4, 0.7), driver.onScreen(picture, 0.5, 0.8), driver.onScreen(picture, 0.55, 0.85)));
        driver.await("a hold was added", s -> open(s).holds().size() == holds + 1);

        int takes = driver.state().takes().size();
        driver.click("take-solve");
        driver.await("it climbs, and says how far the notes are met",
                s -> s.work().running().flatMap(r -> r.at()).filter(at -> at.met().size() == 2).isPresent() || s.takes().size() > takes);
        driver.await("the take is there and shown", s -> s.takes().size() == takes + 1 && s.work().running().isEmpty());
        int number = driver.state().takes().get(takes).number();
        driver.await("it is on the easel", s -> s.showing().orElseThrow().near().equals(new Source.Take(number)));
        assertTrue(driver.state().takes().get(takes).met().get("lean-the-head") > 0.3);

        driver.click("take-0-against");
        driver.act("compare.divider");
        assertEquals(Against.DIVIDER, driver.state().showing().orElseThrow().against());
        Point middle = driver.onScreen(picture, 0.5, 0.5);
        driver.drag(List.of(middle, new Point(middle.x + 20, middle.y), new Point(middle.x + 45, middle.y)));
        assertTrue(driver.state().showing().orElseThrow().divider().x() > 0.55);
        driver.act("compare.alone");

        List<Listed> all = driver.state().shot().orElseThrow().notes();
        driver.key("ctrl Z");
        driver.key("ctrl Z");
        assertEquals(holds, open(driver.state()).holds().size());
        driver.key("ctrl shift Z");
        driver.key("ctrl shift Z");
        assertEquals(all, driver.state().shot().orElseThrow().notes());
        driver.await("all is on disk", s -> s.saving().isDone());
        return driver.state();
    }

    @Test
    void byKeysAlone() throws Exception {
        Path shot = SampleCopy.quickYard(folder);
        try (DeskDriver driver = new DeskDriver(new Dimension(1280, 860)).open(shot)) {
            driver.await("the original is there", s -> s.takes().size() == 1 && s.work().original().isEmpty());
            driver.key("ctrl E");
            driver.key("3");
            driver.awaitTrue("the brush can draw", () -> driver.hasLivePicture());
            for (String key : List.of("UP", "UP", "SPACE", "RIGHT", "RIGHT", "DOWN", "SPACE")) {
                driver.key(key);
            }
            driver.await("a stroke was added", s -> s.history().made().size() == 1);
            driver.key("6");
            driver.awaitTrue("the mesh can be pulled", driver::hasLivePicture);
            for (String key : List.of("SPACE", "LEFT", "LEFT", "SPACE")) {
                driver.key(key);
            }
            driver.await("a handle was set and pulled", s -> s.history().made().size() == 2);
            driver.key("8");
            driver.key("shift DOWN");
            driver.key("SPACE");
            driver.key("shift DOWN");
            driver.key("shift RIGHT");
            driver.key("SPACE");
            driver.await("a hold was added", s -> s.history().made().size() == 3);
            driver.key("ctrl ENTER");
            driver.await("the take is there", s -> s.takes().size() == 2 && s.work().running().isEmpty());
            driver.key("shift 2");
            assertEquals(Against.DIVIDER, driver.state().showing().orElseThrow().against());
            driver.act("compare.divider-right");
            assertEquals(0.55, driver.state().showing().orElseThrow().divider().x(), 1e-9);
            driver.key("ctrl Z");
            driver.key("ctrl Z");
            driver.key("ctrl Z");
            assertTrue(driver.state().history().made().isEmpty());
            driver.key("ctrl shift Z");
            driver.await("all is on disk", s -> s.saving().isDone());
            driver.key("ctrl F");
            driver.awaitTrue("the list of actions has the focus", () -> driver.find("finder-text", JTextField.class).isFocusOwner());
            driver.type("side by side");
            assertEquals("side by side", driver.find("finder-text", JTextField.class).getText());
            driver.key("ENTER");
            assertEquals(Against.BESIDE, driver.state().showing().orElseThrow().against());
        }
        assertEquals(List.of(), ShotCheck.of(shot, Long.MAX_VALUE).findings());
        assertTrue(Files.isDirectory(shot.resolve("takes/001")));
    }
}
