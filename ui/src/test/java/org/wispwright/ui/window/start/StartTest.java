package org.wispwright.ui.window.start;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Dimension;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import javax.swing.JLabel;
import javax.swing.JTextField;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.desk.Memory;
import org.wispwright.ui.window.DeskDriver;
import org.wispwright.ui.window.DeskWindow;

/** Beginnings and ends of a session. Expectations: ours. */
class StartTest {
    @TempDir
    private Path folder;

    private Memory memory() {
        return new Memory(folder.resolve("settings/desk.properties"));
    }

    @Test
    void theFirstStartShowsTheWaysInAndWhatTheToolIsNotFor() {
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST, memory(), true, 1)) {
            driver.find("start-open", javax.swing.JButton.class);
            driver.find("start-sample", javax.swing.JButton.class);
            assertTrue(driver.find("start-caution", JLabel.class).getText().contains("does not predict real smoke, fire or safety"));
            driver.keepScreenshot("start");
        }
    }

    @Test
    void theSampleIsCopiedBelowTheHomeFolderAndOpened() {
        String home = System.getProperty("user.home");
        System.setProperty("user.home", folder.toString());
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST, memory(), false, 1)) {
            driver.keepScreenshot("start-light");
            driver.click("start-sample");
            driver.await("the sample is open", s -> s.shot().isPresent());
            assertEquals("Kiln yard", driver.state().shot().orElseThrow().setup().name());
            assertTrue(Files.isRegularFile(folder.resolve("Wispwright/kiln-yard/shot.json")));
        } finally {
            System.setProperty("user.home", home);
        }
    }

    @Test
    void shotsThemeAndPlaceAreRememberedAndAShotIsOpenedAgain() {
        Path shot = SmallShot.in(folder.resolve("shot")).folder();
        try (DeskDriver driver = new DeskDriver(new Dimension(1100, 740), memory(), true, 1).open(shot)) {
            assertTrue(driver.state().shot().isPresent());
            assertEquals(Optional.of(shot.toAbsolutePath()), memory().now().open(), "there while the desk is open");
        }
        assertEquals(Optional.empty(), memory().now().open());
        assertEquals(List.of(0, 0, 1100, 740), memory().now().window().orElseThrow());
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST, memory(), true, 1)) {
            driver.click("recent-shot");
            driver.await("it is open", s -> s.shot().isPresent());
        }
    }

    @Test
    void afterADeskThatDidNotEndByItselfTheShotIsOfferedAndNothingIsLost() {
        Path shot = SmallShot.in(folder.resolve("shot")).folder();
        memory().change(m -> m.opened(shot));                                  // as a desk that was killed leaves it
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST, memory(), true, 1)) {
            assertTrue(driver.find("start-left", JLabel.class).getText().contains("shot"));
            driver.click("start-again");
            driver.await("it is open", s -> s.shot().isPresent());
        }
    }

    @Test
    void settingsThatAreDamagedAreForgottenAndWrittenAnew() throws IOException {
        Path file = Files.createDirectories(folder.resolve("settings")).resolve("desk.properties");
        Files.writeString(file, "window=1,2\ntextScale=x\n");
        assertEquals(org.wispwright.ui.desk.Remembered.NOTHING, memory().now());
        memory().change(m -> m.withTextScale(5));
        assertEquals(2, memory().now().textScale(), 0);
    }

    /** Frames are the sample's own. */
    @Test
    void aShotIsBegunFromAFolderOfFrames() throws IOException {
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST, memory(), true, 1)) {
            driver.click("start-begin");
            driver.keepScreenshot("begin");
            text(driver, "begin-title", "Yard at night");
            text(driver, "begin-below", folder.toString());
            text(driver, "begin-frames", Path.of("..", "samples", "kiln-yard", "frames").toAbsolutePath().normalize().toString());
            driver.doOnSwing(() -> driver.find("begin-frames", JTextField.class).postActionEvent());
            driver.click("begin-next");
            text(driver, "begin-cells", "8 10");
            driver.click("begin-next");
            driver.awaitTrue("the raster is the frames' own", () -> "540 720".equals(driver.find("begin-raster", JTextField.class).getText()));
            driver.click("begin-next");
            driver.click("begin-next");
            JLabel said = driver.find("begin-message", JLabel.class);
            assertTrue(said.getText().contains("found \"8 10\", needs 3 number(s)"), said.getText());
            driver.click("begin-back");
            driver.click("begin-back");
            text(driver, "begin-cells", "8 10 8");
            driver.click("begin-next");
            driver.click("begin-next");
            driver.click("begin-next");
            driver.awaitTrue("what is wrong is said", () -> said.getText().contains("source"));
            assertTrue(Files.notExists(folder.resolve("yard-at-night")), "no half shot is left");
            text(driver, "begin-source", "0.4 0.3 0.4");
            text(driver, "begin-radius", "0.2");
            driver.click("begin-back");
            text(driver, "begin-aim", "0.4 0.5 0.4");
            text(driver, "begin-position", "0.4 0.5 4");
            driver.click("begin-next");
            driver.click("begin-next");
            driver.await("the shot is open", s -> s.shot().isPresent());
            assertEquals("Yard at night", driver.state().shot().orElseThrow().setup().name());
            assertTrue(Files.isRegularFile(folder.resolve("yard-at-night/frames/front.1027.png")));
        }
    }

    private static void text(DeskDriver driver, String field, String value) {
        driver.doOnSwing(() -> driver.find(field, JTextField.class).setText(value));
    }
}
