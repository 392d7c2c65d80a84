package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.ShotFolder;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code note undo SHOT}. */
@Command(name = "undo", sortOptions = false,
        description = "Take back the last change that a 'note' command made and that was not taken back yet, and say which. "
                + "Refused if a file of it has been changed by hand since. 'note redo' makes it again.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note undo samples/kiln-yard",
            "  java -jar wispwright.jar note undo samples/kiln-yard --json"})
final class NoteUndoCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Parameters(paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Override
    public Integer call() {
        NoteEdits.Moved undone = NoteEdits.of(ShotFolder.open(shot)).undo();
        manner.say(sentence("Took back", undone, " as before", " gone again"), object(undone));
        return ExitCodes.OK;
    }

    /** "Took back 'note off lean': notes/lean.json is as before." */
    static String sentence(String verb, NoteEdits.Moved moved, String there, String gone) {
        String start = verb + " '" + moved.command() + "': ";
        if (!moved.changed()) {
            return start + names(moved.files()) + (moved.files().size() == 1 ? " was" : " were")
                    + " so already, so only the journal changed.";
        }
        return start + Stream.of(true, false).map(kind -> moved.files().stream().filter(file -> file.there() == kind).toList())
                .filter(files -> !files.isEmpty())
                .map(files -> names(files) + (files.size() == 1 ? " is" : " are") + (files.get(0).there() ? there : gone))
                .collect(Collectors.joining("; ")) + ".";
    }

    /** What {@code undo} and {@code redo} say to other programs. */
    static ObjectNode object(NoteEdits.Moved moved) {
        ObjectNode object = Manner.object().put("ok", true).put("command", moved.command()).put("changed", moved.changed());
        ArrayNode files = object.putArray("files");
        moved.files().forEach(file -> files.addObject().put("file", file.file()).put("there", file.there()));
        return object;
    }

    private static String names(List<NoteEdits.FileNow> files) {
        return files.stream().map(NoteEdits.FileNow::file).collect(Collectors.joining(", "));
    }
}
