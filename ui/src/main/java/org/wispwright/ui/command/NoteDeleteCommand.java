package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.ShotFolder;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code note delete SHOT ID}. */
@Command(name = "delete", sortOptions = false, description = "Delete a note. Its text stays in the journal, so 'note undo' brings it back.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note delete samples/kiln-yard open-a-gap",
            "  java -jar wispwright.jar note undo samples/kiln-yard"})
final class NoteDeleteCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Parameters(index = "0", paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Parameters(index = "1", paramLabel = "ID", description = "The note: its file's name without .json.")
    private String id;

    @Override
    public Integer call() {
        NoteEdits.of(ShotFolder.open(shot)).delete(id);
        manner.say("Note '" + id + "' deleted; 'note undo' brings it back.", Manner.object().put("ok", true).put("id", id));
        return ExitCodes.OK;
    }
}
