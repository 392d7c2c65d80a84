package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import java.util.stream.Collectors;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.job.CompareWork;
import org.wispwright.ui.job.Comparison;
import org.wispwright.ui.job.Review;
import org.wispwright.ui.job.ReviewReport;
import org.wispwright.ui.job.ReviewWork;
import picocli.CommandLine.Command;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.TypeConversionException;

/** {@code compare SHOT --takes A,B --out DIR}. */
@Command(name = "compare", sortOptions = false,
        description = "Compare two takes note by note: original, wanted, got, their difference, and one sheet of all.",
        footer = {"",
            "Writes into DIR: sheet.png, compare.json, measures.csv, and for every note the pictures ID.original.png,",
            "ID.wanted.png, ID.got.png and ID.difference.png. Prints a table of measures (docs/commands.md).", "", "Examples:",
            "  java -jar wispwright.jar compare samples/kiln-yard --takes 0,1 --out review",
            "  java -jar wispwright.jar compare samples/kiln-yard --takes 1,2 --out review --json"})
final class CompareCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private ShotChoice choice;

    @Option(names = "--takes", paramLabel = "A,B", required = true, converter = TwoTakes.Converter.class,
            description = "The take to compare against (0 is the original) and the take to judge.")
    private TwoTakes takes;

    @Option(names = "--out", paramLabel = "DIR", required = true, description = "The folder to write into; made if it is not there.")
    private Path out;

    /** Two take numbers. */
    record TwoTakes(int before, int after) {
        /** For picocli: anything else is wrong usage. */
        static final class Converter implements ITypeConverter<TwoTakes> {
            @Override
            public TwoTakes convert(String value) {
                if (!value.matches("[0-9]{1,3},[0-9]{1,3}")) {
                    throw new TypeConversionException("'" + value + "' is not two takes; write for example 0,1");
                }
                String[] two = value.split(",");
                return new TwoTakes(Integer.parseInt(two[0]), Integer.parseInt(two[1]));
            }
        }
    }

    @Override
    public Integer call() {
        Shot shot = choice.shot();
        ShotFolder folder = choice.folder();
        Comparison comparison;
        Review review;
        try (Lanes lanes = new Lanes(choice.threads()); ProgressLine progress = manner.progress()) {
            comparison = CompareWork.compare(folder, shot, takes.before(), takes.after(), lanes, progress, manner.cancel());
            review = ReviewWork.of(folder, shot, comparison, lanes, progress, manner.cancel());
            manner.cancel().stopIfWished();
            CompareWork.write(folder, shot, comparison, review, out, progress);
        }
        ObjectNode object = CompareWork.report(comparison).put("ok", true).put("out", out.toString());
        String notes = comparison.notes().stream().map(Comparison.OfNote::inWords)
                .collect(Collectors.joining(", "));
        manner.say("Take " + takes.after() + " against take " + takes.before() + ": " + notes + ". See " + out.resolve("sheet.png") + ".\n"
                + ReviewReport.table(review), object);
        return ExitCodes.OK;
    }
}
