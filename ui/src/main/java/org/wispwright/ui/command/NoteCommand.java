package org.wispwright.ui.command;

import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** {@code note WHAT SHOT}: works on the notes of a shot without a screen; each WHAT is a command of its own. */
@Command(name = "note", sortOptions = false, synopsisSubcommandLabel = "WHAT",
        description = "List the notes of a shot, make and change them, set them aside, carry them to other frames, make them of painted "
                + "frames; every change can be taken back.",
        subcommands = {NoteListCommand.class, NoteAddCommand.class, NoteSetCommand.class, NoteOffCommand.class,
                NoteOnCommand.class, NoteCopyCommand.class, NoteCarryCommand.class, NoteBetweenCommand.class,
                NotePaintOverCommand.class, NoteSilhouetteCommand.class, NoteDeleteCommand.class, NoteUndoCommand.class,
                NoteRedoCommand.class},
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note list samples/kiln-yard",
            "  java -jar wispwright.jar note off samples/kiln-yard open-a-gap",
            "  java -jar wispwright.jar note copy samples/kiln-yard open-a-gap --frame 1030",
            "  java -jar wispwright.jar note undo samples/kiln-yard",
            "  java -jar wispwright.jar note copy --help"})
final class NoteCommand implements Runnable {
    @Option(names = {"-h", "--help"}, usageHelp = true, description = "Show this help and end.")
    private boolean help;

    @Spec
    private CommandSpec spec;

    /** Without a WHAT: says that one is needed. */
    @Override
    public void run() {
        throw new ParameterException(spec.commandLine(), "'note' needs one of " + String.join(", ", spec.subcommands().keySet()));
    }
}
