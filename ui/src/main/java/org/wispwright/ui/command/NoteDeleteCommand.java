package org.wispwright.ui.command;

import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;

/** {@code note delete SHOT ID}. */
@Command(name = "delete", sortOptions = false, description = "Delete a note. Its text stays in the journal, so 'note undo' brings it back.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note delete samples/kiln-yard open-a-gap",
            "  java -jar wispwright.jar note undo samples/kiln-yard"})
final class NoteDeleteCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private NoteChoice choice;

    @Override
    public Integer call() {
        String id = choice.id();
        choice.edits().delete(id);
        manner.say("Note '" + id + "' deleted; 'note undo' brings it back.", Manner.object().put("ok", true).put("id", id));
        return ExitCodes.OK;
    }
}
