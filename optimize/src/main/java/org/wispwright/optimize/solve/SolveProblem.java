package org.wispwright.optimize.solve;

import java.util.List;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.render.march.Look;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.warp.loss.LossKind;
import org.wispwright.warp.loss.PictureLoss;

/**
 * What is wished of a shot.
 *
 * @param flow  the simulation
 * @param views the cameras that notes and holds speak of
 * @param look  how density shows
 * @param notes at least one
 * @param holds what must stay as in the original
 * @param sources whether the sources' strengths may change too, beside the force
 */
public record SolveProblem(FlowSetup flow, List<View> views, Look look, List<Note> notes, List<Hold> holds, boolean sources) {

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
     * What must stay as in the original: a part of a view's pictures, or all of it, over spans of frames. Any view may be held,
     * whether or not a note was drawn in it.
     *
     * @param id      for messages
     * @param view    index in the problem's views
     * @param spans   at least one
     * @param held    what of the picture stays
     * @param weight  above 0; 1 is usual
     * @param weights 1 in the region, 0 elsewhere, feathered
     */
    public record Hold(String id, int view, List<Span> spans, Held held, double weight, PixelWeights weights) {
        /** Copies the list and checks the weight. @throws IllegalArgumentException naming the hold */
        public Hold {
            spans = List.copyOf(spans);
            if (spans.isEmpty() || !(weight > 0) || Double.isInfinite(weight)) {
                throw new IllegalArgumentException("hold '" + id + "': got " + spans.size() + " spans of frames and a weight of " + weight
                        + ", needs at least one and a finite number above 0");
            }
        }
    }

    /**
     * Frames one after the other.
     *
     * @param first first frame
     * @param last  last frame, not before the first
     */
    public record Span(int first, int last) {
        /** Checks the order. @throws IllegalArgumentException if the last comes before the first */
        public Span {
            if (last < first) {
                throw new IllegalArgumentException("hold: got frames " + first + " to " + last + ", needs the last not before the first");
            }
        }

        /** True if the frame is in it. */
        public boolean contains(int frame) {
            return frame >= first && frame <= last;
        }
    }

    /** What of a picture a hold keeps, and the loss by which it is kept against the original's picture. */
    public enum Held {
        /** Colour and opacity at all scales: {@link LossKind#PYRAMID}. */
        PICTURE(LossKind.PYRAMID),
        /** The outline alone, whatever happens inside it: {@link LossKind#SILHOUETTE}. */
        SILHOUETTE(LossKind.SILHOUETTE);

        private final LossKind kind;

        Held(LossKind kind) {
            this.kind = kind;
        }

        /** How far a picture is from the held one. */
        PictureLoss loss(Picture held, float[] weights) {
            return kind.of(held, held, weights);
        }
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
            if (hold.view() < 0 || hold.view() >= views.size()) {
                throw new IllegalArgumentException("hold '" + hold.id() + "': got view " + hold.view() + ", there are " + views.size());
            }
        }
    }

    /** To be reached by a force alone. */
    public SolveProblem(FlowSetup flow, List<View> views, Look look, List<Note> notes, List<Hold> holds) {
        this(flow, views, look, notes, holds, false);
    }

    /** The same wishes on another grid of the same box. */
    public SolveProblem on(GridShape grid) {
        return new SolveProblem(flow.on(grid), views, look, notes, holds, sources);
    }

    /** The same wishes, with or without the sources' strengths among what may change. */
    public SolveProblem withSources(boolean change) {
        return new SolveProblem(flow, views, look, notes, holds, change);
    }

    /** The last frame that anything is wished of; later frames take no part in a solve. */
    int lastFrame() {
        int last = notes.stream().mapToInt(Note::frame).max().orElseThrow();
        for (Hold hold : holds) {
            for (Span span : hold.spans()) {
                last = Math.max(last, Math.min(span.last(), flow.frames().last()));
            }
        }
        return last;
    }
}
