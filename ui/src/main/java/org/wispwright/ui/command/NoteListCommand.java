package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.stream.Collectors;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.ShotFolder;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code note list SHOT}. */
@Command(name = "list", sortOptions = false, description = "List the notes: id, frame, view, weight, on or off, words. Writes nothing.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note list samples/kiln-yard",
            "  java -jar wispwright.jar note list samples/kiln-yard --json"})
final class NoteListCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Parameters(paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Override
    public Integer call() {
        List<NoteEdits.Listed> notes = NoteEdits.of(ShotFolder.open(shot)).list();
        ObjectNode object = Manner.object().put("ok", true);
        ArrayNode array = object.putArray("notes");
        for (NoteEdits.Listed listed : notes) {
            Note note = listed.note();
            array.addObject().put("id", note.id()).put("frame", note.frame()).put("view", note.view()).put("weight", note.weight())
                    .put("on", listed.on()).put("words", note.words());
        }
        manner.say(notes.isEmpty() ? "The shot has no note." : notes.stream().map(NoteListCommand::line)
                .collect(Collectors.joining(System.lineSeparator())), object);
        return ExitCodes.OK;
    }

    private static String line(NoteEdits.Listed listed) {
        Note note = listed.note();
        String weight = note.weight() == Math.rint(note.weight()) ? String.valueOf((long) note.weight()) : String.valueOf(note.weight());
        return note.id() + "  frame " + note.frame() + "  view " + note.view() + "  weight " + weight + (listed.on() ? "  on   " : "  off  ")
                + note.words().replaceAll("\\s+", " ");
    }
}
