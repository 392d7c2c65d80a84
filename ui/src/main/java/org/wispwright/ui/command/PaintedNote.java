package org.wispwright.ui.command;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Locale;
import java.util.function.BiFunction;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.View;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.PaintedNotes;
import org.wispwright.ui.shot.Shot;
import org.wispwright.warp.paintover.Painted;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** What {@code note paint-over} and {@code note silhouette} have in common: which note is made, and how it is told. Mixed into both. */
final class PaintedNote {
    /** Below this a person should look before a solve. */
    private static final double SURE = 0.8;

    @Mixin
    private ShotChoice choice;

    @Option(names = "--id", paramLabel = "ID", required = true, description = "The id of the new note, which must be free.")
    private String id;

    @Option(names = "--frame", paramLabel = "F", required = true, description = "The frame that the picture shows.")
    private int frame;

    @Option(names = "--view", paramLabel = "V", required = true, description = "The view that it was rendered in.")
    private String view;

    @Option(names = "--words", paramLabel = "WORDS", required = true, description = "What the reviewer said.")
    private String words;

    /** The shot folder's parts that a reading needs. */
    record Place(Shot shot, View camera, int frame, ShotChoice choice) {
    }

    /** Reads, makes the note unless there is nothing to make it of, and says what came out. */
    int make(String command, Manner manner, BiFunction<Place, Lanes, Painted> reading) {
        PaintedNotes.requireFree(choice.folder(), id);
        Shot shot = choice.shot();
        View camera = ShotChoice.view(shot, view).view();
        ShotChoice.requireFrame(shot, frame);
        Painted painted;
        try (Lanes lanes = new Lanes(choice.threads())) {
            painted = reading.apply(new Place(shot, camera, frame, choice), lanes);
        }
        ObjectNode object = Manner.object().put("ok", true).put("made", !painted.isNothing()).put("way", way(painted))
                .put("share", painted.share()).put("massBefore", painted.massBefore()).put("massAfter", painted.massAfter())
                .put("confidence", painted.confidence()).put("noise", painted.noise());
        if (painted.isNothing()) {
            manner.say(String.format(Locale.ROOT, "Nothing changed beyond noise (%.2f codes of 255), so no note was made.",
                    255 * painted.noise()),
                    object);
            return ExitCodes.OK;
        }
        Note note = PaintedNotes.make(choice.folder(), id, words, frame, view, painted.repaint(),
                "note " + command + " --id " + id + " --frame " + frame + " --view " + view);
        object.put("id", note.id()).put("frame", note.frame()).put("view", note.view());
        manner.say("Note '" + id + "' made: frame " + frame + ", view " + view + ". " + told(painted), object);
        return ExitCodes.OK;
    }

    private static String told(Painted painted) {
        String what = switch (painted.way()) {
            case NOTHING -> "Nothing changed";
            case OPACITY -> "Smoke was added or removed";
            case MOVED -> "Smoke was moved";
            case BOTH -> "Smoke was moved, and added or removed";
        };
        double change = painted.massBefore() > 0 ? 100 * (painted.massAfter() / painted.massBefore() - 1) : 0;
        return String.format(Locale.ROOT, "%s on %.1f %% of the frame; mass %.4f to %.4f (%+.1f %%); confidence %.2f%s.", what,
                100 * painted.share(), painted.massBefore(), painted.massAfter(), change, painted.confidence(),
                painted.confidence() < SURE ? ", which is low: look at the wanted picture ('compare') before a solve" : "");
    }

    private static String way(Painted painted) {
        return painted.way().name().toLowerCase(Locale.ROOT);
    }
}
