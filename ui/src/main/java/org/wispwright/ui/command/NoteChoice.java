package org.wispwright.ui.command;

import java.nio.file.Path;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.ShotFolder;
import picocli.CommandLine.Parameters;

/** Which note of which shot a command works on. Mixed into the commands that change or copy one note. */
final class NoteChoice {
    @Parameters(index = "0", paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Parameters(index = "1", paramLabel = "ID", description = "The note: its file's name without .json.")
    private String id;

    /** The folder. @throws org.wispwright.ui.shot.ShotException if it is no shot folder */
    ShotFolder folder() {
        return ShotFolder.open(shot);
    }

    /** The shot's notes. @throws org.wispwright.ui.shot.ShotException if it is no shot folder */
    NoteEdits edits() {
        return NoteEdits.of(folder());
    }

    /** The note's id. */
    String id() {
        return id;
    }
}
