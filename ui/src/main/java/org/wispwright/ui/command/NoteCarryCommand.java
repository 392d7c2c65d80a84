package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.OptionalDouble;
import java.util.concurrent.Callable;
import java.util.stream.Collectors;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.job.CarryWork;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.Takes;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code note carry SHOT ID --frames A-B [--every N] [--follow TAKE] [--weight W] [--id NAME]}. */
@Command(name = "carry", sortOptions = false,
        description = "Make notes with the same retouch and holds on other frames: where they are, or with --follow carried along by the "
                + "smoke of a take. One change; 'note undo' takes all of them back.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note carry samples/kiln-yard open-a-gap --frames 1024-1030 --every 2",
            "  java -jar wispwright.jar note carry samples/kiln-yard open-a-gap --frames 1024-1030 --every 3 --follow 0 --weight 0.5"})
final class NoteCarryCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private ShotChoice choice;

    @Parameters(index = "1", paramLabel = "ID", description = "The note: its file's name without .json.")
    private String id;

    @Option(names = "--frames", paramLabel = "A-B", required = true, converter = FrameSpan.Converter.class,
            description = "First and last frame; the note's own is left out.")
    private FrameSpan frames;

    @Option(names = "--every", paramLabel = "N", defaultValue = "1", description = "Only every Nth of them, from the first on. Default: 1.")
    private int every;

    @Option(names = "--follow", paramLabel = "TAKE", description = "Carry all positions with the smoke of this take, 0 for the original.")
    private Integer take;

    @Option(names = "--weight", paramLabel = "W", description = "Weight of the new notes. Default: the note's.")
    private Double weight;

    @Option(names = "--id", paramLabel = "NAME", description = "The new notes are called NAME-FRAME. Default: ID.")
    private String name;

    @Spec
    private CommandSpec spec;

    @Override
    public Integer call() {
        requireStep(every, spec);
        OptionalDouble weighs = weight(weight, spec);
        NoteEdits edits = NoteEdits.of(choice.folder());
        NoteEdits.Listed from = edits.need(id);
        List<Integer> others = frames.every(every).stream().filter(frame -> frame != from.note().frame()).toList();
        if (others.isEmpty()) {
            throw new ParameterException(spec.commandLine(), "--frames " + frames.first() + "-" + frames.last() + " --every " + every
                    + " has no frame but the note's own");
        }
        List<Note> notes = CarryWork.copies(from.note(), name == null ? id : name, others, weighs);
        edits.requireFit(notes);
        if (take != null) {
            Shot shot = choice.shot();
            Takes takes = choice.takes();
            takes.requireOf(take, shot.flow());
            try (Lanes lanes = new Lanes(choice.threads())) {
                notes = CarryWork.followed(shot, takes, take, from.note(), notes, lanes, manner.cancel());
            }
        }
        edits.addAll("note carry " + id + " --frames " + frames.first() + "-" + frames.last() + (every == 1 ? "" : " --every " + every)
                + (take == null ? "" : " --follow " + take) + (name == null ? "" : " --id " + name), id, notes, from.on());
        manner.say(sentence(notes)
                + (take == null ? " of '" + id + "'." : " of '" + id + "', following take " + take + "."), object(notes));
        return ExitCodes.OK;
    }

    /** "3 notes made: a-1001, a-1003, a-1005". */
    static String sentence(List<Note> notes) {
        return notes.size() + (notes.size() == 1 ? " note made: " : " notes made: ")
                + notes.stream().map(Note::id).collect(Collectors.joining(", "));
    }

    static ObjectNode object(List<Note> notes) {
        ObjectNode object = Manner.object().put("ok", true);
        ArrayNode array = object.putArray("notes");
        notes.forEach(note -> array.addObject().put("id", note.id()).put("frame", note.frame()).put("weight", note.weight()));
        return object;
    }

    static void requireStep(int every, CommandSpec spec) {
        if (every < 1) {
            throw new ParameterException(spec.commandLine(), "--every " + every + " is not a whole number from 1 up");
        }
    }

    static OptionalDouble weight(Double weight, CommandSpec spec) {
        if (weight == null) {
            return OptionalDouble.empty();
        }
        if (!(weight > 0 && weight <= 1000)) {
            throw new ParameterException(spec.commandLine(), "--weight " + weight + " is not a number above 0, at most 1000");
        }
        return OptionalDouble.of(weight);
    }
}
