package org.wispwright.ui.window.easel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Dimension;
import java.awt.Point;
import java.awt.image.BufferedImage;
import java.nio.file.Path;
import java.util.List;
import javax.swing.JComboBox;
import javax.swing.JLabel;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.desk.Against;
import org.wispwright.ui.desk.Showing;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.SimulateWork;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.window.DeskDriver;

/** The picture on the easel, worked by pointer and keys. Expectations: ours; where a place on the screen must be, worked out by hand. */
class EaselTest {
    @TempDir
    private Path folder;
    private DeskDriver driver;
    private EaselCanvas canvas;

    @BeforeEach
    void open() {
        SmallShot shot = SmallShot.in(folder.resolve("shot"));
        ShotFolder opened = ShotFolder.open(shot.folder());
        try (Lanes lanes = new Lanes(1)) {
            SimulateWork.run(opened, ShotCheck.requireForNotes(opened), lanes, Progress.SILENT, new Cancel());
        }
        driver = new DeskDriver(new Dimension(1200, 800)).open(shot.folder());
        canvas = driver.find("easel-picture", EaselCanvas.class);
        driver.doOnSwing(() -> driver.desk().show(s -> s.withNear(new Source.Wanted(driver.desk().state().note().orElseThrow()))));
        driver.awaitTrue("a picture is there", () -> shown() > 0);
    }

    @AfterEach
    void close() {
        driver.close();
    }

    /** Pixels of the easel that are neither surround nor background: brighter than both. */
    private int shown() {
        BufferedImage image = driver.screenshotOf(canvas);
        int bright = 0;
        for (int y = 0; y < image.getHeight(); y++) {
            for (int x = 0; x < image.getWidth(); x++) {
                bright += (image.getRGB(x, y) & 255) > 150 ? 1 : 0;
            }
        }
        return bright;
    }

    private Showing showing() {
        return driver.state().showing().orElseThrow();
    }

    @Test
    void theWheelZoomsAboutThePointerAndTheZoomStaysWhenTheFrameChanges() {
        Placement before = DeskDriver.onSwing(canvas::placement);
        driver.wheel(canvas, 0.3, 0.4, -3);
        Placement after = DeskDriver.onSwing(canvas::placement);
        assertTrue(after.scale() > 1.3 * before.scale());
        double x = 0.3 * (canvas.getWidth() - 1);
        double y = 0.4 * (canvas.getHeight() - 1);
        assertEquals(before.toPicture(x, y).x(), after.toPicture(x, y).x(), 2 / before.scale());
        assertEquals(before.toPicture(x, y).y(), after.toPicture(x, y).y(), 2 / before.scale());
        driver.doOnSwing(() -> driver.desk().show(s -> s.withFrame(s.frame() - 1).withAgainst(Against.DIFFERENCE)));
        assertEquals(after, DeskDriver.onSwing(canvas::placement));
        driver.key("ctrl 0");
        assertEquals(before, DeskDriver.onSwing(canvas::placement));
    }

    @Test
    void theDividersKnobMovesItAndItsLineTurnsIt() {
        driver.doOnSwing(() -> driver.desk().show(s -> s.withFar(Source.ORIGINAL).withAgainst(Against.DIVIDER)));
        Point corner = driver.onScreen(canvas, 0, 0);
        java.awt.geom.Point2D knob = DeskDriver.onSwing(() -> canvas.divider().knob());
        Point at = new Point(corner.x + (int) knob.getX(), corner.y + (int) knob.getY());
        driver.drag(List.of(at, new Point(at.x + 20, at.y), new Point(at.x + 40, at.y - 30)));
        Showing.Divider moved = showing().divider();
        Placement placement = DeskDriver.onSwing(canvas::placement);
        assertEquals(0.5 + 40 / (placement.scale() * canvas.aspect()), moved.x(), 0.01);
        assertEquals(0.5 - 30 / placement.scale(), moved.y(), 0.01);
        Point on = new Point(at.x + 40, at.y + 70);                            // on the line, 100 below its knob
        driver.drag(List.of(on, new Point(on.x - 50, on.y), new Point(on.x - 100, on.y)));
        assertEquals(Math.PI / 4, showing().divider().radians(), 0.03);
        driver.keepScreenshot("easel-divider");
    }

    @Test
    void comparingIsChosenFromTheBarAndByKeys() {
        driver.key("shift 3");
        assertEquals(Against.FADE, showing().against());
        JComboBox<?> how = driver.find("compare-how", JComboBox.class);
        driver.doOnSwing(() -> how.setSelectedIndex(Against.BLINK.ordinal()));
        assertEquals(Against.BLINK, showing().against());
        assertTrue(driver.find("compare-caution", JLabel.class).getText().contains("epilepsy"));
        driver.key("shift 1");
        assertEquals(Against.ALONE, showing().against());
    }

    /** WCAG 2.x, 2.3.1: not more than three flashes in any one second; a flash is a pair of opposing changes. */
    @Test
    void picturesInTurnStayFarBelowThreeFlashesASecond() {
        assertTrue(1000.0 / (2 * EaselPanel.TURN_MILLIS) < 1);
    }

    @Test
    void thePixelUnderThePointerIsReadAsOpacityLightAndCodes() {
        driver.moveTo(driver.onScreen(canvas, 0.5, 0.5));
        JLabel read = driver.find("read-out", JLabel.class);
        assertTrue(read.getText().matches("pixel \\d+, \\d+   opacity \\d\\.\\d{3}   light .* coded \\d+ \\d+ \\d+"), read.getText());
        driver.moveTo(driver.onScreen(canvas, 0.01, 0.01));
        assertFalse(read.getText().contains("pixel"));
    }

    @Test
    void exposureChangesWhatIsSeenAndNothingElse() {
        int before = shown();
        driver.key("ctrl UP");
        driver.key("ctrl UP");
        assertEquals(1, showing().exposure(), 0);
        driver.awaitTrue("the picture is brighter", () -> shown() > before);
        assertTrue(driver.state().history().undoName().isEmpty());
        driver.click("easel-as-is");
        assertEquals(0, showing().exposure(), 0);
    }
}
