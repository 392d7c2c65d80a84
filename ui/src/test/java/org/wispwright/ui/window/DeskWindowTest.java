package org.wispwright.ui.window;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Dimension;
import java.nio.file.Path;
import javax.swing.JDialog;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.desk.Message;

/** The window as a whole. Expectations: ours, by the desk's own words. */
class DeskWindowTest {
    @TempDir
    private Path folder;

    @Test
    void aShotIsOpenedAndNamedInTheTitle() throws Exception {
        Path shot = SampleCopy.kilnYard(folder);
        try (DeskDriver driver = new DeskDriver(new Dimension(1440, 900)).open(shot)) {
            assertEquals("Kiln yard \u2013 Wispwright", driver.window().frame().getTitle());
            driver.keepScreenshot("opened");
            driver.key("ctrl F");
            driver.find("finder", JDialog.class);
            driver.key("ESCAPE");
        }
    }

    @Test
    void whatIsNoShotIsSaidAndTheDeskStaysEmpty() {
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST)) {
            driver.doOnSwing(() -> driver.desk().open(folder));
            driver.await("a fault is said", s -> s.message().filter(m -> m.kind() == Message.Kind.FAULT).isPresent());
            assertTrue(driver.state().message().orElseThrow().words().contains("shot.json"));
            assertTrue(driver.state().shot().isEmpty());
        }
    }
}
