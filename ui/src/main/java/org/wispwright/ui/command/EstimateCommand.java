package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.stream.Collectors;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.job.Estimate;
import org.wispwright.ui.job.Quality;
import org.wispwright.ui.shot.Shot;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** {@code estimate SHOT}: what a solve would take. */
@Command(name = "estimate", sortOptions = false,
        description = "Say what a solve would take, memory, disk and time, from a few gradients on the lowest rung. Writes nothing.",
        footer = {"", "Time is by the usual number of gradients; a note that asks for much takes more.", "", "Examples:",
            "  java -jar wispwright.jar estimate samples/kiln-yard",
            "  java -jar wispwright.jar estimate samples/kiln-yard --quality preview --memory 512M --disk 4G --json"})
final class EstimateCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private ShotChoice choice;

    @Option(names = "--disk", paramLabel = "SIZE", converter = ByteSize.Converter.class,
            description = "Disk for states, as for solve. Default: none.")
    private ByteSize disk;

    @Option(names = "--quality", paramLabel = "Q", converter = SolveCommand.QualityConverter.class,
            description = "preview, review or final. Default: all three.")
    private Quality quality;

    @Override
    public Integer call() {
        Shot shot = choice.shot();
        List<Estimate> estimates;
        try (Lanes lanes = new Lanes(choice.threads()); ProgressLine progress = manner.progress()) {
            progress.now("estimate: measuring the lowest rung");
            estimates = Estimate.all(shot, choice.memoryBytes(), disk == null ? 0 : disk.bytes(), lanes, manner.cancel());
        }
        List<Estimate> asked = estimates.stream().filter(e -> Optional.ofNullable(quality).map(q -> q == e.quality()).orElse(true)).toList();
        ObjectNode object = Manner.object().put("ok", true);
        ArrayNode list = object.putArray("estimates");
        asked.forEach(e -> list.add(e.json()));
        manner.say(asked.stream().map(Estimate::inWords).collect(Collectors.joining(System.lineSeparator())), object);
        return ExitCodes.OK;
    }
}
