package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.ShotFolder;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code note off SHOT ID}. */
@Command(name = "off", sortOptions = false,
        description = "Set a note aside: it is still read and checked, but takes no part in a solve or a comparison. "
                + "Of its file only the key \"on\" changes.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note off samples/kiln-yard open-a-gap",
            "  java -jar wispwright.jar note off samples/kiln-yard open-a-gap --json"})
final class NoteOffCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Parameters(index = "0", paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Parameters(index = "1", paramLabel = "ID", description = "The note: its file's name without .json.")
    private String id;

    @Override
    public Integer call() {
        boolean changed = NoteEdits.of(ShotFolder.open(shot)).setOn(id, false);
        manner.say(changed ? "Note '" + id + "' is off: it takes no part until 'note on'."
                        : "Note '" + id + "' is off already; nothing was done.",
                Manner.object().put("ok", true).put("id", id).put("on", false).put("changed", changed));
        return ExitCodes.OK;
    }
}
