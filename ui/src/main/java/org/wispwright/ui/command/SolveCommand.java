package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.Callable;
import java.util.stream.Collectors;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.Takes;
import org.wispwright.ui.job.CompareWork;
import org.wispwright.ui.job.Comparison;
import org.wispwright.ui.job.SolveReport;
import org.wispwright.ui.job.Beginning;
import org.wispwright.ui.job.Quality;
import org.wispwright.ui.job.SolveWork;
import org.wispwright.ui.job.SourceStrengths;
import picocli.CommandLine.ArgGroup;
import picocli.CommandLine.Command;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.TypeConversionException;

/** {@code solve SHOT}: searches for the force and adds a take. */
@Command(name = "solve", sortOptions = false,
        description = "Search for the force with which the smoke itself arrives at the notes, and keep the result as a new take.",
        footer = {"", "Take 0 is made first if it is not there. Takes are never overwritten.",
            "Stopped by Ctrl-C or cut off by anything else, a solve goes on with --resume from its last iteration.", "", "Examples:",
            "  java -jar wispwright.jar solve samples/kiln-yard",
            "  java -jar wispwright.jar solve samples/kiln-yard --quality preview",
            "  java -jar wispwright.jar solve samples/kiln-yard --from 1",
            "  java -jar wispwright.jar solve samples/kiln-yard --resume",
            "  java -jar wispwright.jar solve samples/kiln-yard --sources",
            "  java -jar wispwright.jar solve samples/kiln-yard --threads 2 --memory 2G --until loss=0.03",
            "  java -Xmx1g -jar wispwright.jar solve samples/kiln-yard --disk 4G",
            "  java -jar wispwright.jar solve samples/kiln-yard --until seconds=60 --until iterations=40 --json"})
final class SolveCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private ShotChoice choice;

    @Option(names = "--disk", paramLabel = "SIZE", converter = ByteSize.Converter.class,
            description = "Disk in the shot's folder for states that --memory does not hold, such as 4G: quicker than to compute them "
                    + "again where the disk is quick. Gone when the solve ends. Default: none.")
    private ByteSize disk;

    @Option(names = "--until", paramLabel = "WHAT=N", converter = Until.Converter.class,
            description = "End early: loss=0.03 (share of the original's), seconds=60, or iterations=40. "
                    + "May be given several times; the first to come true ends it.")
    private List<Until> until = List.of();

    @Option(names = "--without-stay",
            description = "Leave out the term that keeps the frames without a note near the original; only to measure what it does.")
    private boolean withoutStay;

    @Option(names = "--sources", description = "Let the strength of each source change over time too, beside the force: "
            + "for notes that want more or less smoke than there is.")
    private boolean sources;

    @Option(names = "--quality", paramLabel = "Q", converter = QualityConverter.class, description = "How far to climb: preview (the "
            + "lowest rung, a first look), review (up to the "
            + "rung below the shot's own grid) or final. The volumes always have the shot's grid. Default: final.")
    private Quality quality = Quality.FINAL;

    /** Reads the word of a quality. */
    static final class QualityConverter implements ITypeConverter<Quality> {
        @Override
        public Quality convert(String word) {
            return Arrays.stream(Quality.values()).filter(q -> q.name().toLowerCase(Locale.ROOT).equals(word)).findFirst().orElseThrow(
                    () -> new TypeConversionException("got '" + word + "', needs preview, review or final"));
        }
    }

    @ArgGroup
    private Begin begin = new Begin();

    /** Where to begin; one of these at the most. */
    static final class Begin {
        @Option(names = "--resume", description = "Go on with a solve of this shot that was cut off; the result has the same bits.")
        private boolean resume;

        @Option(names = "--anew", description = "Drop what a solve that was cut off has left, and begin at no force.")
        private boolean anew;

        @Option(names = "--from", paramLabel = "TAKE", description = "Go on from where the search of this take ended, a preview's for "
                + "example.")
        private Integer take;

        Beginning beginning() {
            return take != null ? Beginning.from(take) : resume ? Beginning.RESUME : anew ? Beginning.ANEW : Beginning.FRESH;
        }
    }

    @Option(names = "--report", paramLabel = "FILE", description = "Also write the figures that --json prints to this file.")
    private Path report;

    @Override
    public Integer call() {
        Shot shot = choice.shot();
        StopRule rule = Until.all(until);
        SolveWork.Result result;
        try (Lanes lanes = new Lanes(choice.threads()); ProgressLine progress = manner.progress()) {
            result = SolveWork.run(choice.folder(), shot, new SolveWork.Manner(choice.memoryBytes(), disk == null ? 0 : disk.bytes(), rule,
                    !withoutStay, sources, quality, begin.beginning()), lanes, progress,
                    manner.cancel());
        }
        ObjectNode object = SolveReport.of(result).put("ok", true);
        if (report != null) {
            CompareWork.writeJson(object, report);
        }
        String notes = result.comparison().notes().stream()
                .map(Comparison.OfNote::inWords).collect(Collectors.joining(", "));
        manner.say(String.format(Locale.ROOT, "Take %s made in %.0f s: %s.", Takes.name(result.take()), result.seconds(), notes)
                + sources(result), object);
        return ExitCodes.OK;
    }

    private static String sources(SolveWork.Result result) {
        return result.solve().strengths().map(strengths -> " " + String.join("; ", SourceStrengths.inWords(result.flow(), strengths)) + ".")
                .map(line -> " S" + line.substring(2)).orElse("");
    }
}
