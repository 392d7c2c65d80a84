package org.wispwright.ui.job;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;

/** The whole job on a sample, from a copy of its shot folder to the sheet and the report. */
public final class TourWork {
    private TourWork() {
    }

    /**
     * What came out.
     *
     * @param shot the copied shot folder, with its takes
     * @param sheet the sheet's file
     * @param report the figures, as in the file {@code report.json}
     * @param solve the solve
     */
    public record Result(Path shot, Path sheet, ObjectNode report, SolveWork.Result solve) {
    }

    /**
     * Copies a sample, simulates it, solves its notes, draws the sheet, writes the report: {@code out/NAME} (the shot with its takes),
     * {@code out/sheet.png}, the notes' pictures and {@code out/report.json}.
     *
     * @param sample a shot folder, of any file system
     * @param out made if it is not there; must be empty
     * @throws ShotException if out has something in it or cannot be written to, or the sample is not in order
     * @throws Cancel.Cancelled if cancelled
     */
    public static Result run(Path sample, Path out, SolveWork.Manner manner, Lanes lanes, Progress progress, Cancel cancel) {
        long start = System.nanoTime();
        Path folder = out.resolve(sample.getFileName().toString().replace("/", ""));
        requireEmpty(out);
        SampleWork.copy(sample, folder);
        Shot shot = ShotCheck.require(folder, manner.memoryBytes());
        ShotFolder shotFolder = ShotFolder.open(folder);
        progress.milestone("tour: '" + shot.name() + "', " + shot.flow().grid().inWords() + ", " + shot.flow().frames().count()
                + " frames, " + shot.notes().size() + " notes");
        SolveWork.Result solve = SolveWork.run(shotFolder, shot, manner, lanes, progress, cancel);
        Review review = ReviewWork.of(shotFolder, shot, solve.comparison(), lanes, progress, cancel);
        CompareWork.write(shotFolder, shot, solve.comparison(), review, out, progress);
        progress.milestone("tour: two short solves, to tell what the stay term does");
        StayTrade trade = StayTrade.of(shot.withFlow(solve.flow()), lanes, cancel);
        ObjectNode report = SolveReport.of(solve);
        report.set("stayTrade", SolveReport.of(trade, shot.notes()));
        report.put("seconds", (System.nanoTime() - start) / 1e9);
        CompareWork.writeJson(report, out.resolve("report.json"));
        return new Result(folder, out.resolve("sheet.png"), report, solve);
    }

    private static void requireEmpty(Path out) {
        try {
            if (Files.isDirectory(out)) {
                try (Stream<Path> entries = Files.list(out)) {
                    if (entries.findAny().isPresent()) {
                        throw new ShotException(new Finding(out.toString(), "",
                                "this folder is not empty, and the tour overwrites nothing; move it away or give another with --out."));
                    }
                }
            } else {
                Files.createDirectories(out);
            }
        } catch (IOException refused) {
            throw PictureFile.cannotWrite(out, refused);
        }
    }
}
