package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.List;
import java.util.OptionalDouble;
import java.util.concurrent.Callable;
import org.wispwright.ui.job.CarryWork;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.ShotFolder;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code note between SHOT FIRST SECOND [--every N] [--ease] [--weight W] [--id NAME]}. */
@Command(name = "between", sortOptions = false,
        description = "Make notes for the frames between two notes of one view, whose retouches have the same list of kinds: positions, "
                + "radii, strengths and weights go from the one to the other. One change; 'note undo' takes all of them back.",
        footer = {"", "Examples (after the first, which makes the second note):",
            "  java -jar wispwright.jar note copy samples/kiln-yard open-a-gap --frame 1035 --id open-late",
            "  java -jar wispwright.jar note between samples/kiln-yard open-a-gap open-late --every 2 --ease"})
final class NoteBetweenCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Parameters(index = "0", paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Parameters(index = "1", paramLabel = "FIRST", description = "The note of the earlier frame.")
    private String first;

    @Parameters(index = "2", paramLabel = "SECOND", description = "The note of the later frame.")
    private String second;

    @Option(names = "--every", paramLabel = "N", defaultValue = "1",
            description = "Only every Nth frame from the first note's on. Default: 1.")
    private int every;

    @Option(names = "--ease", description = "Start and end slowly instead of going evenly.")
    private boolean ease;

    @Option(names = "--weight", paramLabel = "W", description = "Weight of the new notes. Default: between the two.")
    private Double weight;

    @Option(names = "--id", paramLabel = "NAME", description = "The new notes are called NAME-FRAME. Default: FIRST.")
    private String name;

    @Spec
    private CommandSpec spec;

    @Override
    public Integer call() {
        NoteCarryCommand.requireStep(every, spec);
        OptionalDouble weighs = NoteCarryCommand.weight(weight, spec);
        NoteEdits edits = NoteEdits.of(ShotFolder.open(shot));
        NoteEdits.Listed a = edits.need(first);
        NoteEdits.Listed b = edits.need(second);
        List<Note> notes = CarryWork.between(a.note(), b.note(), name == null ? first : name, every, ease, weighs);
        edits.addAll("note between " + first + " " + second + (every == 1 ? "" : " --every " + every) + (ease ? " --ease" : "")
                + (name == null ? "" : " --id " + name), first, notes, a.on() && b.on());
        manner.say(NoteCarryCommand.sentence(notes) + " between '" + first + "' and '" + second + "'.", NoteCarryCommand.object(notes));
        return ExitCodes.OK;
    }
}
