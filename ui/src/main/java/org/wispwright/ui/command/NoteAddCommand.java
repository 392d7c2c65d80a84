package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.NoteValues;
import org.wispwright.ui.shot.RetouchFile;
import org.wispwright.ui.shot.ShotFolder;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code note add SHOT --id ID --frame F --view V --words TEXT --retouch FILE [--weight W]}. */
@Command(name = "add", sortOptions = false,
        description = "Make a note from a retouch file: a JSON object with \"wispwright\": 1, \"retouch\" and perhaps \"holds\", "
                + "as in a note.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note add samples/kiln-yard --id dent --frame 1030 --view front --words \"Dent the left side.\""
                + " --retouch dent.json",
            "  java -jar wispwright.jar note add samples/kiln-yard --id dent --frame 1030 --view front --words Dent. --weight 2"
                + " --retouch dent.json"})
final class NoteAddCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Parameters(paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Option(names = "--id", paramLabel = "ID", required = true, description = "The id of the new note, which must be free.")
    private String id;

    @Option(names = "--frame", paramLabel = "F", required = true, description = "The frame.")
    private int frame;

    @Option(names = "--view", paramLabel = "V", required = true, description = "The view.")
    private String view;

    @Option(names = "--words", paramLabel = "TEXT", required = true, description = "What the reviewer said.")
    private String words;

    @Option(names = "--retouch", paramLabel = "FILE", required = true, description = "The retouch file.")
    private Path retouch;

    @Option(names = "--weight", paramLabel = "W", description = "Share among the notes. Default: 1.")
    private Double weight;

    @Override
    public Integer call() {
        ShotFolder folder = ShotFolder.open(shot);
        Note note = NoteEdits.of(folder).add(id, new NoteValues(Optional.of(words), Optional.of(frame), Optional.of(view),
                Optional.ofNullable(weight), Optional.of(RetouchFile.read(retouch, Optional.of(folder)))));
        int operations = note.retouch().operations().size();
        manner.say("Note '" + note.id() + "' made: frame " + note.frame() + ", view " + note.view() + ", " + operations
                        + (operations == 1 ? " operation." : " operations."),
                Manner.object().put("ok", true).put("id", note.id()).put("frame", note.frame()).put("view", note.view())
                        .put("weight", note.weight()).put("operations", operations).put("holds", note.holds().size()));
        return ExitCodes.OK;
    }
}
