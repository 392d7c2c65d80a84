package org.wispwright.optimize.solve;

import java.util.List;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.render.march.Look;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;

/**
 * What is wished of a shot.
 *
 * @param flow  the simulation
 * @param views the cameras that notes and holds speak of
 * @param look  how density shows
 * @param notes at least one
 * @param holds regions of pictures that must stay as in the original
 */
public record SolveProblem(FlowSetup flow, List<View> views, Look look, List<Note> notes, List<Hold> holds) {

    /** Share of a pixel's weight where a note's retouch does not reach, so that the rest of the frame stays put. */
    public static final float WEIGHT_ELSEWHERE = 0.5f;

    /**
     * One wish on one frame.
     *
     * @param id     for messages and reports
     * @param frame  inside the shot's frames and not its first, which no force reaches
     * @param view   index in the problem's views
     * @param weight above 0; 1 is usual
     * @param wish   what is wanted
     */
    public record Note(String id, int frame, int view, double weight, Wish wish) {
        /** Checks the weight. @throws IllegalArgumentException naming the note */
        public Note {
            if (!(weight > 0) || Double.isInfinite(weight)) {
                throw new IllegalArgumentException("note '" + id + "': got a weight of " + weight + ", needs a finite number above 0");
            }
        }
    }

    /**
     * A region that must stay as in the original.
     *
     * @param id         for messages
     * @param view       index in the problem's views
     * @param firstFrame first frame held
     * @param lastFrame  last frame held, not before the first
     * @param weights    1 in the region, 0 elsewhere, feathered
     */
    public record Hold(String id, int view, int firstFrame, int lastFrame, PixelWeights weights) {
    }

    /** Weights of an original picture's pixels, at any raster. */
    @FunctionalInterface
    public interface PixelWeights {
        /** One weight a pixel, 0..1, row 0 at the top. */
        float[] at(Picture original);
    }

    /** Copies the lists and checks what refers to what. @throws IllegalArgumentException naming what is off */
    public SolveProblem {
        views = List.copyOf(views);
        notes = List.copyOf(notes);
        holds = List.copyOf(holds);
        if (notes.isEmpty()) {
            throw new IllegalArgumentException("solve: the shot has no note that is on; add one, or there is nothing to reach");
        }
        for (Note note : notes) {
            if (note.view() < 0 || note.view() >= views.size()) {
                throw new IllegalArgumentException("note '" + note.id() + "': got view " + note.view() + ", there are " + views.size());
            }
            if (!flow.frames().contains(note.frame()) || note.frame() == flow.frames().first()) {
                throw new IllegalArgumentException("note '" + note.id() + "': frame " + note.frame() + " is not one that a force can change; needs "
                        + (flow.frames().first() + 1) + " to " + flow.frames().last());
            }
        }
        for (Hold hold : holds) {
            if (hold.view() < 0 || hold.view() >= views.size() || hold.lastFrame() < hold.firstFrame()) {
                throw new IllegalArgumentException("hold '" + hold.id() + "': got view " + hold.view() + ", frames " + hold.firstFrame() + " to "
                        + hold.lastFrame() + "; needs one of " + views.size() + " views and the last frame not before the first");
            }
        }
    }

    /** The same wishes on another grid of the same box. */
    public SolveProblem on(GridShape grid) {
        return new SolveProblem(flow.on(grid), views, look, notes, holds);
    }

    /** The last frame that anything is wished of; later frames take no part in a solve. */
    int lastFrame() {
        int last = notes.stream().mapToInt(Note::frame).max().orElseThrow();
        for (Hold hold : holds) {
            last = Math.max(last, Math.min(hold.lastFrame(), flow.frames().last()));
        }
        return last;
    }
}
