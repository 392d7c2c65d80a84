package org.wispwright.ui.window;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Component;
import java.awt.Dimension;
import java.awt.Point;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import javax.swing.JLabel;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.desk.Source;

/** Where things go wrong or get tight. Expectations: ours. */
class EdgesTest {
    @TempDir
    private Path folder;

    @Test
    void aFrameThatCannotBeReadIsSaidAboveThePictureAndTheDeskWorksOn() throws IOException {
        Path shot = SampleCopy.quickYard(folder);
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST).open(shot)) {
            driver.await("the original is there", s -> s.takes().size() == 1 && s.work().original().isEmpty());
            Files.writeString(shot.resolve("frames/front.1038.png"), "no picture");
            driver.doOnSwing(() -> driver.desk().show(s -> s.withFrame(1038).withView("front").withNear(new Source.Rendered())));
            JLabel missing = driver.find("easel-missing", JLabel.class);
            driver.awaitTrue("it is said", () -> missing.isShowing() && missing.getText().contains("frames/front.1038.png"));
            driver.doOnSwing(() -> driver.desk().show(s -> s.withNear(Source.ORIGINAL)));
            driver.awaitTrue("the next picture is there", () -> !missing.isShowing());
        }
    }

    /** A folder in the journal's place stands for a disk that refuses. */
    @Test
    void whatTheDiskRefusesIsSaidAndWrittenOnceItCan() throws IOException {
        Path shot = SmallShot.in(folder.resolve("shot")).folder();
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST).open(shot)) {
            Path journal = shot.resolve("notes/.journal.jsonl");
            Files.createDirectories(journal.resolve("in-the-way"));
            driver.act("note.toggle");
            driver.await("it is refused", s -> s.saving().refused().isPresent());
            JLabel saved = driver.find("saved", JLabel.class);
            assertEquals("1 not on disk", saved.getText());
            assertTrue(saved.getToolTipText().contains("notes/.journal.jsonl"), saved.getToolTipText());
            Files.delete(journal.resolve("in-the-way"));
            Files.delete(journal);
            driver.key("ctrl S");
            driver.await("it is on disk", s -> s.saving().isDone());
            assertEquals("all on disk", saved.getText());
        }
    }

    @Test
    void everythingCanBeReachedInTheSmallestWindowAndAtTwiceTheTextOnALargeScreen() {
        Path shot = SmallShot.in(folder.resolve("shot")).folder();
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST).open(shot)) {
            assertEquals(List.of(), hidden(driver));
            driver.keepScreenshot("smallest");
        }
        try (DeskDriver driver = new DeskDriver(new Dimension(3840, 2160), false, 2).open(shot)) {
            assertEquals(List.of(), hidden(driver));
            driver.keepScreenshot("large");
        }
    }

    /** Parts that must lie within the window and have room. */
    private static List<String> hidden(DeskDriver driver) {
        List<String> hidden = new ArrayList<>();
        Component window = driver.window().frame();
        for (String name : new String[] {"notes", "easel-picture", "hand", "takes", "ribbon", "title", "find", "note-new", "compare-how", "zoom"}) {
            Component c = driver.find(name, Component.class);
            Point at = DeskDriver.onSwing(c::getLocationOnScreen);
            boolean within = at.x >= 0 && at.y >= 0 && at.x + c.getWidth() <= window.getWidth() && at.y + c.getHeight() <= window.getHeight();
            if (!within || c.getWidth() < 8 || c.getHeight() < 8) {
                hidden.add(name + " at " + at + ", " + c.getWidth() + "x" + c.getHeight());
            }
        }
        Component picture = driver.find("easel-picture", Component.class);
        if (picture.getHeight() < 200) {
            hidden.add("the picture has only " + picture.getHeight() + " pixels of height");
        }
        return hidden;
    }

    /** What stays after ten shots is what stays after one, give or take a tenth: nothing holds on to a shot that is gone. */
    @Test
    void theHeapAfterTenShotsIsTheHeapAfterOne() {
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST)) {
            long first = 0;
            long last = 0;
            for (int n = 0; n < 10; n++) {
                Path shot = SmallShot.in(folder.resolve("shot" + n)).folder();
                driver.doOnSwing(() -> driver.desk().open(shot));
                driver.await("it is open and at rest", s -> s.shot().filter(o -> o.folder().root().equals(shot)).isPresent()
                        && s.takes().size() == 1 && s.work().original().isEmpty());
                driver.pause(500);
                last = used();
                first = n == 0 ? last : first;
            }
            double kept = first;
            double now = last;
            assertTrue(now <= 1.1 * kept, () -> String.format("%.1f MiB after one, %.1f MiB after ten", kept / (1 << 20), now / (1 << 20)));
        }
    }

    private static long used() {
        long least = Long.MAX_VALUE;
        for (int n = 0; n < 5; n++) {
            System.gc();
            least = Math.min(least, Runtime.getRuntime().totalMemory() - Runtime.getRuntime().freeMemory());
        }
        return least;
    }
}
