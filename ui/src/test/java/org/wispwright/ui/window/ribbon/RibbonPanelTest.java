package org.wispwright.ui.window.ribbon;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Component;
import java.awt.Dimension;
import java.awt.event.MouseEvent;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import javax.swing.JComponent;
import javax.swing.JLabel;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.desk.DeskState;
import org.wispwright.ui.desk.NoteEdit;
import org.wispwright.ui.desk.SolvedShot;
import org.wispwright.ui.window.DeskDriver;
import org.wispwright.ui.window.DeskWindow;
import org.wispwright.ui.window.Palette;

/** The frames as a person goes over them: six, 1001 to 1006, notes on 1004 (front) and 1006 (side). Expectations: by hand. */
class RibbonPanelTest {
    @TempDir
    private static Path made;
    private static Path shot;

    @BeforeAll
    static void solve() {
        shot = SolvedShot.in(made.resolve("yard"));
    }

    private static int frame(DeskDriver d) {
        return d.state().showing().orElseThrow().frame();
    }

    private static void awaitFrame(DeskDriver d, int frame) {
        d.await("frame " + frame + " is shown", s -> s.showing().orElseThrow().frame() == frame);
    }

    private static void awaitPlot(DeskDriver d) {
        d.awaitTrue("the plot and the pictures", () -> {
            DeskState s = d.desk().state();
            return IntStream.rangeClosed(1001, 1006).allMatch(f -> d.desk().change().of(s.shot().orElseThrow(), 1,
                    s.showing().orElseThrow().view(), f).isPresent());
        });
    }

    @Test
    void draggingGoesOverTheFrames() throws IOException {
        try (DeskDriver d = new DeskDriver(new Dimension(1440, 900)).open(shot)) {
            JComponent strip = d.find("strip", JComponent.class);
            d.drag(List.of(d.onScreen(strip, 0.02, 0.5), d.onScreen(strip, 0.3, 0.5), d.onScreen(strip, 0.75, 0.5)));
            awaitFrame(d, 1005);
            d.key("LEFT");
            awaitFrame(d, 1004);
            d.key("RIGHT");
            awaitFrame(d, 1005);
            d.key("RIGHT");
            awaitFrame(d, 1006);
            d.key("RIGHT");
            awaitFrame(d, 1006);
            awaitPlot(d);
            d.keepScreenshot("ribbon-dark");
        }
    }

    @Test
    void aPinGoesToItsNoteAndTellsItsWords() {
        try (DeskDriver d = new DeskDriver(DeskWindow.SMALLEST, false, 1).open(shot)) {
            RibbonStrip strip = d.find("strip", RibbonStrip.class);
            awaitPlot(d);
            int pins = DeskDriver.onSwing(() -> strip.getFontMetrics(Palette.small()).getHeight() + 6);
            double y = (double) pins / strip.getHeight();
            d.clickAt(d.onScreen(strip, 5.5 / 6, y));
            d.await("the note is open", s -> s.note().equals(Optional.of("open")));
            assertEquals(List.of(1006, "side"), List.of(frame(d), d.state().showing().orElseThrow().view()));
            assertEquals("1006 \u00b7 side: Open a gap.", tip(strip, 5.5 / 6, pins));
            assertEquals("frame 1002", tip(strip, 1.5 / 6, pins));
            awaitPlot(d);
            d.keepScreenshot("ribbon-light");
        }
    }

    private static String tip(RibbonStrip strip, double x, int y) {
        return DeskDriver.onSwing(() -> strip.getToolTipText(new MouseEvent(strip, MouseEvent.MOUSE_MOVED, 0, 0,
                (int) (x * strip.getWidth()), y, 0, false)));
    }

    @Test
    void stepsAndJumpsByButtonsAndKeys() {
        try (DeskDriver d = new DeskDriver(new Dimension(1440, 900), true, 2).open(shot)) {
            d.click("frame-first");
            awaitFrame(d, 1001);
            d.click("frame-next");
            awaitFrame(d, 1002);
            d.click("frame-next-note");
            awaitFrame(d, 1004);
            d.key("shift PERIOD");
            awaitFrame(d, 1006);
            d.key("COMMA");
            awaitFrame(d, 1005);
            d.key("HOME");
            awaitFrame(d, 1001);
            d.key("PERIOD");
            awaitFrame(d, 1002);
            d.key("END");
            awaitFrame(d, 1006);
            awaitPlot(d);
            d.keepScreenshot("ribbon-200");
        }
    }

    @Test
    void playsUntilSomeoneGoesElsewhere() {
        try (DeskDriver d = new DeskDriver(new Dimension(1440, 900), true, 1).open(shot)) {
            int before = frame(d);
            d.key("SPACE");
            d.await("it goes on", s -> s.showing().orElseThrow().frame() != before);
            JLabel said = d.find("ribbon-said", JLabel.class);
            assertTrue(DeskDriver.onSwing(said::getText).matches("playing 24/s, \\d+ dropped"), said.getText());
            d.key("SPACE");
            d.awaitTrue("it has ended", () -> said.getText().equals("6 frames, 24/s"));
            d.find("frame-play", Component.class);
        }
    }

    @Test
    void anOffNoteAndAHoldAreTold() {
        try (DeskDriver d = new DeskDriver(new Dimension(1440, 900), true, 1).open(shot)) {
            RibbonStrip strip = d.find("strip", RibbonStrip.class);
            d.doOnSwing(() -> d.desk().edit(NoteEdit.on("Off", "open", false)));
            int small = DeskDriver.onSwing(() -> strip.getFontMetrics(Palette.small()).getHeight());
            assertEquals("1006 \u00b7 side, off: Open a gap.", tip(strip, 5.5 / 6, small + 6));
            RibbonRows rows = DeskDriver.onSwing(() -> RibbonRows.of(strip.getFontMetrics(Palette.small()),
                    strip.getHeight()));
            assertEquals("held on frames 1004 to 1004, holds: 1", tip(strip, 3.5 / 6, rows.holds() + 2));
            d.keepScreenshot("ribbon-off");
            d.key("ctrl Z");
            d.await("on disk", s -> s.saving().isDone());
        }
    }
}
