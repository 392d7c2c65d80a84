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
}
