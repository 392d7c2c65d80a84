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
import org.wispwright.warp.loss.LossChoice;
import org.wispwright.warp.loss.LossKind;
import org.wispwright.warp.loss.PictureLoss;
import org.wispwright.warp.loss.PyramidLoss;

/**
 * Turns a problem into terms: runs the original once, draws its pictures where they are needed, applies the wishes to them.
 *
 * <p>Scales, so that every note starts at its weight: each loss of a note ({@link LossChoice}) has the factor
 * {@code weight share / (its value for the original)}. Met is by the pyramid loss whatever the note is solved with; where that is not
 * among its losses its term has the factor 0. Holds and the
 * stay term start at 0, so they are measured in R, the mean of the notes' pyramid
 * losses for the original: a hold of weight w weighs {@value #HOLD_WEIGHT} w/R,
 * shared by the frames it is looked at (noted frames, and every third); one of the silhouette is measured in S instead, the mean of
 * the notes' silhouette losses for the original, {@value #LEAST_OUTLINE} at the least, for a note may leave outlines alone; the stay term {@value #STAY_WEIGHT}/R on every third frame
 * without a note, in each view that has one, falling to 0 within a third of the range of a noted frame. Frames after the last that anything
 * is wished of are left to themselves: no force acts there, and to pull them back would fight the note.
 */
final class TermPlan {
    /** Measured: at 1 a held view keeps a fifth of its change (root of squares), at 2 less, at 4 and above notes begin to pay. */
    static final double HOLD_WEIGHT = 2;
    /** A loss of so much overlap counts for a held silhouette at least as much as a note, however little the notes change outlines. */
    static final double LEAST_OUTLINE = 0.02;
    static final double STAY_WEIGHT = 0.02;
    static final int EVERY = 3;

    private final SolveProblem problem;
    private final FrameTerms terms;
    private final boolean stay;
    private final Map<Long, Picture> originals = new HashMap<>();
    private final List<NoteTerms> notes = new ArrayList<>();
    private final double startLoss;

    /** The term that measures met, and the terms that the note is solved with; the first may be one of them. */
    private record NoteTerms(Part met, List<Part> parts, LossChoice choice) { }

    /** A term, its loss for the original, and its share of the note's loss there. */
    private record Part(int term, double start, double share) {
        double fallen(double[] losses) {
            return losses[term] / start;
        }
    }

    TermPlan(SolveProblem problem, SmokeSolver solver, SmokeState start, FrameTerms terms, boolean stay, BooleanSupplier cancelled) {
        this.problem = problem;
        this.terms = terms;
        this.stay = stay;
        TreeSet<Long> needed = new TreeSet<>();
        problem.notes().forEach(note -> needed.add(key(note.frame(), note.view())));
        problem.holds().forEach(hold -> framesOf(hold).forEach(frame -> needed.add(key(frame, hold.view()))));
        stayFrames().forEach(frame -> notedViews().forEach(view -> needed.add(key(frame, view))));
        Simulation.run(solver, start, null, null, problem.lastFrame(), cancelled, (frame, state, force) -> {
            NotFinite.in(state, "frame " + frame).ifPresent(bad -> {
                throw new IllegalArgumentException("the original blows up on a grid of " + problem.flow().grid().inWords() + ": " + bad
                        + "; give the shot weaker sources, buoyancy, lift or wind, or more substeps");
            });
            for (int view = 0; view < problem.views().size(); view++) {
                if (needed.contains(key(frame, view))) {
                    originals.put(key(frame, view), terms.picture(state.density(), view));
                }
            }
        });
        startLoss = addNotes();
        double reference = notes.stream().mapToDouble(note -> note.met.start).average().orElseThrow();
        for (SolveProblem.Hold hold : problem.holds()) {
            addHold(hold, hold.held() == SolveProblem.Held.SILHOUETTE ? Math.max(LEAST_OUTLINE, outlines()) : reference);
        }
        addStay(reference);
    }

    private double addNotes() {
        double sum = 0;
        for (SolveProblem.Note note : problem.notes()) {
            Picture original = originals.get(key(note.frame(), note.view()));
            Picture wanted = note.wish().wanted(original);
            float[] weights = note.wish().weights(original);
            PyramidLoss pyramid = new PyramidLoss(wanted, weights);
            double start = pyramid.value(original);
            if (!(start > LossChoice.LEAST_START)) {
                throw new IllegalArgumentException("note '" + note.id() + "': its retouch changes nothing that can be seen on frame "
                        + note.frame() + " (loss of the original " + start
                        + "); check where its strokes and handles lie, or switch it off");
            }
            LossChoice choice = note.wish().losses(original, wanted);
            double share = choice.share(LossKind.PYRAMID);
            Part met = new Part(terms.add(note.frame(), note.view(), pyramid, note.weight() * share / start), start, share);
            List<Part> parts = new ArrayList<>();
            for (LossKind kind : choice.kinds()) {
                parts.add(kind == LossKind.PYRAMID ? met
                        : part(note, kind, kind.of(original, wanted, weights), original, choice.share(kind)));
            }
            notes.add(new NoteTerms(met, parts, choice));
            sum += note.weight();
        }
        return sum;
    }

    private Part part(SolveProblem.Note note, LossKind kind, PictureLoss loss, Picture original, double share) {
        double start = loss.value(original);
        if (!(start > LossChoice.LEAST_START)) {
            throw new IllegalArgumentException("note '" + note.id() + "': its loss '" + kind.word()
                    + "' sees nothing of its retouch on frame " + note.frame() + " (" + start
                    + " for the original); name another, or leave the choice to the program");
        }
        return new Part(terms.add(note.frame(), note.view(), loss, note.weight() * share / start), start, share);
    }

    private void addHold(SolveProblem.Hold hold, double reference) {
        List<Integer> frames = framesOf(hold);
        for (int frame : frames) {
            Picture original = originals.get(key(frame, hold.view()));
            float[] weights = hold.weights().at(original);
            terms.add(frame, hold.view(), hold.held().loss(original, weights), HOLD_WEIGHT * hold.weight() / (reference * frames.size()));
        }
    }

    /** Mean of the notes' silhouette losses for the original: how far they change outlines. */
    private double outlines() {
        double sum = 0;
        for (SolveProblem.Note note : problem.notes()) {
            Picture original = originals.get(key(note.frame(), note.view()));
            Picture wanted = note.wish().wanted(original);
            sum += LossKind.SILHOUETTE.of(original, wanted, note.wish().weights(original)).value(original);
        }
        return sum / problem.notes().size();
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
        TreeSet<Integer> frames = new TreeSet<>();
        hold.spans().forEach(span -> frames.addAll(framesOf(span)));
        return List.copyOf(frames);
    }

    private List<Integer> framesOf(SolveProblem.Span span) {
        FrameRange range = problem.flow().frames();
        List<Integer> frames = new ArrayList<>();
        for (int frame = Math.max(span.first(), range.first() + 1); frame <= Math.min(span.last(), range.last()); frame++) {
            int at = frame;
            boolean noted = problem.notes().stream().anyMatch(note -> note.frame() == at);
            if (noted || (frame - range.first()) % EVERY == 0) {
                frames.add(frame);
            }
        }
        if (frames.isEmpty() && span.last() > range.first()) {
            frames.add(Math.min(span.last(), range.last()));                   // a span of a frame or two between those looked at
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

    /** Met of each note, from the terms' losses: by the pyramid loss, whatever the note is solved with. */
    List<Double> met(double[] losses) {
        return notes.stream().map(note -> 1 - note.met.fallen(losses)).toList();
    }

    /** Copies of the notes' pictures as the last evaluation drew them, in the problem's order. */
    List<Picture> got() {
        return problem.notes().stream().map(note -> terms.last(note.frame(), note.view())).toList();
    }

    /** What each note is solved with, and how far that has fallen. */
    List<SolveResult.NoteLoss> noteLosses(double[] losses) {
        return notes.stream().map(note -> new SolveResult.NoteLoss(note.choice,
                1 - note.parts.stream().mapToDouble(part -> part.share * part.fallen(losses)).sum())).toList();
    }
}
