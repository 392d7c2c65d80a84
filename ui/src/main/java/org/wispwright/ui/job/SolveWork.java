package org.wispwright.ui.job;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Locale;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.optimize.solve.Simulation;
import org.wispwright.optimize.solve.Solve;
import org.wispwright.optimize.solve.SolveCancelled;
import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.optimize.solve.SolveResult;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotDigest;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.TakeDraft;
import org.wispwright.ui.shot.TakeRecord;
import org.wispwright.ui.shot.Takes;
import org.wispwright.warp.loss.LossChoice;

/** Solves a shot's notes and adds a take. Makes take 0 first if it is not there. Same bits for any number of lanes. */
public final class SolveWork {
    private SolveWork() {
    }

    /**
     * How to solve.
     *
     * @param memoryBytes that all of it may take; what the work itself does not need goes to the states that a sweep keeps
     * @param diskBytes that states may take in the shot's folder when memory does not hold them all; 0 for none
     * @param until when to end before the program's own rule does
     * @param stay false leaves the stay term out; only to measure what it does
     * @param sources whether the sources' strengths may change too
     * @param quality how far it climbs
     * @param beginning where it begins
     */
    public record Manner(long memoryBytes, long diskBytes, StopRule until, boolean stay, boolean sources, Quality quality,
                         Beginning beginning) {
        /** A whole solve from the beginning, whatever an unfinished one has left. */
        public Manner(long memoryBytes, StopRule until, boolean stay) {
            this(memoryBytes, 0, until, stay, false, Quality.FINAL, Beginning.ANEW);
        }
    }

    /**
     * What came out.
     *
     * @param take the new take's number
     * @param flow what was simulated
     * @param asked how much smoke each note wants
     * @param solve what the search found
     * @param comparison the new take against the original, note by note
     * @param divergenceMax largest |div u| h / |u| of any frame
     * @param massRatio smoke in the last frame as a share of the original's
     * @param forceRms root mean square of the force over box and range, m/s2
     * @param departure see {@link Departure}
     * @param seconds wall time of it all
     */
    public record Result(int take, FlowSetup flow, List<SmokeAsked> asked, SolveResult solve, Comparison comparison, double divergenceMax, double massRatio, double forceRms,
                         Departure departure, double seconds) {
    }

    /** Digest of the problem that a solve of the shot as it is on disk would have; records of other problems are not gone on with. */
    public static String digest(ShotFolder folder, boolean stay, boolean sources) {
        return ShotDigest.of(folder, "stay " + stay + " sources " + sources);
    }

    /** Runs the solve of a shot that was just read from disk; see the other. */
    public static Result run(ShotFolder folder, Shot shot, Manner manner, Lanes lanes, Progress progress, Cancel cancel) {
        return run(folder, shot, digest(folder, manner.stay(), manner.sources()), manner, lanes, progress, cancel);
    }

    /**
     * Runs the solve.
     *
     * @param digest {@link #digest} of the files that the shot was read from; they may change while it runs
     * @throws ShotException if the shot has no note, a note wants nothing, the memory does not hold one state, a take 0 of another
     *     set-up is there, or the disk refuses
     * @throws Cancel.Cancelled if cancelled; no half take is left, and what the search had found can be gone on with
     */
    public static Result run(ShotFolder folder, Shot asRead, String digest, Manner manner, Lanes lanes, Progress progress, Cancel cancel) {
        long start = System.nanoTime();
        ShotProblem.of(asRead);
        if (manner.sources() && asRead.flow().sources().isEmpty()) {
            throw new ShotException(new Finding("shot.json", "/sources",
                    "the shot has no source whose strength could change; solve without --sources, or add one."));
        }
        SimulateWork.Result original = SimulateWork.run(folder, asRead, lanes, progress, cancel);
        Shot shot = asRead.withFlow(original.flow());
        SolveProblem problem = ShotProblem.of(shot).withSources(manner.sources());
        List<SmokeAsked> asked = SmokeAsked.ofAll(Takes.of(folder), shot, lanes);
        asked.stream().filter(SmokeAsked::isWorthTelling).forEach(smoke -> progress.milestone(smoke.inWords(manner.sources())));
        try (SolveSearch search = SolveSearch.begin(folder, digest, problem, manner, progress)) {
            progress.milestone("estimate: " + Estimate.of(manner.quality(), shot, manner.memoryBytes(), manner.diskBytes(), lanes, cancel)
                    .inWords());
            SolveResult solve = search.run(lanes, cancel);
            progress.writesTake();
            Result result = take(folder, shot, manner, original, asked, solve, search, lanes, progress, cancel, start);
            search.over();
            return result;
        }
    }

    private static Result take(ShotFolder folder, Shot shot, Manner manner, SimulateWork.Result original, List<SmokeAsked> asked, SolveResult solve,
                               SolveSearch search, Lanes lanes, Progress progress, Cancel cancel, long start) {
        FlowSetup flow = shot.flow();
        Takes takes = Takes.of(folder);
        for (int n = 0; n < solve.noteLosses().size(); n++) {
            LossChoice choice = solve.noteLosses().get(n).choice();
            progress.milestone("note " + shot.notes().get(n).id() + ": solved with loss " + choice.inWords() + " (" + choice.why() + ")");
        }
        double forceRms = norm(solve.unknowns());
        try (TakeDraft draft = takes.draft()) {
            SmokeSolver solver = new SmokeSolver(flow, lanes);
            FrameWriting writing = new FrameWriting(flow, solver, draft, "take", progress);
            ForceBasis basis = Solve.basis(flow, lanes);
            Simulation.run(solver, flow.startState(), basis, solve.unknowns(), solve.strengths().orElse(null), flow.frames().last(),
                    cancel::wished, writing);
            draft.writeForce(solve.unknowns());
            if (solve.strengths().isPresent()) {
                draft.writeSources(SourceStrengths.json(flow, solve.strengths().get()));
            }
            draft.writeSearch(search.end());
            double massRatio = original.lastMass() > 0 ? writing.lastMass() / original.lastMass() : 1;
            cancel.stopIfWished();
            int take = draft.finish(record(shot, manner, asked, solve, writing, massRatio, forceRms));
            Comparison comparison = CompareWork.compare(folder, shot, 0, take, lanes, progress, new Cancel());
            Departure departure = Departure.of(shot, frame -> takes.density(0, frame, flow), frame -> takes.density(take, frame, flow),
                    lanes, new Cancel());
            return new Result(take, flow, asked, solve, comparison, writing.divergenceMax(), massRatio, forceRms, departure,
                    (System.nanoTime() - start) / 1e9);
        } catch (SolveCancelled wished) {
            throw new Cancel.Cancelled();
        }
    }

    /** Nothing in it depends on threads, memory or the clock: the same shot gives the same bytes. */
    private static TakeRecord record(Shot shot, Manner manner, List<SmokeAsked> asked, SolveResult solve, FrameWriting writing, double massRatio,
                                     double forceRms) {
        ObjectNode settings = TakeRecord.object().put("stay", manner.stay()).put("sources", manner.sources())
                .put("quality", manner.quality().name().toLowerCase(Locale.ROOT));
        if (manner.beginning().kind() == Beginning.Kind.TAKE) {
            settings.put("from", manner.beginning().take());
        }
        settings.set("notes", notes(shot));
        ObjectNode losses = settings.putObject("noteLosses");
        settings.put("untilLoss", manner.until().loss());
        ObjectNode figures = TakeRecord.object().put("gradients", solve.gradients()).put("forceRms", forceRms).put("massRatio", massRatio)
                .put("divergenceMax", writing.divergenceMax()).put("largestDisplacementCells", writing.pacing().cells()).put("energyWeight", solve.energyWeight()).put("energyShare", solve.energyShare())
                        .put("ended", solve.ended());
        ObjectNode smoke = figures.putObject("smokeAsked");
        asked.forEach(a -> smoke.put(a.note().id(), a.depth()));
        ObjectNode met = figures.putObject("met");
        ObjectNode falls = figures.putObject("lossFall");
        for (int n = 0; n < Math.min(shot.notes().size(), solve.met().size()); n++) {
            String id = shot.notes().get(n).id();
            met.put(id, solve.met().get(n));
            losses.put(id, solve.noteLosses().get(n).choice().inWords());
            falls.put(id, solve.noteLosses().get(n).fall());
        }
        solve.strengths().ifPresent(strengths -> figures.set("sources", SourceStrengths.figures(shot.flow(), strengths)));
        return new TakeRecord(TakeRecord.Kind.SOLVE, Build.version(), TakeRecord.digest(shot.flow()), settings, figures, solve.losses());
    }

    private static ArrayNode notes(Shot shot) {
        ArrayNode list = TakeRecord.object().putArray("notes");
        shot.notes().stream().map(Note::id).forEach(list::add);
        return list;
    }

    private static double norm(double[] x) {
        double sum = 0;
        for (double v : x) {
            sum += v * v;
        }
        return Math.sqrt(sum);
    }
}
