package org.wispwright.ui.command;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.concurrent.Callable;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.job.Comparison;
import org.wispwright.ui.job.SolveWork;
import org.wispwright.ui.job.SampleWork;
import org.wispwright.ui.job.TourWork;
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

    /** The tour's solve may stop here: further iterations would polish what a person no longer sees on the sheet. */
    private static final StopRule GOOD_ENOUGH = new StopRule(0.05, Double.POSITIVE_INFINITY, Integer.MAX_VALUE);

    @Option(names = "--out", paramLabel = "DIR",
            description = "An empty or new folder to leave everything in. Default: tour, or tour-2 if that is there, and so on.")
    private Path out;

    @Mixin
    private Means means;

    @Override
    public Integer call() {
        TourWork.Result result;
        try (Lanes lanes = new Lanes(means.threads()); ProgressLine progress = manner.progress()) {
            SolveWork.Manner how = new SolveWork.Manner(means.memoryBytes(), GOOD_ENOUGH, true);
            Path into = out == null ? freeFolder() : out;
            result = SampleWork.onOwnSample(sample -> TourWork.run(sample, into, how, lanes, progress, manner.cancel()));
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

    private static Path freeFolder() {
        Path folder = Path.of("tour");
        for (int n = 2; Files.exists(folder); n++) {
            folder = Path.of("tour-" + n);
        }
        return folder;
    }
}
