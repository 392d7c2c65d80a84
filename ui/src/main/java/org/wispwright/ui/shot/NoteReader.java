package org.wispwright.ui.shot;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.warp.loss.LossChoice;
import org.wispwright.warp.loss.LossKind;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.Retouch;

/** Reads {@code notes/<id>.json} (format: docs/shot-folder.md); positions are fractions of the picture's height. */
final class NoteReader {
    /** The most notes that a shot may have. */
    static final int MOST_NOTES = 1000;
    /** The most a note file may weigh: 4 MiB. */
    static final long MOST_BYTES = 4L << 20;
    /** What the name of a note file without its ending must match. */
    static final String ID = "[A-Za-z0-9][A-Za-z0-9_-]{0,63}";

    private final ShotFolder folder;
    private final MattePictures mattes;
    private final Findings findings;

    NoteReader(ShotFolder folder, MattePictures mattes, Findings findings) {
        this.folder = folder;
        this.mattes = mattes;
        this.findings = findings;
    }

    /**
     * Notes in the order of their ids.
     *
     * @param on take part
     * @param off are read and checked all the same
     */
    record Notes(List<Note> on, List<Note> off) {
    }

    /** All notes that could be read; what could not be read is in the findings. */
    Notes read() {
        Notes notes = new Notes(new ArrayList<>(), new ArrayList<>());
        for (String name : findings.attempt(() -> folder.names("notes", ".json", MOST_NOTES)).orElse(List.of())) {
            String file = "notes/" + name;
            findings.check(() -> {
                JsonPlace top = JsonDoor.read(folder, file, MOST_BYTES).with(mattes);
                Note note = note(top, name, folder);
                (isOn(top) ? notes.on() : notes.off()).add(note);
            });
        }
        return notes;
    }

    /** Whether the note takes part: the key {@code on}, true where it is not written. */
    static boolean isOn(JsonPlace top) {
        return top.ask("on").map(JsonPlace::truth).orElse(true);
    }

    /** The note of a file; its paint-overs are read from the folder. @throws ShotException if it is not as it must be */
    static Note note(JsonPlace top, String fileName, ShotFolder folder) {
        String id = fileName.substring(0, fileName.length() - ".json".length());
        if (!id.matches(ID)) {
            throw top.fault("the file name '" + fileName + "'", "letters, digits, '-' and '_' before .json, at most 64", "rename the file");
        }
        top.version(SetupReader.FORMAT).only("wispwright", "on", "words", "frame", "view", "weight", "weighBy", "retouch", "holds", "loss");
        String words = top.need("words").text(2000);
        int frame = top.need("frame").whole(0, Integer.MAX_VALUE);
        String view = top.need("view").text(100);
        double weight = top.ask("weight").map(p -> p.positive(1000)).orElse(1.0);
        Optional<Matte> weighBy = top.ask("weighBy").map(MatteReader::matte);
        Retouch retouch = retouch(top, folder);
        List<Hold> holds = HoldReader.ofNote(top, frame);
        Optional<LossChoice> loss = top.ask("loss").map(NoteReader::loss);
        return top.make(() -> new Note(id, words, frame, view, weight, weighBy, retouch, holds, loss));
    }

    /** The list of operations; a note that was just begun has none. @throws ShotException if it is not as it must be */
    static Retouch retouch(JsonPlace top, ShotFolder folder) {
        JsonPlace list = top.need("retouch");
        List<Operation> operations = list.items(0, Retouch.MOST_OPERATIONS).stream().map(place -> RetouchReader.operation(place, folder))
                .toList();
        return list.make(() -> new Retouch(operations));
    }

    private static LossChoice loss(JsonPlace place) {
        List<LossKind> kinds = place.items(1, LossKind.values().length).stream().map(item -> item.choice(LossKind.class)).toList();
        return place.make(() -> new LossChoice(kinds, "as the note says"));
    }
}
