package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.Locale;
import java.util.concurrent.Callable;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.work.Comparison;
import org.wispwright.ui.work.SolveWork;
import org.wispwright.ui.work.TourWork;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** {@code tour [--out DIR]}: the whole job on the sample that travels in the program. */
@Command(name = "tour", sortOptions = false,
        description = "Show the whole job on a sample: simulate, solve its notes, compare, and leave a sheet and a report.",
        footer = {"", "Leaves in DIR: the shot with its takes, sheet.png, the notes' pictures, report.json.", "", "Examples:",
            "  java -jar wispwright.jar tour",
            "  java -jar wispwright.jar tour --out my-tour --threads 2"})
final class TourCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Option(names = "--out", paramLabel = "DIR", defaultValue = "tour",
            description = "An empty or new folder to leave everything in. Default: ${DEFAULT-VALUE}.")
    private Path out;

    @Mixin
    private Means means;

    @Override
    public Integer call() {
        TourWork.Result result;
        try (Lanes lanes = new Lanes(means.threads()); ProgressLine progress = manner.progress()) {
            SolveWork.Manner how = new SolveWork.Manner(means.memoryBytes(), StopRule.OWN, true);
            result = TourWork.onOwnSample(sample -> TourWork.run(sample, out, how, lanes, progress, manner.cancel()));
        }
        StringBuilder words = new StringBuilder();
        for (Comparison.OfNote n : result.solve().comparison().notes()) {
            words.append(String.format(Locale.ROOT, "  %5.1f %%  %s (frame %d): %s%n", 100 * n.met(), n.note().id(), n.note().frame(),
                    n.note().words()));
        }
        words.append("Before, wanted and after: ").append(result.sheet());
        manner.say("Met:" + System.lineSeparator() + words, result.report().deepCopy().put("ok", true));
        return ExitCodes.OK;
    }
}
