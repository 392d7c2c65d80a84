package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.ShotFolder;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code note undo SHOT}. */
@Command(name = "undo", sortOptions = false,
        description = "Take back the last change that off, on, copy or delete made and that was not taken back yet, and say which. "
                + "Refused if the note's file has been changed by hand since.",
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
        NoteEdits.Undone undone = NoteEdits.of(ShotFolder.open(shot)).undo();
        manner.say("Took back '" + undone.command() + "': " + undone.file() + (!undone.changed()
                        ? " was as before already, so only the journal changed."
                        : undone.there() ? " is as it was before." : " is gone again."),
                Manner.object().put("ok", true).put("command", undone.command()).put("file", undone.file())
                        .put("there", undone.there()).put("changed", undone.changed()));
        return ExitCodes.OK;
    }
}
