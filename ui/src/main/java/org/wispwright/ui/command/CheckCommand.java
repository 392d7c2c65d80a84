package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.job.Comparison;
import org.wispwright.ui.job.NoteFolds;
import org.wispwright.ui.job.SmokeAsked;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.MemoryNeed;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.warp.retouch.Folds;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code check SHOT}: validates everything without running and without writing. */
@Command(name = "check", sortOptions = false,
        description = "Read a whole shot and say everything that is wrong with it. Runs nothing, writes nothing.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar check samples/kiln-yard",
            "  java -jar wispwright.jar check samples/kiln-yard --memory 512M --json"})
final class CheckCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Parameters(paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Option(names = "--memory", paramLabel = "SIZE", converter = ByteSize.Converter.class,
            description = "The memory that a solve may take, such as 512M or 2G. Default: what Java has.")
    private ByteSize memory;

    @Spec
    private CommandSpec spec;

    @Override
    public Integer call() {
        long bytes = memory == null ? Runtime.getRuntime().maxMemory() : memory.bytes();
        ShotCheck.Result result = ShotCheck.of(shot, bytes);
        ObjectNode object = Manner.object().put("ok", result.findings().isEmpty());
        if (!result.findings().isEmpty()) {
            PrintWriter err = spec.commandLine().getErr();
            ArrayNode list = object.put("exitCode", ExitCodes.BAD_INPUT).putArray("findings");
            for (Finding finding : result.findings()) {
                list.add(json(finding));
                err.println("wispwright: " + finding.inWords());
            }
            if (manner.json()) {
                manner.say("", object);
            }
            return ExitCodes.BAD_INPUT;
        }
        Shot checked = result.shot().orElseThrow();
        FlowSetup flow = checked.flow();
        long need = MemoryNeed.bytes(flow);
        int holds = checked.holds().size() + checked.notes().stream().mapToInt(note -> note.holds().size()).sum();
        int rendered = checked.views().stream().mapToInt(v -> v.rendered().size()).sum();
        object.put("name", checked.name()).put("cells", flow.grid().cells()).put("firstFrame", flow.frames().first())
                .put("lastFrame", flow.frames().last())
                .put("views", checked.views().size()).put("notes", checked.notes().size() + checked.off().size())
                        .put("notesOff", checked.off().size()).put("holds", holds).put("renderedFrames", rendered)
                        .put("leastMemoryBytes", need);
        ArrayNode folding = object.putArray("foldingNotes");
        ArrayNode asked = object.putArray("smokeAsked");
        StringBuilder said = new StringBuilder();
        try (Lanes lanes = new Lanes(1)) {
            for (Note note : checked.notes()) {
                SmokeAsked.known(ShotFolder.open(shot), checked, note, lanes).ifPresent(smoke -> {
                    asked.add(smoke.json());
                    said.append(smoke.isWorthTelling() ? " N" + smoke.inWords(false).substring(1) + "." : "");
                });
            }
        }
        for (Note note : checked.notes()) {
            Folds found = NoteFolds.of(note, checked.view(note.view()).orElseThrow().view());
            if (found.cells() > 0) {
                folding.add(note.id());
                said.append(" Note ").append(note.id()).append(": ").append(Comparison.OfNote.inWords(found))
                        .append("; pull its handles less far, or spread the pull over more of them.");
            }
        }
        manner.say("'" + checked.name() + "' is in order: " + flow.grid().inWords() + ", frames " + flow.frames().first() + " to "
                + flow.frames().last()
                + ", views " + checked.views().size() + ", notes " + (checked.notes().size() + checked.off().size())
                + (checked.off().isEmpty() ? "" : " (" + checked.off().size() + " off)") + ", holds " + holds + ", rendered frames " + rendered
                + "; a solve takes at least " + MemoryNeed.inWords(need) + "." + said, object);
        return ExitCodes.OK;
    }

    /** A finding for other programs. */
    static ObjectNode json(Finding finding) {
        return Manner.object().put("file", finding.file()).put("pointer", finding.pointer()).put("sentence", finding.sentence());
    }
}
