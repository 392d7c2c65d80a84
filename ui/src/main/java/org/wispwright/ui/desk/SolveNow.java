package org.wispwright.ui.desk;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.wispwright.optimize.solve.Progress;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.shot.Note;

/**
 * The solve that runs. It works on the notes that were there when it was started.
 *
 * @param shot   the shot then
 * @param choice how it was asked for
 * @param phase  what it does
 * @param wish   what was wished of it last and has not come true yet
 * @param frame  the frame that was simulated last, while frames are simulated
 * @param at     the last accepted iteration
 * @param curve  loss over time, one point an iteration
 * @param got    note id to what its frame looks like now, at the solve's own raster; renewed every few seconds
 */
public record SolveNow(OpenShot shot, SolveChoice choice, Phase phase, Wish wish, Optional<FrameOf> frame, Optional<Progress> at,
                       List<Point> curve, Map<String, Picture> got) {
    /** What a solve does. */
    public enum Phase {
        /** Reads the shot, and looks at the original. */ STARTING,
        /** Searches. */ SEARCHING,
        /** Waits between two iterations. */ PAUSED,
        /** Simulates and writes the take. */ WRITING
    }

    /** What a person wishes of it. */
    public enum Wish {
        /** To go on. */ GO_ON,
        /** To wait after the iteration. */ PAUSE,
        /** To end after the iteration, with a take of what there is. */ KEEP,
        /** To end at once; the records stay. */ STOP
    }

    /**
     * A point of the curve.
     *
     * @param seconds since the solve began, pauses left out
     * @param loss    as a share of the original's
     */
    public record Point(double seconds, double loss) {
    }

    /** A frame of a run. @param number its number @param last the last that will be */
    public record FrameOf(int number, int last) {
    }

    /** Keeps copies. */
    public SolveNow {
        curve = List.copyOf(curve);
        got = Map.copyOf(got);
    }

    /** A solve that was asked for a moment ago. */
    static SolveNow begun(OpenShot shot, SolveChoice choice) {
        return new SolveNow(shot, choice, Phase.STARTING, Wish.GO_ON, Optional.empty(), Optional.empty(), List.of(), Map.of());
    }

    /** The notes that it works on, in the order of {@link Progress#met}. */
    public List<Note> notes() {
        return shot.asItIs().notes();
    }

    /** True if the shot's notes are no longer those that it works on. */
    public boolean isOfOtherNotesThan(OpenShot now) {
        return shot.folder() == now.folder() && !notes().equals(now.asItIs().notes());
    }

    /** True if there is an iteration to keep, and the take is not being written yet. */
    public boolean canBeKept() {
        return at.isPresent() && (phase == Phase.SEARCHING || phase == Phase.PAUSED) && wish != Wish.KEEP && wish != Wish.STOP;
    }

    /** True if it can be paused now. */
    public boolean canBePaused() {
        return (phase == Phase.STARTING || phase == Phase.SEARCHING) && wish == Wish.GO_ON;
    }

    /** True if it waits, or will. */
    public boolean canGoOn() {
        return wish == Wish.PAUSE;
    }

    /** Another phase. */
    SolveNow in(Phase other) {
        return new SolveNow(shot, choice, other, wish, Optional.empty(), at, curve, got);
    }

    /** Another wish. */
    SolveNow with(Wish other) {
        return new SolveNow(shot, choice, phase, other, frame, at, curve, got);
    }

    /** A frame further. */
    SolveNow with(FrameOf other) {
        return new SolveNow(shot, choice, phase, wish, Optional.of(other), at, curve, got);
    }

    /** An iteration further, and so at work on the search unless it waits. */
    SolveNow with(Progress now, List<Point> points, Map<String, Picture> pictures) {
        return new SolveNow(shot, choice, phase == Phase.STARTING ? Phase.SEARCHING : phase, wish, Optional.empty(), Optional.of(now),
                points, pictures);
    }
}
