package org.wispwright.ui.command;

import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;

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

    @Mixin
    private NoteChoice choice;

    @Override
    public Integer call() {
        String id = choice.id();
        boolean changed = choice.edits().setOn(id, false);
        manner.say(changed ? "Note '" + id + "' is off: it takes no part until 'note on'."
                        : "Note '" + id + "' is off already; nothing was done.",
                Manner.object().put("ok", true).put("id", id).put("on", false).put("changed", changed));
        return ExitCodes.OK;
    }
}
