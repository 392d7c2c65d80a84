package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.wispwright.ui.shot.NoteValues;
import org.wispwright.ui.shot.RetouchFile;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** {@code note set SHOT ID [--words TEXT] [--frame F] [--view V] [--weight W] [--retouch FILE]}. */
@Command(name = "set", sortOptions = false,
        description = "Give a note other words, another frame, view, weight or retouch. The rest of its file stays as it is.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note set samples/kiln-yard open-a-gap --weight 2",
            "  java -jar wispwright.jar note set samples/kiln-yard open-a-gap --words \"Open a wider gap.\" --retouch wider.json"})
final class NoteSetCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private NoteChoice choice;

    @Option(names = "--words", paramLabel = "TEXT", description = "What the reviewer said.")
    private String words;

    @Option(names = "--frame", paramLabel = "F", description = "The frame.")
    private Integer frame;

    @Option(names = "--view", paramLabel = "V", description = "The view.")
    private String view;

    @Option(names = "--weight", paramLabel = "W", description = "Share among the notes.")
    private Double weight;

    @Option(names = "--retouch", paramLabel = "FILE",
            description = "A retouch file; its holds, if it has any, take the place of the note's.")
    private Path retouch;

    @Spec
    private CommandSpec spec;

    @Override
    public Integer call() {
        String id = choice.id();
        NoteValues values = new NoteValues(Optional.ofNullable(words), Optional.ofNullable(frame), Optional.ofNullable(view),
                Optional.ofNullable(weight), Optional.ofNullable(retouch).map(path -> RetouchFile.read(path,
                Optional.of(choice.folder()))));
        if (values.isEmpty()) {
            throw new ParameterException(spec.commandLine(), "'note set' needs one of --words, --frame, --view, --weight, --retouch");
        }
        boolean changed = choice.edits().set(id, values);
        manner.say(changed ? "Note '" + id + "' changed." : "Note '" + id + "' is so already; nothing was done.",
                Manner.object().put("ok", true).put("id", id).put("changed", changed));
        return ExitCodes.OK;
    }
}
