package org.wispwright.ui.window;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Component;
import java.awt.Dimension;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.desk.Against;
import org.wispwright.ui.desk.Source;

/** The pictures of docs/desk.md, made by doing what it says. Accept new ones with -Dgolden=write. */
class GuidePicturesTest {
    private static final Dimension SIZE = new Dimension(1280, 820);

    @TempDir
    private Path folder;

    @Test
    void theGuidesPicturesAreTrue() throws Exception {
        Path shot = SampleCopy.kilnYard(folder);
        try (DeskDriver driver = new DeskDriver(SIZE)) {
            Golden.check("desk-start", driver.screenshot());
            driver.open(shot);
            driver.await("the original is there", s -> s.takes().size() == 1 && s.work().original().isEmpty());
            driver.click("note-open-a-gap");
            driver.await("its note is open", s -> s.note().filter("open-a-gap"::equals).isPresent());
            Component picture = driver.find("easel-picture", Component.class);
            driver.click("hand-add");
            driver.awaitTrue("the brush can draw", driver::hasLivePicture);
            driver.drag(List.of(driver.onScreen(picture, 0.4, 0.42), driver.onScreen(picture, 0.39, 0.47), driver.onScreen(picture, 0.4, 0.52)));
            settle(driver);
            Golden.check("desk-brush", driver.screenshot());
            driver.key("ctrl Z");
            driver.click("note-lean-the-head");
            driver.await("its note is open", s -> s.note().filter("lean-the-head"::equals).isPresent());
            driver.click("hand-pull");
            driver.awaitTrue("the mesh can be pulled", driver::hasLivePicture);
            settle(driver);
            Golden.check("desk-pull", driver.screenshot());
            driver.click("hand-hold");
            settle(driver);
            Golden.check("desk-hold", driver.screenshot());
            driver.click("hand-look");
            driver.click("take-solve");
            driver.await("the take is there", s -> s.takes().size() == 2 && s.work().running().isEmpty());
            driver.doOnSwing(() -> driver.desk().show(s -> s.withNear(new Source.Take(1)).withFar(Source.ORIGINAL).withAgainst(Against.DIVIDER)));
            settle(driver);
            Golden.check("desk-compare", driver.screenshot());
            assertTrue(driver.state().takes().get(1).met().size() == 2);
        }
        try (DeskDriver driver = new DeskDriver(SIZE, false, 1).open(shot)) {
            driver.await("the takes are there", s -> s.takes().size() == 2);
            settle(driver);
            Golden.check("desk-light", driver.screenshot());
        }
    }

    /** Thumbnails, outlines and figures come beside the work; waits until the window stays as it is. */
    private static void settle(DeskDriver driver) {
        int[] before = {};
        for (int n = 0; n < 60; n++) {
            driver.pause(400);
            java.awt.image.BufferedImage now = driver.screenshot();
            int[] pixels = now.getRGB(0, 0, now.getWidth(), now.getHeight(), null, 0, now.getWidth());
            if (java.util.Arrays.equals(before, pixels) && n > 4) {
                return;
            }
            before = pixels;
        }
    }
}
