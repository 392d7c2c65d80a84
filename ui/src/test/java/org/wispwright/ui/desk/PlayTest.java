package org.wispwright.ui.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.command.SmallShot;

/** Playing with a clock set by hand: 24 frames a second, so frame n is due at n / 24 s. Expectations: by that arithmetic. */
class PlayTest {
    private static final double SECONDS_PER_FRAME = 1 / 24.0;

    @TempDir
    private Path folder;
    private long now;
    private Runnable tick;

    private Play play(WindowlessDesk d) {
        d.desk.show(s -> s.withFrame(1001));
        Play play = new Play(d.desk, () -> now, t -> {
            tick = t;
            return () -> tick = null;
        }, () -> { });
        play.toggle();
        return play;
    }

    private void tickAt(double frames) {
        now = Math.round(frames * SECONDS_PER_FRAME * 1e9) + 1;
        tick.run();
    }

    private int frame(WindowlessDesk d) {
        return d.desk.state().showing().orElseThrow().frame();
    }

    /** Lets the picture come, or the word that there is none. */
    private void drawn(WindowlessDesk d, Play play) {
        d.until("the picture has come", () -> !play.waits());
    }

    @Test
    void aFrameIsDroppedWhenItsTurnPassesBeforeThePictureIsThere() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            Play play = play(d);
            tickAt(1.5);                                                       // the first picture is not there yet
            assertEquals(1001, frame(d));
            drawn(d, play);
            tickAt(1.5);
            assertEquals(1002, frame(d));
            assertEquals(0, play.dropped());
            tickAt(4.2);
            assertEquals(1002, frame(d));
            drawn(d, play);
            tickAt(4.2);
            assertEquals(1005, frame(d));
            assertEquals(2, play.dropped());
            drawn(d, play);
            tickAt(7.1);                                                       // six frames in all: round to the first, and one on
            assertEquals(1002, frame(d));
            assertEquals(4, play.dropped());
            assertTrue(play.isPlaying());
        }
    }

    @Test
    void itEndsWhenSomeoneElseChangesTheFrame() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            Play play = play(d);
            d.desk.show(s -> s.withFrame(1004));
            tickAt(1);
            assertFalse(play.isPlaying());
            assertEquals(1004, frame(d));
            assertEquals(null, tick);
        }
    }
}
