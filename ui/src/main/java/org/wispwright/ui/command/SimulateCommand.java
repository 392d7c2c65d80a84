package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Locale;
import java.util.concurrent.Callable;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.job.SimulateWork;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;

/** {@code simulate SHOT}: makes take 0, the original. */
@Command(name = "simulate", sortOptions = false, description = "Simulate the shot without extra force and keep it as take 0, the original.",
        footer = {"", "If take 0 is there and belongs to this set-up, nothing is done.", "", "Examples:",
            "  java -jar wispwright.jar simulate samples/kiln-yard",
            "  java -jar wispwright.jar simulate samples/kiln-yard --threads 2 --json"})
final class SimulateCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private ShotChoice choice;

    @Override
    public Integer call() {
        Shot shot = choice.shot();
        SimulateWork.Result result;
        try (Lanes lanes = new Lanes(choice.threads()); ProgressLine progress = manner.progress()) {
            result = SimulateWork.run(choice.folder(), shot, lanes, progress, manner.cancel());
        }
        ObjectNode object = Manner.object().put("ok", true).put("take", 0).put("made", result.made()).put("frames", result.frames())
                .put("seconds", result.seconds()).put("lastMass", result.lastMass()).put("divergenceMax", result.divergenceMax())
                .put("substeps", result.flow().substeps());
        manner.say(result.made()
                ? String.format(Locale.ROOT, "Take 0 made: %d frames%s in %.1f s.", result.frames(),
                        result.flow().substeps() > 1 ? " of " + result.flow().substeps() + " substeps" : "", result.seconds())
                : "Take 0 is there already and belongs to this set-up; nothing was done.", object);
        return ExitCodes.OK;
    }
}
