package org.wispwright.ui.command;

import java.util.Optional;
import java.util.concurrent.Callable;
import org.wispwright.ui.shot.Note;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** {@code note copy SHOT ID --frame F [--view V] [--id NEW]}. */
@Command(name = "copy", sortOptions = false,
        description = "Make a note with the same retouch, words and holds on another frame. Of its text only frame and view differ.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note copy samples/kiln-yard open-a-gap --frame 1030",
            "  java -jar wispwright.jar note copy samples/kiln-yard open-a-gap --frame 1030 --view side --id gap-from-the-side"})
final class NoteCopyCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private NoteChoice choice;

    @Option(names = "--frame", paramLabel = "F", required = true, description = "The frame of the new note.")
    private int frame;

    @Option(names = "--view", paramLabel = "V", description = "The view of the new note. Default: the same.")
    private String view;

    @Option(names = "--id", paramLabel = "NEW", description = "The id of the new note, which must be free. Default: ID-F.")
    private String newId;

    @Override
    public Integer call() {
        String id = choice.id();
        Note note = choice.edits().copy(id, frame, Optional.ofNullable(view), Optional.ofNullable(newId));
        manner.say("Note '" + note.id() + "' made of '" + id + "': frame " + note.frame() + ", view " + note.view() + ".",
                Manner.object().put("ok", true).put("id", note.id()).put("from", id).put("frame", note.frame()).put("view", note.view()));
        return ExitCodes.OK;
    }
}
