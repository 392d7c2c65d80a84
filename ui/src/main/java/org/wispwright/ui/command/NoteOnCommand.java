package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.ShotFolder;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code note on SHOT ID}. */
@Command(name = "on", sortOptions = false,
        description = "Let a note that is off take part again. Of its file only the key \"on\" changes.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note on samples/kiln-yard open-a-gap",
            "  java -jar wispwright.jar note on samples/kiln-yard open-a-gap --json"})
final class NoteOnCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Parameters(index = "0", paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Parameters(index = "1", paramLabel = "ID", description = "The note: its file's name without .json.")
    private String id;

    @Override
    public Integer call() {
        boolean changed = NoteEdits.of(ShotFolder.open(shot)).setOn(id, true);
        manner.say(changed ? "Note '" + id + "' is on." : "Note '" + id + "' is on already; nothing was done.",
                Manner.object().put("ok", true).put("id", id).put("on", true).put("changed", changed));
        return ExitCodes.OK;
    }
}
