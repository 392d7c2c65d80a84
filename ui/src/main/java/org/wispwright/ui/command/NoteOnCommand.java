package org.wispwright.ui.command;

import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;

/** {@code note on SHOT ID}. */
@Command(name = "on", sortOptions = false,
        description = "Let a note that is off take part again. Of its file only the key \"on\" changes.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note on samples/kiln-yard open-a-gap",
            "  java -jar wispwright.jar note on samples/kiln-yard open-a-gap --json"})
final class NoteOnCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private NoteChoice choice;

    @Override
    public Integer call() {
        String id = choice.id();
        boolean changed = choice.edits().setOn(id, true);
        manner.say(changed ? "Note '" + id + "' is on." : "Note '" + id + "' is on already; nothing was done.",
                Manner.object().put("ok", true).put("id", id).put("on", true).put("changed", changed));
        return ExitCodes.OK;
    }
}
