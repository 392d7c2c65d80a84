package org.wispwright.ui.job;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import org.wispwright.optimize.solve.SolveResult;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.TakeRecord;

/** A solve's figures for other programs: the names of {@code report.json}, see docs/commands.md. */
public final class SolveReport {
    private SolveReport() {
    }

    /** The report of a solve. */
    public static ObjectNode of(SolveWork.Result result) {
        ObjectNode top = CompareWork.report(result.comparison());
        SolveResult solve = result.solve();
        top.put("take", result.take()).put("divergenceMax", result.divergenceMax()).put("massRatio", result.massRatio())
                .put("forceRms", result.forceRms()).put("departure", result.departure().all())
                .put("departureBeforeLastNote", result.departure().before()).put("gradients", solve.gradients())
                .put("solveSeconds", solve.seconds()).put("seconds", result.seconds()).put("peakMemoryBytes", PeakMemory.bytes())
                .put("energyShare", solve.energyShare()).put("ended", solve.ended());
        ArrayNode asked = top.putArray("smokeAsked");
        result.asked().forEach(smoke -> asked.add(smoke.json()));
        solve.strengths().ifPresent(strengths -> top.set("sources", SourceStrengths.figures(result.flow(), strengths)));
        ArrayNode losses = top.putArray("noteLosses");
        for (int n = 0; n < solve.noteLosses().size(); n++) {
            SolveResult.NoteLoss note = solve.noteLosses().get(n);
            losses.addObject().put("id", result.comparison().notes().get(n).note().id()).put("loss", note.choice().inWords())
                    .put("why", note.choice().why()).put("fall", note.fall());
        }
        ArrayNode bands = top.putArray("bands");
        for (SolveResult.BandRun run : solve.bands()) {
            bands.addObject().put("cells", run.grid().inWords()).put("low", run.band().low()).put("high", run.band().high())
                    .put("splines", run.band().splines()).put("unknowns", run.unknowns()).put("iterations", run.iterations())
                    .put("gradients", run.gradients()).put("loss", run.loss()).put("seconds", run.seconds());
        }
        ArrayNode course = top.putArray("losses");
        solve.losses().forEach(course::add);
        return top;
    }

    /** What the stay term buys and costs: {@code stayTrade} of the tour's report. */
    public static ObjectNode of(StayTrade trade, List<Note> notes) {
        ObjectNode top = TakeRecord.object().put("cells", trade.grid().inWords()).put("iterations", StayTrade.ITERATIONS);
        top.set("with", side(trade.with(), notes));
        top.set("without", side(trade.without(), notes));
        return top;
    }

    private static ObjectNode side(StayTrade.Side side, List<Note> notes) {
        ObjectNode top = TakeRecord.object().put("departure", side.departure().all())
                .put("departureBeforeLastNote", side.departure().before());
        ObjectNode met = top.putObject("met");
        for (int n = 0; n < notes.size(); n++) {
            met.put(notes.get(n).id(), side.met().get(n));
        }
        return top;
    }
}
