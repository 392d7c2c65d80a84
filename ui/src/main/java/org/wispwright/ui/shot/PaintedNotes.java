package org.wispwright.ui.shot;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.SerializationFeature;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ObjectNode;
import org.wispwright.warp.retouch.Repaint;

/** Makes notes whose retouch is a paint-over: first its layers as a file beside the notes, then the note, one entry in the journal. */
public final class PaintedNotes {
    private static final ObjectMapper JSON = JsonMapper.builder().enable(SerializationFeature.INDENT_OUTPUT).build();

    private PaintedNotes() {
    }

    /**
     * Refuses what would be refused at the end, before the work of reading pictures.
     *
     * @throws ShotException if the id is none or is taken
     */
    public static void requireFree(ShotFolder folder, String id) {
        NoteEdits.of(folder).requireNew(id);
    }

    /**
     * Makes a note. If it cannot be made nothing is left of its layers.
     *
     * @param command what the person asked for, for the journal
     * @throws ShotException if the shot or the note is not as it must be, the name is taken, or the disk refuses
     */
    public static Note make(ShotFolder folder, String id, String words, int frame, String view, Repaint repaint, String command) {
        NoteEdits edits = NoteEdits.of(folder);
        edits.requireNew(id);
        boolean wasThere = PaintFile.isThere(folder, id, repaint);
        String file = PaintFile.write(folder, id, repaint);
        ObjectNode note = JSON.createObjectNode().put("wispwright", SetupReader.FORMAT).put("words", words).put("frame", frame)
                .put("view", view);
        note.putArray("retouch").addObject().putObject("paintOver").put("layers", file);
        try {
            return edits.make(id, JSON.writeValueAsString(note) + "\n", command);
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException(impossible);
        } catch (ShotException refused) {
            if (!wasThere) {
                PaintFile.remove(folder, file);
            }
            throw refused;
        }
    }
}
