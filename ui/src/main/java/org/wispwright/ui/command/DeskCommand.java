package org.wispwright.ui.command;

import java.awt.GraphicsEnvironment;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.window.DeskWindow;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** {@code desk [SHOT]}: the window; also what the program opens without a command. Ends when the window is closed. */
@Command(name = "desk", sortOptions = false,
        description = "Open the desk: the window in which notes are drawn, solved and compared. It is what opens without a command.",
        footer = {"", "This is a tool for pictures. It does not predict real smoke, fire or safety.", "", "Examples:",
            "  java -jar wispwright.jar",
            "  java -jar wispwright.jar desk samples/kiln-yard"})
final class DeskCommand implements Callable<Integer> {
    @Parameters(index = "0", arity = "0..1", paramLabel = "SHOT", description = "The shot folder to open.")
    private Path folder;

    @Override
    public Integer call() {
        return open(Optional.ofNullable(folder));
    }

    /** Opens the window and waits until it is closed. @throws ShotException if this machine has no display */
    static int open(Optional<Path> folder) {
        if (GraphicsEnvironment.isHeadless()) {
            throw new ShotException(new Finding("desk", "", "this machine has no display to open a window on; use the commands "
                    + "(wispwright --help), or run it where there is one."));
        }
        DeskWindow.runUntilClosed(folder);
        return ExitCodes.OK;
    }
}
