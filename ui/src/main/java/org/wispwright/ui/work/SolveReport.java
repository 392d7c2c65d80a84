package org.wispwright.ui.work;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import org.wispwright.optimize.solve.SolveResult;

/** A solve's figures for other programs: the names of {@code report.json}, see docs/commands.md. */
public final class SolveReport {
    private SolveReport() {
    }

    /** The report of a solve. */
    public static ObjectNode of(SolveWork.Result result) {
        ObjectNode top = CompareWork.report(result.comparison());
        SolveResult solve = result.solve();
        top.put("take", result.take()).put("divergenceMax", result.divergenceMax()).put("massRatio", result.massRatio())
                .put("forceRms", result.forceRms())
                .put("departure", result.departure()).put("gradients", solve.gradients()).put("solveSeconds", solve.seconds())
                        .put("seconds", result.seconds())
                .put("peakMemoryBytes", PeakMemory.bytes()).put("energyShare", solve.energyShare()).put("ended", solve.ended());
        ArrayNode bands = top.putArray("bands");
        for (SolveResult.BandRun run : solve.bands()) {
            bands.addObject().put("cells", run.grid().inWords()).put("low", run.band().low()).put("high", run.band().high())
                    .put("splines", run.band().splines())
                    .put("unknowns", run.unknowns()).put("iterations", run.iterations()).put("gradients", run.gradients())
                            .put("loss", run.loss()).put("seconds", run.seconds());
        }
        ArrayNode losses = top.putArray("losses");
        solve.losses().forEach(losses::add);
        return top;
    }
}
