package org.wispwright.ui.command;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.solve.Measurement;
import org.wispwright.optimize.solve.StateRoom;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.MemoryNeed;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.job.MeasureReport;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** {@code measure}: what this machine can do. */
@Command(name = "measure", sortOptions = false,
        description = "Measure what this machine can do: a forward run, a gradient, a step, and where the time goes.",
        footer = {"", "Close other programs first: the figures are the least of a few tries.", "", "Examples:",
            "  java -jar wispwright.jar measure",
            "  java -jar wispwright.jar measure --grid 128 --frames 30 --threads 2 --memory 256M --json"})
final class MeasureCommand implements Callable<Integer> {
    private static final int MOST_CELLS = 512;
    private static final int MOST_FRAMES = 1000;

    @Mixin
    private Manner manner;

    @Option(names = "--grid", paramLabel = "N", defaultValue = "64", description = "Cells each way, 8 to 512. Default: ${DEFAULT-VALUE}.")
    private int cells;

    @Option(names = "--frames", paramLabel = "F", defaultValue = "24", description = "Frames, 2 to 1000. Default: ${DEFAULT-VALUE}.")
    private int frames;

    @Option(names = "--memory", paramLabel = "SIZE", converter = ByteSize.Converter.class,
            description = "The memory for the states that a gradient keeps, such as 256M. Default: enough to keep all, if Java has it.")
    private ByteSize memory;

    @Option(names = "--disk", paramLabel = "SIZE", converter = ByteSize.Converter.class,
            description = "Disk, where Java puts temporary files, for states that --memory does not hold. Default: none.")
    private ByteSize disk;

    @Option(names = "--threads", paramLabel = "N", converter = ThreadCount.Converter.class,
            description = "Threads to use. Default: one for each core.")
    private ThreadCount threads;

    @Spec
    private CommandSpec spec;

    @Override
    public Integer call() {
        if (cells < 8 || cells > MOST_CELLS || frames < 2 || frames > MOST_FRAMES) {
            throw new ParameterException(spec.commandLine(), "measure takes a --grid of 8 to " + MOST_CELLS + " and --frames of 2 to "
                    + MOST_FRAMES
                    + ", not " + cells + " and " + frames);
        }
        GridShape grid = new GridShape(cells, cells, cells, 1);
        long most = Runtime.getRuntime().maxMemory();
        long state = SmokeState.bytes(grid);
        long work = MemoryNeed.besidesStates(grid);
        long forStates = memory == null ? Math.min(state * frames, most - work) : memory.bytes();
        if (forStates < state || work + forStates > most) {
            throw new ShotException(new Finding("measure", "", "a grid of " + grid.inWords() + " takes " + MemoryNeed.inWords(work)
                    + " and " + MemoryNeed.inWords(Math.max(state, forStates))
                    + " for states, and Java has " + MemoryNeed.inWords(most) + "; take a smaller --grid, a --memory of at least "
                            + MemoryNeed.inWords(state)
                    + ", or more for Java with java -Xmx."));
        }
        Measurement measured;
        try (Lanes lanes = new Lanes(threads == null ? Runtime.getRuntime().availableProcessors()
                : threads.count()); ProgressLine progress = manner.progress()) {
            progress.now("measure: " + grid.inWords() + ", " + frames + " frames");
            measured = Measurement.of(cells, frames, disk == null ? StateRoom.inMemory(forStates)
                    : new StateRoom(forStates, disk.bytes(), temporary()), lanes);
        }
        manner.say(MeasureReport.inWords(measured), MeasureReport.of(measured).put("ok", true));
        return ExitCodes.OK;
    }

    private static Path temporary() {
        try {
            return Files.createTempFile("wispwright-states", "");
        } catch (IOException refused) {
            throw new ShotException(new Finding("measure", "", "no temporary file can be made (" + refused.getMessage() + "); leave out --disk."),
                    refused);
        }
    }
}
