package org.wispwright.ui.window;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Component;
import java.awt.Dimension;
import java.awt.Toolkit;
import java.awt.event.InputEvent;
import java.awt.event.MouseEvent;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import java.util.Set;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;

/**
 * 500 things done at random: actions from the list, strokes and drags on the picture, clicks on cards. Nothing is thrown, all that was edited can
 * be undone to the start, and the shot is in order. Expectations: ours.
 */
class MonkeyTest {
    private static final int DEEDS = 500;
    /** They open a window of the platform's, end the session, run for long or write outside the shot. */
    private static final Set<String> LEFT_OUT = Set.of("shot.open", "shot.begin", "shot.sample", "shot.leave", "note.paint-over", "take.solve",
            "take.resume", "take.write-pictures", "take.write-frame", "take.write-sheet", "take.write-files", "look.theme",
            "look.text-larger", "look.text-smaller");

    @TempDir
    private Path folder;

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5})
    void nothingIsThrownAndAllCanBeUndone(long seed) {
        Path shot = SmallShot.in(folder.resolve("shot")).folder();
        Random random = new Random(seed);
        try (DeskDriver driver = new DeskDriver(new Dimension(1280, 800)).open(shot); EventWatch watch = new EventWatch(10_000)) {
            driver.await("the original is there", s -> s.takes().size() == 1 && s.work().original().isEmpty());
            List<Listed> start = driver.state().shot().orElseThrow().notes();
            Component picture = driver.find("easel-picture", Component.class);
            List<DeskAction> actions = driver.window().actions().all().stream().filter(a -> !LEFT_OUT.contains(a.id())).toList();
            for (int n = 0; n < DEEDS; n++) {
                if (random.nextInt(3) == 0) {
                    drag(picture, random);
                } else {
                    DeskAction action = actions.get(random.nextInt(actions.size()));
                    driver.doOnSwing(() -> {
                        if (driver.window().actions().get(action.id()).isEnabled()) {
                            driver.window().actions().get(action.id()).actionPerformed(null);
                        }
                    });
                }
            }
            driver.pause(1000);                                                // some deeds come to their end beside Swing's thread
            driver.await("all is on disk", s -> s.saving().isDone() || s.saving().refused().isPresent());
            assertEquals(List.of(), watch.thrown(), "seed " + seed);
            DeskState end = driver.state();
            assertTrue(end.saving().isDone(), () -> "seed " + seed + ": " + end.saving());
            assertEquals(end.shot().orElseThrow().notes(), NoteEdits.of(ShotFolder.open(shot)).list(), "seed " + seed + ": what is on disk");
            driver.doOnSwing(() -> {
                while (!driver.desk().state().history().made().isEmpty()) {
                    driver.desk().undo();
                }
            });
            driver.await("all is undone on disk", s -> s.saving().isDone());
            assertEquals(start, driver.state().shot().orElseThrow().notes(), "seed " + seed);
            assertEquals(List.of(), watch.thrown(), "seed " + seed);
        }
        assertEquals(List.of(), ShotCheck.of(shot, Long.MAX_VALUE).findings(), "seed " + seed);
    }

    private static void drag(Component picture, Random random) {
        int x = random.nextInt(picture.getWidth());
        int y = random.nextInt(picture.getHeight());
        int modifiers = InputEvent.BUTTON1_DOWN_MASK | (random.nextInt(6) == 0 ? InputEvent.CTRL_DOWN_MASK : 0)
                | (random.nextInt(6) == 0 ? InputEvent.SHIFT_DOWN_MASK : 0);
        post(picture, MouseEvent.MOUSE_MOVED, x, y, 0);
        post(picture, MouseEvent.MOUSE_PRESSED, x, y, modifiers);
        for (int n = random.nextInt(4); n > 0; n--) {
            x += random.nextInt(81) - 40;
            y += random.nextInt(81) - 40;
            post(picture, MouseEvent.MOUSE_DRAGGED, x, y, modifiers);
        }
        post(picture, MouseEvent.MOUSE_RELEASED, x, y, modifiers);
        DeskDriver.onSwing(() -> null);
    }

    private static void post(Component c, int kind, int x, int y, int modifiers) {
        boolean moves = kind == MouseEvent.MOUSE_MOVED || kind == MouseEvent.MOUSE_DRAGGED;
        Toolkit.getDefaultToolkit().getSystemEventQueue().postEvent(new MouseEvent(c, kind, System.currentTimeMillis(), modifiers, x, y, 1, false,
                moves ? MouseEvent.NOBUTTON : MouseEvent.BUTTON1));
    }
}
