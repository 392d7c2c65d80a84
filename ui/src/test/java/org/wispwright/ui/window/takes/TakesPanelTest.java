package org.wispwright.ui.window.takes;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Component;
import java.awt.Dimension;
import java.awt.Rectangle;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import javax.swing.AbstractButton;
import javax.swing.JComponent;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.NoteEdit;
import org.wispwright.ui.desk.SolveNow;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.desk.TakeWork;
import org.wispwright.ui.job.Quality;
import org.wispwright.ui.window.DeskDriver;
import org.wispwright.ui.window.DeskWindow;

/** The takes' side of the window, worked by hand. Expectations: ours, by the desk's own state. */
class TakesPanelTest {
    @TempDir
    private Path place;

    /** 24 x 48 x 24 cells: two rungs, so that there is time to watch. */
    private Path finer() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.swap("shot.json", "\"cells\": [8, 16, 8], \"cellMetres\": 0.25", "\"cells\": [24, 48, 24], \"cellMetres\": 0.0834");
        shot.swap("shot.json", "\"velocityInterpolation\": \"cubic\",", "");
        return shot.folder();
    }

    @Test
    void aSolveIsStartedWatchedPausedAndKeptAndItsTakeWrittenOut() throws IOException {
        Path out = Files.createDirectory(place.resolve("out"));
        try (DeskDriver driver = new DeskDriver(new Dimension(1440, 900)).open(finer())) {
            driver.await("the original and the estimate are there", s -> s.hasOriginal() && !s.work().foretold().estimates().isEmpty()
                    && !s.work().asked().isEmpty());
            driver.keepScreenshot("takes-before-dark");
            click(driver, "quality-final");
            driver.await("the quality is chosen", s -> s.work().choice().quality() == Quality.FINAL);
            click(driver, "take-solve");
            driver.await("some iterations are done", s -> iterations(s) > 5);
            click(driver, "take-pause");
            driver.await("it waits", s -> phase(s) == SolveNow.Phase.PAUSED);
            driver.doOnSwing(() -> driver.desk().edit(NoteEdit.on("Switch off", "open", false)));
            driver.awaitTrue("it says that it works on other notes", () -> driver.find("solve-differs", JComponent.class).isShowing());
            driver.keepScreenshot("takes-running-dark");
            driver.doOnSwing(driver.desk()::undo);
            int before = iterations(driver.state());
            click(driver, "take-pause");
            driver.await("it goes on", s -> iterations(s) > before);
            click(driver, "take-keep");
            driver.await("the take is there", s -> s.takes().size() == 2 && s.work().running().isEmpty());
            assertEquals(new Source.Take(1), driver.state().showing().orElseThrow().near());
            click(driver, "take-0");
            driver.await("the original is shown", s -> s.showing().orElseThrow().near().equals(Source.ORIGINAL));
            click(driver, "take-1-against");
            driver.await("take 1 is what it is set against", s -> s.showing().orElseThrow().far().equals(new Source.Take(1)));
            driver.key("ctrl shift RIGHT");
            driver.await("the next take is shown", s -> s.showing().orElseThrow().near().equals(new Source.Take(1)));
            assertThrows(AssertionError.class, () -> driver.act("take.next"));
            TakesPanel panel = driver.find("takes", TakesPanel.class);
            driver.doOnSwing(() -> panel.chooseFoldersBy(() -> Optional.of(out)));
            click(driver, "take-write-frame");
            driver.await("it is written", s -> s.message().filter(m -> m.words().contains("yard-take-001-front")).isPresent());
            driver.keepScreenshot("takes-after-dark");
            try (var files = Files.list(out.resolve("yard-take-001-front"))) {
                assertEquals(1, files.count());
            }
        }
    }

    @Test
    void closingAsksOnlyWhileASolveRuns() {
        Path shot = finer();
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST, false, 1).open(shot)) {
            driver.await("the original is there", DeskState::hasOriginal);
            driver.key("ctrl ENTER");
            driver.await("it runs", s -> s.work().running().isPresent());
            driver.doOnSwing(() -> driver.desk().solving().pause(true));
            driver.await("it waits", s -> phase(s) == SolveNow.Phase.PAUSED);
            asked(driver);
            driver.keepScreenshot("takes-leaving-light");
            click(driver, "leave-stay");
            assertTrue(driver.window().frame().isDisplayable());
            assertEquals(SolveNow.Phase.PAUSED, phase(driver.state()));
            driver.await("nobody is asked any more", s -> s.work().leaving() == TakeWork.Leaving.NO);
            asked(driver);
            click(driver, "leave-stop");
            driver.awaitTrue("the window is closed", () -> !driver.window().frame().isDisplayable());
        }
        assertTrue(Files.exists(shot.resolve("takes/.solving/record-1.bin")));
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST, false, 1).open(shot)) {
            driver.await("what was cut off is found", s -> s.work().unfinished().isPresent());
            assertFalse(driver.find("take-solve", AbstractButton.class).isEnabled());
            driver.keepScreenshot("takes-cut-off-light");
            click(driver, "take-resume");
            driver.await("it goes on", s -> iterations(s) > 1);
            click(driver, "take-pause");
            driver.await("it waits", s -> phase(s) == SolveNow.Phase.PAUSED);
            asked(driver);
            click(driver, "leave-keep");
            driver.awaitTrue("the window is closed", () -> !driver.window().frame().isDisplayable());
        }
        assertTrue(Files.isRegularFile(shot.resolve("takes/001/take.json")));
    }

    /** Everything can be reached with large words in the smallest window: nothing is wider than the panel, and it scrolls. */
    @Test
    void largeWordsFitIntoTheSmallestWindow() {
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST, true, 2).open(SmallShot.in(place.resolve("yard")).folder())) {
            driver.await("the estimate is there", s -> s.hasOriginal() && !s.work().foretold().estimates().isEmpty());
            driver.keepScreenshot("takes-large-dark");
            JComponent panel = driver.find("takes", TakesPanel.class);
            for (String name : List.of("take-0", "take-0-against", "quality-preview", "cost-final", "solve-sources", "take-solve",
                    "take-write-files")) {
                JComponent part = driver.find(name, JComponent.class);
                reveal(driver, part);
                Rectangle shown = DeskDriver.onSwing(() -> {
                    Rectangle all = javax.swing.SwingUtilities.convertRectangle(part.getParent(), part.getBounds(), panel);
                    return all.intersection(new Rectangle(panel.getSize()));
                });
                assertEquals(part.getSize(), shown.getSize(), name);
            }
            driver.keepScreenshot("takes-large-end-dark");
        }
    }

    @Test
    void everyControlHasItsNameAndTip() {
        try (DeskDriver driver = new DeskDriver(new Dimension(1440, 900), false, 1).open(SmallShot.in(place.resolve("yard")).folder())) {
            driver.await("the original is there", s -> s.hasOriginal() && !s.work().foretold().estimates().isEmpty());
            driver.keepScreenshot("takes-before-light");
            TakesPanel panel = driver.find("takes", TakesPanel.class);
            for (Component c : driver.everything()) {
                if (c instanceof AbstractButton button && javax.swing.SwingUtilities.isDescendingFrom(c, panel)
                        && !(c.getParent() instanceof javax.swing.JScrollBar)) {
                    String name = button.getAccessibleContext().getAccessibleName();
                    assertTrue(button.getName() != null && name != null && !name.isBlank(), () -> "no name: " + button);
                    assertTrue(button.getToolTipText() != null && !button.getToolTipText().isBlank(), () -> "no tip: " + button.getName());
                }
            }
        }
    }

    private static void asked(DeskDriver driver) {
        driver.key("ctrl Q");
        driver.await("the person is asked", s -> s.work().leaving() == TakeWork.Leaving.ASKED);
    }

    private static void click(DeskDriver driver, String name) {
        reveal(driver, driver.find(name, JComponent.class));
        driver.click(name);
    }

    private static void reveal(DeskDriver driver, JComponent part) {
        driver.doOnSwing(() -> part.scrollRectToVisible(new Rectangle(part.getSize())));
    }

    private static int iterations(DeskState s) {
        return s.work().running().flatMap(SolveNow::at).map(at -> at.iteration()).orElse(0);
    }

    private static SolveNow.Phase phase(DeskState s) {
        return s.work().running().map(SolveNow::phase).orElse(null);
    }
}
