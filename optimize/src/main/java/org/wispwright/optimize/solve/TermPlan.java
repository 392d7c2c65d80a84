package org.wispwright.optimize.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import java.util.function.BooleanSupplier;
import java.util.stream.IntStream;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.loss.PyramidLoss;

/**
 * Turns a problem into terms: runs the original once, draws its pictures where they are needed, applies the wishes to them.
 *
 * <p>Scales, so that every note starts at its weight: a note's term is {@code weight / (its loss for the original)}. Holds and the
 * stay term start at 0, so they are measured in R, the mean of the notes' losses for the original: a hold weighs {@value #HOLD_WEIGHT}/R,
 * shared by the frames it is looked at (noted frames, and every third); the stay term {@value #STAY_WEIGHT}/R on every third frame
 * without a note, in each view that has one, falling to 0 within a third of the range of a noted frame. Frames after the last that anything
 * is wished of are left to themselves: no force acts there, and to pull them back would fight the note.
 */
final class TermPlan {
    static final double HOLD_WEIGHT = 1;
    static final double STAY_WEIGHT = 0.02;
    static final int EVERY = 3;

    private final SolveProblem problem;
    private final FrameTerms terms;
    private final boolean stay;
    private final Map<Long, Picture> originals = new HashMap<>();
    private final int[] noteTerms;
    private final double[] noteStarts;
    private final double startLoss;

    TermPlan(SolveProblem problem, SmokeSolver solver, SmokeState start, FrameTerms terms, boolean stay, BooleanSupplier cancelled) {
        this.problem = problem;
        this.terms = terms;
        this.stay = stay;
        TreeSet<Long> needed = new TreeSet<>();
        problem.notes().forEach(note -> needed.add(key(note.frame(), note.view())));
        problem.holds().forEach(hold -> framesOf(hold).forEach(frame -> needed.add(key(frame, hold.view()))));
        stayFrames().forEach(frame -> notedViews().forEach(view -> needed.add(key(frame, view))));
        Simulation.run(solver, start, null, null, problem.lastFrame(), cancelled, (frame, state, force) -> {
            for (int view = 0; view < problem.views().size(); view++) {
                if (needed.contains(key(frame, view))) {
                    originals.put(key(frame, view), terms.picture(state.density(), view));
                }
            }
        });
        noteTerms = new int[problem.notes().size()];
        noteStarts = new double[problem.notes().size()];
        startLoss = addNotes();
        double reference = IntStream.range(0, noteStarts.length).mapToDouble(n -> noteStarts[n]).average().orElseThrow();
        for (SolveProblem.Hold hold : problem.holds()) {
            addHold(hold, reference);
        }
        addStay(reference);
    }

    private double addNotes() {
        double sum = 0;
        for (int n = 0; n < noteTerms.length; n++) {
            SolveProblem.Note note = problem.notes().get(n);
            Picture original = originals.get(key(note.frame(), note.view()));
            PyramidLoss loss = new PyramidLoss(note.wish().wanted(original), note.wish().weights(original));
            noteStarts[n] = loss.value(original);
            if (!(noteStarts[n] > 1e-9)) {
                throw new IllegalArgumentException("note '" + note.id() + "': its retouch changes nothing that can be seen on frame " + note.frame()
                        + " (loss of the original " + noteStarts[n] + "); check where its strokes and handles lie, or switch it off");
            }
            noteTerms[n] = terms.add(note.frame(), note.view(), loss, note.weight() / noteStarts[n]);
            sum += note.weight();
        }
        return sum;
    }

    private void addHold(SolveProblem.Hold hold, double reference) {
        List<Integer> frames = framesOf(hold);
        for (int frame : frames) {
            Picture original = originals.get(key(frame, hold.view()));
            float[] weights = hold.weights().at(original);
            terms.add(frame, hold.view(), new PyramidLoss(original, weights), HOLD_WEIGHT / (reference * frames.size()));
        }
    }

    private void addStay(double reference) {
        for (int frame : stayFrames()) {
            double ramp = ramp(frame);
            for (int view : notedViews()) {
                Picture original = originals.get(key(frame, view));
                float[] weights = new float[original.width() * original.height()];
                java.util.Arrays.fill(weights, 1f);
                if (ramp > 0) {
                    terms.add(frame, view, new PyramidLoss(original, weights), STAY_WEIGHT * ramp / reference);
                }
            }
        }
    }

    /** Share of the stay term's weight: 0 on a noted frame, 1 from a third of the range away. */
    private double ramp(int frame) {
        FrameRange range = problem.flow().frames();
        int nearest = problem.notes().stream().mapToInt(note -> Math.abs(note.frame() - frame)).min().orElseThrow();
        return Math.min(1, nearest / (range.count() / 3.0));
    }

    private List<Integer> stayFrames() {
        FrameRange range = problem.flow().frames();
        if (!stay) {
            return List.of();
        }
        return IntStream.rangeClosed(range.first() + 1, problem.lastFrame())
                .filter(frame -> (frame - range.first()) % EVERY == 0)
                .filter(frame -> problem.notes().stream().noneMatch(note -> note.frame() == frame))
                .boxed().toList();
    }

    private List<Integer> notedViews() {
        return problem.notes().stream().map(SolveProblem.Note::view).distinct().sorted().toList();
    }

    private List<Integer> framesOf(SolveProblem.Hold hold) {
        FrameRange range = problem.flow().frames();
        List<Integer> frames = new ArrayList<>();
        for (int frame = Math.max(hold.firstFrame(), range.first() + 1); frame <= Math.min(hold.lastFrame(), range.last()); frame++) {
            int at = frame;
            boolean noted = problem.notes().stream().anyMatch(note -> note.frame() == at);
            if (noted || (frame - range.first()) % EVERY == 0) {
                frames.add(frame);
            }
        }
        if (frames.isEmpty() && hold.lastFrame() > range.first()) {
            frames.add(Math.min(hold.lastFrame(), range.last()));              // a hold of a frame or two between those looked at
        }
        return frames;
    }

    private static long key(int frame, int view) {
        return (long) frame << 20 | view;
    }

    /** The loss of the original: the sum of the notes' weights. */
    double startLoss() {
        return startLoss;
    }

    /** Met of each note, from the terms' losses. */
    List<Double> met(double[] losses) {
        return IntStream.range(0, noteTerms.length).mapToObj(n -> 1 - losses[noteTerms[n]] / noteStarts[n]).toList();
    }
}
