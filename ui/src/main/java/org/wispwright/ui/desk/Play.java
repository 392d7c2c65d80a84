package org.wispwright.ui.desk;

import java.util.function.LongSupplier;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.ui.desk.Pictures.Ask;

/**
 * Plays the shown take at the shot's rate, round and round. The clock says which frame is due; one whose turn passes while the picture
 * before it is still being drawn is dropped, and counted. Ends when someone else changes the frame, view or shot. Desk's thread.
 */
public final class Play {
    private static final String ASKS = "play";

    private final Desk desk;
    private final LongSupplier nanos;
    private final Ticker ticker;
    private final Runnable told;
    private Runnable stopTicking;
    private OpenShot shot;
    private Showing shown;
    private int firstShown;
    private long began;
    private long at;
    private long dropped;
    private boolean drawn;

    /** Calls something again and again. */
    public interface Ticker {
        /** Begins. @param tick to be called on the desk's thread, several times a frame @return ends it */
        Runnable begin(Runnable tick);
    }

    /**
     * @param nanos the time, nanoseconds from any start
     * @param told  of every change of what is asked here
     */
    public Play(Desk desk, LongSupplier nanos, Ticker ticker, Runnable told) {
        this.desk = desk;
        this.nanos = nanos;
        this.ticker = ticker;
        this.told = told;
    }

    /** True while it plays. */
    public boolean isPlaying() {
        return stopTicking != null;
    }

    /** Frames dropped since it began. */
    public long dropped() {
        return dropped;
    }

    /** True while the picture of the shown frame is still being drawn. */
    boolean waits() {
        return !drawn;
    }

    /** Begins, or ends. Nothing without a shot. */
    public void toggle() {
        if (isPlaying()) {
            stop();
            return;
        }
        DeskState state = desk.state();
        if (state.shot().isEmpty()) {
            return;
        }
        shot = state.shot().get();
        firstShown = state.showing().orElseThrow().frame();
        began = nanos.getAsLong();
        at = 0;
        dropped = 0;
        shows(state.showing().get());
        stopTicking = ticker.begin(this::tick);
        told.run();
    }

    /** Ends; the frame stays. */
    public void stop() {
        if (isPlaying()) {
            stopTicking.run();
            stopTicking = null;
            told.run();
        }
    }

    private void tick() {
        if (!isPlaying()) {
            return;
        }
        Showing now = desk.state().showing().orElse(null);
        if (now == null || now.frame() != shown.frame() || !now.view().equals(shown.view())
                || desk.state().shot().orElseThrow().folder() != shot.folder()) {
            stop();
            return;
        }
        FrameRange range = shot.setup().flow().frames();
        long due = (long) ((nanos.getAsLong() - began) * range.perSecond() / 1e9);
        if (!drawn || due <= at) {
            return;
        }
        dropped += due - at - 1;
        at = due;
        int frame = range.first() + (int) ((firstShown - range.first() + due) % range.count());
        desk.show(s -> s.withFrame(frame));
        shows(now.withFrame(frame));
        told.run();
    }

    /** The next frame waits until this one's picture, or its draft, has been drawn: otherwise no picture would ever be finished. */
    private void shows(Showing next) {
        shown = next;
        drawn = false;
        Source source = next.near() instanceof Source.Wanted ? Source.ORIGINAL : next.near();
        desk.pictures().ask(ASKS, desk.state().shot().orElseThrow(), new Ask(source, next.view(), next.frame(), 0), come -> drawn = true,
                none -> drawn = true);
    }
}
